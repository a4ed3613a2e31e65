import { expect, test } from "vitest";
import { caCode } from "@/lib/gnss/caCode";
import { codeLines, worstCodeLine } from "@/lib/gnss/spectra/codeLines";
import { effectiveCn0DbHz, separationOfFactor, toleratedJsDb } from "@/lib/gnss/spectra/effectiveCn0";
import { boc, bpsk, MBOC } from "@/lib/gnss/spectra/modulation";
import {
  interferenceFactor,
  spectralSeparation,
  type InterferenceSpectrum,
} from "@/lib/gnss/spectra/spectralSeparation";
import { formulaCases } from "@/tests/reference/formulaCases";
import { expectNear, expectNearRelative } from "@/tests/support/expectNear";
import { modulationNamed } from "./modulationNamed";

const decibels = (ratio: number) => 10 * Math.log10(ratio);
const code = (modulation: ReturnType<typeof bpsk>): InterferenceSpectrum => ({ kind: "code", modulation });

// S03: Betz; BPSK against itself also in closed form, 2/(3 Rc).
test.each(formulaCases("S03"))("$name", ({ given, expected }) => {
  const [interference, signal] = [given.i, given.s].map((name) => modulationNamed(String(name)));
  const kappa = spectralSeparation(code(interference), signal, given.B_MHz * 1e6);
  expectNear(decibels(kappa), expected.dB_Hz, decibels(1 + 1e-4), "separation in dB/Hz");
});

// S04: values 1, 1.5 and 2.22 from memory (Kaplan & Hegarty, 2nd edition, chapter 6).
const factors: Record<string, [InterferenceSpectrum, number | null]> = {
  "CW at centre": [{ kind: "line", offsetHz: 0 }, null],
  "matched BPSK, infinite band": [code(bpsk(1)), null],
  "CW 0.5 MHz off": [{ kind: "line", offsetHz: 0.5e6 }, null],
  "BPSK(10) jammer on BPSK(1), 30.69 MHz": [code(bpsk(10)), 30.69e6],
};
test.each(formulaCases("S04"))("$name", ({ given, expected }) => {
  const [interference, bandwidthHz] = factors[String(given.case)];
  expectNearRelative(interferenceFactor(interference, bpsk(1), bandwidthHz), expected.Q, 2e-5, "Q");
});

test("noise over the main lobe has 2.2153; two halves of a band do what the band does", () => {
  const lobe: InterferenceSpectrum = { kind: "band", offsetHz: 0, widthHz: 2.046e6 };
  expectNearRelative(interferenceFactor(lobe, bpsk(1), null), 2.2153, 2e-5, "Q");
  const half = (offsetHz: number) => spectralSeparation({ kind: "band", offsetHz, widthHz: 1.023e6 }, boc(1, 1), null);
  const whole = spectralSeparation({ kind: "band", offsetHz: 0, widthHz: 2.046e6 }, boc(1, 1), null);
  expectNearRelative((half(-0.5115e6) + half(0.5115e6)) / 2, whole, 1e-9, "separation");
});

test("what lies outside of the band does no harm", () => {
  expect(spectralSeparation({ kind: "line", offsetHz: 3e6 }, bpsk(1), 4e6)).toBe(0);
  expect(spectralSeparation({ kind: "band", offsetHz: 5e6, widthHz: 1e6 }, bpsk(1), 4e6)).toBe(0);
  expect(() => spectralSeparation({ kind: "band", offsetHz: 0, widthHz: 0 }, bpsk(1), 4e6)).toThrow(RangeError);
});

test("separation is the same whichever of the two signals is called the interference", () => {
  const one = spectralSeparation(code(MBOC), bpsk(10), 24e6);
  expectNearRelative(spectralSeparation(code(bpsk(10)), MBOC, 24e6), one, 1e-9, "separation");
});

// S05, S06: Betz; Kaplan & Hegarty, 2nd edition, chapter 6.
test.each(formulaCases("S05"))("$name", ({ given, expected }) => {
  const jamming = [{ jsDb: given.JS_dB, separationPerHz: separationOfFactor(given.Q, given.Rc) }];
  expectNearRelative(effectiveCn0DbHz(given.CN0_dBHz, jamming), expected.eff_dBHz, 2e-5, "effective C/N0");
});
test.each(formulaCases("S06"))("$name", ({ given, expected }) => {
  const separation = separationOfFactor(given.Q, given.Rc);
  const js = toleratedJsDb(given.CN0_dBHz, given.eff_dBHz, separation);
  expectNearRelative(js, expected.JS_dB, 2e-5, "J/S");
  const back = effectiveCn0DbHz(given.CN0_dBHz, [{ jsDb: js, separationPerHz: separation }]);
  expectNear(back, given.eff_dBHz, 1e-9, "there and back");
});

// 44 dB-Hz at J/S 30: 29.9, 31.6 and 33.2 dB-Hz for Q = 1, 1.5 and 2.22; values from a second program.
test.each([
  [1, 29.9],
  [1.5, 31.6],
  [2.22, 33.2],
])("44 dB-Hz at J/S 30 and Q %s leaves %s dB-Hz", (factor, effective) => {
  const jamming = [{ jsDb: 30, separationPerHz: separationOfFactor(factor, 1.023e6) }];
  expectNear(effectiveCn0DbHz(44, jamming), effective, 0.06, "effective C/N0");
});

test("interferences add, none changes nothing, and a signal already too weak tolerates none", () => {
  const one = { jsDb: 30, separationPerHz: 1e-6 };
  const twice = { jsDb: 30 + decibels(2), separationPerHz: 1e-6 };
  expectNear(effectiveCn0DbHz(45, [one, one]), effectiveCn0DbHz(45, [twice]), 1e-9, "two alike");
  expectNear(effectiveCn0DbHz(45, []), 45, 1e-12, "none");
  expect(toleratedJsDb(28, 28, 1e-6)).toBe(-Infinity);
});

// S07: Parkinson & Spilker and Kaplan & Hegarty list PRN 1 to 8 (from memory); printed to 0.01 dB.
test.each(formulaCases("S07"))("$name", ({ given, expected }) => {
  const line = worstCodeLine(given.prn);
  expect(line.offsetKhz).toBe(expected.kHz);
  expectNear(line.levelDb, expected.dB, 0.0051, "level");
});

test("all lines and the carrier together are the code's power", () => {
  const power = codeLines(7, 39 * 1023).reduce((sum, { levelDb }) => sum + 2 * 10 ** (levelDb / 10), 1 / 1023 ** 2);
  const chips = caCode(7);
  const changes = chips.filter((chip, n) => chip !== chips[(n + 1) % 1023]).length;
  // Far lines come from the edges alone: beyond 39 chip rates lies 1/(39 pi^2) for an edge at every other chip.
  expectNear(power, 1 - (2 * changes) / 1023 / (Math.PI ** 2 * 39), 1e-5, "power");
});
