import { chipsToMetres } from "@/lib/gnss/constants";
import type { Answers, PublicCase, WrongMethod } from "../kind";
import type { SidePeakTruth } from "./drawCase";
import type { SidePeakParameters } from "./parameters";
import { solve } from "./solve";

type Wrong = WrongMethod<SidePeakParameters, SidePeakTruth>;

/** Typical wrong readings; each differs from the right one in the named step alone. */
export const wrongMethods: Readonly<Record<string, Wrong>> = {
  "ten-log": {
    label: "10 log of magnitudes instead of 20 log",
    misses: ["sideLevel"],
    solve({ publicCase }) {
      const right = solve(publicCase);
      const half = (field: string) => (Number(right[field]) / 2).toFixed(1);
      return { ...right, "earlier.level": half("earlier.level"), "later.level": half("later.level") };
    },
  },
  "lock-trusted": {
    label: "The lock believed: tracked peak called the main one, side peaks written down by formula",
    misses: ["sideLevel"],
    solve: ({ publicCase }) => ({
      ...byFormula(publicCase),
      "lock.peak": "main",
      "lock.lag": (publicCase.data.trackedLagChips as number).toFixed(3),
      "lock.bias": "0",
    }),
  },
  "by-formula": {
    label: "Side peaks taken as half a chip off and 6 dB down, without reading them",
    misses: ["sideLevel"],
    solve: ({ publicCase }) => byFormula(publicCase),
  },
  "whole-chip": {
    label: "Side peaks taken as a whole chip off",
    misses: ["sideBias"],
    solve: ({ publicCase }) => withBiases(publicCase, (bias) => (bias < 0 ? -1 : 1) * chipsToMetres(1)),
  },
  sign: {
    label: "Sign of the bias turned round: a later peak taken for a range too short",
    misses: ["sideBias"],
    solve: ({ publicCase }) => withBiases(publicCase, (bias) => -bias),
  },
  reflection: {
    label: "Unequal peaks put down to a reflection",
    misses: ["peak"],
    solve: ({ publicCase }) => ({ ...solve(publicCase), "lock.peak": "reflection" }),
  },
};

function byFormula(shown: PublicCase): Answers {
  const halfChipM = chipsToMetres(0.5).toFixed(1);
  const side = {
    "earlier.bias": `-${halfChipM}`,
    "earlier.level": "6.0",
    "later.bias": halfChipM,
    "later.level": "6.0",
  };
  return { ...solve(shown), ...side };
}

/** All three biases wrong in the same way; that of a lock on the main peak is left as it is. */
function withBiases(shown: PublicCase, wrong: (biasM: number) => number): Answers {
  const right = solve(shown);
  const changed = (field: string) => wrong(Number(right[field])).toFixed(1);
  return {
    ...right,
    ...(right["lock.peak"] === "side" ? { "lock.bias": changed("lock.bias") } : {}),
    "earlier.bias": changed("earlier.bias"),
    "later.bias": changed("later.bias"),
  };
}
