import type { WrongMethod } from "../kind";
import { otherType, type StandOffTruth } from "./drawCase";
import { Q_OF } from "./interference-types";
import type { StandOffParameters } from "./parameters";
import { answersFor, given, usableOf, work } from "./solve";
import { interferenceDbm, recoveryM } from "./standOffOf";
import { voltageEffective, voltageRecoveryM } from "./voltageRatio";

type Wrong = WrongMethod<StandOffParameters, StandOffTruth>;

/** Typical wrong ways; each is worked with care but for the named step. */
export const wrongMethods: Readonly<Record<string, Wrong>> = {
  "js-in-volts": {
    label: "J/S taken for a ratio of voltages: 20 log",
    misses: ["effective", "recovery"],
    solve({ publicCase }) {
      const { site, q } = given(publicCase);
      const receivedDbm = interferenceDbm(site);
      const effectiveDbHz = site.satellites.map(({ cn0DbHz }) => voltageEffective(site, receivedDbm, q, cn0DbHz));
      const usable = usableOf(site, effectiveDbHz);
      return answersFor(site, { receivedDbm, effectiveDbHz, usable, recoveryM: voltageRecoveryM(site, q) });
    },
  },
  "antenna-gain-forgotten": {
    label: "Antenna gain towards the interferer left out",
    misses: ["received", "recovery"],
    solve({ publicCase }) {
      const { site, q } = given(publicCase);
      return answersFor(site, work({ ...site, antennaGainDb: 0 }, q));
    },
  },
  "strongest-satellite": {
    label: "Recovery of the strongest satellite, not of the fourth",
    misses: ["recovery"],
    solve({ publicCase }) {
      const { site, q } = given(publicCase);
      const strongest = Math.max(...site.satellites.map(({ cn0DbHz }) => cn0DbHz));
      return answersFor(site, { ...work(site, q), recoveryM: recoveryM(site, q, strongest) });
    },
  },
  "wrong-q": {
    label: "Q of another sort of interference",
    misses: ["effective"],
    solve({ truth, publicCase }) {
      const { site } = given(publicCase);
      return answersFor(site, work(site, Q_OF[otherType(truth.type)]));
    },
  },
};
