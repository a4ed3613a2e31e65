import { expect, test } from "vitest";
import { boc, bpsk, MBOC } from "@/lib/gnss/spectra/modulation";
import { powerInBand } from "@/lib/gnss/spectra/powerInBand";
import { powerSpectralDensity } from "@/lib/gnss/spectra/powerSpectralDensity";
import { formulaCases } from "@/tests/reference/formulaCases";
import { expectNear, expectNearRelative } from "@/tests/support/expectNear";
import { modulationNamed } from "./modulationNamed";

const decibels = (ratio: number) => 10 * Math.log10(ratio);

// Betz 2001, formulas and composition as named in tests/reference/signal-formulas.json.
test.each(formulaCases("S01"))("$name", ({ given, expected }) => {
  const density = powerSpectralDensity(modulationNamed(String(given.signal)), given.f_MHz * 1e6);
  expectNearRelative(decibels(density), expected.dB, 2e-5, "density");
});

test.each(formulaCases("S02"))("$name", ({ given, expected }) => {
  const share = powerInBand(modulationNamed(String(given.signal)), given.B_MHz * 1e6);
  expectNearRelative(share, expected.frac, 1e-4, "share");
  expectNearRelative(-decibels(share), expected.loss_dB, 1e-4, "loss");
});

// All power is 1: definition. The tails fall as 1/f^2, so a band of 4000 chip rates still lacks some of it.
test.each([
  ["BPSK(1)", bpsk(1)],
  ["BOC(1,1)", boc(1, 1)],
  ["BOC(15,10)", boc(15, 10)],
  ["BOCcos(15,2.5)", boc(15, 2.5, "cosine")],
  ["MBOC", MBOC],
] as const)("%s has power 1 over all frequencies", (_name, modulation) =>
  expectNear(powerInBand(modulation, 4000 * modulation.chipRateHz), 1, 2e-3, "power"),
);

test("the density is smooth where its formula divides by zero, and even", () => {
  for (const modulation of [bpsk(1), boc(1, 1), boc(6, 1), boc(15, 10), boc(15, 2.5, "cosine")]) {
    for (const places of [0, 1.023e6, 3 * 1.023e6, 6 * 1.023e6, 15 * 1.023e6]) {
      const at = powerSpectralDensity(modulation, places);
      const beside = powerSpectralDensity(modulation, places + 0.5);
      expectNear(at * 1e6, beside * 1e6, 2e-5, `density at ${places} Hz`);
      expect(powerSpectralDensity(modulation, -places - 1e5)).toBe(powerSpectralDensity(modulation, places + 1e5));
    }
  }
});

test("a subcarrier that no whole number of half periods fits is refused", () => {
  expect(() => boc(1.3, 1)).toThrow(RangeError);
  expect(() => powerInBand(bpsk(1), 0)).toThrow(RangeError);
});
