import { UNITS, type Dimension, type Unit } from "@/lib/gnss/units";

/** Powers of the base units by name; a unit that is not named has power 0. */
export type Powers = Readonly<Record<string, number>>;

/**
 * What a value measures. A level in dB is ten times the logarithm of a quantity measured by `of`: nothing for dB, Hz for
 * dB-Hz, W for dBW; `per` is what it is counted by, 1/m for dB/100 m. A `free` level came from log10 of a plain number and
 * may still be taken as one.
 */
export type Measure = { sort: "plain"; powers: Powers } | { sort: "level"; of: Powers; per: Powers; free: boolean };

export const NUMBER: Measure = { sort: "plain", powers: {} };
export const plain = (powers: Powers): Measure => ({ sort: "plain", powers });
export const level = (of: Powers, per: Powers = {}): Measure => ({ sort: "level", of, per, free: false });

const WATT: Powers = { V: 1, A: 1 };

/** What each dimension is in base units, and the factor from its own base to them. */
const MEASURES: Readonly<Record<Dimension, { measure: Measure; scale: number }>> = {
  ratio: { measure: NUMBER, scale: 1 },
  code: { measure: plain({ chip: 1 }), scale: 1 },
  time: { measure: plain({ s: 1 }), scale: 1 },
  length: { measure: plain({ m: 1 }), scale: 1 },
  frequency: { measure: plain({ s: -1 }), scale: 1 },
  level: { measure: level({}), scale: 1 },
  "density ratio": { measure: level({ s: -1 }), scale: 1 },
  "power level": { measure: level(WATT), scale: 1 },
  "noise amplitude": { measure: plain({ sigma: 1 }), scale: 1 },
  "noise power": { measure: plain({ sigma: 2 }), scale: 1 },
  angle: { measure: plain({ rad: 1 }), scale: 0.017453292519943295 }, // pi / 180
  temperature: { measure: plain({ K: 1 }), scale: 1 },
  "loss per length": { measure: level({}, { m: -1 }), scale: 0.01 },
  voltage: { measure: plain({ V: 1 }), scale: 1 },
  current: { measure: plain({ A: 1 }), scale: 1 },
  resistance: { measure: plain({ V: 1, A: -1 }), scale: 1 },
  "resistance per length": { measure: plain({ V: 1, A: -1, m: -1 }), scale: 1e-3 }, // ohm/km
  jerk: { measure: plain({ m: 1, s: -3 }), scale: 9.80665 }, // standard gravity, exact: 3rd CGPM (1901)
};

export const measureOf = (unit: Unit): Measure => MEASURES[UNITS[unit].dimension].measure;

/** A value in base units: metres, seconds, rad, dB. */
export function toBase(value: number, unit: Unit): number {
  const { dimension, toBase: factor, offset } = UNITS[unit];
  return (value * factor + offset) * MEASURES[dimension].scale;
}

export function fromBase(value: number, unit: Unit): number {
  const { dimension, toBase: factor, offset } = UNITS[unit];
  return (value / MEASURES[dimension].scale - offset) / factor;
}

/** Powers after a product (`times` 1), a quotient (-1) or a power of the second. */
export function combine(first: Powers, second: Powers, times = 1): Powers {
  const names = new Set([...Object.keys(first), ...Object.keys(second)]);
  const entries = [...names].map((name) => [name, (first[name] ?? 0) + times * (second[name] ?? 0)] as const);
  // A tenth of a power, from a logarithm, is made whole again: what is left of rounding is taken off.
  const clean = entries.map(([name, power]) => [name, Math.round(power * 1e6) / 1e6] as const);
  return Object.fromEntries(clean.filter(([, power]) => power !== 0));
}

export const isNothing = (powers: Powers): boolean => Object.keys(powers).length === 0;
export const areSame = (first: Powers, second: Powers): boolean => isNothing(combine(first, second, -1));

/** In words for a fault: "a value in m/s", "a plain number", "a level in dB". */
export function describe(measure: Measure): string {
  if (measure.sort === "plain")
    return isNothing(measure.powers) ? "a plain number" : `a value in ${unitText(measure.powers)}`;
  if (measure.free) return "a plain number or a level in dB";
  const per = isNothing(measure.per) ? "" : ` times ${unitText(measure.per)}`;
  return `${levelText(measure.of)}${per}`;
}

function levelText(of: Powers): string {
  if (isNothing(of)) return "a level in dB";
  if (areSame(of, { s: -1 })) return "a level in dB-Hz";
  if (areSame(of, WATT)) return "a level in dBW";
  return `a level that counts ${unitText(of)}`;
}

function unitText(powers: Powers): string {
  const known = (Object.keys(UNITS) as Unit[]).find((unit) => {
    const { toBase: factor, dimension } = UNITS[unit];
    const { measure, scale } = MEASURES[dimension];
    return factor * scale === 1 && measure.sort === "plain" && areSame(measure.powers, powers);
  });
  if (known) return known;
  const part = (sign: number) =>
    Object.entries(powers)
      .filter(([, power]) => power * sign > 0)
      .map(([name, power]) => (power * sign === 1 ? name : `${name}^${power * sign}`))
      .join(" ");
  const below = part(-1);
  return `${part(1) || "1"}${below && `/${below.includes(" ") ? `(${below})` : below}`}`;
}
