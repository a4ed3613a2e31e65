import { expect, test } from "vitest";
import { galileoE1B } from "@/lib/gnss/signals/galileoE1B";
import { gpsL1Ca } from "@/lib/gnss/signals/gpsL1Ca";
import { gpsL1cD } from "@/lib/gnss/signals/gpsL1cD";
import { gpsL1cP } from "@/lib/gnss/signals/gpsL1cP";
import { gpsL5Q } from "@/lib/gnss/signals/gpsL5Q";
import { boc, bpsk, MBOC } from "@/lib/gnss/spectra/modulation";
import { modulationOfSignal } from "@/lib/gnss/spectra/modulationOfSignal";
import { powerSpectralDensity } from "@/lib/gnss/spectra/powerSpectralDensity";
import { expectNearRelative } from "@/tests/support/expectNear";

test("plain and binary offset carriers", () => {
  expect(modulationOfSignal(gpsL1Ca)).toEqual(bpsk(1));
  expect(modulationOfSignal(gpsL5Q)).toEqual(bpsk(10));
  expect(modulationOfSignal(gpsL1cD)).toEqual(boc(1, 1));
});

// Galileo OS SIS ICD: E1-B and E1-C together have the MBOC spectrum; IS-GPS-800: L1C with pilot 75 % of the power in
// 29/33 slow chips.
test("composite subcarriers make up the common spectrum", () => {
  for (const offsetHz of [0.4e6, 1.2e6, 6.138e6, 9e6]) {
    const common = powerSpectralDensity(MBOC, offsetHz);
    expectNearRelative(powerSpectralDensity(modulationOfSignal(galileoE1B), offsetHz), common, 1e-9, "E1-B");
    const pilot = powerSpectralDensity(modulationOfSignal(gpsL1cP), offsetHz);
    const data = powerSpectralDensity(modulationOfSignal(gpsL1cD), offsetHz);
    expectNearRelative(0.75 * pilot + 0.25 * data, common, 1e-9, "L1C");
  }
});
