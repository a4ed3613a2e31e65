import { codeWave } from "../codeWave";
import { lineSpacingHz, type SearchSignal } from "../search/searchSignal";
import { signalLines } from "../signalLines";

/** One period of a code as a correlator reads it, at any place. */
export type ReplicaTable = {
  /** Values at equal steps, the first again at the end, for straight lines between them; power 1. */
  values: Float64Array;
  pointsPerChip: number;
  lengthChips: number;
};

const POINTS_PER_HALF = 32; // of a chip, or of a half period of its subcarrier
const LARGEST_TABLE = 1 << 20;

/**
 * A code behind an ideal low-pass filter, as the samples of a capture hold it: a filtered replica changes smoothly with
 * the delay, and the spacing between early and late may be finer than the samples.
 * @param halfBandHz lines up to here are kept
 */
export function replicaTable(signal: SearchSignal, prn: number, halfBandHz: number): ReplicaTable {
  const { lengthChips, halvesPerChip } = signal;
  let points = 4;
  while (points < lengthChips * Math.max(POINTS_PER_HALF, 16 * halvesPerChip)) points *= 2;
  if (points > LARGEST_TABLE) throw new RangeError(`replicaTable: code of at most 32768 chips, got ${lengthChips}`);
  const highest = Math.min(points / 2 - 1, Math.floor(halfBandHz / lineSpacingHz(signal)));
  if (!(highest >= 1)) throw new RangeError(`replicaTable: a band that holds a line of the code, got ${halfBandHz} Hz`);
  const values = codeWave(signalLines(signal.chips(prn), halvesPerChip, highest), highest, points);
  return { values, pointsPerChip: points / lengthChips, lengthChips };
}

/**
 * Scale R/|R'| in chips of a code discriminator for this replica: its own correlation R and the slope of it at half of
 * the spacing.
 * @param spacingChips early to late
 */
export function discriminatorScaleChips(table: ReplicaTable, spacingChips: number): number {
  const half = spacingChips / 2;
  const step = half / 4;
  const slope = (ownCorrelation(table, half + step) - ownCorrelation(table, half - step)) / (2 * step);
  return -ownCorrelation(table, half) / slope;
}

function ownCorrelation(table: ReplicaTable, shiftChips: number): number {
  const points = table.values.length - 1;
  let sum = 0;
  for (let n = 0; n < points; n++) sum += table.values[n] * readReplica(table, n + shiftChips * table.pointsPerChip);
  return sum / points;
}

/** Value at a place in points, from one period below 0 to one period beyond the end. */
export function readReplica({ values }: ReplicaTable, point: number): number {
  const length = values.length - 1;
  const at = point < 0 ? point + length : point >= length ? point - length : point;
  const below = at | 0;
  return values[below] + (at - below) * (values[below + 1] - values[below]);
}
