// @vitest-environment jsdom
import { cleanup, render, screen, within } from "@testing-library/react";
import { afterEach, expect, test } from "vitest";
import { CheckFigures } from "@/app/(work)/[employer]/modules/[id]/releases/[number]/_components/CheckFigures";
import type { ReleaseStatisticsView } from "@/lib/queries/getReleaseStatistics";

afterEach(cleanup);

const check = (over: Partial<ReleaseStatisticsView["checks"][number]>): ReleaseStatisticsView["checks"][number] => ({
  ...{ checkId: "reading", title: "Read a trace", cases: 24, met: 18, bounds: { lower: 0.533, upper: 0.902 } },
  ...{ minutes: { lower: 9, middle: 12.25, upper: 15 }, byClock: 2, fresh: { cases: 5, met: 4 }, errors: [] },
  ...{ discrimination: 0.418 },
  ...over,
});
const figures = (...checks: ReleaseStatisticsView["checks"]): ReleaseStatisticsView => ({
  ...{ sittings: checks.length > 0 ? 24 : 0, leastSittings: 30, review: { sittings: 100, day: "2027-11-11" } },
  checks,
});
const cellsOf = (row: HTMLElement) =>
  within(row)
    .getAllByRole("cell")
    .map(({ textContent }) => textContent);

test("rate with bounds, time with quartiles, discrimination with its sign", () => {
  render(<CheckFigures figures={figures(check({}), check({ checkId: "b", title: "B", discrimination: -0.2 }))} />);
  const row = screen.getByRole("row", { name: /^Read a trace/ });
  expect(cellsOf(row)).toEqual([
    "18 of 2475\u00a0%, 53\u00a0% to 90\u00a0%fresh cases: 4 of 5",
    "12.3\u00a0min9.0 to 15.0\u00a0minhanded in by the clock: 2",
    "+0.42",
  ]);
  expect(screen.getByText("\u22120.20")).toBeTruthy();
});

test.each([
  ["too few", "too few to say"],
  ["alike", "all alike, cannot be told"],
  ["only check", "no other check"],
] as const)("no figure where %s", (discrimination, words) => {
  render(<CheckFigures figures={figures(check({ discrimination }))} />);
  expect(screen.getByText(words)).toBeTruthy();
});

test("classes of error by quantity, no more than five of a check", () => {
  const errors = Array.from({ length: 7 }, (_, n) => ({
    quantity: `Q${n}`,
    errorClass: n ? `E${n}` : null,
    cases: 9 - n,
  }));
  render(<CheckFigures figures={figures(check({ errors }))} />);
  const rows = within(screen.getByRole("table", { name: "Outside, by class of error" }))
    .getAllByRole("row")
    .slice(1);
  expect(rows).toHaveLength(6);
  expect(cellsOf(rows[0]!)).toEqual(["Read a trace", "none known", "9 of 24"]);
  expect(rows[5]!.textContent).toContain("2 less frequent");
});

test("says that nothing is there before the first marking record", () => {
  render(<CheckFigures figures={figures()} />);
  expect(screen.queryByRole("table")).toBeNull();
  expect(screen.getByText("No case of this release has been marked yet.")).toBeTruthy();
  expect(screen.getByText(/11 Nov 2027/)).toBeTruthy();
});
