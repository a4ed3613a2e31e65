import { describe, expect, test } from "vitest";
import { figuresOf } from "@/lib/checks/chain/figures";
import { feedFault, isSupplied, keepsAll, leastMarginDb, marginsOf } from "@/lib/checks/chain/limits";
import { orderFault } from "@/lib/checks/chain/orderFault";
import { bestChain, countChains, goodChains, possibleChains } from "@/lib/checks/chain/possibleChains";
import { runLossDb, stageOf, type Part } from "@/lib/checks/chain/site";
import { delayLeftOutNs, lossLeftOutDb, noiseFiguresAddedDb } from "@/lib/checks/chain/wrongFigures";
import { expectNear } from "@/tests/support/expectNear";
import { named, SITE } from "./site";

const [A1, A2, C1, S1, S2, D1, D2] = named("A1", "A2", "C1", "S1", "S2", "D1", "D2");
const right: Part[] = [A1, C1, S1, D1];

describe("a chain of 26 dB at the antenna, 12 dB of cable, arrester and splitter", () => {
  const figures = figuresOf(right, SITE);
  // Loss of the run: 9.5606 dB at 1 GHz times the root of 1.57542, 1.25516, by hand: 12.000 dB.
  test("the run loses 12 dB at L1", () => expectNear(runLossDb(C1 as never, SITE.runM), 12, 1e-3, "loss"));
  // Friis, worked by hand with linear values: 26 dB and 2 dB, 16.5 dB of loss behind it, receiver of 8 dB.
  // F = 1.58489 + (44.668 - 1)/398.107 + (6.3096 - 1)/8.9125 = 2.29036, 3.599 dB.
  test("has a net gain of 9.5 dB and a noise figure of 3.60 dB", () => {
    expectNear(figures.gainDb, 9.5, 1e-3, "gain");
    expectNear(figures.noiseFigureDb, 3.599, 2e-3, "noise figure");
  });
  // The same parts in the rack: 12.5 dB of loss in front; F = 17.7828 (1.58489 + (2.51189 - 1)/398.107 + (6.3096 - 1)/158.489) = 28.847.
  test("and 14.60 dB when the amplifier stands behind cable and arrester", () =>
    expectNear(figuresOf([C1, S1, A1, D1], SITE).noiseFigureDb, 14.601, 3e-3, "noise figure"));
  // -30 dBm + 26 dB = -4 dBm against 5 dBm.
  test("leaves 9 dB under the 1 dB point", () => expectNear(figures.amplifiers[0].headroomDb, 9, 1e-12, "headroom"));
  // Ohm's law by hand: 40 mA through 10 + 0.5 + 0.5 + 2 ohm (100 m of 20 ohm/km) drops 0.52 V of 5 V.
  test("feeds the amplifier with 4.48 V", () => {
    expectNear(figures.amplifiers[0].volts!, 4.48, 1e-12, "volts");
    expect(figures.totalMa).toBe(40);
  });
  // 100 m / (0.85 x 0.299792458 m/ns) = 392.43 ns (definition), and 20 + 0.5 + 1 ns of the parts.
  test("delays by 413.93 ns", () => expectNear(figures.delayNs, 413.93, 0.005, "delay"));
  test("margins are to the nearer end of the window, under the noise limit and under the 1 dB point", () => {
    const { gainDb, noiseDb, overloadDb } = marginsOf(figures, SITE);
    expectNear(gainDb, 1.5, 1e-3, "from 8 dB");
    expectNear(noiseDb, 1.401, 2e-3, "of 5 dB");
    expectNear(overloadDb, 9, 1e-12, "headroom");
    expectNear(leastMarginDb(figures, SITE), noiseDb, 1e-12, "least");
    expect(keepsAll(right, SITE)).toBe(true);
    expect(keepsAll(right, { ...SITE, noiseLimitDb: 4.5 })).toBe(false);
    expect(keepsAll(right, { ...SITE, gainFromDb: 9 })).toBe(false);
    expect(keepsAll(right, { ...SITE, neighbourDbm: -21.5 })).toBe(false);
    expect(keepsAll(right, { ...SITE, limitMa: 39 })).toBe(false);
    expect(keepsAll(right, { ...SITE, sourceOhm: 60 })).toBe(false);
  });
});

