/** Loss of a cable as a data sheet prints it. */
export type LossPoint = { frequencyHz: number; dbPer100M: number };

/** Loss per 100 m = skinDb * sqrt(f/1 GHz) + dielectricDb * f/1 GHz, f up to a few GHz. */
export type CableLoss = { skinDb: number; dielectricDb: number };

const LOSS_PER_K = 0.00196; // half of copper's 0.393 % per K: skin effect goes with the root of the resistance
const DATA_SHEET_C = 20;

/**
 * The two terms of a cable's loss from data-sheet points: skin effect grows with the root of the frequency, dielectric
 * loss with the frequency itself (textbook). One point is taken as skin effect alone; more are fitted by least squares
 * of the relative errors.
 */
export function fitCableLoss(points: readonly LossPoint[]): CableLoss {
  if (points.length === 0) throw new RangeError("fitCableLoss: at least one point of the data sheet");
  for (const { frequencyHz, dbPer100M } of points)
    if (!(frequencyHz > 0 && dbPer100M > 0))
      throw new RangeError(`fitCableLoss: frequency and loss above 0, got ${frequencyHz} Hz, ${dbPer100M} dB`);
  let [rootRoot, rootWhole, wholeWhole, root, whole] = [0, 0, 0, 0, 0];
  for (const { frequencyHz, dbPer100M } of points) {
    const x = Math.sqrt(frequencyHz / 1e9) / dbPer100M;
    const y = frequencyHz / 1e9 / dbPer100M;
    rootRoot += x * x;
    rootWhole += x * y;
    wholeWhole += y * y;
    root += x;
    whole += y;
  }
  const determinant = rootRoot * wholeWhole - rootWhole * rootWhole;
  if (!(determinant > 1e-9 * rootRoot * wholeWhole)) return { skinDb: root / rootRoot, dielectricDb: 0 };
  return {
    skinDb: (root * wholeWhole - whole * rootWhole) / determinant,
    dielectricDb: (whole * rootRoot - root * rootWhole) / determinant,
  };
}

/**
 * Loss in dB of a run of cable. It grows by 0.2 % per K above the data sheet's 20 degrees Celsius (from copper's
 * resistance; common practice, no source).
 */
export function cableLossDb(cable: CableLoss, lengthM: number, frequencyHz: number, temperatureC = 20): number {
  const ghz = frequencyHz / 1e9;
  const per100M = cable.skinDb * Math.sqrt(ghz) + cable.dielectricDb * ghz;
  return (per100M * lengthM * (1 + LOSS_PER_K * (temperatureC - DATA_SHEET_C))) / 100;
}
