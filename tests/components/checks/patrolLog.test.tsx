// @vitest-environment jsdom
import { cleanup, render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, expect, test, vi } from "vitest";
import { takeReading } from "@/components/checks/takeReading";
import { Workspace } from "@/components/checks/Workspace";
import { locate } from "@/lib/checks/locate/locate";
import { sumOfSquares } from "@/lib/gnss/interference/bearingFix";
import { linesOf } from "@/lib/checks/locate/patrolLog";
import { planOf, seedOf } from "@/tests/checks/planOf";

afterEach(cleanup);

const { publicCase, truth } = locate.build(seedOf(11), planOf(locate, { intermittent: 100 }));
const map = () => screen.getByRole("application");
const sumShown = () =>
  Number(
    screen
      .getByText(/^Sum of squares of/)
      .parentElement!.textContent!.match(/[\d\u2009]+\.\d\d/)![0]
      .replace(/\u2009/g, ""),
  );
const cursor = () => {
  const [, east, north] = map()
    .getAttribute("aria-label")!
    .match(/east ([\u2212\d\u2009]+) m, north ([\u2212\d\u2009]+) m/)!;
  const number = (text: string) => Number(text.replace(/\u2009/g, "").replace("\u2212", "-"));
  return { eastM: number(east), northM: number(north) };
};

test("every stop stands in the log, silent ones as such, and every bearing on the map", () => {
  const { container } = render(<Workspace view={publicCase} filesAddress="" />);
  const log = screen.getByRole("table", { name: "Patrol log" });
  expect(within(log).getAllByRole("row")).toHaveLength(truth.log.length + 1);
  const silent = truth.log.filter(({ bearingDeg }) => bearingDeg === null).length;
  expect(within(log).getAllByText("nothing heard")).toHaveLength(silent);
  expect(container.querySelectorAll("[data-bearing]")).toHaveLength(truth.log.length - silent);
});

test("the sum of squares is that of the bearings that count, at the cursor", async () => {
  render(<Workspace view={publicCase} filesAddress="" />);
  const lines = linesOf(truth.log);
  const expected = (left: number | null) =>
    sumOfSquares(
      lines.filter(({ stop }) => stop !== left),
      cursor(),
    );
  expect(Math.abs(sumShown() - expected(null))).toBeLessThanOrEqual(0.005);
  map().focus();
  await userEvent.keyboard("{ArrowRight}{Shift>}{ArrowUp}{/Shift}");
  expect(Math.abs(sumShown() - expected(null))).toBeLessThanOrEqual(0.005);
  await userEvent.click(screen.getByRole("checkbox", { name: `Stop ${truth.reflectionStop}` }));
  expect(Math.abs(sumShown() - expected(truth.reflectionStop))).toBeLessThanOrEqual(0.005);
});

test("place and ellipse are taken into the form", async () => {
  const onTake = vi.fn();
  render(<Workspace view={publicCase} filesAddress="" onTake={onTake} />);
  await userEvent.clear(screen.getByRole("textbox", { name: /^Long half axis/ }));
  await userEvent.type(screen.getByRole("textbox", { name: /^Long half axis/ }), "84{Enter}");
  await userEvent.click(screen.getByRole("button", { name: "Take place and ellipse" }));
  const written = takeReading(publicCase.sections, {}, onTake.mock.calls[0][0], null);
  const { eastM, northM } = cursor();
  expect(Object.fromEntries(written.map(({ id, value }) => [id, value]))).toEqual({
    "fix.east": String(eastM).replace("-", "\u2212"),
    "fix.north": String(northM).replace("-", "\u2212"),
    "fix.major": "84",
    "fix.minor": "50",
    "fix.azimuth": "0",
  });
});
