import { caCode } from "@/lib/gnss/caCode";
import { CA_LENGTH_CHIPS } from "@/lib/gnss/constants";
import { circularCorrelation } from "@/lib/gnss/correlation";
import { cosTurns, pow10Db, sinTurns } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { CELLS, CELLS_PER_CHIP, STEP_CHIPS } from "./readTrace";

export type TraceSettings = {
  prn: number;
  /** Standard deviation of the noise in I and in Q, in the trace's own counts. */
  sigma: number;
  signal: { delayChips: number; cn0TDb: number } | null;
};

const LAST_FIGURE = 1e4;

/** |R| by lag as a correlator shows it after one coherent sum, rounded to four decimals: these are the samples that are marked. */
export function drawTrace(settings: TraceSettings, random: Random): number[] {
  const inPhase = correlatedNoise(settings, random);
  const quadrature = correlatedNoise(settings, random);
  if (settings.signal) addSignal(settings, settings.signal, random.uniform(), inPhase, quadrature);
  return Array.from(inPhase, (i, cell) => {
    const q = quadrature[cell];
    return Math.round(Math.sqrt(i * i + q * q) * LAST_FIGURE) / LAST_FIGURE;
  });
}

/** White noise, eight samples a chip, run through the correlator, so that neighbouring cells agree as real ones do. */
function correlatedNoise({ prn, sigma }: TraceSettings, random: Random): Float64Array {
  const samples = Float64Array.from({ length: CELLS }, () => random.gaussian());
  const overChip = chipSums(samples);
  const code = Float64Array.from(caCode(prn));
  const scale = sigma / Math.sqrt(CELLS);
  return Float64Array.from({ length: CELLS }, (_, lag) => {
    let sum = 0;
    for (let chip = 0; chip < CA_LENGTH_CHIPS; chip++) sum += code[chip] * overChip[lag + chip * CELLS_PER_CHIP];
    return sum * scale;
  });
}

/** Sum of eight samples from each one on, twice round, so that the loop above needs no modulo. */
function chipSums(samples: Float64Array): Float64Array {
  const sums = new Float64Array(2 * CELLS);
  for (let first = 0; first < CELLS; first++) {
    let sum = 0;
    for (let step = 0; step < CELLS_PER_CHIP; step++) sum += samples[(first + step) % CELLS];
    sums[first] = sum;
    sums[first + CELLS] = sum;
  }
  return sums;
}

/** The code's own correlation, straight between whole chips. Peak over noise: amplitude^2 / (2 sigma^2) = C/N0 T. */
function addSignal(
  { prn, sigma }: TraceSettings,
  { delayChips, cn0TDb }: NonNullable<TraceSettings["signal"]>,
  phaseTurns: number,
  inPhase: Float64Array,
  quadrature: Float64Array,
): void {
  const code = caCode(prn);
  const agreement = circularCorrelation(code, code);
  const amplitude = (sigma * Math.sqrt(2 * pow10Db(cn0TDb))) / CA_LENGTH_CHIPS;
  const [cosine, sine] = [cosTurns(phaseTurns), sinTurns(phaseTurns)];
  for (let cell = 0; cell < CELLS; cell++) {
    const offset = cell * STEP_CHIPS - delayChips + CA_LENGTH_CHIPS;
    const whole = Math.floor(offset);
    const part = offset - whole;
    const left = agreement[whole % CA_LENGTH_CHIPS];
    const right = agreement[(whole + 1) % CA_LENGTH_CHIPS];
    const level = amplitude * (left + part * (right - left));
    inPhase[cell] += level * cosine;
    quadrature[cell] += level * sine;
  }
}
