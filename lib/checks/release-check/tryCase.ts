import { seededRandom } from "@/lib/numeric/random";
import { wrongMethodsOf } from "../definitionsOf";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers, BuiltCase, CheckKind, CheckPlan, Difficulty, Marking, Trial } from "../kind";
import { caseSeed } from "./caseSeed";
import { GUESSES_PER_CASE } from "./rule";
import type { Failing, LineId, Tally } from "./tally";

export type TriedKind = CheckKind & { readonly trial: Trial };

/** One case, and every hand-in that is tried on it. */
export function tryCase(kind: TriedKind, plan: CheckPlan, baseSeedHex: string, n: number): Tally {
  const seedHex = caseSeed(baseSeedHex, n, "case");
  const count = counter(n);
  const built = build(kind, plan, seedHex);
  if ("fault" in built) {
    count.add("solvable", false, 0, built.fault);
    return count.tally(null);
  }
  const { trial } = kind;
  const right = trial.judge(built, plan, handInOf(kind, plan, built, seedHex, "solvable", 0));
  const unfair = trial.difficulty(built, plan).find(({ value, from, to }) => !(value >= from && value <= to));
  const note = right.met ? unfair && outOfBand(unfair) : outside(right);
  count.add("solvable", note === undefined, 0, note ?? "");

  const tried = (line: LineId, hand: number) =>
    trial.judge(built, plan, handInOf(kind, plan, built, seedHex, line, hand));
  const read = tried("read", 0);
  count.add("read", read.met, 0, outside(read));
  for (const name of Object.keys(wrongMethodsOf(kind, plan))) {
    const wrong = tried(`wrong/${name}`, 0);
    if (handedIn(wrong) !== handedIn(right)) count.add(`wrong/${name}`, wrong.met, 0, "met by a wrong method");
    else count.name(`wrong/${name}`);
  }
  for (let hand = 0; hand < GUESSES_PER_CASE; hand++) {
    count.add("guess", tried("guess", hand).met, hand, "met by a blind guess");
  }
  return count.tally(built.draws);
}

/** The hand-in of one line of the table for a case, so that one that went wrong can be looked at. */
export function handInOf(
  kind: TriedKind,
  plan: CheckPlan,
  built: BuiltCase,
  seedHex: string,
  line: LineId,
  hand: number,
): Answers {
  const { trial } = kind;
  if (line === "read") return trial.read(built, plan, seededRandom(seedHex, "release-check/read"));
  if (line === "guess")
    return trial.guess(built.publicCase, plan, seededRandom(seedHex, `release-check/guess-${hand}`));
  if (line === "solvable") return trial.solve ? trial.solve(built, plan) : kind.solve(built, plan);
  const method = wrongMethodsOf(kind, plan)[line.slice("wrong/".length)];
  if (!method) throw new RangeError(`handInOf: ${kind.id} has no line ${line}`);
  return method.solve(built, plan);
}

// A builder that finds no fair case says so by throwing; the lead has to see that, whatever else the parameters do.
function build(kind: TriedKind, plan: CheckPlan, seedHex: string): BuiltCase | { fault: string } {
  try {
    return kind.trial.build(seedHex, plan);
  } catch (error) {
    return { fault: `not built: ${error instanceof Error ? error.message : String(error)}` };
  }
}

/** As it was read: two texts for one value are one answer. */
const handedIn = ({ rows }: Marking): string =>
  JSON.stringify(
    rows.map(({ quantity, subject, understood, handedIn: text }) => [quantity, subject, understood ?? text]),
  );

export const outside = ({ rows }: Marking): string => {
  const labels = rows
    .filter(({ within }) => !within)
    .map(({ label, subject }) => [label, subject].filter(Boolean).join(", "));
  return `outside: ${[...new Set(labels)].join("; ")}`.slice(0, 300);
};

const outOfBand = ({ label, unit, value, from, to }: Difficulty): string =>
  `unfair: ${label} ${formatUnderstood(value, unit)}, fair is ${formatUnderstood(from, unit)} to ${formatUnderstood(to, unit)}`;

/** Counts the hand-ins of one case. Of a wrong method or a guess it is the met ones that are to be looked at. */
export function counter(n: number) {
  const lines: Tally["lines"] = {};
  const failing: Failing[] = [];
  const name = (line: LineId) => (lines[line] ??= { tried: 0, met: 0 });
  return {
    name,
    add(line: LineId, met: boolean, hand: number, note: string) {
      const count = name(line);
      count.tried += 1;
      if (met) count.met += 1;
      if (met === (line === "guess" || line.startsWith("wrong/"))) failing.push({ line, n, hand, note });
    },
    tally: (draws: number | null): Tally => ({
      lines,
      built: draws === null ? 0 : 1,
      draws: draws ?? 0,
      mostDraws: draws ?? 0,
      failing: failing.sort((a, b) => (a.line < b.line ? -1 : a.line > b.line ? 1 : a.hand - b.hand)),
    }),
  };
}
