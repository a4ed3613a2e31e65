import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Answers } from "@/lib/checks/kind";
import { locate as kind } from "@/lib/checks/locate/locate";
import { markAnswers } from "@/lib/checks/locate/markAnswers";
import { reachInEllipse } from "@/lib/gnss/interference/bearingFix";
import { seededRandom } from "@/lib/numeric/random";
import { planOf, seeds } from "../planOf";

const plan = planOf(kind);
const built = seeds(40).map((seed) => ({ seed, one: kind.build(seed, plan) }));

test("the right method meets its own cases", () => {
  for (const { seed, one } of built) {
    const marking = markAnswers(one.truth, plan, kind.solve(one, plan));
    expect(
      marking.rows.filter(({ within }) => !within),
      seed,
    ).toEqual([]);
    expect(marking.met).toBe(true);
  }
});

test.each(Object.entries(kind.wrongMethods))("%s misses what it says in every case", (_id, wrong) => {
  for (const { seed, one } of built) {
    const { quantities, met } = markAnswers(one.truth, plan, wrong.solve(one, plan));
    const outside = quantities.filter(({ within }) => !within).map(({ of }) => of);
    expect(outside, seed).toEqual(expect.arrayContaining([...wrong.misses]));
    expect(met, seed).toBe(false);
  }
});

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

test("trial: read by eye meets, guesses do not, difficulty is in its bands", () => {
  const trial = kind.trial!;
  for (const { seed, one } of built) {
    expect(trial.judge(one, plan, trial.read(one, plan, seededRandom(seed, "read"))).met, seed).toBe(true);
    const guess = trial.guess(one.publicCase, plan, seededRandom(seed, "guess"));
    expect(Object.keys(guess).sort()).toEqual(Object.keys(kind.solve(one, plan)).sort());
    expect(trial.judge(one, plan, guess).met).toBe(false);
    for (const { value, from, to } of trial.difficulty(one, plan)) expect(value >= from && value <= to).toBe(true);
  }
});

test("whatever is typed is marked, twice alike", () => {
  const { one } = built[3];
  const ids = Object.keys(kind.solve(one, plan));
  const typed = fc.oneof(
    fc.string(),
    fc.double().map(String),
    fc.constantFrom("", "NaN", "1e400", "-0", "1,5", "\u22125", "5 chip", "report", "L1"),
  );
  fc.assert(
    fc.property(fc.array(typed, { minLength: ids.length, maxLength: ids.length }), (texts) => {
      const answers: Answers = Object.fromEntries(ids.map((id, n) => [id, texts[n]]));
      const marking = markAnswers(one.truth, plan, answers);
      for (const row of marking.rows) if (!row.within) expect(row.reason).toMatch(/[.?]$/);
      expect(JSON.stringify(markAnswers(one.truth, plan, answers))).toBe(JSON.stringify(marking));
    }),
    { numRuns: 60, seed: 7 },
  );
});

test("marking draws the case again from its seed", () => {
  const { seed, one } = built[5];
  const answers = kind.solve(one, plan);
  expect(kind.mark(seed, plan, answers)).toEqual(markAnswers(one.truth, plan, answers));
});
