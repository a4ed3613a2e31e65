import { floatParts, timesPowerOfTwo } from "./floatParts";

/*
 * Elementary functions from + - * / and square root alone, so that a case is the same bit for bit on every server and in
 * every browser; the built-in ones may differ in the last digit from one engine to the next.
 * Argument reduction after Cody & Waite, "Software Manual for the Elementary Functions" (1980): the constant is split in a
 * part that multiplies exactly and a correction. Series of Abramowitz & Stegun, "Handbook of Mathematical Functions" (1964),
 * equation named at each function. Relative error within 1e-15.
 */
const LN2_HIGH = 355 / 512; // nine bits, so a whole multiple is exact
const LN2_LOW = -2.1219444005469058e-4; // ln 2 - 355/512
const LOG2_E = 1.4426950408889634;
const LN10 = 2.302585092994046;
const LOG10_E = 0.4342944819032518;
const LOG10_2_HIGH = 19728 / 65536;
const LOG10_2_LOW = 4.605038981195214e-6; // log10 2 - 19728/65536
const HALF_PI_PARTS = [1.5707963267341256, 6.077100506303966e-11, 2.0222662487111665e-21] as const; // 33 bits each
const LARGEST_ANGLE_RAD = 1e6; // beyond it a whole multiple of a 33-bit part is no longer exact
const TAN_15_DEGREES = 0.2679491924311227;
const SQRT_3 = Math.sqrt(3);

export const PI = 3.141592653589793;

const FACTORIAL = [1];
for (let n = 1; n <= 19; n++) FACTORIAL.push(FACTORIAL[n - 1] * n); // all below 2^70 with at most 53 odd bits: exact
const EXP_SERIES = Array.from({ length: 13 }, (_, n) => 1 / FACTORIAL[n + 2]);
const SIN_SERIES = Array.from({ length: 8 }, (_, n) => (n % 2 ? 1 : -1) / FACTORIAL[2 * n + 3]);
const COS_SERIES = Array.from({ length: 8 }, (_, n) => (n % 2 ? -1 : 1) / FACTORIAL[2 * n + 4]);
const LOG_SERIES = Array.from({ length: 10 }, (_, n) => 2 / (2 * n + 3));
const ARC_SERIES = Array.from({ length: 13 }, (_, n) => (n % 2 ? 1 : -1) / (2 * n + 3));

/** e to the power x; 4.2.1 on |x| <= (ln 2)/2. */
export function exp(x: number): number {
  if (!(x <= 709.782712893384)) return x !== x ? x : Infinity;
  if (x < -745.2) return 0;
  const k = Math.floor(x * LOG2_E + 0.5);
  const r = x - k * LN2_HIGH - k * LN2_LOW;
  return timesPowerOfTwo(1 + (r + r * r * series(EXP_SERIES, r)), k);
}

/** Natural logarithm; -Infinity at 0, NaN below; 4.1.27. */
export function log(x: number): number {
  if (!(x > 0 && x < Infinity)) return x === 0 ? -Infinity : x > 0 ? x : NaN;
  const { mantissa, exponent } = floatParts(x);
  return exponent * LN2_LOW + logOfMantissa(mantissa) + exponent * LN2_HIGH;
}

/** Decimal logarithm, with the exceptions of `log`. */
export function log10(x: number): number {
  if (!(x > 0 && x < Infinity)) return log(x);
  const { mantissa, exponent } = floatParts(x);
  return exponent * LOG10_2_LOW + logOfMantissa(mantissa) * LOG10_E + exponent * LOG10_2_HIGH;
}

/** ln(1 + x) that keeps a small x: Kahan's correction, in Higham, "Accuracy and Stability of Numerical Algorithms", 1.14. */
export function log1p(x: number): number {
  const sum = 1 + x;
  return sum === 1 ? x : (log(sum) * x) / (sum - 1);
}

/** e^x - 1 that keeps a small x: Kahan's correction, Higham 1.14. */
export function expm1(x: number): number {
  const power = exp(x);
  if (power === 1) return x;
  const change = power - 1;
  return change === -1 || power === Infinity ? change : (change * x) / log(power);
}

