import type { WrongMethod } from "../kind";
import type { InterfererTruth } from "./drawCase";
import type { InterfererParameters } from "./parameters";
import { answersFor, readingOf } from "./solve";

type Wrong = WrongMethod<InterfererParameters, InterfererTruth>;

/**
 * Typical wrong ways; each measures with care but for the named step. With nothing there nothing is mirrored and no
 * overload is blamed: these two then come to the right answer.
 */
export const wrongMethods: Readonly<Record<string, Wrong>> = {
  "mirror-image": {
    label: "The mirrored frequency taken for the centre",
    misses: ["centre"],
    solve({ files }) {
      const right = readingOf(files);
      return answersFor({ ...right, centreHz: 0 - right.centreHz });
    },
  },
  "own-line-called-carrier": {
    label: "The receiver's line at 0 Hz called a carrier",
    misses: ["ownLine"],
    solve({ files }) {
      const right = readingOf(files);
      const line = { centreHz: 0, bandwidthHz: 0, periodS: 0, levelDb: right.ownLineDb };
      return { ...answersFor({ ...right, class: "carrier", ...line }), "receiver.ownLine": "" };
    },
  },
  "overload-blamed": {
    label: "Put down to overload of the own amplifier: nothing there",
    misses: ["class"],
    solve({ files }) {
      const right = readingOf(files);
      return answersFor({ ...right, class: "nothing", centreHz: 0, bandwidthHz: 0, periodS: 0, levelDb: 0 });
    },
  },
};
