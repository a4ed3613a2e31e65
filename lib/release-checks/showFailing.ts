import type { Answers, BuiltCase, CheckPlan, Difficulty, Marking, PublicCase } from "@/lib/checks/kind";
import { caseSeed } from "@/lib/checks/release-check/caseSeed";
import { judgeTally } from "@/lib/checks/release-check/judgeTally";
import { GUESSES_PER_CASE } from "@/lib/checks/release-check/rule";
import { emptyTally } from "@/lib/checks/release-check/tally";
import { handInOf, type TriedKind } from "@/lib/checks/release-check/tryCase";
import { casesOf } from "./casesOf";
import { releaseCheckFingerprint } from "./releaseCheckFingerprint";
import { truthText } from "./truthText";

/** Which hand-in of which tried case: line of the table, number of the case, number of the hand-in from 0. */
export type TriedHandIn = { line: string; n: number; hand: number };

export type FailingCase = {
  /** Name of the line. */
  label: string;
  /** Null where the builder finds no case: `fault` says why. */
  view: PublicCase | null;
  fault: string;
  /** What a technician works on is a file, and none is made for looking at it. */
  worksFromFiles: boolean;
  truth: string;
  difficulty: Difficulty[];
  answers: Answers;
  /** Null of a whole case too: its samples are not made for looking at it. */
  marking: Marking | null;
};

/** A tried case made again, with its truth and the marking of its hand-in; null for one that was never tried. */
export function showFailing(kind: TriedKind, plan: CheckPlan, { line, n, hand }: TriedHandIn): FailingCase | null {
  const label = labelOf(kind, plan, line);
  const { cases, whole } = casesOf(plan, false);
  const most = line === "whole" ? whole : cases;
  if (label === null || !inside(n, most) || !inside(hand, line === "guess" ? GUESSES_PER_CASE : 1)) return null;
  const seedHex = caseSeed(releaseCheckFingerprint(plan), n, line === "whole" ? "whole" : "case");
  const built = buildOrFault(kind, plan, seedHex);
  if (typeof built === "string") {
    return {
      label,
      view: null,
      fault: built,
      worksFromFiles: false,
      truth: "",
      difficulty: [],
      answers: {},
      marking: null,
    };
  }
  const shown = {
    ...{ label, view: built.publicCase, fault: "", truth: truthText(built.truth) },
    worksFromFiles: worksFromFiles(kind, built),
    difficulty: kind.trial.difficulty(built, plan),
  };
  if (line === "whole") return { ...shown, answers: {}, marking: null };
  const answers = handInOf(kind, plan, built, seedHex, line, hand);
  return { ...shown, answers, marking: kind.trial.judge(built, plan, answers) };
}

/** The samples are left out, or what is shown names a file. */
const worksFromFiles = ({ trial }: TriedKind, { files, publicCase }: BuiltCase): boolean =>
  !trial.whole || Object.values(publicCase.data).some((value) => files.some(({ name }) => name === value));

const inside = (number: number, count: number) => Number.isInteger(number) && number >= 0 && number < count;

const labelOf = (kind: TriedKind, plan: CheckPlan, line: string): string | null => {
  const counted = { ...emptyTally(), lines: { whole: { tried: 0, met: 0 } } };
  return judgeTally(kind, plan, counted).find(({ id }) => id === line)?.label ?? null;
};

function buildOrFault(kind: TriedKind, plan: CheckPlan, seedHex: string) {
  try {
    return kind.trial.build(seedHex, plan);
  } catch (error) {
    return error instanceof Error ? error.message : String(error);
  }
}
