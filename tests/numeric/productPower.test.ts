import { describe, expect, test } from "vitest";
import { createProductPower } from "@/lib/numeric/productPower";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear } from "@/tests/support/expectNear";

const random = seededRandom("31".repeat(32), "productPower");
const spectrum = (size: number) => Float64Array.from({ length: 2 * size }, () => random.gaussian());

/** The power at one k, written down from the definition. */
function powerAt(k: number, a: Float64Array, b: Float64Array): number {
  const size = a.length / 2;
  let [re, im] = [0, 0];
  for (let n = 0; n < size; n++) {
    const productRe = a[2 * n] * b[2 * n] - a[2 * n + 1] * b[2 * n + 1];
    const productIm = a[2 * n] * b[2 * n + 1] + a[2 * n + 1] * b[2 * n];
    const angle = (-2 * Math.PI * ((k * n) % size)) / size;
    re += productRe * Math.cos(angle) - productIm * Math.sin(angle);
    im += productRe * Math.sin(angle) + productIm * Math.cos(angle);
  }
  return re * re + im * im;
}

// One size for every way in which eights and fours can follow each other.
describe.each([16, 32, 64, 128, 256, 512, 1024, 2048, 4096])("%i points", (size) => {
  const { add, places } = createProductPower(size);

  test("every k has its place", () => {
    expect([...places].sort((x, y) => x - y)).toEqual(Array.from({ length: size }, (_, k) => k));
  });

  test("gives the powers of the definition, added to what is there", () => {
    const [a, b] = [spectrum(size), spectrum(size)];
    const out = new Float64Array(size).fill(7);
    add(out, a, b);
    const some = [0, 1, 2, 3, size / 4, size / 2, size - 1, Math.floor(0.7 * size)];
    for (const place of some) {
      const power = powerAt(places[place], a, b);
      expectNear(out[place], 7 + power, 1e-10 * (size * size + power), `power at ${places[place]}`);
    }
  });

  test("keeps the energy: Parseval", () => {
    const [a, b] = [spectrum(size), spectrum(size)];
    const out = new Float64Array(size);
    add(out, a, b);
    let energy = 0;
    for (let n = 0; n < 2 * size; n += 2) energy += (a[n] ** 2 + a[n + 1] ** 2) * (b[n] ** 2 + b[n + 1] ** 2);
    expectNear(out.reduce((sum, value) => sum + value, 0) / (size * energy), 1, 1e-12, "ratio of energies");
  });
});

test.each([0, 8, 24, 2047, 32.5])("refuses %d points", (size) => {
  expect(() => createProductPower(size)).toThrow(RangeError);
});
