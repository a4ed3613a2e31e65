import { CA_LENGTH_CHIPS } from "@/lib/gnss/constants";
import type { WrongMethod } from "../kind";
import { ALL_PRNS } from "../searchCapture";
import type { SatellitesTruth } from "./drawScene";
import type { SatellitesParameters } from "./parameters";
import { answersFor } from "./solve";

type Wrong = WrongMethod<SatellitesParameters, SatellitesTruth>;

/** Typical wrong methods; each takes the scene as found and differs in the named step alone. */
export const wrongMethods: Readonly<Record<string, Wrong>> = {
  "swapped-iq": {
    label: "I and Q swapped: every Doppler negated",
    misses: ["doppler"],
    solve: ({ truth }) =>
      answersFor(truth.scene.satellites.map((found) => ({ ...found, dopplerHz: -found.dopplerHz }))),
  },
  "mirrored-delay": {
    label: "Delay of the replica for code phase: 1 023 minus the phase",
    misses: ["codePhase"],
    solve: ({ truth }) =>
      answersFor(
        truth.scene.satellites.map((found) => ({ ...found, codePhaseChips: CA_LENGTH_CHIPS - found.codePhaseChips })),
      ),
  },
  "nothing-found": {
    label: "Nothing found: samples read as unsigned",
    misses: ["found", "invented", "codePhase", "doppler", "cn0"],
    solve: () => answersFor([]),
  },
  "ghost-listed": {
    label: "A false peak of the strongest satellite listed as one more",
    misses: ["invented"],
    solve({ truth }) {
      const { satellites } = truth.scene;
      const strongest = satellites.reduce((a, b) => (b.cn0DbHz > a.cn0DbHz ? b : a));
      const absent = ALL_PRNS.filter((prn) => !satellites.some((satellite) => satellite.prn === prn))[0];
      const ghost = {
        ...strongest,
        prn: absent,
        dopplerHz: strongest.dopplerHz + 1000,
        cn0DbHz: strongest.cn0DbHz - 21,
      };
      return answersFor([...satellites, ghost]);
    },
  },
  "snr-for-cn0": {
    label: "Signal-to-noise ratio in 1 kHz for C/N0",
    misses: ["cn0"],
    solve: ({ truth }) =>
      answersFor(truth.scene.satellites.map((found) => ({ ...found, cn0DbHz: found.cn0DbHz - 30 }))),
  },
};
