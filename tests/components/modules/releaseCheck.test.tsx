// @vitest-environment jsdom
import { cleanup, render, screen, within } from "@testing-library/react";
import { afterEach, describe, expect, test, vi } from "vitest";
import {
  NO_REASONS,
  releaseCheckReason,
  ReleaseReasons,
} from "@/app/(work)/[employer]/modules/[id]/_components/ReleaseReasons";
import { CheckTrial } from "@/app/(work)/[employer]/modules/[id]/release-check/_components/CheckTrial";
import { percentText } from "@/app/(work)/[employer]/modules/[id]/release-check/_components/percentText";
import { SittingRate } from "@/app/(work)/[employer]/modules/[id]/release-check/_components/SittingRate";
import type { LineVerdict } from "@/lib/checks/release-check/judgeTally";
import type { CheckTrialView } from "@/lib/queries/checkTrialView";
import type { ReleaseCheckView } from "@/lib/queries/getReleaseCheck";

afterEach(cleanup);

const line = (over: Partial<LineVerdict>): LineVerdict => ({
  ...{ id: "read", label: "Right method, read with care", asked: "at least 97 %", tried: 1000, met: 984 },
  ...{ rate: 0.984, lower: 0.974, upper: 0.991, within: true },
  ...over,
});
const table = (...lines: LineVerdict[]) => ({
  ...{
    lines,
    failing: [{ line: "read", n: 16, hand: 0, note: "outside: Doppler" }],
    built: 1000,
    draws: 1031,
    mostDraws: 3,
  },
  ...{ finishedAt: "2026-12-01T19:00:00.000Z", engineVersion: "1.0.0" },
});
const check = (over: Partial<CheckTrialView> = {}): CheckTrialView => ({
  ...{ id: "list", title: "Which satellites", kind: "satellites", needed: true, within: true },
  ...{ result: table(line({})), run: null, preview: null },
  ...over,
});
const OUTSIDE = check({
  within: false,
  result: table(line({ id: "guess", label: "Blind guess", tried: 10_000, met: 250, rate: 0.025, within: false })),
});
const view = (over: Partial<ReleaseCheckView> = {}): ReleaseCheckView => ({
  ...{ moduleId: "m", code: "TWO-1", title: "List", revision: 1, errors: 0, checks: [check()], freshCases: 1 },
  sitting: { careful: 0.984, carefulWithFresh: 0.9997, guessed: 0, guessedWithin: true, taken: [] },
  ...over,
});

describe("a check", () => {
  test("shows counts, rate, bounds and a word beside every glyph", () => {
    render(<CheckTrial base="/f/modules/m/release-check" check={check()} />);
    const row = screen.getByRole("rowheader", { name: "Right method, read with care" }).closest("tr")!;
    expect(row.textContent).toContain("984 of 1\u2009000");
    expect(row.textContent).toContain("98.40\u00a0%");
    expect(row.textContent).toContain("97.4\u00a0% to 99.10\u00a0%");
    expect(within(row).getByText("Within")).toBeDefined();
  });

  test("leads to each case that is not as it should be", () => {
    const { container } = render(<CheckTrial base="/f/modules/m/release-check" check={check()} />);
    const link = container.querySelector("details a")!;
    expect(link.textContent).toBe("Case 17");
    expect(link.getAttribute("href")).toBe("/f/modules/m/release-check/list?line=read&n=16&hand=0");
  });

  test("says how far it is, and what to do when it stopped or failed", () => {
    const run = { tried: 40, of: 1000, whole: 0, ofWhole: 25, fault: null, own: true };
    const text = (state: "running" | "stopped" | "failed") => {
      const { container } = render(
        <CheckTrial
          base=""
          check={check({ result: null, run: { ...run, state, fault: state === "failed" ? "AB12" : null } })}
        />,
      );
      return container.textContent;
    };
    expect(text("running")).toContain("40 of 1000 cases");
    expect(text("stopped")).toContain("goes on from there");
    expect(text("failed")).toContain("Reference AB12");
  });

  test("that people judge has nothing to try", () => {
    render(<CheckTrial base="" check={check({ needed: false, result: null })} />);
    expect(screen.getByText(/People judge this check/)).toBeDefined();
  });
});

describe("the release waits", () => {
  const unfinished = view({ checks: [check({ result: null })], sitting: null });
  const guessable = view({ sitting: { ...view().sitting!, guessed: 0.05, guessedWithin: false } });
  test.each([
    ["until it is known", undefined, NO_REASONS, "Reading the release check"],
    ["for what has not finished", unfinished, NO_REASONS, "Run the release check first"],
    ["for nothing within bounds", view(), NO_REASONS, null],
    ["for a reason outside them", view({ checks: [OUTSIDE] }), NO_REASONS, "Give a reason for what is outside"],
    [
      "for more than blanks",
      view({ checks: [OUTSIDE] }),
      { checks: { list: "  " }, sitting: "" },
      "Give a reason for what is outside",
    ],
    ["no longer with one", view({ checks: [OUTSIDE] }), { checks: { list: "Watched." }, sitting: "" }, null],
    ["for a sitting that guessing meets", guessable, NO_REASONS, "Give a reason for what is outside"],
    ["for nothing that people judge", view({ checks: [check({ needed: false, result: null })] }), NO_REASONS, null],
  ])("%s", (_what, given, reasons, expected) => expect(releaseCheckReason(given, reasons)).toBe(expected));

  test("asks for a reason of each check outside, with what was counted", () => {
    const change = vi.fn();
    render(
      <ReleaseReasons
        href="/x"
        view={view({ checks: [check({ id: "ok" }), OUTSIDE] })}
        reasons={NO_REASONS}
        onChange={change}
      />,
    );
    expect(screen.getAllByRole("textbox")).toHaveLength(1);
    expect(screen.getByLabelText(/Why "list" is released outside its bounds/)).toBeDefined();
    expect(screen.getByText("Blind guess: 250 of 10000")).toBeDefined();
  });
});

test("the whole sitting: careful people, fresh cases, guessing", () => {
  const { container } = render(<SittingRate view={view()} />);
  expect(container.textContent).toContain("98.40\u00a0%");
  expect(container.textContent).toContain("one fresh case");
  expect(screen.getByText("Within")).toBeDefined();
  cleanup();
  expect(render(<SittingRate view={view({ sitting: null })} />).container.textContent).toBe("");
});

test.each([
  [0, "0"],
  [1, "100"],
  [0.0036, "0.36"],
  [0.9574, "95.7"],
  [0.9979, "99.79"],
])("%d is written %s per cent", (rate, text) => expect(percentText(rate)).toBe(`${text}\u00a0%`));
