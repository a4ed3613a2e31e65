import { expect, test } from "vitest";
import { chainLevels, compressionOfHeadroomDb, sumOfLevelsDbm, type ChainPart } from "@/lib/gnss/chain/chainLevels";
import { formulaCases } from "@/tests/reference/formulaCases";
import { expectNear, expectNearRelative } from "@/tests/support/expectNear";

const part = (gainDb: number, noiseFigureDb: number, outputCompressionDbm: number | null = null): ChainPart => ({
  gainDb,
  noiseFigureDb,
  outputCompressionDbm,
});
const QUIET = { antennaK: 130, signalDbm: -128.5, strongDbm: null };

// L03: Friis 1944.
test.each(formulaCases("L03"))("$name", ({ given, expected }) => {
  const stages = given.stages_gain_nf_dB as unknown as [number, number][];
  const last = chainLevels(
    stages.map(([gain, figure]) => part(gain, figure)),
    QUIET,
  ).at(-1)!;
  expectNearRelative(last.noiseFigureDb, expected.NF_dB, 2e-5, "noise figure");
  expectNearRelative(last.gainDb, expected.gain_dB, 2e-5, "gain");
});

// Friis's law for a loss in front: its decibels add to the noise figure in full.
test("an amplifier at the bottom of the cable cannot make good what the cable has lost", () => {
  const amplifier = part(26, 2);
  const cable = part(-12, 12);
  const top = chainLevels([amplifier, cable], QUIET);
  const bottom = chainLevels([cable, amplifier], QUIET);
  expectNear(bottom.at(-1)!.noiseFigureDb, 14, 1e-9, "loss in front adds in full");
  expect(bottom.at(-1)!.cn0DbHz).toBeLessThan(top.at(-1)!.cn0DbHz - 8);
  expectNear(top.at(-1)!.gainDb, bottom.at(-1)!.gainDb, 1e-12, "net gain");
});

// -158.5 dBW at 0 dBi, 130 K and noise figures of 2.0 and 3.1 dB: 45.3 and 43.7 dB-Hz, values from a second program.
test.each([
  [2.0, 45.3],
  [3.1, 43.7],
])("a chain of %s dB leaves %s dB-Hz", (figure, cn0DbHz) => {
  const [level] = chainLevels([part(26, figure)], QUIET);
  expectNear(level.cn0DbHz, cn0DbHz, 0.05, "C/N0");
  expectNear(level.signalDbm - level.noiseDbmHz, level.cn0DbHz, 1e-9, "signal over noise density");
});

test("a strong neighbour is followed to each compression point, and costs the weak signal gain", () => {
  const chain = [part(28, 1.2, 5), part(-6, 6), part(20, 8, 10)];
  const quiet = chainLevels(chain, QUIET);
  const loud = chainLevels(chain, { ...QUIET, strongDbm: -23 });
  expect(quiet.every(({ headroomDb, strongDbm }) => headroomDb === Infinity && strongDbm === null)).toBe(true);
  // Definition of the 1 dB compression point: -23 + 28 dBm stands right on it.
  expectNear(loud[0].headroomDb, 0, 1e-12, "headroom");
  expectNear(loud[0].compressionDb, 1, 1e-9, "compression");
  expectNear(loud[0].strongDbm!, 4, 1e-9, "strong signal");
  expectNear(loud[2].headroomDb, 10 - (4 - 6 + 20), 1e-9, "headroom of the second amplifier");
  expectNear(loud[0].signalDbm, quiet[0].signalDbm - 1, 1e-9, "signal");
  expect(loud[2].cn0DbHz).toBeLessThan(quiet[2].cn0DbHz);
  expectNear(loud[2].gainDb, quiet[2].gainDb, 1e-12, "the plain gain stays");
});

test("compression vanishes far below its point and never lets the output pass a ceiling", () => {
  expect(compressionOfHeadroomDb(Infinity)).toBe(0);
  expectNear(compressionOfHeadroomDb(20), 0, 0.02, "20 dB below");
  expectNear(compressionOfHeadroomDb(-90) - compressionOfHeadroomDb(-80), 10, 1e-4, "ten more in, none more out");
});

test("levels add as powers", () => {
  expectNear(sumOfLevelsDbm([-30, -30]), -26.9897, 1e-4, "two alike");
  expectNear(sumOfLevelsDbm([-30, -130]), -30, 1e-6, "one alone");
  expect(() => chainLevels([], QUIET)).toThrow(RangeError);
});
