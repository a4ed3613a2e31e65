import { describe, expect, test } from "vitest";
import { chipsToMetres } from "@/lib/gnss/constants";
import { sidePeaks } from "@/lib/gnss/sidePeaks";
import { galileoE1B } from "@/lib/gnss/signals/galileoE1B";
import { galileoE1C } from "@/lib/gnss/signals/galileoE1C";
import { gpsL1Ca } from "@/lib/gnss/signals/gpsL1Ca";
import { gpsL1cP } from "@/lib/gnss/signals/gpsL1cP";
import { signalShape } from "@/lib/gnss/signals/signalShape";
import type { Modulation } from "@/lib/gnss/signals/signal";
import { boc, bpsk, MBOC } from "@/lib/gnss/spectra/modulation";
import { correlationShape } from "@/lib/gnss/tracking/correlationShape";
import { expectNear } from "@/tests/support/expectNear";

const sine = (m: number, n: number): Modulation => ({ kind: "BOC", m, n });

describe("sidePeaks", () => {
  // Side peaks of BOC(1,1): half a chip off, half as high and negative, 146.5 m and 6 dB; common practice, no source.
  test("BOC(1,1) has one on each side", () => {
    const [peak, ...more] = sidePeaks(signalShape(sine(1, 1)));
    expect(more).toEqual([]);
    expect([peak.delayChips, peak.level]).toEqual([0.5, -0.5]);
    expectNear(peak.levelDb, -6.0206, 5e-5, "level, dB");
    expectNear(chipsToMetres(peak.delayChips), 146.5, 0.05, "bias, m");
  });

  // Betz, "Binary Offset Carrier Modulations for Radionavigation" (2001): 2m/n = k half periods in a chip give 2k - 1 peaks,
  // 1/k chip apart, of alternating sign and of height (k - j)/k (from memory).
  test.each([
    [10, 5],
    [15, 2.5],
    [6, 1],
    [5, 2],
  ])("BOC(%d,%d) has the published number, places and heights", (m, n) => {
    const count = (2 * m) / n;
    const peaks = sidePeaks(signalShape(sine(m, n)));
    expect(peaks).toHaveLength(count - 1);
    peaks.forEach(({ delayChips, level }, at) => {
      const j = at + 1;
      expectNear(delayChips, j / count, 1 / 960, "delay, chips");
      expectNear(level, (j % 2 === 0 ? 1 : -1) * ((count - j) / count), 1e-12, "level");
    });
  });

  test("plain chips have none", () => expect(sidePeaks(signalShape(gpsL1Ca.modulation))).toEqual([]));

  test("a filter moves them outwards, the less the wider it is", () => {
    const delays = [4e6, 8e6, 16e6, 40e6].map((bandwidthHz) => {
      const [first] = sidePeaks(correlationShape(boc(1, 1), bandwidthHz), 0.1);
      expectNear(first.level, -0.5, 0.002, `level at ${bandwidthHz} Hz`);
      return first.delayChips;
    });
    expect([...delays].sort((a, b) => b - a)).toEqual(delays);
    expectNear(delays[3], 0.5, 0.01, "delay at 40 MHz, chips");
  });
});

describe("signalShape", () => {
  const delays = Array.from({ length: 49 }, (_, n) => n / 40);

  test("is 1 at 0, even, and 0 from one chip on", () => {
    for (const { modulation } of [gpsL1Ca, gpsL1cP, galileoE1B, galileoE1C]) {
      const shape = signalShape(modulation);
      expectNear(shape(0), 1, 1e-12, "peak");
      for (const delay of delays) expect(shape(-delay)).toBe(shape(delay));
      for (const delay of [1, 1.3, 100]) expect(shape(delay)).toBe(0);
    }
  });

  // MBOC(6,1,1/11) is the mean of data and pilot: Galileo OS SIS ICD, issue 2, 2.3.3; the fast part of L1C's pilot is
  // 4/33 of its chips: IS-GPS-800, 3.3.
  test("the two components of E1 have the spectrum agreed on between them", () => {
    const [data, pilot] = [signalShape(galileoE1B.modulation), signalShape(galileoE1C.modulation)];
    const mboc = correlationShape(MBOC, null);
    for (const delay of delays) expectNear((data(delay) + pilot(delay)) / 2, mboc(delay), 1e-12, `${delay} chips`);
    expect(data(1 / 12)).not.toBe(pilot(1 / 12));
    const overlay = signalShape(gpsL1cP.modulation);
    const [slow, fast] = [correlationShape(boc(1, 1), null), correlationShape(boc(6, 1), null)];
    for (const delay of delays)
      expectNear(overlay(delay), (29 * slow(delay) + 4 * fast(delay)) / 33, 1e-12, `${delay} chips`);
  });

  test("plain chips give the triangle", () => {
    const shape = signalShape(gpsL1Ca.modulation);
    for (const delay of delays) expectNear(shape(delay), correlationShape(bpsk(1), null)(delay), 1e-12, `${delay}`);
  });

  // The steeper main peak of the pilot, whose fast part is subtracted: common practice, no source.
  test("the data's and the pilot's side peaks differ", () => {
    const [data, pilot] = [galileoE1B, galileoE1C].map(({ modulation }) => sidePeaks(signalShape(modulation)));
    const strongest = (peaks: typeof data) => Math.max(...peaks.map(({ level }) => Math.abs(level)));
    expect(strongest(data)).not.toBe(strongest(pilot));
    for (const peaks of [data, pilot]) expect(strongest(peaks)).toBeGreaterThan(0.3);
  });
});
