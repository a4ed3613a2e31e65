/** One line of the table: `solvable`, `whole`, `read`, `guess`, or `wrong/` with the name of a wrong method. */
export type LineId = string;

/** Hand-ins that were tried and those that met the check; of `solvable` and `whole`, cases and those that are sound. */
export type Count = { tried: number; met: number };

/** A case to look at: one that is not as it should be. `hand` counts the hand-ins of a line for one case, from 0. */
export type Failing = { line: LineId; n: number; hand: number; note: string };

/** What was counted over some cases, plain JSON. Tallies of parts add up to the tally of the whole. */
export type Tally = {
  lines: Record<LineId, Count>;
  /** Cases that were built, and how often the builder drew until it had them. */
  built: number;
  draws: number;
  mostDraws: number;
  failing: Failing[];
};

const MOST_FAILING = 5; // of each line: enough to see why, short enough to be stored

export const emptyTally = (): Tally => ({ lines: {}, built: 0, draws: 0, mostDraws: 0, failing: [] });

/** Order does not matter: of the failing cases those with the lowest numbers stay. */
export function addTallies(a: Tally, b: Tally): Tally {
  const ids = [...new Set([...Object.keys(a.lines), ...Object.keys(b.lines)])].sort();
  return {
    lines: Object.fromEntries(ids.map((id) => [id, addCounts(a.lines[id], b.lines[id])])),
    built: a.built + b.built,
    draws: a.draws + b.draws,
    mostDraws: Math.max(a.mostDraws, b.mostDraws),
    failing: firstOfEach([...a.failing, ...b.failing]),
  };
}

const NONE: Count = { tried: 0, met: 0 };
const addCounts = (a = NONE, b = NONE): Count => ({ tried: a.tried + b.tried, met: a.met + b.met });

function firstOfEach(failing: readonly Failing[]): Failing[] {
  const sorted = [...failing].sort((a, b) =>
    a.line < b.line ? -1 : a.line > b.line ? 1 : a.n - b.n || a.hand - b.hand,
  );
  return sorted.filter(({ line }, at) => sorted[at - MOST_FAILING]?.line !== line);
}
