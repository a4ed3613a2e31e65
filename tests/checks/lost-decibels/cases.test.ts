import { describe, expect, test } from "vitest";
import { shareAt } from "@/lib/checks/lost-decibels/drawFault";
import { lostDecibels as kind } from "@/lib/checks/lost-decibels/lostDecibels";
import { isInSector } from "@/lib/checks/receiver-log/sector";
import { bandMeans, directionAt } from "@/lib/gnss/sky/receiverLog";
import { seededRandom } from "@/lib/numeric/random";
import { planOf, seeds } from "../planOf";

const plan = planOf(kind);
const trial = kind.trial!;
const built = seeds(24).map((seed) => ({ seed, one: trial.build(seed, plan) }));

test("every cause comes up", () => expect(new Set(built.map(({ one }) => one.truth.cause)).size).toBe(5));

test("guesses and nothing at all are outside, difficulty is inside its bands", () => {
  for (const { seed, one } of built) {
    expect(trial.judge(one, plan, trial.guess(one.publicCase, plan, seededRandom(seed, "guess"))).met).toBe(false);
    for (const { label, value, from, to } of trial.difficulty(one, plan))
      expect(value >= from && value <= to, `${label} ${value}`).toBe(true);
  }
});

test("to say that nothing is wrong does not meet a case in which nothing is", () => {
  const nothing = built.filter(({ one }) => one.truth.cause === "nothing");
  const said = {
    ...{
      "fault.cause": "nothing",
      "fault.start": "none",
      "fault.stop": "none",
      "fault.depth": "0",
      "fault.act": "nothing",
    },
    ...{ "fault.azimuthFrom": "0", "fault.azimuthTo": "0", "pattern.high": "", "pattern.low": "" },
  };
  for (const { one } of nothing) {
    const marking = trial.judge(one, plan, said);
    expect(marking.quantities.filter(({ within }) => !within).map(({ of }) => of)).toEqual(["high", "low"]);
    expect(marking.met).toBe(false);
  }
});

describe("what is put in is what the log shows", () => {
  test("the fault touches its satellites, its readings and nothing else", () => {
    for (const { seed, one } of built) {
      const { fault, log } = one.truth;
      if (!fault?.sector) continue;
      const [inside, beside]: [number[], number[]] = [[], []];
      for (const pass of log.passes)
        pass.cn0DbHz.forEach((cn0, at) => {
          const { azimuthDeg, elevationDeg } = directionAt(pass, log.trackEvery, pass.first + at);
          if (elevationDeg > 55 || elevationDeg < 35 || shareAt(fault, pass.first + at) === 0) return;
          (isInSector(fault.sector!, azimuthDeg) ? inside : beside).push(cn0 ?? NaN);
        });
      const mean = (values: number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;
      // 35 to 55 deg alone: the pattern itself changes by less than 2 dB there.
      if (inside.length > 200 && beside.length > 200 && inside.every(Number.isFinite))
        expect(Math.abs(mean(beside) - mean(inside) - fault.depthDb), seed).toBeLessThan(1.5);
    }
  });

  test("high satellites are stronger than low ones, and the form's means are those of the log", () => {
    for (const { one } of built) {
      const { log, fault, highDbHz, lowDbHz } = one.truth;
      const bands = bandMeans(log, fault?.readings ?? null);
      expect([bands[5].meanDbHz, bands[1].meanDbHz]).toEqual([highDbHz, lowDbHz]);
      expect(highDbHz - lowDbHz).toBeGreaterThan(3);
    }
  });

  test("logs, depths and sectors stay in their ranges", () => {
    for (const { one } of built) {
      const { log, fault } = one.truth;
      const hours = (log.readings * log.intervalS) / 3600;
      expect(hours >= 2 && hours <= 24 && log.intervalS >= 10 && log.intervalS <= 30).toBe(true);
      if (!fault) continue;
      expect(fault.depthDb >= 3 && fault.depthDb <= 15).toBe(true);
      if (!fault.sector) continue;
      const width = (fault.sector.toDeg - fault.sector.fromDeg + 360) % 360;
      expect(width >= 30 && width <= 90).toBe(true);
    }
  });
});

test("the form is the same whatever happened, and the data hold the log alone", () => {
  const [first, ...others] = built.map(({ one }) => one.publicCase);
  for (const other of others) {
    expect([other.sections, other.tolerances, other.brief]).toEqual([first.sections, first.tolerances, first.brief]);
    expect(Object.keys(other.data).sort()).toEqual(["columnsFile", "currentMa", "gainDb", "log", "logFile"]);
    expect(Object.keys(other.data.log as object).sort()).toEqual([
      "intervalS",
      "passes",
      "readings",
      "startUnixMs",
      "trackEvery",
    ]);
    expect(JSON.stringify(other.data).length).toBeLessThan(300_000);
  }
});

test("the files are those that the case names", () => {
  const { publicCase, files } = kind.build(built[0].seed, plan);
  expect(files.map(({ name }) => name)).toEqual([publicCase.data.logFile, publicCase.data.columnsFile]);
  expect(publicCase).toEqual(built[0].one.publicCase);
});
