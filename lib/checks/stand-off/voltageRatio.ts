import { CA_CHIP_RATE_HZ, L1_HZ } from "@/lib/gnss/constants";
import { distanceOfPowerM, milliwattsToDbm } from "@/lib/gnss/interference/standOff";
import { decibels, pow10, pow10Db } from "@/lib/numeric/elementary";
import { decidingCn0DbHz, jsDb, type StandOffSite } from "./standOffOf";

/** Effective C/N0 in dB-Hz as it comes out when J/S in dB is taken for 20 log of a ratio. */
export function voltageEffective(site: StandOffSite, receivedPowerDbm: number, q: number, cn0DbHz: number): number {
  const ratio = pow10(jsDb(site, receivedPowerDbm, cn0DbHz) / 20);
  return -decibels(pow10Db(-cn0DbHz) + ratio / (q * CA_CHIP_RATE_HZ));
}

/** Distance of recovery in m by the same mistake. */
export function voltageRecoveryM(site: StandOffSite, q: number): number {
  const cn0DbHz = decidingCn0DbHz(site);
  const room = pow10Db(-site.thresholdDbHz) - pow10Db(-cn0DbHz);
  const toleratedDb = 2 * decibels(room * q * CA_CHIP_RATE_HZ);
  const path = { ...site, eirpDbm: milliwattsToDbm(site.eirpMw), frequencyHz: L1_HZ };
  return distanceOfPowerM(path, toleratedDb + cn0DbHz + site.noiseDensityDbmHz);
}
