import { describe, expect, test } from "vitest";
import { jammedOrNot as kind } from "@/lib/checks/jammed-or-not/jammedOrNot";
import { seededRandom } from "@/lib/numeric/random";
import { fitLine, mean, standardDeviation } from "@/lib/numeric/statistics";
import { planOf, seeds } from "../planOf";

const plan = planOf(kind);
const trial = kind.trial!;
const built = seeds(24).map((seed) => ({ seed, one: trial.build(seed, plan) }));
const outside = (rows: { within: boolean }[]) => rows.filter(({ within }) => !within);
const after = (values: readonly number[], from: number) => values.slice(from);

test("every verdict comes up", () => expect(new Set(built.map(({ one }) => one.truth.verdict)).size).toBe(4));

test("the right method meets its own cases, a reading or two beside as well", () => {
  for (const { seed, one } of built) {
    expect(outside(trial.judge(one, plan, kind.solve(one, plan)).rows), seed).toEqual([]);
    const read = trial.read(one, plan, seededRandom(seed, "read"));
    expect(outside(trial.judge(one, plan, read).rows), seed).toEqual([]);
  }
});

test.each(Object.entries(kind.wrongMethods))(
  "where it says something else, a wrong method is outside: %s",
  (_id, wrong) => {
    let others = 0;
    for (const { seed, one } of built) {
      const answers = wrong.solve(one, plan);
      if (JSON.stringify(answers) === JSON.stringify(kind.solve(one, plan))) continue;
      others++;
      expect(trial.judge(one, plan, answers).met, seed).toBe(false);
    }
    expect(others).toBeGreaterThan(0);
  },
);

test("guesses are outside, difficulty is inside its bands", () => {
  for (const { seed, one } of built) {
    expect(trial.judge(one, plan, trial.guess(one.publicCase, plan, seededRandom(seed, "guess"))).met).toBe(false);
    for (const { label, value, from, to } of trial.difficulty(one, plan))
      expect(value >= from && value <= to, `${label} ${value}`).toBe(true);
  }
});

describe("what is put in is what the instruments show", () => {
  test("Doppler follows the clock: 1 ns in a second is 1.575 Hz at L1", () => {
    const running = built.filter(({ one }) => one.truth.event.clockNsS !== 0);
    expect(running.length).toBeGreaterThan(1);
    for (const { seed, one } of running) {
      const { event, columns, log } = one.truth;
      const clock = after(columns.clockNs, event.pullsFrom + 1);
      const seconds = clock.map((_, n) => n * log.intervalS);
      const rateNsS = fitLine(seconds, clock).slope;
      // The station's own wander, 6 ns in some quarter of an hour, moves the slope by less than 0.1 ns/s.
      expect(Math.abs(mean(after(columns.dopplerMeanHz, event.pullsFrom + 1)) - 1.57542 * rateNsS), seed).toBeLessThan(
        0.2,
      );
    }
  });

  test("before the start nothing tells the verdicts apart", () => {
    for (const { seed, one } of built) {
      const { event, columns } = one.truth;
      for (const [values, usual] of [
        [columns.gainDb, 0.15],
        [columns.eastM, 0.9],
        [columns.dopplerMeanHz, 0.12],
      ] as const) {
        const spread = standardDeviation(values.slice(0, event.first));
        expect(spread > 0.7 * usual && spread < 1.5 * usual, `${seed} ${usual} ${spread}`).toBe(true);
      }
    }
  });

  test("false signals have one level, and the gain backs off while they rise", () => {
    for (const { seed, one } of built.filter(({ one }) => one.truth.verdict === "deceived")) {
      const { event, log, cn0ChangeDb } = one.truth;
      const levels = log.passes.flatMap(({ first, cn0DbHz }) => {
        const own = cn0DbHz.slice(Math.max(0, event.first - first)).filter((cn0) => cn0 !== null);
        return first <= event.first && own.length > 50 ? [mean(own)] : [];
      });
      expect(Math.max(...levels) - Math.min(...levels), seed).toBeLessThan(2.2);
      expect(cn0ChangeDb, seed).toBeGreaterThan(0);
      expect(event.gainDb, seed).toBeLessThan(0);
    }
  });
});

test("the form is the same whatever happened, and the data hold the readings alone", () => {
  const [first, ...others] = built.map(({ one }) => one.publicCase);
  for (const other of others) {
    expect([other.sections, other.tolerances, other.brief]).toEqual([first.sections, first.tolerances, first.brief]);
    expect(other.given.map(({ label }) => label)).toEqual(first.given.map(({ label }) => label));
    expect(Object.keys(other.data).sort()).toEqual([
      "clockNs",
      "columnsFile",
      "dopplerMeanHz",
      "dopplerSpreadHz",
      "eastM",
      "gainDb",
      "log",
      "logFile",
      "northM",
      "upM",
    ]);
    expect(JSON.stringify(other.data).length).toBeLessThan(300_000);
  }
});

test("the files are those that the case names", () => {
  const { publicCase, files } = kind.build(built[0].seed, plan);
  expect(files.map(({ name }) => name)).toEqual([publicCase.data.logFile, publicCase.data.columnsFile]);
  expect(publicCase).toEqual(built[0].one.publicCase);
});