describe("the feed", () => {
  const faultOf = (chain: Part[]) => feedFault(chain, figuresOf(chain, SITE));
  test("is intact through parts that pass it", () => expect(faultOf(right)).toBeNull());
  test("ends at a part that blocks direct current below an amplifier", () => {
    expect(faultOf([A1, C1, S2, D1])).toEqual({ part: S2, two: false });
    const figures = figuresOf([A1, C1, S2, D1], SITE);
    expect(figures.amplifiers[0].volts).toBeNull();
    expect(isSupplied(figures, SITE)).toBe(false);
  });
  test("is not asked of a part above every amplifier", () => expect(faultOf([C1, S2, A1, D1])).toBeNull());
  test("comes twice through a splitter that passes all ports", () =>
    expect(faultOf([A1, C1, S1, D2])).toEqual({ part: D2, two: true }));
  test("without an amplifier has nobody to reach", () =>
    expect(faultOf([C1, S1, D1])).toEqual({ part: null, two: false }));
});

describe("the order", () => {
  test.each<[string, Part[], RegExp | null]>([
    ["right", right, null],
    ["amplifier behind the arrester", [C1, S1, A1, D1], null],
    ["no run", [A1, S1, D1], /no run of cable/],
    ["no arrester", [A1, C1, D1], /no arrester/],
    ["two arresters", [A1, C1, S1, S2, D1], /more than one arrester/],
    ["no splitter", [A1, C1, S1], /no splitter/],
    ["arrester at the antenna", [S1, A1, C1, D1], /right behind the run/],
    ["amplifier before the arrester", [C1, A1, S1, D1], /right behind the run/],
    ["splitter on the roof", [D1, C1, S1, A1], /behind the arrester/],
    ["one amplifier twice", [A1, A1, C1, S1, D1], /A1 is named twice/],
  ])("%s", (_what, chain, reason) => {
    const fault = orderFault(chain, SITE);
    if (reason) expect(fault).toMatch(reason);
    else expect(fault).toBeNull();
  });
  test("a site with one receiver needs no splitter", () => {
    const single = { ...SITE, needsSplitter: false };
    expect(orderFault([A1, C1, S1], single)).toBeNull();
    expect(orderFault(right, single)).toMatch(/needs no splitter/);
  });
});

describe("all chains of a site", () => {
  // Two amplifiers at three places: 2 x 3 with one; with two 2 orders x 6 pairs of places in order = 12. One cable,
  // arresters and splitters times: one of each that lets the feed through, two of each in all.
  test("are as many as counting by hand gives", () => {
    expect(possibleChains(SITE)).toHaveLength(18);
    expect(countChains(SITE)).toBe(18 * 4);
    expect(new Set(possibleChains(SITE).map((chain) => chain.map(({ id }) => id).join(" "))).size).toBe(18);
  });
  test("stand in order and let one feed through", () => {
    for (const chain of possibleChains(SITE)) {
      expect(orderFault(chain, SITE)).toBeNull();
      expect(feedFault(chain, figuresOf(chain, SITE))).toBeNull();
    }
  });
  test("those that keep every limit are found without trying each in full", () => {
    const wide = { ...SITE, gainToDb: 60, noiseLimitDb: 20, limitMa: 200 };
    for (const site of [SITE, wide])
      expect(goodChains(site)).toEqual(possibleChains(site).filter((one) => keepsAll(one, site)));
    expect(goodChains(wide).length).toBeGreaterThan(goodChains(SITE).length);
  });
  test("the best leaves most on its tightest limit", () => {
    expect(bestChain(SITE)).toEqual(right);
    expect(bestChain({ ...SITE, noiseLimitDb: 1 })).toBeNull();
  });
});

test("figures of one wrong step, by hand", () => {
  // 12.000 - 9.5606 dB; 2 + 12 + 0.5 + 4 dB; 392.43 - 333.56 ns at the speed of light.
  expectNear(lossLeftOutDb(right, SITE), 2.439, 1e-3, "loss");
  expectNear(noiseFiguresAddedDb(right, SITE), 18.5, 1e-3, "noise figures");
  expectNear(delayLeftOutNs(right, SITE), 58.86, 0.01, "delay");
  expect(lossLeftOutDb([A1], SITE)).toBe(0);
  expect(stageOf(A2, SITE)).toEqual({ gainDb: 20, noiseFigureDb: 5, outputCompressionDbm: 10 });
});
