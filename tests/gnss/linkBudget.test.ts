import { expect, test } from "vitest";
import {
  clockErrorHz,
  codeDopplerChipsPerS,
  dopplerOfRangeRateHz,
  halfChipSlipS,
  samplesPerCodePeriod,
} from "@/lib/gnss/doppler";
import * as link from "@/lib/gnss/linkBudget";
import { formulaCases } from "@/tests/reference/formulaCases";
import { expectNear, expectNearRelative } from "@/tests/support/expectNear";

type Values = Record<string, number>;

/** Every formula by its number in tests/reference/signal-formulas.json; six digits are compared. */
const formulas: Record<string, (given: Values) => Values> = {
  L01: ({ dBW }) => ({ dBm: link.dBwToDbm(dBW) }),
  L02: ({ T_K }) => ({ dBm_Hz: link.noiseDensityDbmHz(T_K), dBW_Hz: link.noiseDensityDbmHz(T_K) - 30 }),
  L03: (given) => {
    const stages = given.stages_gain_nf_dB as unknown as [number, number][];
    const whole = link.cascade(stages.map(([gainDb, noiseFigureDb]) => ({ gainDb, noiseFigureDb })));
    return { NF_dB: whole.noiseFigureDb, gain_dB: whole.gainDb };
  },
  L04: ({ T_ant_K, NF_dB }) => {
    const system = link.systemTemperatureK(T_ant_K, NF_dB);
    return { T_sys_K: system, N0_dBm_Hz: link.noiseDensityDbmHz(system) };
  },
  L05: ({ P_dBm, G_dBic, L_dB, T_sys_K }) => ({ CN0_dBHz: link.expectedCn0DbHz(P_dBm, G_dBic, L_dB, T_sys_K) }),
  L06: ({ d_m, f_Hz }) => ({ dB: link.freeSpaceLossDb(d_m, f_Hz) }),
  L07: ({ CN0_dBHz, B_Hz }) => ({ dB: link.snrDb(CN0_dBHz, B_Hz) }),
  L08: ({ CN0_dBHz, Rb }) => ({ EbN0_dB: link.snrDb(CN0_dBHz, Rb), BER: link.bitErrorRatio(CN0_dBHz, Rb) }),
  F01: ({ v_mps, f_Hz }) => {
    // the table prints magnitudes; a growing range lowers the frequency
    const doppler = dopplerOfRangeRateHz(-v_mps, f_Hz);
    return { fd_Hz: doppler, "code_cps_1.023M": codeDopplerChipsPerS(doppler, f_Hz) };
  },
  F02: ({ fd_Hz }) => ({ s: halfChipSlipS(fd_Hz) }),
  F03: ({ ppm }) => ({ Hz: clockErrorHz(ppm) }),
};

const cases = Object.entries(formulas).flatMap(([id, compute]) =>
  formulaCases(id).map((entry) => ({ ...entry, compute })),
);

test.each(cases)("$name", ({ given, expected, compute }) => {
  const computed = compute(given);
  expect(Object.keys(computed).sort()).toEqual(Object.keys(expected).sort());
  for (const [quantity, value] of Object.entries(expected))
    expectNearRelative(computed[quantity], value, 2e-5, quantity);
});

test("a growing range lowers the frequency", () => {
  expect(dopplerOfRangeRateHz(100, 1575.42e6)).toBeLessThan(0);
});

test("a low-noise amplifier in front decides the noise figure, wherever its gain comes later", () => {
  const amplifier = { gainDb: 28, noiseFigureDb: 1.2 };
  const cable = { gainDb: -12, noiseFigureDb: 12 };
  const [before, after] = [link.cascade([amplifier, cable]), link.cascade([cable, amplifier])];
  expectNear(before.gainDb, after.gainDb, 1e-12, "net gain does not depend on the order");
  // A loss in front adds its own figure in full: 12 + 1.2 dB.
  expectNear(after.noiseFigureDb, 13.2, 1e-9, "amplifier behind the cable");
  expect(before.noiseFigureDb).toBeLessThan(2);
  expect(() => link.cascade([])).toThrow(RangeError);
});

test("a capture's rate must give whole samples per code period, two per chip or more", () => {
  expect(samplesPerCodePeriod(4.092e6)).toBe(4092);
  for (const rate of [2.045e6, 2.0465001e6, 0, NaN]) expect(() => samplesPerCodePeriod(rate)).toThrow(RangeError);
});
