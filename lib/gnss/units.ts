/** Units that people may type or read; conversions stay inside one dimension. */
export type Unit =
  | "1"
  | "%"
  | "ppm"
  | "chip"
  | "ns"
  | "us"
  | "ms"
  | "s"
  | "min"
  | "h"
  | "mm"
  | "m"
  | "km"
  | "Hz"
  | "kHz"
  | "MHz"
  | "dB"
  | "dB/100m"
  | "dB-Hz"
  | "dBm"
  | "dBW"
  | "sigma"
  | "sigma2"
  | "deg"
  | "K"
  | "V"
  | "mA"
  | "ohm"
  | "ohm/km"
  | "g/s";

export type Dimension =
  | "ratio"
  | "code"
  | "time"
  | "length"
  | "frequency"
  | "level"
  | "density ratio"
  | "power level"
  | "noise amplitude"
  | "noise power"
  | "angle"
  | "temperature"
  | "loss per length"
  | "voltage"
  | "current"
  | "resistance"
  | "resistance per length"
  | "jerk";

/** One unit: value in base units = value * toBase + offset. */
export type UnitDefinition = { readonly dimension: Dimension; readonly toBase: number; readonly offset: number };

const unit = (dimension: Dimension, toBase: number, offset = 0): UnitDefinition => ({ dimension, toBase, offset });

/** All units with their dimension; the factors are the SI prefixes, dBm = dBW + 30. */
export const UNITS: Readonly<Record<Unit, UnitDefinition>> = {
  "1": unit("ratio", 1),
  "%": unit("ratio", 0.01),
  ppm: unit("ratio", 1e-6),
  chip: unit("code", 1),
  ns: unit("time", 1e-9),
  us: unit("time", 1e-6),
  ms: unit("time", 1e-3),
  s: unit("time", 1),
  min: unit("time", 60),
  h: unit("time", 3600),
  mm: unit("length", 1e-3),
  m: unit("length", 1),
  km: unit("length", 1e3),
  Hz: unit("frequency", 1),
  kHz: unit("frequency", 1e3),
  MHz: unit("frequency", 1e6),
  dB: unit("level", 1),
  "dB/100m": unit("loss per length", 1),
  "dB-Hz": unit("density ratio", 1),
  dBm: unit("power level", 1, -30),
  dBW: unit("power level", 1),
  sigma: unit("noise amplitude", 1),
  sigma2: unit("noise power", 1),
  deg: unit("angle", 1),
  K: unit("temperature", 1),
  V: unit("voltage", 1),
  mA: unit("current", 1e-3),
  ohm: unit("resistance", 1),
  "ohm/km": unit("resistance per length", 1),
  "g/s": unit("jerk", 1),
};

/** Whether a quantity in one unit can be stated in the other. */
export const isConvertible = (from: Unit, to: Unit): boolean => UNITS[from].dimension === UNITS[to].dimension;

/**
 * The same quantity in another unit.
 * @throws RangeError between dimensions: chips become seconds or metres only for a named code
 */
export function convert(value: number, from: Unit, to: Unit): number {
  if (from === to) return value;
  if (!isConvertible(from, to)) throw new RangeError(`convert: ${from} and ${to} measure different things`);
  const { toBase, offset } = UNITS[from];
  return (value * toBase + offset - UNITS[to].offset) / UNITS[to].toBase;
}
