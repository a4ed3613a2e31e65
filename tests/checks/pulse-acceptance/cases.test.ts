import { describe, expect, test } from "vitest";
import { pulseAcceptance as kind } from "@/lib/checks/pulse-acceptance/pulseAcceptance";
import { readTimeErrorLog } from "@/lib/formats/readTimeErrorLog";
import { planOf, seedOf, seeds } from "../planOf";

const plan = planOf(kind);
const built = seeds(14).map((seed) => ({ seed, built: kind.build(seed, plan) }));
const right = new Map(built.map(({ built: one }) => [one, kind.solve({ ...one, truth: null as never }, plan)]));

test("max|TE| keeps 3 ns from both published limits, whatever the case's own", () => {
  // ITU-T G.8272: 100 ns for PRTC-A, 40 ns for PRTC-B.
  for (const { built: one } of built) {
    const { figures, accepted, limitNs, clock } = one.truth;
    for (const limit of [40, 100]) expect(Math.abs(figures.maxTeNs - limit)).toBeGreaterThanOrEqual(3);
    expect(limitNs).toBe(clock === "PRTC-A" ? 100 : 40);
    expect(figures.maxTeNs <= limitNs).toBe(accepted);
    expect(Math.abs(figures.meanNs)).toBeLessThanOrEqual(155);
  }
  expect(new Set(built.map(({ built: one }) => one.truth.accepted)).size).toBe(2);
});

test("a step that the sawtooth would hide is none, and stands where a careful look finds it", () => {
  for (const { seed, built: one } of built) {
    const { step, sawtoothNs } = one.truth.shape;
    expect(right.get(one)!["step.seen"], seed).toBe(step ? "yes" : "no");
    if (!step) continue;
    expect(Math.abs(step.sizeNs)).toBeGreaterThanOrEqual(Math.max(8, 1.5 * sawtoothNs));
    expect(Math.abs(Number(right.get(one)!["step.time"]) - step.index / 2)).toBeLessThanOrEqual(2.05);
  }
});

test("a lead can hold limit, step and missed triggers", () => {
  const held = planOf(kind, { limit: "PRTC-B", stepless: 0, step: [20, 20], triggers: [2, 2] });
  const { truth } = kind.build(seedOf(41), held);
  expect(truth.limitNs).toBe(40);
  expect(truth.shape.triggers).toHaveLength(2);
  expect(Math.abs(truth.shape.step!.sizeNs)).toBeGreaterThanOrEqual(20);
});

describe("the public case", () => {
  test("holds readings as they came, and no figure of them", () => {
    for (const { built: one } of built) {
      expect(Object.keys(one.publicCase.data).sort()).toEqual([
        "clock",
        "intervalS",
        "limitNs",
        "logFile",
        "mtieLongS",
        "mtieShortS",
        "readingsNs",
        "startCableNs",
        "stopCableNs",
      ]);
      const text = JSON.stringify({ ...one.publicCase, data: null });
      for (const value of [one.truth.figures.maxTeNs, one.truth.figures.mtieLongNs])
        expect(text).not.toContain(value.toFixed(1));
      expect(JSON.stringify(one.publicCase.data).length).toBeLessThan(40_000);
    }
  });

  test("looks the same with a step and without, with missed triggers and without", () => {
    const shapeOf = (stepless: number, count: number) => {
      const { publicCase } = kind.build(
        seedOf(6),
        planOf(kind, { stepless, triggers: [count, count], limit: "PRTC-A" }),
      );
      return JSON.stringify({ ...publicCase, given: publicCase.given.map(({ label }) => label), data: null }).replace(
        /MTIE over [^"]*/g,
        "",
      );
    };
    expect(shapeOf(0, 3)).toBe(shapeOf(50, 0));
  });

  test("the file is a log that the bench reads: 24 h, every 30 s", () => {
    const [{ built: one }] = built;
    const { series, readings } = readTimeErrorLog(new TextDecoder().decode(one.files[0].bytes));
    expect(readings).toBe(2881);
    expect(series.intervalS).toBe(30);
    expect([...series.valuesNs]).toEqual(one.truth.readingsNs);
    expect(one.files[0].bytes.length).toBeLessThan(45_000);
  });
});
