import { MOST_SITTINGS_GUESSED } from "./rule";

/** As the front matter of a module has it. */
export type Required = { all: readonly string[]; some: { of: readonly string[]; count: number } | null };

/** Rate at which one case of a check is met; null where people judge and nothing can be computed. */
export type CheckRates = { id: string; read: number | null; guess: number | null };

export type SittingRates = {
  /** Careful people, each check sat once, and with every fresh case that the release allows. */
  careful: number;
  carefulWithFresh: number;
  /** Blind guessing with every fresh case: the most that it can reach. */
  guessed: number;
  guessedWithin: boolean;
  /** Checks that people judge: taken as met, by everybody. */
  taken: string[];
};

/** What the requirement comes to over the whole sitting, checks and cases taken as independent of each other. */
export function sittingRates(required: Required, freshCases: number, checks: readonly CheckRates[]): SittingRates {
  const over = (of: (rates: CheckRates) => number | null, cases: number) =>
    requirementRate(required, new Map(checks.map((rates) => [rates.id, withCases(of(rates) ?? 1, cases)])));
  const guessed = over(({ guess }) => guess, 1 + freshCases);
  return {
    careful: over(({ read }) => read, 1),
    carefulWithFresh: over(({ read }) => read, 1 + freshCases),
    guessed,
    guessedWithin: guessed <= MOST_SITTINGS_GUESSED,
    taken: checks.filter(({ read }) => read === null).map(({ id }) => id),
  };
}

/** Met at least once in so many cases. */
function withCases(rate: number, cases: number): number {
  let met = 0;
  for (let n = 0; n < cases; n++) met += (1 - met) * rate;
  return met;
}

/** All of these, and at least so many of those; a check in both lists is met or not in both. */
function requirementRate({ all, some }: Required, rates: ReadonlyMap<string, number>): number {
  const rateOf = (id: string) => rates.get(id) ?? 0;
  const needed = new Set(all);
  const every = [...needed].reduce((product, id) => product * rateOf(id), 1);
  if (!some) return every;
  const sure = some.of.filter((id) => needed.has(id)).length;
  const others = [...new Set(some.of)].filter((id) => !needed.has(id));
  // A check that is named twice counts twice, as when the requirement itself is looked at.
  const weightOf = (id: string) => some.of.filter((one) => one === id).length;
  let chances = [1];
  for (const id of others) chances = withOneMore(chances, rateOf(id), weightOf(id));
  const wanted = Math.max(0, some.count - sure);
  return every * chances.slice(wanted).reduce((sum, chance) => sum + chance, 0);
}

/** Chances of so many met, by number, after one more check. */
function withOneMore(chances: readonly number[], rate: number, weight: number): number[] {
  const next = new Array<number>(chances.length + weight).fill(0);
  chances.forEach((chance, met) => {
    next[met] += chance * (1 - rate);
    next[met + weight] += chance * rate;
  });
  return next;
}
