const view = new Float64Array(1);
const words = new Uint32Array(view.buffer);
view[0] = 1;
const HIGH = words[0] === 0 ? 1 : 0; // which half holds sign and exponent depends on the processor
const BIAS = 1023;
const TWO_54 = 18014398509481984;

/** Powers of two from 2^-1074 (index 0) to 2^1023, by exact doubling. */
const POWERS_OF_TWO = new Float64Array(2098);
POWERS_OF_TWO[0] = 5e-324; // the smallest double, 2^-1074
for (let n = 1; n < POWERS_OF_TWO.length; n++) POWERS_OF_TWO[n] = POWERS_OF_TWO[n - 1] * 2;

/** value * 2^exponent, exact unless the result leaves the range of normal numbers. @param exponent -2000 to 2000 */
export function timesPowerOfTwo(value: number, exponent: number): number {
  if (exponent > 1023) return value * POWERS_OF_TWO[2097] * POWERS_OF_TWO[exponent - 1023 + 1074];
  if (exponent < -1022) return value * POWERS_OF_TWO[1074 - 1022] * POWERS_OF_TWO[Math.max(0, exponent + 1022 + 1074)];
  return value * POWERS_OF_TWO[exponent + 1074];
}

/** Writes a positive finite number as mantissa * 2^exponent with the mantissa in [sqrt 1/2, sqrt 2); exact. */
export function floatParts(value: number): { mantissa: number; exponent: number } {
  const subnormal = value < 2.2250738585072014e-308;
  view[0] = subnormal ? value * TWO_54 : value;
  let exponent = (words[HIGH] >>> 20) - BIAS - (subnormal ? 54 : 0);
  words[HIGH] = (words[HIGH] & 0xfffff) | (BIAS << 20);
  let mantissa = view[0];
  if (mantissa >= 1.4142135623730951) {
    mantissa /= 2;
    exponent += 1;
  }
  return { mantissa, exponent };
}
