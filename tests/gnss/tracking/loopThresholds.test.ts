import { expect, test } from "vitest";
import { L1_HZ } from "@/lib/gnss/constants";
import { fllJitterHz, fllLimitHz } from "@/lib/gnss/tracking/carrierJitter";
import { dllJitterChips } from "@/lib/gnss/tracking/dllJitter";
import {
  codeMarginChips,
  dllThresholdDbHz,
  fllThresholdDbHz,
  oscillatorJitterDeg,
  vibrationJitterDeg,
} from "@/lib/gnss/tracking/loopThresholds";
import { residualFrequencyHz } from "@/lib/gnss/tracking/residualFrequency";
import { expectNear } from "@/tests/support/expectNear";

test("at the threshold of a frequency loop three sigma are a quarter turn per coherent time", () => {
  for (const [loopHz, coherentS] of [
    [10, 0.001],
    [2, 0.02],
  ])
    expectNear(
      fllJitterHz(loopHz, fllThresholdDbHz(loopHz, coherentS), coherentS, true),
      fllLimitHz(coherentS),
      1e-9,
      "jitter",
    );
});

test("at the threshold of a code loop three sigma are half of the spacing; a wider loop needs more", () => {
  const threshold = (loopHz: number) => dllThresholdDbHz({ loopHz, spacingChips: 0.5, coherentS: 0.02 }, 1.023e6, null);
  const loop = { loopHz: 1, spacingChips: 0.5, cn0DbHz: threshold(1), coherentS: 0.02 };
  expectNear(3 * dllJitterChips(loop, 1.023e6, null), 0.25, 1e-6, "three sigma");
  expect(threshold(4)).toBeGreaterThan(threshold(1));
  expectNear(codeMarginChips(0.01, -0.02, 0.5), 0.2, 1e-12, "margin");
});

// Kaplan & Hegarty, 2nd edition, 5.6.1: 1e-9 per g, 0.005 g^2/Hz from 20 to 2000 Hz at L1 make 1.42 degrees (from
// memory).
test("an oscillator that is shaken or poor adds jitter", () => {
  expectNear(vibrationJitterDeg(L1_HZ, 1e-9, 0.005, 20, 2000), 1.42, 0.005, "vibration");
  // by hand: 160 * 1e-10 * 1575.42e6 / 18
  expectNear(oscillatorJitterDeg(3, 1e-10, 18, L1_HZ), 1.4004, 1e-4, "order 3");
  expectNear(
    oscillatorJitterDeg(2, 1e-10, 18, L1_HZ) / oscillatorJitterDeg(3, 1e-10, 18, L1_HZ),
    0.9,
    1e-12,
    "order 2",
  );
});

test("25 Hz of false lock show in the prompts although each sum over a bit stands still but for its sign", () => {
  const prompts = new Float64Array(2 * 2000);
  for (let n = 0; n < 2000; n++) {
    const bit = Math.floor((n + 13) / 20) % 3 === 0 ? -1 : 1;
    prompts[2 * n] = bit * Math.cos(2 * Math.PI * 0.025 * n);
    prompts[2 * n + 1] = bit * Math.sin(2 * Math.PI * 0.025 * n);
  }
  expectNear(residualFrequencyHz(prompts, 7, 20, 1e-3), 25, 1e-9, "frequency");
  const sums = [7, 27, 47].map((edge) => {
    let [re, im] = [0, 0];
    for (let n = edge; n < edge + 20; n++) [re, im] = [re + prompts[2 * n], im + prompts[2 * n + 1]];
    return Math.abs(Math.atan2(im, re) / Math.PI) % 1; // half turns: the same for all, as a Costas loop sees it
  });
  for (const half of sums) expectNear(Math.sin(Math.PI * half), Math.sin(Math.PI * sums[0]), 1e-9, "phase of the bits");
});
