import type { CheckKind, CheckPlan } from "@/lib/checks/kind";

/** A plan with the kind's own defaults; `over` replaces single parameters. */
export function planOf<P, T>(kind: CheckKind<P, T>, over: Partial<P> = {}): CheckPlan<P> {
  const defaults = Object.fromEntries(kind.parameters.map((spec) => [spec.name, spec.default])) as P;
  return {
    id: "sample",
    kind: kind.id,
    version: kind.version,
    title: kind.title,
    minutes: kind.defaultMinutes,
    needs: null,
    parameters: { ...defaults, ...over },
    quantities: [],
  };
}

/** Seeds by number, far apart in every digit. */
export const seedOf = (n: number): string =>
  Array.from({ length: 8 }, (_, word) =>
    (Math.imul(n * 8 + word + 1, 0x9e3779b1) >>> 0).toString(16).padStart(8, "0"),
  ).join("");

export const seeds = (count: number): string[] => Array.from({ length: count }, (_, n) => seedOf(n));
