import { cableDelayNs } from "@/lib/gnss/chain/cableDelay";
import type { WrongMethod } from "../kind";
import { budgetOf, delayOfPart, standardNs, statedNs } from "./budget";
import type { DelayEntryTruth } from "./drawCase";
import type { DelayEntryParameters } from "./parameters";
import { PULSE_LEAD, wayOf, type SitePart } from "./site";
import { solve, type Steps } from "./solve";

type Wrong = WrongMethod<DelayEntryParameters, DelayEntryTruth>;

const wrong = (label: string, misses: Wrong["misses"], step: Partial<Steps>): Wrong => ({
  label,
  misses,
  solve: ({ publicCase }) => solve(publicCase, step),
});

/** Typical wrong ways; each differs from the right one in the named step alone. */
export const wrongMethods: Readonly<Record<string, Wrong>> = {
  "wrong-sign": {
    label: "The value entered with the wrong sign",
    misses: ["entry"],
    solve({ publicCase }) {
      const right = solve(publicCase);
      return { ...right, "entry.value": String(-Number(right["entry.value"])) };
    },
  },
  "reel-length": wrong("The drum's length taken for the installed one", ["parts"], {
    delayNs: (part, runNs) => delayOfPart(onTheDrum(part), runNs),
  }),
  "light-in-air": wrong("Cables counted with the speed of light in air", ["parts"], {
    delayNs: ({ paper, ...part }, runNs) =>
      paper.says === "cable" ? cableDelayNs(paper.installedM, 1) : delayOfPart({ ...part, paper }, runNs),
  }),
  "pulse-lead-forgotten": wrong("The way counted to the receiver's output only, without the 1PPS lead", ["parts"], {
    counts: (parts) => wayOf(parts).filter(({ name }) => name !== PULSE_LEAD),
  }),
  "strays-counted": wrong("Every part of the list counted", ["parts"], { counts: (parts) => parts }),
  "echo-not-halved": wrong("The echo's time there and back taken for the delay of the run", ["parts"], {
    runNs: ({ leadNs, endNs }) => endNs - leadNs,
  }),
  "test-lead-left-in": wrong("The test lead left in the measured run", ["parts"], { runNs: ({ endNs }) => endNs / 2 }),
  "added-straight": wrong("Standard uncertainties added straight, not as squares", ["uncertainty"], {
    uncertaintyNs: (counted) => counted.reduce((sum, { part, ns }) => sum + standardNs(part.uncertainty, ns), 0),
  }),
  "limits-as-standard": wrong("Limits taken for standard uncertainties", ["uncertainty"], {
    uncertaintyNs: (counted) => budgetOf(counted, statedNs).uncertaintyNs,
  }),
};

const onTheDrum = ({ paper, ...part }: SitePart): SitePart =>
  paper.says === "cable" && paper.reelM !== null
    ? { ...part, paper: { ...paper, installedM: paper.reelM } }
    : { ...part, paper };
