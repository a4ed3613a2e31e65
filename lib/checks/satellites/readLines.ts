import { answerOf, isBlank } from "../answerOf";
import type { Answers } from "../kind";
import { parsePrn } from "../parsePrn";
import { MOST_LINES } from "./publicCase";

/** One line of the hand-in, as typed. */
export type ListedLine = { line: number; prn: string; codePhase: string; doppler: string; cn0: string };

export type ReadLines = {
  /** In the order of PRN; more than one line for a PRN that is listed twice. */
  byPrn: ReadonlyMap<number, readonly ListedLine[]>;
  /** Lines that name no satellite. */
  unread: readonly (ListedLine & { problem: string })[];
};

/** Sorts the lines of a hand-in by the satellite they name; lines left blank are no lines. */
export function readLines(answers: Answers): ReadLines {
  const byPrn = new Map<number, ListedLine[]>();
  const unread: (ListedLine & { problem: string })[] = [];
  for (const line of linesOf(answers)) {
    const reading = parsePrn(line.prn);
    if ("problem" in reading) unread.push({ ...line, problem: isBlank(line.prn) ? NO_PRN : reading.problem });
    else byPrn.set(reading.prn, [...(byPrn.get(reading.prn) ?? []), line]);
  }
  return { byPrn: new Map([...byPrn].sort(([a], [b]) => a - b)), unread };
}

const NO_PRN = "This line names no satellite.";

function linesOf(answers: Answers): ListedLine[] {
  const all = Array.from({ length: MOST_LINES }, (_, n) => {
    const typed = (field: string) => answerOf(answers, `satellites.${n + 1}.${field}`);
    return {
      line: n + 1,
      prn: typed("prn"),
      codePhase: typed("codePhase"),
      doppler: typed("doppler"),
      cn0: typed("cn0"),
    };
  });
  return all.filter(({ prn, codePhase, doppler, cn0 }) => ![prn, codePhase, doppler, cn0].every(isBlank));
}
