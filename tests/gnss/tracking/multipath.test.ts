import { expect, test } from "vitest";
import { chipsToMetres } from "@/lib/gnss/constants";
import { boc, bpsk, MBOC } from "@/lib/gnss/spectra/modulation";
import { powerInBand } from "@/lib/gnss/spectra/powerInBand";
import { correlationShape } from "@/lib/gnss/tracking/correlationShape";
import {
  earlyMinusLate,
  earlyMinusLatePower,
  multipathEnvelope,
  multipathErrorChips,
  multipathPlateauChips,
  settledErrorChips,
} from "@/lib/gnss/tracking/multipathEnvelope";
import { amplitudeRatio, groundExtraPathM, wallExtraPathM } from "@/lib/gnss/tracking/reflectionPath";
import { formulaCases } from "@/tests/reference/formulaCases";
import { expectNear, expectNearRelative } from "@/tests/support/expectNear";

// M01: triangle geometry, same shape as van Nee's and Braasch's envelopes.
test.each(formulaCases("M01"))("$name", ({ given, expected }) => {
  const { alpha, delta_chip, d_chip } = given;
  expectNearRelative(multipathErrorChips(alpha, delta_chip, d_chip), expected.e_plus, 2e-5, "in phase");
  expectNearRelative(multipathErrorChips(-alpha, delta_chip, d_chip), expected.e_minus, 2e-5, "opposite");
});

// M02: definition.
test.each(formulaCases("M02"))("$name", ({ given, expected }) =>
  expectNearRelative(chipsToMetres(multipathPlateauChips(given.alpha, given.d)), expected.m, 2e-5, "plateau"),
);

test("the discriminator's zero is where the closed form says", () => {
  const shape = correlationShape(bpsk(1), null);
  for (const spacingChips of [0.1, 0.5, 1])
    for (const ratio of [0.7, 0.3, -0.3, -0.7])
      for (let delayChips = 0.013; delayChips < 1.6; delayChips += 0.0991)
        expectNear(
          settledErrorChips({ shape, spacingChips, ratio, delayChips }),
          multipathErrorChips(ratio, delayChips, spacingChips),
          1e-7,
          `${ratio} at ${delayChips} chips, spacing ${spacingChips}`,
        );
});

// Corner values of textbook autocorrelations, Betz 2001.
test.each([
  ["BPSK(1)", bpsk(1), [1, 0.75, 0.5, 0.25, 0]],
  ["BOC(1,1)", boc(1, 1), [1, 0.25, -0.5, -0.25, 0]],
  ["BOC(2,1)", boc(2, 1), [1, -0.75, 0.5, -0.25, 0]],
] as const)("autocorrelation of %s", (_name, modulation, quarters) => {
  const shape = correlationShape(modulation, null);
  quarters.forEach((expected, n) => expectNear(shape(n / 4), expected, 1e-12, `at ${n / 4} chip`));
  expect(shape(-0.3)).toBe(shape(0.3));
  expect(shape(1.2)).toBe(0);
});

test.each([
  ["BPSK(1)", bpsk(1)],
  ["BOC(1,1)", boc(1, 1)],
  ["BOCcos(2,1)", boc(2, 1, "cosine")],
  ["MBOC", MBOC],
] as const)("a wide filter hardly changes %s, a narrow one leaves the power in its band", (_name, modulation) => {
  const [plain, wide] = [correlationShape(modulation, null), correlationShape(modulation, 80e6)];
  for (let delay = 0; delay < 1.3; delay += 0.0371) expectNear(wide(delay), plain(delay), 0.04, `at ${delay} chip`);
  expectNearRelative(correlationShape(modulation, 4e6)(0), powerInBand(modulation, 4e6), 1e-9, "power");
});

test("a filter makes the envelope smooth and lets the reflection in later, and a narrow correlator helps less", () => {
  const spacing = 0.1;
  const narrow = correlationShape(bpsk(1), 4.092e6);
  const largest = (shape: ReturnType<typeof correlationShape>) =>
    Math.max(
      ...multipathEnvelope(shape, spacing, 0.5, [0.1, 0.2, 0.3, 0.5, 0.7]).map(({ inPhaseChips }) => inPhaseChips),
    );
  expectNear(largest(correlationShape(bpsk(1), null)), 0.025, 1e-6, "no filter: the flat top");
  expect(largest(narrow)).toBeGreaterThan(0.04);
});

test("the envelope has both signs, 0 at no delay and beyond reach", () => {
  const rows = multipathEnvelope(correlationShape(bpsk(1), null), 0.5, 0.5, [0, 0.4, 1.3]);
  expect(rows[0]).toEqual({ delayChips: 0, inPhaseChips: 0, oppositeChips: 0 });
  expect(rows[1].inPhaseChips).toBeGreaterThan(0);
  expect(rows[1].oppositeChips).toBeLessThan(0);
  expectNear(rows[2].inPhaseChips, 0, 1e-9, "beyond 1 + d/2");
});

// By hand: beside the side peak at 1/2 chip |R| falls with slope 3 inwards and 1 outwards, so |E| = |L| at 0.55 chip
// for a spacing of 0.2.
test("a power discriminator on BOC(1,1) has a false zero at its side peak, a coherent one does not rise there", () => {
  const clean = { shape: correlationShape(boc(1, 1), null), spacingChips: 0.2, ratio: 0, delayChips: 0 };
  const power = (x: number) => earlyMinusLatePower(clean, 0, x);
  expectNear(power(0.55), 0, 1e-12, "side peak");
  expect(power(0.54)).toBeLessThan(0);
  expect(power(0.56)).toBeGreaterThan(0);
  expect(earlyMinusLate(clean, 0.54)).toBeGreaterThan(0);
  expectNear(power(0), 0, 1e-15, "main peak");
});

test("in phase and in opposite phase both discriminators agree on the error; a quarter turn lies between", () => {
  const signal = { shape: correlationShape(bpsk(1), null), spacingChips: 0.5, ratio: 0.4, delayChips: 0.3 };
  const settled = settledErrorChips(signal);
  expectNear(earlyMinusLatePower(signal, 0, settled), 0, 1e-7, "in phase");
  const opposite = settledErrorChips({ ...signal, ratio: -0.4 });
  expectNear(earlyMinusLatePower(signal, 0.5, opposite), 0, 1e-7, "opposite");
  expect(earlyMinusLatePower(signal, 0.25, settled)).toBeGreaterThan(0);
  expect(earlyMinusLatePower(signal, 0.25, opposite)).toBeLessThan(0);
});

// Geometry by hand; -6 dB are a ratio of 0.501.
test("extra paths of ground and wall", () => {
  expectNear(groundExtraPathM(2, 30), 2, 1e-12, "ground");
  expectNear(wallExtraPathM(10, 60, 0), 10, 1e-9, "wall");
  expectNear(wallExtraPathM(10, 0, 60), 10, 1e-9, "wall aside");
  expectNear(amplitudeRatio(-6), 0.501187, 1e-6, "ratio");
});

test("a reflection stronger than the direct signal, or earlier, is refused", () => {
  expect(() => multipathErrorChips(1, 0.1, 0.5)).toThrow(RangeError);
  expect(() => multipathErrorChips(0.5, -0.1, 0.5)).toThrow(RangeError);
  expect(() => multipathErrorChips(0.5, 0.1, 1.5)).toThrow(RangeError);
  expect(() => correlationShape(bpsk(1), 0)).toThrow(RangeError);
});
