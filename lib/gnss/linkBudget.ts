import { decibels, PI, pow10Db } from "@/lib/numeric/elementary";
import { erfc } from "@/lib/numeric/erfc";
import { BOLTZMANN_J_K, SPEED_OF_LIGHT_M_S } from "./constants";

const REFERENCE_K = 290; // temperature at which noise figures are stated, Friis 1944

/** Power in dBm of a power in dBW. */
export const dBwToDbm = (dBw: number): number => dBw + 30;

/** Noise density k T in dBm/Hz; -173.98 at 290 K. Boltzmann's constant is exact, SI 2019. */
export const noiseDensityDbmHz = (temperatureK: number): number => decibels(BOLTZMANN_J_K * temperatureK) + 30;

/** One part of a chain; a passive loss of x dB at 290 K has gain -x and noise figure x. */
export type ChainStage = { gainDb: number; noiseFigureDb: number };

/**
 * Noise figure and gain of a chain, first stage at the antenna: Friis, "Noise Figures of Radio Receivers" (1944).
 * F = F1 + (F2 - 1)/G1 + (F3 - 1)/(G1 G2) + ...
 */
export function cascade(stages: readonly ChainStage[]): ChainStage {
  if (stages.length === 0) throw new RangeError("cascade: at least one stage");
  let factor = 1;
  let gain = 1;
  for (const stage of stages) {
    factor += (pow10Db(stage.noiseFigureDb) - 1) / gain;
    gain *= pow10Db(stage.gainDb);
  }
  return { gainDb: decibels(gain), noiseFigureDb: decibels(factor) };
}

/** System temperature in K at the antenna port, T_ant + 290 (F - 1). Common practice, no source. */
export const systemTemperatureK = (antennaK: number, noiseFigureDb: number): number =>
  antennaK + REFERENCE_K * (pow10Db(noiseFigureDb) - 1);

/** C/N0 in dB-Hz: P + G - L - N0, all in dB. Common practice, no source. */
export const expectedCn0DbHz = (powerDbm: number, antennaGainDb: number, lossDb: number, systemK: number): number =>
  powerDbm + antennaGainDb - lossDb - noiseDensityDbmHz(systemK);

/** Free-space path loss in dB, 20 log10(4 pi d f / c). Textbook. */
export const freeSpaceLossDb = (distanceM: number, frequencyHz: number): number =>
  2 * decibels((4 * PI * distanceM * frequencyHz) / SPEED_OF_LIGHT_M_S);

/** Signal-to-noise ratio in dB inside a bandwidth; after a coherent sum of T the bandwidth is 1/T. Definition. */
export const snrDb = (cn0DbHz: number, bandwidthHz: number): number => cn0DbHz - decibels(bandwidthHz);

/** Bit error ratio of BPSK, erfc(sqrt(Eb/N0))/2. Textbook. */
export const bitErrorRatio = (cn0DbHz: number, bitsPerS: number): number =>
  erfc(Math.sqrt(pow10Db(cn0DbHz) / bitsPerS)) / 2;
