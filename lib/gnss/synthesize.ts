import { cosTurns, pow10Db, sinTurns } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { bandLimitedCode, CODE_TABLE_POINTS, highestLineInBand, POINTS_PER_CHIP } from "./bandLimitedCode";
import { CA_LENGTH_CHIPS, DATA_BIT_MS, L1_HZ } from "./constants";
import { samplesPerCodePeriod } from "./doppler";
import type { Scene, SceneSatellite } from "./scene";

/**
 * Counts per standard deviation of the noise in I or Q. Full scale is then 5.3 sigma (one sample in ten million clips) and
 * rounding adds 0.0006 dB of noise: the converter is not part of any check that uses these captures.
 */
const COUNTS_PER_SIGMA = 24;
const FULL_SCALE = 127;

/**
 * Samples of a scene as complex 8-bit integers: every satellite's band-limited C/A code on its carrier, data bits, code
 * Doppler (a 1540th of the carrier's) and white Gaussian noise. C/N0 counts the power inside the capture's band, so a
 * replica with unfiltered chips reads 0.4 dB less at 2.046 MHz and 0.2 dB less at 4.092 MHz.
 * @param scene rate a whole number of kHz from 2046
 * @param random drawn twice per sample, I then Q, whatever the scene: the noise does not depend on the satellites
 * @param onProgress called after each millisecond of signal
 * @returns samples I, Q, I, Q ...; scale = counts per sigma of the noise in I or Q
 */
export function synthesizeCi8(
  scene: Scene,
  random: Random,
  onProgress?: (done: number, total: number) => void,
): { samples: Int8Array; scale: number } {
  const blocks = synthesizeBlocks(scene, random);
  const samples = new Int8Array(2 * samplesPerCodePeriod(scene.rateHz) * scene.durationMs);
  let ms = 0;
  for (const block of blocks) {
    samples.set(block, ms * block.length);
    ms++;
    onProgress?.(ms, scene.durationMs);
  }
  return { samples, scale: COUNTS_PER_SIGMA };
}

/**
 * The same samples millisecond by millisecond, for captures too long to be held.
 * @returns blocks of I, Q, I, Q ...; the array is used again for the next block
 */
export function synthesizeBlocks(scene: Scene, random: Random): Generator<Int8Array, void> {
  const perMs = samplesPerCodePeriod(scene.rateHz);
  if (!Number.isInteger(scene.durationMs) || scene.durationMs < 1)
    throw new RangeError(`synthesizeBlocks: whole milliseconds from 1, got ${scene.durationMs}`);
  return blocksOf(scene, random, perMs);
}

function* blocksOf({ rateHz, durationMs, satellites }: Scene, random: Random, perMs: number) {
  const block = new Float64Array(2 * perMs);
  const samples = new Int8Array(2 * perMs);
  for (let ms = 0; ms < durationMs; ms++) {
    block.fill(0);
    for (const satellite of satellites) addSatellite(block, satellite, rateHz, ms * perMs);
    addNoise(samples, block, random);
    yield samples;
  }
}

function addNoise(samples: Int8Array, block: Float64Array, random: Random): void {
  for (let n = 0; n < block.length; n++) {
    const counts = Math.floor(block[n] + COUNTS_PER_SIGMA * random.gaussian() + 0.5);
    samples[n] = Math.max(-FULL_SCALE, Math.min(FULL_SCALE, counts));
  }
}

/** Adds one satellite to a block that starts at sample `first`; phases are computed afresh for each block. */
function addSatellite(block: Float64Array, satellite: SceneSatellite, rateHz: number, first: number): void {
  const perMs = block.length / 2;
  const table = bandLimitedCode(satellite.prn, highestLineInBand(perMs));
  const amplitude = COUNTS_PER_SIGMA * Math.sqrt((2 * pow10Db(satellite.cn0DbHz)) / rateHz);
  const chipsPerSample = (CA_LENGTH_CHIPS / perMs) * (1 + satellite.dopplerHz / L1_HZ);
  const chips = satellite.codePhaseChips + first * chipsPerSample;
  const turns = satellite.carrierPhaseCycles + (first * satellite.dopplerHz) / rateHz;
  const stepRe = cosTurns(satellite.dopplerHz / rateHz);
  const stepIm = sinTurns(satellite.dopplerHz / rateHz);
  const pointStep = chipsPerSample * POINTS_PER_CHIP;
  let period = Math.floor(chips / CA_LENGTH_CHIPS);
  let point = (chips - period * CA_LENGTH_CHIPS) * POINTS_PER_CHIP;
  let level = amplitude * dataBit(satellite, period);
  let re = cosTurns(turns);
  let im = sinTurns(turns);
  for (let n = 0; n < 2 * perMs; n += 2) {
    if (point >= CODE_TABLE_POINTS) {
      point -= CODE_TABLE_POINTS;
      level = amplitude * dataBit(satellite, ++period);
    }
    const below = point | 0;
    const code = level * (table[below] + (point - below) * (table[below + 1] - table[below]));
    block[n] += code * re;
    block[n + 1] += code * im;
    const next = re * stepRe - im * stepIm;
    im = re * stepIm + im * stepRe;
    re = next;
    point += pointStep;
  }
}

/** Data bit of a code period, counted from the one in progress at the first sample. */
function dataBit({ dataBits, bitEdgeMs }: SceneSatellite, period: number): number {
  if (!dataBits) return 1;
  const bit = Math.floor((period + ((DATA_BIT_MS - bitEdgeMs) % DATA_BIT_MS)) / DATA_BIT_MS);
  return dataBits[bit % dataBits.length];
}
