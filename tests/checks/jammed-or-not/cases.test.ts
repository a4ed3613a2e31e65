import { describe, expect, test } from "vitest";
import { jammedOrNot as kind } from "@/lib/checks/jammed-or-not/jammedOrNot";
import { fitLine, mean, standardDeviation } from "@/lib/numeric/statistics";
import { planOf, seeds } from "../planOf";

const plan = planOf(kind);
const trial = kind.trial!;
const built = seeds(24).map((seed) => ({ seed, one: trial.build(seed, plan) }));
const after = (values: readonly number[], from: number) => values.slice(from);

test("every verdict comes up", () => expect(new Set(built.map(({ one }) => one.truth.verdict)).size).toBe(4));

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
