import { describe, expect, test } from "vitest";
import type { Answers, BuiltCase } from "@/lib/checks/kind";
import { acceptedFalsePeaks, type FalseLockTruth } from "@/lib/checks/false-lock/drawScene";
import { falseLock as kind } from "@/lib/checks/false-lock/falseLock";
import { markAnswers } from "@/lib/checks/false-lock/markAnswers";
import { publicCase } from "@/lib/checks/false-lock/publicCase";
import { verdictAnswers } from "@/lib/checks/false-lock/solve";
import { planOf, seedOf, seeds } from "../planOf";
import { sceneFor } from "./sceneFor";

const plan = planOf(kind);
const UNSEARCHED = { searched: [], weakPeak: null };
const { truth } = sceneFor(seedOf(2), { decoy: 100 });
const accepted = acceptedFalsePeaks(truth);
const parent = truth.scene.satellites.find(({ prn }) => prn === truth.parentPrn);
const parentHz = parent?.dopplerHz ?? NaN;

const right: Answers = {
  ...verdictAnswers(truth.listed),
  "falseLock.parent": String(truth.parentPrn),
  "falseLock.doppler": accepted[0].dopplerHz.toFixed(0),
  "falseLock.cn0": accepted[0].apparentCn0DbHz.toFixed(1),
  "falseLock.test": "many-lags",
  "falseLock.remedy": "subtract",
};
const mark = (answers: Answers) => markAnswers(truth, plan, { ...right, ...answers }, UNSEARCHED);
const row = (quantity: string, answers: Answers) => mark(answers).rows.find((one) => one.quantity === quantity);

test("the scene as it is, is met", () => expect(mark({})).toMatchObject({ met: true, withinCount: 6 }));

describe("verdicts are critical and exact", () => {
  const verdictRow = (prn: number, typed: string) =>
    mark({ [`verdicts.prn${prn}`]: typed }).rows.find(({ subject }) => subject === `PRN ${prn}`);
  const absentPrn = truth.listed.find(({ verdict }) => verdict === "absent")?.prn ?? 0;

  test.each([
    ["the reported one called genuine", truth.victimPrn, "genuine", "false satellite accepted"],
    ["the reported one called absent", truth.victimPrn, "absent", "lock not explained"],
    ["the weak one refused", truth.weakPrn, "absent", "genuine satellite refused"],
    ["the strong one refused", truth.parentPrn, "cross-correlation", "genuine satellite refused"],
    ["an absent one called genuine", absentPrn, "genuine", "false satellite accepted"],
    ["an absent one called a lock", absentPrn, "cross-correlation", "no lock to explain"],
    ["nothing said", truth.victimPrn, "", null],
    ["a word of nobody", truth.victimPrn, "perhaps", null],
  ])("%s", (_what, prn, typed, errorClass) => {
    expect(verdictRow(prn, typed)).toMatchObject({ within: false, critical: true, errorClass });
    expect(markAnswers(truth, { ...plan, needs: 1 }, { ...right, [`verdicts.prn${prn}`]: typed }, UNSEARCHED).met).toBe(
      false,
    );
  });
});

describe("Doppler of the false peak", () => {
  test("any of those within 1 dB of the highest is right", () => {
    for (const { dopplerHz, apparentCn0DbHz } of accepted) {
      const answers = { "falseLock.doppler": String(dopplerHz + 40), "falseLock.cn0": String(apparentCn0DbHz) };
      expect(row("falseDoppler", answers)?.within).toBe(true);
      expect(row("falseCn0", answers)?.within).toBe(true);
    }
  });

  test("half a bin of 100 Hz, not more", () => {
    expect(row("falseDoppler", { "falseLock.doppler": String(accepted[0].dopplerHz + 49.9) })?.within).toBe(true);
    expect(row("falseDoppler", { "falseLock.doppler": String(accepted[0].dopplerHz + 50.1) })?.within).toBe(false);
  });

  test("a lower one is named", () => {
    const lower = truth.falsePeaks.find(({ levelDb }) => levelDb < accepted[0].levelDb - 1);
    const typed = String(lower?.dopplerHz ?? parentHz + 20_000);
    expect(row("falseDoppler", { "falseLock.doppler": typed })).toMatchObject({
      within: false,
      errorClass: "lower false peak",
    });
  });

  test("the sign is named", () =>
    expect(row("falseDoppler", { "falseLock.doppler": String(-accepted[0].dopplerHz) })).toMatchObject({
      errorClass: "sign",
    }));

  test("what is no whole kHz away is told where the false peaks stand", () =>
    expect(row("falseDoppler", { "falseLock.doppler": String(parentHz + 300) })?.reason).toMatch(
      /plus or minus whole kHz/,
    ));

  test.each(["", "NaN", "1e999", "5 chip"])("%j is outside with a sentence", (typed) =>
    expect(row("falseDoppler", { "falseLock.doppler": typed })).toMatchObject({
      within: false,
      difference: null,
      reason: expect.any(String),
    }),
  );
});

describe("apparent C/N0", () => {
  const level = accepted[0].apparentCn0DbHz;
  test.each([
    [level + 1.45, true, null],
    [level - 1.55, false, null],
    [parent?.cn0DbHz ?? NaN, false, "parent's own C/N0"],
    [level - 30, false, "SNR in 1 kHz"],
  ])("%d", (typed, within, errorClass) =>
    expect(row("falseCn0", { "falseLock.cn0": typed.toFixed(2) })).toMatchObject({ within, errorClass }),
  );
});

test.each([
  [String(truth.victimPrn), "victim for parent"],
  ["40", null],
  ["", null],
])("parent %j is outside", (typed, errorClass) =>
  expect(row("parent", { "falseLock.parent": typed })).toMatchObject({ within: false, errorClass }),
);

test.each([
  ["test", "doppler-modulo", true, null],
  ["test", "data-bits", true, null],
  ["test", "power-follows", true, null],
  ["test", "mask", true, null],
  ["test", "highest-peak", false, "highest peak wins"],
  ["test", "second-path", false, "multipath"],
  ["test", "threshold", false, null],
  ["remedy", "compare", true, null],
  ["remedy", "raise", false, "threshold raised"],
  ["remedy", "antenna", false, "multipath"],
  ["remedy", "longer", false, null],
  ["remedy", "weight", false, null],
])("%s: %s", (quantity, typed, within, errorClass) => {
  const marked = row(quantity, { [`falseLock.${quantity}`]: typed });
  expect(marked).toMatchObject({ within, errorClass });
  expect(marked?.reason === null).toBe(within);
});

describe("a wrong method is not met", () => {
  const built = seeds(20).map((seed): BuiltCase<FalseLockTruth> => {
    const scene = sceneFor(seed);
    return { ...scene, publicCase: publicCase(scene.truth, plan), files: [] };
  });
  test.each(Object.entries(kind.wrongMethods))("%s", (_id, wrong) => {
    for (const one of built) expect(markAnswers(one.truth, plan, wrong.solve(one, plan), UNSEARCHED).met).toBe(false);
  });
});

test("an empty hand-in is outside everywhere", () =>
  expect(markAnswers(truth, plan, {}, UNSEARCHED).withinCount).toBe(0));
