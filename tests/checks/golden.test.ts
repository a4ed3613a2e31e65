import { describe, expect, test } from "vitest";
import { cn0 } from "@/lib/checks/cn0/cn0";
import { chain } from "@/lib/checks/chain/chain";
import { correlatorReading } from "@/lib/checks/correlator-reading/correlatorReading";
import { delayEntry } from "@/lib/checks/delay-entry/delayEntry";
import { falseLock } from "@/lib/checks/false-lock/falseLock";
import { publicCase as falseLockCase } from "@/lib/checks/false-lock/publicCase";
import { interferer } from "@/lib/checks/interferer/interferer";
import { jammedOrNot } from "@/lib/checks/jammed-or-not/jammedOrNot";
import { locate } from "@/lib/checks/locate/locate";
import { lostDecibels } from "@/lib/checks/lost-decibels/lostDecibels";
import { drawScene } from "@/lib/checks/satellites/drawScene";
import { publicCase as satellitesCase } from "@/lib/checks/satellites/publicCase";
import { pulseAcceptance } from "@/lib/checks/pulse-acceptance/pulseAcceptance";
import { satellites } from "@/lib/checks/satellites/satellites";
import { searchPlan } from "@/lib/checks/search-plan/searchPlan";
import { sidePeak } from "@/lib/checks/side-peak/sidePeak";
import { standOff } from "@/lib/checks/stand-off/standOff";
import { skyView } from "@/lib/checks/sky-view/skyView";
import { sceneFor } from "./false-lock/sceneFor";
import { GOLDEN } from "./goldenHashes";
import { goldenOf } from "./goldenOf";
import { planOf, seedOf } from "./planOf";

/*
 * A released builder never changes: these hashes are of its first release, and a difference means a new version of the kind.
 * Captures take seconds, so their scenes are compared for all seeds and their files for a few.
 */
const SLOW = 120_000;
const list = (hashes: readonly string[]) => hashes.map((hash, n) => [n, hash] as const);

describe("correlator-reading@1", () => {
  const plan = planOf(correlatorReading);
  test.each(list(GOLDEN.correlatorReading))("seed %i", (n, hash) =>
    expect(goldenOf(correlatorReading.build(seedOf(n), plan))).toBe(hash),
  );
});

describe("delay-entry@1", () => {
  const plan = planOf(delayEntry);
  test.each(list(GOLDEN.delayEntry))("seed %i", (n, hash) =>
    expect(goldenOf(delayEntry.build(seedOf(n), plan))).toBe(hash),
  );
});

describe("pulse-acceptance@1", () => {
  const plan = planOf(pulseAcceptance);
  test.each(list(GOLDEN.pulseAcceptance))("seed %i", (n, hash) =>
    expect(goldenOf(pulseAcceptance.build(seedOf(n), plan))).toBe(hash),
  );
});

describe("search-plan@1", () => {
  const plan = planOf(searchPlan);
  test.each(list(GOLDEN.searchPlan))("seed %i", { timeout: SLOW }, (n, hash) =>
    expect(goldenOf(searchPlan.build(seedOf(n), plan))).toBe(hash),
  );
});

describe("chain@1", () => {
  const plan = planOf(chain);
  test.each(list(GOLDEN.chain))("seed %i", (n, hash) => expect(goldenOf(chain.build(seedOf(n), plan))).toBe(hash));
});

describe("sky-view@1", () => {
  const plan = planOf(skyView);
  test.each(list(GOLDEN.skyView))("seed %i", (n, hash) => expect(goldenOf(skyView.build(seedOf(n), plan))).toBe(hash));
});

describe("satellites@1", () => {
  const plan = planOf(satellites);
  test.each(list(GOLDEN.satelliteScenes))("scene of seed %i", (n, hash) => {
    const { truth } = drawScene(seedOf(n), plan.parameters);
    expect(goldenOf({ truth, publicCase: satellitesCase(truth, plan), files: [] })).toBe(hash);
  });
  test.each(list(GOLDEN.satelliteCaptures))("capture of seed %i", { timeout: SLOW }, (n, hash) =>
    expect(goldenOf(satellites.build(seedOf(n), plan))).toBe(hash),
  );
});

describe("false-lock@1", () => {
  const plan = planOf(falseLock);
  // Its capture is held against its hash in false-lock/capture.test.ts, which has made it anyway.
  test.each(list(GOLDEN.falseLockScenes))("scene of seed %i", { timeout: SLOW }, (n, hash) => {
    const { truth } = sceneFor(seedOf(n));
    expect(goldenOf({ truth, publicCase: falseLockCase(truth, plan), files: [] })).toBe(hash);
  });
});

describe("cn0@1", () => {
  const plan = planOf(cn0);
  test.each(list(GOLDEN.cn0))("seed %i", (n, hash) => expect(goldenOf(cn0.build(seedOf(n), plan))).toBe(hash));
});

describe("side-peak@1", () => {
  const plan = planOf(sidePeak);
  test.each(list(GOLDEN.sidePeak))("seed %i", (n, hash) =>
    expect(goldenOf(sidePeak.build(seedOf(n), plan))).toBe(hash),
  );
});

describe("stand-off@1", () => {
  const plan = planOf(standOff);
  test.each(list(GOLDEN.standOff))("seed %i", (n, hash) =>
    expect(goldenOf(standOff.build(seedOf(n), plan))).toBe(hash),
  );
});

describe("locate@1", () => {
  const plan = planOf(locate);
  test.each(list(GOLDEN.locate))("seed %i", (n, hash) => expect(goldenOf(locate.build(seedOf(n), plan))).toBe(hash));
});

describe("lost-decibels@1", () => {
  const plan = planOf(lostDecibels);
  test.each(list(GOLDEN.lostDecibels))("seed %i", (n, hash) =>
    expect(goldenOf(lostDecibels.build(seedOf(n), plan))).toBe(hash),
  );
});

describe("jammed-or-not@1", () => {
  const plan = planOf(jammedOrNot);
  test.each(list(GOLDEN.jammedOrNot))("seed %i", (n, hash) =>
    expect(goldenOf(jammedOrNot.build(seedOf(n), plan))).toBe(hash),
  );
});

describe("interferer@1", () => {
  const plan = planOf(interferer);
  test.each(list(GOLDEN.interferer))("seed %i", { timeout: SLOW }, (n, hash) =>
    expect(goldenOf(interferer.build(seedOf(n), plan))).toBe(hash),
  );
});
