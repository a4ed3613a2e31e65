import { describe, expect, test } from "vitest";
import { createDft } from "@/lib/numeric/dft";
import { createFft } from "@/lib/numeric/fft";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear } from "@/tests/support/expectNear";

const signal = (length: number) => {
  const random = seededRandom("ab".repeat(32), `signal ${length}`);
  return Float64Array.from({ length: 2 * length }, () => random.uniform() - 0.5);
};

/** The definition, term by term. */
function directTransform(data: Float64Array): Float64Array {
  const length = data.length / 2;
  const out = new Float64Array(2 * length);
  for (let k = 0; k < length; k++) {
    for (let n = 0; n < length; n++) {
      const angle = (-2 * Math.PI * ((k * n) % length)) / length;
      out[2 * k] += data[2 * n] * Math.cos(angle) - data[2 * n + 1] * Math.sin(angle);
      out[2 * k + 1] += data[2 * n] * Math.sin(angle) + data[2 * n + 1] * Math.cos(angle);
    }
  }
  return out;
}

function expectSpectrum(actual: Float64Array, expected: Float64Array, tolerance: number) {
  expected.forEach((value, n) => expectNear(actual[n], value, tolerance, `entry ${n}`));
}

describe.each([4, 8, 64, 256, 1024])("createFft(%i)", (size) => {
  test("agrees with the definition and inverts", () => {
    const data = signal(size);
    const spectrum = new Float64Array(2 * size);
    const back = new Float64Array(2 * size);
    createFft(size).transform(spectrum, data);
    expectSpectrum(spectrum, directTransform(data), 1e-11);
    createFft(size).inverseTransform(back, spectrum);
    expectSpectrum(back, data, 1e-14);
  });
});

test("createFft takes its twiddle factors from our own sine and cosine", () => {
  const source = createFft(2048) as unknown as { table: ArrayLike<number> };
  expect(source.table).toBeInstanceOf(Float64Array);
  expectNear(source.table[2 * 256], Math.SQRT1_2, 2e-16, "cos of 1/8 turn");
  expectNear(source.table[2 * 256 + 1], -Math.SQRT1_2, 2e-16, "-sin of 1/8 turn");
});

test.each([0, 2, 3, 1023, 2046, -4, 2.5])("createFft refuses the size %d", (size) =>
  expect(() => createFft(size)).toThrow(RangeError),
);

// 1023 chips and 2046 samples per code period have no power of two; 1021 is prime.
describe.each([2, 3, 7, 31, 341, 1021, 1023, 2046])("createDft(%i)", (length) => {
  test("agrees with the definition", () => {
    const data = signal(length);
    const spectrum = new Float64Array(2 * length);
    createDft(length).transform(spectrum, data);
    expectSpectrum(spectrum, directTransform(data), 3e-11);
  });
});

test("createDft keeps the energy at 4092 points (Parseval)", () => {
  const data = signal(4092);
  const spectrum = new Float64Array(data.length);
  createDft(4092).transform(spectrum, data);
  const energy = (values: Float64Array) => values.reduce((sum, value) => sum + value * value, 0);
  expectNear(energy(spectrum) / 4092, energy(data), 1e-9, "energy");
});

test.each([0, 1, 2.5, NaN])("createDft refuses the length %d", (length) =>
  expect(() => createDft(length)).toThrow(RangeError),
);
