import type { Answers, PublicCase } from "../kind";
import { givenIn } from "./publicCase";
import { QUADRANTS } from "./quantities";
import { choiceOf, survey, type Surveyed } from "./survey";

/** The right method, from roof and horizons alone. */
export function solve(publicCase: PublicCase): Answers {
  const { roof, rules } = givenIn(publicCase);
  const surveyed = survey(roof, rules);
  return answersFor(surveyed, choiceOf(surveyed));
}

/** As somebody writes it down, to a tenth. */
export const answersFor = (surveyed: readonly Surveyed[], choice: string): Answers =>
  Object.fromEntries([
    ...surveyed.flatMap(({ id, blockedPercent, quadrantsPercent, worst, roomM }) => [
      [`${id}.blocked`, `${blockedPercent.toFixed(1)} %`],
      [`${id}.quadrant`, QUADRANTS[worst].value],
      [`${id}.quadrantBlocked`, `${quadrantsPercent[worst].toFixed(1)} %`],
      [`${id}.room`, `${roomM.toFixed(1)} m`],
    ]),
    ["verdict.choice", choice],
  ]);