/** 10 to the power x: whole part by multiplication, exact up to 10^22, rest by `exp`. */
export function pow10(x: number): number {
  if (!(x > -308 && x < 309)) return x !== x ? x : x > 0 ? Infinity : 0;
  const whole = Math.floor(x + 0.5);
  const rest = exp((x - whole) * LN10);
  return whole < 0 ? rest / wholePowerOfTen(-whole) : rest * wholePowerOfTen(whole);
}

/** Power ratio of a level in dB. */
export const pow10Db = (dB: number): number => pow10(dB / 10);

/** Level in dB of a power ratio. */
export const decibels = (powerRatio: number): number => 10 * log10(powerRatio);

/** Sine of an angle in rad. @throws RangeError beyond 1e6 rad: count turns there, see `sinTurns` */
export const sin = (angleRad: number): number => sinOfQuarters(...reduceRad(angleRad));

/** Cosine of an angle in rad. @throws RangeError beyond 1e6 rad */
export function cos(angleRad: number): number {
  const [rest, quarters] = reduceRad(angleRad);
  return sinOfQuarters(rest, quarters + 1);
}

/** Sine of an angle in turns (cycles); whole turns fall away exactly, whatever their number. */
export const sinTurns = (turns: number): number => sinOfQuarters(...reduceTurns(turns));

/** Cosine of an angle in turns (cycles). */
export function cosTurns(turns: number): number {
  const [rest, quarters] = reduceTurns(turns);
  return sinOfQuarters(rest, quarters + 1);
}

/** Angle of the point (x, y) in rad, from -pi to pi; 0 at the origin; 4.4.42 after two reductions. */
export function atan2(y: number, x: number): number {
  const across = Math.abs(x);
  const up = Math.abs(y);
  if (across === 0 && up === 0) return 0;
  const steep = up > across;
  const first = arcTangent(steep ? across / up : up / across);
  const quarter = steep ? PI / 2 - first : first;
  const half = x < 0 ? PI - quarter : quarter;
  return y < 0 ? -half : half;
}

/** Horner's scheme, lowest power first in the list. */
function series(coefficients: readonly number[], x: number): number {
  let sum = 0;
  for (let n = coefficients.length - 1; n >= 0; n--) sum = sum * x + coefficients[n];
  return sum;
}

function logOfMantissa(mantissa: number): number {
  const s = (mantissa - 1) / (mantissa + 1);
  return 2 * s + s * s * s * series(LOG_SERIES, s * s);
}

function wholePowerOfTen(exponent: number): number {
  let power = 1;
  for (let n = 0; n < exponent % 22; n++) power *= 10;
  for (let n = 0; n < Math.floor(exponent / 22); n++) power *= 1e22;
  return power;
}

/** Rest in rad, |rest| <= pi/4, and the number of quarter turns taken off. */
function reduceRad(angleRad: number): [number, number] {
  if (!(Math.abs(angleRad) <= LARGEST_ANGLE_RAD))
    throw new RangeError(`sin, cos: angle within 1e6 rad, got ${angleRad}`);
  const quarters = Math.floor(angleRad / (PI / 2) + 0.5);
  const [first, second, third] = HALF_PI_PARTS;
  return [angleRad - quarters * first - quarters * second - quarters * third, quarters];
}

function reduceTurns(turns: number): [number, number] {
  const part = turns - Math.floor(turns); // exact
  const quarters = Math.floor(part * 4 + 0.5);
  return [(part - quarters / 4) * (2 * PI), quarters];
}

/** sin(rest + quarters * pi/2); 4.3.65 and 4.3.66 on |rest| <= pi/4. */
function sinOfQuarters(rest: number, quarters: number): number {
  const square = rest * rest;
  const quarter = ((quarters % 4) + 4) % 4;
  const value =
    quarter % 2 === 0
      ? rest + rest * square * series(SIN_SERIES, square)
      : 1 - square / 2 + square * square * series(COS_SERIES, square);
  return quarter < 2 ? value : -value;
}

function arcTangent(ratio: number): number {
  const turned = ratio > TAN_15_DEGREES; // then take 30 degrees off
  const x = turned ? (ratio * SQRT_3 - 1) / (SQRT_3 + ratio) : ratio;
  const square = x * x;
  return (turned ? PI / 6 : 0) + (x + x * square * series(ARC_SERIES, square));
}
