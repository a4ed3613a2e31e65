import { CA_CHIP_RATE_HZ, L1_HZ } from "@/lib/gnss/constants";
import {
  distanceOfPowerM,
  milliwattsToDbm,
  receivedDbm,
  type InterferencePath,
} from "@/lib/gnss/interference/standOff";
import { effectiveCn0DbHz, separationOfFactor, toleratedJsDb } from "@/lib/gnss/spectra/effectiveCn0";

/** All that a case gives. */
export type StandOffSite = {
  eirpMw: number;
  distanceM: number;
  exponent: number;
  screenDb: number;
  /** Of the GNSS antenna towards the interferer. */
  antennaGainDb: number;
  /** At the antenna's terminals, where C/N0 is received power less this. */
  noiseDensityDbmHz: number;
  thresholdDbHz: number;
  satellites: readonly { prn: number; elevationDeg: number; cn0DbHz: number }[];
};

/** So many satellites must be at or above the threshold: position and time. */
export const NEEDED = 4;

const pathOf = ({ eirpMw, exponent, screenDb, antennaGainDb }: StandOffSite): InterferencePath => ({
  eirpDbm: milliwattsToDbm(eirpMw),
  frequencyHz: L1_HZ,
  exponent,
  screenDb,
  antennaGainDb,
});

/** Interference in dBm at the antenna's terminals. */
export const interferenceDbm = (site: StandOffSite): number => receivedDbm(pathOf(site), site.distanceM);

/** J/S in dB: the signal's power at the same terminals is C/N0 plus noise density. */
export const jsDb = (site: StandOffSite, receivedPowerDbm: number, cn0DbHz: number): number =>
  receivedPowerDbm - (cn0DbHz + site.noiseDensityDbmHz);

/** C/N0 in dB-Hz that is left of a satellite under so much interference. */
export const effectiveOf = (site: StandOffSite, receivedPowerDbm: number, q: number, cn0DbHz: number): number =>
  effectiveCn0DbHz(cn0DbHz, [
    { jsDb: jsDb(site, receivedPowerDbm, cn0DbHz), separationPerHz: separationOfFactor(q, CA_CHIP_RATE_HZ) },
  ]);

/** C/N0 in dB-Hz of the satellite that decides: the fourth strongest. */
export const decidingCn0DbHz = ({ satellites }: StandOffSite): number =>
  satellites.map(({ cn0DbHz }) => cn0DbHz).sort((a, b) => b - a)[NEEDED - 1];

/** Distance in m from which a satellite of that C/N0 is at the threshold or above. */
export function recoveryM(site: StandOffSite, q: number, cn0DbHz: number): number {
  const tolerated = toleratedJsDb(cn0DbHz, site.thresholdDbHz, separationOfFactor(q, CA_CHIP_RATE_HZ));
  return distanceOfPowerM(pathOf(site), tolerated + cn0DbHz + site.noiseDensityDbmHz);
}
