import { CA_LENGTH_CHIPS } from "@/lib/gnss/constants";
import type { WrongMethod } from "../kind";
import type { CorrelatorReadingTruth } from "./drawCase";
import type { CorrelatorReadingParameters } from "./parameters";
import { readTrace } from "./readTrace";
import { convertedLag, solve } from "./solve";

type Wrong = WrongMethod<CorrelatorReadingParameters, CorrelatorReadingTruth>;

/** Typical wrong readings; each differs from the right one in the named step alone. */
export const wrongMethods: Readonly<Record<string, Wrong>> = {
  "mirrored-delay": {
    label: "Replica shifted the wrong way: 1 023 minus the delay",
    misses: ["lag"],
    solve({ publicCase }) {
      const right = solve(publicCase);
      const lagChips = CA_LENGTH_CHIPS - Number(right["reading.lag"]);
      return { ...right, "reading.lag": lagChips.toFixed(2), ...convertedLag(lagChips) };
    },
  },
  "chip-of-300-m": {
    label: "300 m taken for a chip",
    misses: ["lagLength"],
    solve({ publicCase }) {
      const right = solve(publicCase);
      return { ...right, "reading.lagLength": (300 * Number(right["reading.lag"])).toFixed(0) };
    },
  },
  "side-lobe": {
    label: "A side lobe read as the peak",
    misses: ["lag"],
    solve({ publicCase }) {
      const { trace, falseAlarmPerCell } = publicCase.data;
      const { secondLagChips } = readTrace(trace as number[], falseAlarmPerCell as number);
      const right = solve(publicCase);
      return { ...right, "reading.lag": secondLagChips.toFixed(2), ...convertedLag(secondLagChips) };
    },
  },
  "always-detected": {
    label: "The highest cell taken for a signal, whatever the threshold",
    misses: ["threshold"],
    solve({ publicCase }) {
      return { ...solve(publicCase), "reading.detection": "yes", "reading.threshold": "" };
    },
  },
  "three-sigma": {
    label: "Threshold three standard deviations above the mean",
    misses: ["threshold"],
    solve({ publicCase }) {
      const { trace, falseAlarmPerCell } = publicCase.data;
      const { noiseMean, noiseRms } = readTrace(trace as number[], falseAlarmPerCell as number);
      const deviation = Math.sqrt(noiseRms * noiseRms - noiseMean * noiseMean);
      return { ...solve(publicCase), "reading.threshold": (noiseMean + 3 * deviation).toFixed(2) };
    },
  },
};
