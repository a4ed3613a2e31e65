import { expect, test } from "vitest";
import { caCode } from "@/lib/gnss/caCode";
import { signalLines } from "@/lib/gnss/signalLines";
import { expectNear } from "@/tests/support/expectNear";

const chips = Int8Array.from([1, -1, -1, 1, 1, 1, -1]);
const POINTS = 480; // per chip, a multiple of all numbers of halves below

/** The Fourier integral of the waveform as a fine sum, written down from the definition. */
function lineAt(k: number, halves: number): [number, number] {
  let [re, im] = [0, 0];
  const total = POINTS * chips.length;
  for (let n = 0; n < total; n++) {
    const place = (n + 0.5) / POINTS;
    const half = Math.floor((place % 1) * halves);
    const value = chips[Math.floor(place)] * (half % 2 ? -1 : 1);
    const angle = (-2 * Math.PI * k * place) / chips.length;
    re += (value * Math.cos(angle)) / total;
    im += (value * Math.sin(angle)) / total;
  }
  return [re, im];
}

test.each([1, 2, 12])("a chip of %i halves has the lines of its Fourier integral", (halves) => {
  const lines = signalLines(chips, halves, 20);
  for (const k of [0, 1, 5, 7, 12, 14, 20]) {
    const [re, im] = lineAt(k, halves);
    expectNear(lines[2 * k], re, 1e-4, `real part of line ${k}`); // the sum's own step error
    expectNear(lines[2 * k + 1], im, 1e-4, `imaginary part of line ${k}`);
  }
});

const share = (halves: number, highest: number) => {
  const lines = signalLines(caCode(7), halves, highest);
  let power = lines[0] ** 2;
  for (let k = 1; k <= highest; k++) power += 2 * (lines[2 * k] ** 2 + lines[2 * k + 1] ** 2);
  return power;
};

test("the main lobe of plain chips holds 0.903 of the power, that of ideal random ones", () => {
  // integral of sinc^2 from -1 to 1 = 0.9028: textbook; one code differs from the mean of all by a few per cent
  expectNear(share(1, 1023), 0.903, 0.02, "share within the chip rate");
});

test("all lines together have the waveform's power of 1", () => {
  for (const halves of [1, 2]) expect(share(halves, 40_000)).toBeGreaterThan(0.985);
});
