import { expect, test } from "vitest";
import { CA_CHIP_RATE_HZ, chipsToMetres, L1_HZ } from "@/lib/gnss/constants";
import { bpsk } from "@/lib/gnss/spectra/modulation";
import { gaborBandwidthHz, leastDelayDeviationS } from "@/lib/gnss/spectra/gaborBandwidth";
import {
  fllJitterHz,
  fllLimitHz,
  phaseToMetres,
  pllJitterDeg,
  pllThresholdDbHz,
} from "@/lib/gnss/tracking/carrierJitter";
import { dllJitterChips, dllJitterExactChips } from "@/lib/gnss/tracking/dllJitter";
import type { LoopOrder } from "@/lib/gnss/tracking/loopFilter";
import { dynamicStressDeg, phaseMarginDeg } from "@/lib/gnss/tracking/loopStress";
import { formulaCases } from "@/tests/reference/formulaCases";
import { expectNear, expectNearRelative } from "@/tests/support/expectNear";
import { modulationNamed } from "../spectra/modulationNamed";

type Values = Record<string, number>;

const loopOf = ({ Bn_Hz, D, CN0_dBHz, T_s }: Values) => ({
  loopHz: Bn_Hz,
  spacingChips: D,
  cn0DbHz: CN0_dBHz,
  coherentS: T_s,
});

/**
 * Every formula by its number in tests/reference/signal-formulas.json, where each row names its source. T01 and T02:
 * text of the page seen; T03 to T06: from memory; T07: textbook.
 */
const formulas: Record<string, (given: Values) => Values> = {
  T01: (given) => {
    const chip = dllJitterChips(loopOf(given), CA_CHIP_RATE_HZ, given.B_Hz);
    return { chip, m: chipsToMetres(chip) };
  },
  T02: (given) => ({ chip: dllJitterExactChips(loopOf(given), bpsk(given.n), given.B_Hz) }),
  T03: ({ Bn_Hz, CN0_dBHz, T_s }) => {
    const deg = pllJitterDeg(Bn_Hz, CN0_dBHz, T_s);
    return { deg, mm_L1: phaseToMetres(deg, L1_HZ) * 1000 };
  },
  T04: ({ Bn_Hz, T_s }) => ({ dBHz: pllThresholdDbHz(Bn_Hz, T_s) }),
  T05: ({ Bn_Hz, CN0_dBHz, T_s, F }) => ({ Hz: fllJitterHz(Bn_Hz, CN0_dBHz, T_s, F === 2) }),
  T06: ({ order, dyn_SI, Bn_Hz }) => ({ deg: dynamicStressDeg(order as LoopOrder, dyn_SI, Bn_Hz, L1_HZ) }),
  T07: ({ signal, B_Hz }) => ({ MHz: gaborBandwidthHz(modulationNamed(String(signal)), B_Hz) / 1e6 }),
};

const cases = Object.entries(formulas).flatMap(([id, compute]) =>
  formulaCases(id).map((entry) => ({ ...entry, compute, relative: id === "T02" || id === "T07" ? 1e-4 : 2e-5 })),
);

test.each(cases)("$name", ({ given, expected, compute, relative }) => {
  const computed = compute(given);
  expect(Object.keys(computed).sort()).toEqual(Object.keys(expected).sort());
  for (const [quantity, value] of Object.entries(expected))
    expectNearRelative(computed[quantity], value, relative, quantity);
});

// The rule's figures for other loops, from a second program by the same formulas; the rule itself is from memory.
test.each([
  [18, 0.001, 27.1],
  [18, 0.02, 24.6],
  [10, 0.02, 22.2],
])("a Costas loop of %s Hz and %s s reaches 15 degrees at %s dB-Hz", (loopHz, coherentS, cn0DbHz) => {
  expectNear(pllThresholdDbHz(loopHz, coherentS), cn0DbHz, 0.05, "threshold");
  expectNear(pllJitterDeg(loopHz, pllThresholdDbHz(loopHz, coherentS), coherentS), 15, 1e-9, "jitter there");
});

test.each([
  [1, 3.2],
  [0.1, 0.97],
])("40 dB-Hz, 2 Hz, 1 ms, %s chip: %s m", (spacingChips, metres) => {
  const loop = { loopHz: 2, spacingChips, cn0DbHz: 40, coherentS: 0.001 };
  expectNear(chipsToMetres(dllJitterChips(loop, CA_CHIP_RATE_HZ, null)), metres, 0.05, "jitter");
});

// No code loop is better than the bound; a narrow correlator behind a wide filter comes close (Betz 2001).
test("the exact jitter stays above the least possible and comes within a tenth of it", () => {
  for (const bandwidthHz of [4.092e6, 8.184e6, 20.46e6]) {
    const narrow = { loopHz: 1, spacingChips: 0.02, cn0DbHz: 60, coherentS: 0.02 };
    const least = leastDelayDeviationS(bpsk(1), bandwidthHz, 1, 60) * CA_CHIP_RATE_HZ;
    const inBand = dllJitterExactChips(narrow, bpsk(1), bandwidthHz);
    expect(inBand).toBeGreaterThan(least * 0.9);
    expect(inBand).toBeLessThan(least * 1.15);
  }
});

test("the cases of the code formula meet where one ends and the next begins", () => {
  const b = 4;
  for (const edge of [1 / b, Math.PI / b]) {
    const jitter = (spacingChips: number) =>
      dllJitterChips({ loopHz: 1, spacingChips, cn0DbHz: 60, coherentS: 0.02 }, 1e6, b * 1e6);
    expectNearRelative(jitter(edge * (1 + 1e-9)), jitter(edge * (1 - 1e-9)), 0.03, "jitter");
  }
});

test("three sigma and the stress use up 45 degrees", () => {
  const errors = { thermalDeg: 3, vibrationDeg: 4, oscillatorDeg: 12, stressDeg: -6 };
  expectNear(phaseMarginDeg(errors), 45 - 39 - 6, 1e-12, "margin");
  expectNear(fllLimitHz(0.001), 83.333, 1e-3, "frequency limit");
});

test("a loop without bandwidth, spacing or time is refused", () => {
  const loop = { loopHz: 1, spacingChips: 1, cn0DbHz: 45, coherentS: 0.02 };
  for (const wrong of [{ loopHz: 0 }, { spacingChips: 0 }, { spacingChips: 2 }, { coherentS: NaN }])
    expect(() => dllJitterChips({ ...loop, ...wrong }, 1.023e6, null)).toThrow(RangeError);
  expect(() => dllJitterChips(loop, 1.023e6, 0)).toThrow(RangeError);
  expect(() => dllJitterExactChips(loop, bpsk(1), 0)).toThrow(RangeError);
});
