import { expect, test } from "vitest";
import * as detection from "@/lib/gnss/detection";
import { formulaCases } from "@/tests/reference/formulaCases";
import { expectNear, expectNearRelative } from "@/tests/support/expectNear";

type Values = Record<string, number>;
const toDb = (ratio: number) => 10 * Math.log10(ratio);

const detected = ({ CN0_dBHz, T_s, M = 1, Pfa }: Values) => {
  const gamma = detection.thresholdSigma2(Pfa, M);
  const rho = detection.coherentSnr(CN0_dBHz, T_s);
  return { gamma, rho_dB: toDb(rho), Pd: detection.detectionProbability(gamma, M, rho) };
};

/** Every formula by its number in tests/reference/signal-formulas.json. */
const formulas: Record<string, (given: Values) => Values> = {
  D01: ({ Pfa }) => ({ Vt_over_sigma: detection.envelopeThresholdSigma(Pfa) }),
  D02: (given) => ({ rho_dB: detected(given).rho_dB, Pd: detected(given).Pd }),
  D03: ({ M, Pfa }) => ({ gamma: detection.thresholdSigma2(Pfa, M) }),
  D04: (given) => ({ gamma: detected(given).gamma, Pd: detected(given).Pd }),
  D05: ({ N, Pfa_sys }) => {
    const perCell = detection.falseAlarmPerCell(Pfa_sys, N);
    return { Pfa_cell: perCell, gamma_M1: detection.thresholdSigma2(perCell, 1) };
  },
  D06: ({ N, M, p }) => ({ P: detection.atLeastOf(M, N, p) }),
  D07: ({ N, rho_dB }) => ({ P: detection.largestOfCells(N, 10 ** (rho_dB / 10)) }),
  D08: ({ df_Hz, T_s }) => ({ dB: detection.dopplerLossDb(df_Hz, T_s) }),
  D09: ({ tau_chip }) => ({ dB: detection.codeLossDb(tau_chip) }),
  D10: ({ a }) => ({ dB: detection.bitFlipLossDb(a) }),
  D11: ({ n, Pfa, Pd }) => {
    const factor = detection.detectability(Pfa, Pd);
    return { L_dB: detection.nonCoherentLossDb(n, factor), Dc: factor };
  },
  D12: ({ M, Pfa, Pd }) => ({
    rho1_dB: toDb(detection.requiredSnr(1, Pfa, Pd)),
    rhoM_dB: toDb(detection.requiredSnr(M, Pfa, Pd)),
    L_dB: detection.squaringLossDb(M, Pfa, Pd),
  }),
  D13: ({ code, step_chip, fmax_Hz, bin_Hz, T_s, M }) => {
    const cells = detection.searchCells(code, step_chip, fmax_Hz, bin_Hz);
    return { cells, time_s: detection.searchTimeS(cells, T_s, M, 1) };
  },
};
/** D07 was printed from a quadrature; the rest to six digits. */
const relativeOf = (id: string) => (id === "D07" ? 1e-4 : 2e-5);

const cases = Object.entries(formulas).flatMap(([id, compute]) =>
  formulaCases(id).map((entry) => ({ ...entry, compute, relative: relativeOf(id) })),
);

test.each(cases)("$name", ({ given, expected, compute, relative }) => {
  const computed = compute(given);
  expect(Object.keys(computed).sort()).toEqual(Object.keys(expected).sort());
  for (const [quantity, value] of Object.entries(expected))
    expectNearRelative(computed[quantity], value, relative, quantity);
});

// Kaplan & Hegarty, Understanding GPS, 2nd edition, 5.8: 16 % false alarms need 1.914 sigma (from memory).
test("16 % false alarms per cell need 1.914 sigma", () =>
  expectNear(detection.envelopeThresholdSigma(0.16), 1.914, 5e-4, "threshold"));

test("false alarms per cell and per search undo each other, tiny ones too", () => {
  for (const perSearch of [1e-9, 1e-4, 0.01, 0.5]) {
    const perCell = detection.falseAlarmPerCell(perSearch, 411_246);
    expectNearRelative(detection.falseAlarmPerSearch(perCell, 411_246), perSearch, 1e-9, "per search");
  }
  expectNearRelative(detection.falseAlarmPerSearch(1e-12, 1000), 1e-9, 1e-6, "a thousand cells of 1e-12");
});

test("the threshold holds the false alarms it was set for", () => {
  for (const sums of [1, 20, 500])
    expectNearRelative(
      detection.falseAlarmOfThreshold(detection.thresholdSigma2(1e-7, sums), sums),
      1e-7,
      1e-9,
      "per cell",
    );
});

test("losses vanish without an offset and are complete where the sum cancels", () => {
  expect(detection.dopplerLossDb(0, 0.001)).toBe(0);
  expect(detection.dopplerLossDb(1000, 0.001)).toBeGreaterThan(200);
  expect(detection.codeLossDb(0)).toBe(-0);
  expect(detection.bitFlipLossDb(0.5)).toBe(Infinity);
  expectNear(detection.squaringLossDb(1, 1e-3, 0.9), 0, 1e-9, "one sum loses nothing");
});

test("trying at least none always succeeds, all of all is the power", () => {
  expectNear(detection.atLeastOf(0, 8, 0.3), 1, 1e-12, "at least 0 of 8");
  expectNear(detection.atLeastOf(8, 8, 0.3), 0.3 ** 8, 1e-15, "8 of 8");
});
