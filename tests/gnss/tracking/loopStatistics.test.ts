import { expect, test } from "vitest";
import { fllJitterHz, pllJitterDeg } from "@/lib/gnss/tracking/carrierJitter";
import { correlationShape } from "@/lib/gnss/tracking/correlationShape";
import {
  costasPhaseCycles,
  frequencyDiscriminatorHz,
  powerDiscriminator,
  type Correlation,
} from "@/lib/gnss/tracking/discriminators";
import { dllJitterChips } from "@/lib/gnss/tracking/dllJitter";
import { createLoopFilter, type LoopBandwidths } from "@/lib/gnss/tracking/loopFilter";
import { bpsk } from "@/lib/gnss/spectra/modulation";
import { seededRandom } from "@/lib/numeric/random";
import { standardDeviation } from "@/lib/numeric/statistics";
import { expectNearRelative } from "@/tests/support/expectNear";

const T = 1e-3;
const STEPS = 200_000;
const triangle = correlationShape(bpsk(1), null);
const random = seededRandom("1".repeat(64), "loops");

/**
 * Early, prompt and late sums of a code that is `chips` late and a carrier `cycles` ahead; noise of variance 1,
 * correlated as R.
 */
function sumsAt(cn0DbHz: number, spacing: number, chips: number, cycles: number): Correlation {
  const amplitude = Math.sqrt(2 * 10 ** (cn0DbHz / 10) * T);
  const [re, im] = [Math.cos(2 * Math.PI * cycles), Math.sin(2 * Math.PI * cycles)];
  const [near, far] = [triangle(spacing / 2), triangle(spacing)];
  const draw = () => {
    // prompt first; early and late share their part of it, and what is left of their correlation
    const [p, x, y] = [random.gaussian(), random.gaussian(), random.gaussian()];
    const left = Math.sqrt(1 - near * near);
    const shared = (far - near * near) / left;
    return [near * p + left * x, p, near * p + shared * x + Math.sqrt(left * left - shared * shared) * y];
  };
  const [i, q] = [draw(), draw()];
  const levels = [triangle(chips - spacing / 2), triangle(chips), triangle(chips + spacing / 2)];
  const [earlyI, promptI, lateI] = levels.map((level, n) => amplitude * level * re + i[n]);
  const [earlyQ, promptQ, lateQ] = levels.map((level, n) => amplitude * level * im + q[n]);
  return { earlyI, earlyQ, promptI, promptQ, lateI, lateQ };
}

// A loop of Bn over 200 s gives 4 Bn t independent values: 0.8 % to 1.3 % of the standard deviation at the bandwidths
// below. One step of delay widens a loop by about 2 Bn T.
test.each([
  [45, 1, 5],
  [45, 0.2, 5],
  [36, 1, 4],
  [36, 0.5, 4],
])("code loop at %s dB-Hz, spacing %s chip, %s Hz: the jitter of the formula", (cn0DbHz, spacingChips, loopHz) => {
  // Early minus late power over what it is without noise: the formula's loop knows the amplitude.
  const slope = 8 * 10 ** (cn0DbHz / 10) * T * (1 - spacingChips / 2);
  const measured = codeJitter(cn0DbHz, spacingChips, loopHz, ({ earlyI, earlyQ, lateI, lateQ }) => {
    return (earlyI * earlyI + earlyQ * earlyQ - lateI * lateI - lateQ * lateQ) / slope;
  });
  const expected = dllJitterChips({ loopHz, spacingChips, cn0DbHz, coherentS: T }, 1.023e6, null);
  expectNearRelative(measured, expected, 0.04, "jitter");
});

test("a discriminator over its own power is a narrower loop when noise is part of that power", () => {
  const own = (sums: Correlation) => powerDiscriminator(sums, 0.5);
  const expected = dllJitterChips({ loopHz: 4, spacingChips: 1, cn0DbHz: 36, coherentS: T }, 1.023e6, null);
  expect(codeJitter(36, 1, 4, own)).toBeLessThan(0.9 * expected);
});

function codeJitter(
  cn0DbHz: number,
  spacingChips: number,
  loopHz: number,
  read: (sums: Correlation) => number,
): number {
  const filter = createLoopFilter();
  let error = 0;
  const errors = Array.from({ length: STEPS }, () => {
    const value = read(sumsAt(cn0DbHz, spacingChips, error, 0));
    error -= T * filter.step({ order: 2, phaseHz: loopHz, frequencyHz: 0 }, value, 0, T);
    return error;
  });
  return standardDeviation(errors.slice(5000));
}

test.each([
  [45, 15, 3],
  [38, 10, 2],
  [36, 5, 2],
] as const)("Costas loop at %s dB-Hz, %s Hz, order %s: the jitter of the formula", (cn0DbHz, loopHz, order) => {
  const filter = createLoopFilter();
  let error = 0;
  const errors = Array.from({ length: STEPS }, () => {
    const read = costasPhaseCycles(sumsAt(cn0DbHz, 1, 0, error));
    error -= T * filter.step({ order, phaseHz: loopHz, frequencyHz: 0 }, read, 0, T);
    return error * 360;
  });
  expectNearRelative(standardDeviation(errors.slice(5000)), pllJitterDeg(loopHz, cn0DbHz, T), 0.06, "jitter");
});

test.each([
  [45, 10],
  [40, 5],
])("frequency loop at %s dB-Hz, %s Hz: the jitter of the formula", (cn0DbHz, loopHz) => {
  const filter = createLoopFilter();
  const loops: LoopBandwidths = { order: 2, phaseHz: 0, frequencyHz: loopHz };
  let [rate, phase] = [0, 0];
  const errors = Array.from({ length: STEPS / 2 }, () => {
    const first = sumsAt(cn0DbHz, 1, 0, phase);
    const second = sumsAt(cn0DbHz, 1, 0, phase - T * rate);
    phase -= 2 * T * rate;
    rate = filter.step(loops, 0, frequencyDiscriminatorHz(first, second, T, true), 2 * T);
    return rate;
  });
  expectNearRelative(standardDeviation(errors.slice(5000)), fllJitterHz(loopHz, cn0DbHz, T, false), 0.06, "jitter");
});
