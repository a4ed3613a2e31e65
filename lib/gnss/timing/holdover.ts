import { findRoot } from "@/lib/numeric/findRoot";
import { PI, sinTurns } from "@/lib/numeric/elementary";

const DAY_S = 86_400;
const STEPS = 4096;

/** An oscillator left to itself. */
export type Holdover = {
  /** Time error when the reference is lost. */
  startNs: number;
  /** Fractional frequency offset then, 1e-12 for a picosecond per second. */
  frequencyOffset: number;
  /** Fractional change of frequency per day by ageing. */
  driftPerDay: number;
  /** Fractional frequency per K. */
  temperatureCoefficientPerK: number;
  /** Temperature now less the mean while the oscillator was steered. */
  temperatureChangeK: number;
  /** Amplitude of the daily wave of temperature; it begins at its mean, rising. */
  dailySwingK: number;
};

/** Standard uncertainties of what is known of it at the start. */
export type HoldoverUncertainty = {
  startNs: number;
  frequencyOffset: number;
  driftPerDay: number;
  /** Flicker floor of the Allan deviation: the clock wanders by about this times the time. */
  allanFloor: number;
};

/**
 * Expected time error in ns after a time in holdover: x0 + y0 t + D t^2/2, the temperature's share of the frequency
 * added up over time. ITU-T G.810, I.3 for the first three terms; temperature: definition of the coefficient.
 */
export function holdoverErrorNs(clock: Holdover, afterS: number): number {
  const { startNs, frequencyOffset, driftPerDay, temperatureCoefficientPerK, temperatureChangeK, dailySwingK } = clock;
  const steady = frequencyOffset + temperatureCoefficientPerK * temperatureChangeK;
  const ageing = ((driftPerDay / DAY_S) * afterS * afterS) / 2;
  // Integral of the swing sin(2 pi t/day): (day/2pi)(1 - cos) = (day/pi) sin^2
  const wave = sinTurns(afterS / DAY_S / 2);
  const daily = temperatureCoefficientPerK * dailySwingK * (DAY_S / PI) * wave * wave;
  return startNs + (steady * afterS + ageing + daily) * 1e9;
}

/** Standard uncertainty in ns of that error: the terms' own uncertainties and the flicker floor, added as squares. */
export function holdoverUncertaintyNs(uncertainty: HoldoverUncertainty, afterS: number): number {
  const terms = [
    uncertainty.startNs * 1e-9,
    uncertainty.frequencyOffset * afterS,
    ((uncertainty.driftPerDay / DAY_S) * afterS * afterS) / 2,
    uncertainty.allanFloor * afterS,
  ];
  return Math.sqrt(terms.reduce((sum, term) => sum + term * term, 0)) * 1e9;
}

/**
 * Time in s until |expected error| plus `coverage` uncertainties first reaches a limit; Infinity when it does not
 * before the horizon. Looked for in 4096 steps and then narrowed to 1 ms.
 * @param limit a number of ns, or a limit that changes with the time in holdover
 */
export function timeToLimitS(
  clock: Holdover,
  uncertainty: HoldoverUncertainty,
  limit: number | ((afterS: number) => number),
  { coverage = 2, horizonS = 240 * 3600 }: { coverage?: number; horizonS?: number } = {},
): number {
  const limitNs = typeof limit === "number" ? () => limit : limit;
  const excess = (afterS: number) =>
    Math.abs(holdoverErrorNs(clock, afterS)) + coverage * holdoverUncertaintyNs(uncertainty, afterS) - limitNs(afterS);
  if (excess(0) >= 0) return 0;
  for (let n = 1; n <= STEPS; n++) {
    const here = (n * horizonS) / STEPS;
    if (excess(here) >= 0) return findRoot(excess, here - horizonS / STEPS, here, 1e-3);
  }
  return Infinity;
}
