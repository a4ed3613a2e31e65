import type { WrongMethod } from "../kind";
import { answersFor } from "./answersFor";
import type { FalseLockTruth } from "./drawScene";
import type { FalseLockParameters } from "./parameters";

type Wrong = WrongMethod<FalseLockParameters, FalseLockTruth>;

/** Typical wrong methods; each takes the scene as found and differs in the named step alone. */
export const wrongMethods: Readonly<Record<string, Wrong>> = {
  "highest-peak-wins": {
    label: "What passes the threshold is there",
    misses: ["verdict", "test"],
    solve: ({ truth }) => ({ ...answersFor(truth, () => "genuine"), "falseLock.test": "highest-peak" }),
  },
  "threshold-raised": {
    label: "Threshold raised until the false lock and every weak satellite are gone",
    misses: ["verdict", "test", "remedy"],
    solve: ({ truth }) => ({
      ...answersFor(truth, ({ reportedCn0DbHz }) => ((reportedCn0DbHz ?? 0) >= 36 ? "genuine" : "absent")),
      "falseLock.test": "threshold",
      "falseLock.remedy": "raise",
    }),
  },
  multipath: {
    label: "Called multipath",
    misses: ["test", "remedy"],
    solve: ({ truth }) => ({
      ...answersFor(truth, ({ verdict }) => verdict),
      "falseLock.test": "second-path",
      "falseLock.remedy": "antenna",
    }),
  },
  "sky-plot-alone": {
    label: "Sky plot and report believed, capture not searched",
    misses: ["falseDoppler"],
    solve: ({ truth }) => ({
      ...answersFor(truth, ({ verdict, reportedCn0DbHz }) => (reportedCn0DbHz === null ? "absent" : verdict)),
      "falseLock.doppler": "",
      "falseLock.cn0": "29",
      "falseLock.test": "mask",
    }),
  },
};
