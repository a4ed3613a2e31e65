import { describe, expect, test } from "vitest";
import type { Answers } from "@/lib/checks/kind";
import { skyView as kind } from "@/lib/checks/sky-view/skyView";
import type { SkyViewTruth } from "@/lib/checks/sky-view/drawCase";
import { markAnswers } from "@/lib/checks/sky-view/markAnswers";
import { choiceOf, survey, type Roof, type Rules } from "@/lib/checks/sky-view/survey";
import { planOf, seedOf } from "../planOf";

const plan = planOf(kind);
const rules: Rules = { maskDeg: 10, totalPercent: 25, quadrantPercent: 12.5 };
const pieces = (tops: readonly number[]) => tops.map((topDeg, n) => ({ fromDeg: 90 * n, toDeg: 90 * (n + 1), topDeg }));
const roof: Roof = {
  hatch: { eastM: 0, northM: 0 },
  emitters: [
    { name: "dish", eastM: 0, northM: 10, keepOutM: 4 },
    { name: "panel", eastM: 10, northM: 0, keepOutM: 8 },
  ],
  positions: [
    { id: "A", eastM: 0, northM: 0, horizon: pieces([5, 30, 15, 5]) },
    { id: "B", eastM: 1, northM: 9, horizon: pieces([5, 20, 5, 5]) },
    { id: "C", eastM: 25, northM: 0, horizon: pieces([30, 40, 30, 5]) },
  ],
};
const surveyed = survey(roof, rules);
const truth: SkyViewTruth = { roof, rules, surveyed, choice: choiceOf(surveyed) };

/*
 * By hand from five-figure sines: a quadrant up to 15 deg hides 2.58 % of the sky above 10 deg, up to 20 deg 5.09 %, up to
 * 30 deg 9.87 %, up to 40 deg 14.19 %. Rooms: A 2 m to the panel; B root 2 less 4 = -2.6 m to the dish; C 7 m to the panel.
 */
const good: Answers = {
  "A.blocked": "12.5",
  "A.quadrant": "south-east",
  "A.quadrantBlocked": "9.9 %",
  "A.room": "2 m",
  "B.blocked": "5,1",
  "B.quadrant": "south-east",
  "B.quadrantBlocked": "5.1",
  "B.room": "\u22122.6 m",
  "C.blocked": "33.9 %",
  "C.quadrant": "south-east",
  "C.quadrantBlocked": "14.2",
  "C.room": "7000 mm",
  "verdict.choice": "A",
};
const mark = (answers: Answers) => markAnswers(truth, plan, { ...good, ...answers });
const rowsOf = (quantity: string, answers: Answers) => mark(answers).rows.filter((row) => row.quantity === quantity);

test("figures worked by hand are within", () => {
  expect(mark({}).rows.filter(({ within }) => !within)).toEqual([]);
  expect(mark({}).met).toBe(true);
});

describe("outside, with the class of error", () => {
  test.each<[string, Answers, string | null]>([
    ["blocked", { "C.blocked": "28.5" }, null],
    // Of the plot's area up to 30 deg 43.75 %, up to 40 deg 60.94 %: a quarter of 2 x 43.75 + 60.94.
    ["blocked", { "C.blocked": "37.1" }, "area on the plot"],
    // 20/80 twice and 30/80, a quarter each.
    ["blocked", { "C.blocked": "21.9" }, "degrees of elevation"],
    ["blocked", { "C.blocked": "0.339" }, "fraction for per cent"],
    // sin 20/4 + 3 sin 5/4.
    ["blocked", { "B.blocked": "15.1" }, "mask left out"],
    ["quadrantBlocked", { "A.quadrantBlocked": "39.5" }, "share of the quadrant"],
    ["quadrantBlocked", { "A.quadrantBlocked": "0.099" }, "fraction for per cent"],
    ["quadrantBlocked", { "A.quadrantBlocked": "12" }, null],
    ["quadrant", { "A.quadrant": "south-west" }, null],
    ["room", { "A.room": "6" }, "another emitter"],
    ["room", { "A.room": "10 m" }, "keep-out distance not taken off"],
    ["room", { "C.room": "-7" }, "sign"],
    ["room", { "C.room": "5" }, null],
    ["choice", { "verdict.choice": "B" }, "emitter overlooked"],
    ["choice", { "verdict.choice": "C" }, "limit in all broken"],
    ["choice", { "verdict.choice": "none" }, "fit position refused"],
  ])("%s %j", (quantity, answers, errorClass) => {
    const outside = rowsOf(quantity, answers).filter(({ within }) => !within);
    expect(outside).toMatchObject([{ errorClass }]);
    expect(outside[0].reason).toMatch(/[.?]$/);
  });
});

describe("a choice that is outside for another reason", () => {
  const choiceRow = (own: Rules, value: string) => {
    const at: SkyViewTruth = { ...truth, rules: own, surveyed: survey(roof, own), choice: "A" };
    return markAnswers(at, plan, { ...good, "verdict.choice": value }).rows.find(
      ({ quantity }) => quantity === "choice",
    );
  };
  test("one quadrant alone", () =>
    expect(choiceRow({ ...rules, totalPercent: 40 }, "C")).toMatchObject({
      errorClass: "limit in one quadrant broken",
    }));
  test("it would do, and another has less sky blocked", () =>
    expect(choiceRow({ ...rules, totalPercent: 40, quadrantPercent: 20 }, "C")).toMatchObject({
      errorClass: "not the best of those that will do",
    }));
});

test("the share in a quadrant is judged for the quadrant that was named", () => {
  const marking = mark({ "A.quadrant": "south-west", "A.quadrantBlocked": "2.6" });
  const within = (of: string) => marking.quantities.find((quantity) => quantity.of === of)?.within;
  expect(within("quadrant")).toBe(false);
  expect(within("quadrantBlocked")).toBe(true);
});

test("a wrong choice alone keeps the check from being met, whatever is needed", () => {
  const marking = markAnswers(truth, { ...plan, needs: 1 }, { ...good, "verdict.choice": "B" });
  expect(marking.withinCount).toBe(4);
  expect(marking.met).toBe(false);
});

test.each(["", "NaN", "1e400", "-0", "two", "5 dB", "north-east", "1,234"])("%j everywhere says why", (typed) => {
  const marking = markAnswers(truth, plan, Object.fromEntries(Object.keys(good).map((id) => [id, typed])));
  for (const row of marking.rows) if (!row.within) expect(row.reason).toMatch(/[.?]$/);
  expect(marking.met).toBe(false);
});

test("marking twice gives the same bytes", () => {
  const [first, second] = [1, 2].map(() => JSON.stringify(kind.mark(seedOf(3), plan, good)));
  expect(second).toBe(first);
});
