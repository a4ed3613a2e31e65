import { describe, expect, test } from "vitest";
import { locate as kind } from "@/lib/checks/locate/locate";
import { reachInEllipse } from "@/lib/gnss/interference/bearingFix";
import { planOf, seeds } from "../planOf";

const plan = planOf(kind);
const built = seeds(40).map((seed) => ({ seed, one: kind.build(seed, plan) }));

describe("a log", () => {
  test("has one reflection among bearings of their stated spread, and the transmitter clear of the ellipse's edge", () => {
    for (const { one } of built) {
      const { log, best, ellipse, transmitter } = one.truth;
      const heard = log.filter(({ bearingDeg }) => bearingDeg !== null);
      expect(heard.length).toBeGreaterThanOrEqual(7);
      expect(heard.length).toBeLessThanOrEqual(9);
      expect(best.lines).toHaveLength(heard.length - 1);
      for (const { spreadDeg } of heard) expect(spreadDeg! >= 2 && spreadDeg! <= 6).toBe(true);
      expect(reachInEllipse(ellipse, transmitter)).toBeLessThanOrEqual(0.8);
    }
  });

  test("shows silent stops when the interferer is off at times, and none else", () => {
    for (const intermittent of [0, 100]) {
      const one = kind.build(seeds(3)[2], planOf(kind, { intermittent }));
      const silent = one.truth.log.filter(({ bearingDeg }) => bearingDeg === null);
      expect(silent.length > 0).toBe(intermittent === 100);
      for (const { levelDbm, spreadDeg } of silent) expect([levelDbm, spreadDeg]).toEqual([null, null]);
    }
  });

  test("runs forward in time from stop to stop", () => {
    for (const { one } of built) {
      const times = one.truth.log.map(({ timeUtc }) => timeUtc);
      expect([...times].sort()).toEqual(times);
      expect(new Set(times).size).toBe(times.length);
    }
  });

  test("some draws are refused, and counted", () =>
    expect(Math.max(...built.map(({ one }) => one.draws))).toBeGreaterThan(1));
});

test("the file is the log with a row of units", () => {
  const [{ one }] = built;
  const lines = new TextDecoder().decode(one.files[0].bytes).split("\r\n");
  expect(lines[1]).toBe(",UTC,m,m,deg,deg,dBm");
  const [first] = one.truth.log;
  expect(lines[2].split(",").slice(0, 4)).toEqual(["1", first.timeUtc, String(first.eastM), String(first.northM)]);
  expect(lines).toHaveLength(one.truth.log.length + 3);
});

test("the public case holds the log and nothing of where it points", () => {
  for (const { one } of built) {
    expect(Object.keys(one.publicCase.data).sort()).toEqual(["frequencyMhz", "log", "logFile"]);
    const { data, given } = one.publicCase;
    const text = JSON.stringify([data, given]);
    expect(text).not.toMatch(/transmitter|reflection|ellipse/i);
    expect(text).not.toContain(`${one.truth.transmitter.eastM}`);
  }
});
