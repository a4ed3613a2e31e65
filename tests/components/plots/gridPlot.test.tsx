// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { gridOverview } from "@/components/plots/gridOverview";
import { GridPlot } from "@/components/plots/GridPlot";
import type { Cell } from "@/components/plots/useGridCursor";

beforeEach(() => {
  // jsdom draws nothing.
  vi.spyOn(HTMLCanvasElement.prototype, "getContext").mockReturnValue(null);
});
afterEach(() => {
  cleanup();
  vi.restoreAllMocks();
});

const ROWS = 41;
const COLUMNS = 400;
const DOPPLERS = Float64Array.from({ length: ROWS }, (_, row) => -5000 + 250 * row);
const LAGS = Float64Array.from({ length: COLUMNS }, (_, column) => column / 4);
const POWER = new Float32Array(ROWS * COLUMNS).fill(1);
POWER[11 * COLUMNS + 355] = 10.43;
POWER[30 * COLUMNS + 100] = 5;
const OVERVIEW = gridOverview(POWER, COLUMNS);

function grid(given: { cell?: Cell; onMove?: (cell: Cell) => void; onTake?: (cell: Cell) => void } = {}) {
  return render(
    <GridPlot
      dopplersHz={DOPPLERS}
      lagsChips={LAGS}
      power={POWER}
      overview={OVERVIEW}
      summary="Search grid."
      {...given}
    />,
  );
}
const reading = () => screen.getByRole("application").getAttribute("aria-label");

test("nothing is painted over the cells", () => {
  expect(grid().container.querySelector(".plot-ground")).toBeNull();
});

test("P visits the peaks, strongest first, and reads the cell of the full grid", async () => {
  grid();
  await userEvent.tab();
  await userEvent.keyboard("p");
  expect(reading()).toBe("Search grid. 88.75 chip, \u22122\u2009250 Hz, power 10.43, noise 1");
  await userEvent.keyboard("p");
  expect(reading()).toBe("Search grid. 25.00 chip, +2\u2009500 Hz, power 5.00, noise 1");
});

test.each([
  ["{ArrowRight}", { row: 20, column: 201 }],
  ["{ArrowLeft}", { row: 20, column: 199 }],
  ["{ArrowUp}", { row: 21, column: 200 }],
  ["{ArrowDown}", { row: 19, column: 200 }],
  ["{Shift>}{ArrowUp}{/Shift}", { row: 30, column: 200 }],
  ["{Shift>}{ArrowRight}{/Shift}", { row: 20, column: 210 }],
  ["{Home}", { row: 20, column: 0 }],
  ["{End}", { row: 20, column: 399 }],
])("%s goes to %j", async (keys, cell) => {
  const moved = vi.fn();
  grid({ onMove: moved });
  await userEvent.tab();
  await userEvent.keyboard(keys);
  expect(moved).toHaveBeenLastCalledWith(cell);
});

test("the cursor stays on the grid", async () => {
  const moved = vi.fn();
  grid({ cell: { row: 40, column: 399 }, onMove: moved });
  await userEvent.tab();
  await userEvent.keyboard("{ArrowUp}{ArrowRight}");
  expect(moved.mock.calls.map(([cell]) => cell)).toEqual([
    { row: 40, column: 399 },
    { row: 40, column: 399 },
  ]);
});

test("Enter takes the cell under the cursor", async () => {
  const taken = vi.fn();
  grid({ cell: { row: 11, column: 355 }, onTake: taken });
  await userEvent.tab();
  await userEvent.keyboard("{Enter}");
  expect(taken).toHaveBeenCalledWith({ row: 11, column: 355 });
});

test("keys for gloves move one cell and find the next peak", async () => {
  const moved = vi.fn();
  grid({ onMove: moved });
  await userEvent.click(screen.getByRole("button", { name: "One cell up" }));
  expect(moved).toHaveBeenLastCalledWith({ row: 21, column: 200 });
  await userEvent.click(screen.getByRole("button", { name: "Next peak" }));
  expect(moved).toHaveBeenLastCalledWith({ row: 11, column: 355 });
});

test("the table shows the row of the cursor, two hundred cells at a time", () => {
  grid({ cell: { row: 11, column: 355 } });
  fireEvent.keyDown(screen.getByRole("application"), { key: "t" });
  expect(screen.getByText("rows 201 to 400 of 400")).toBeTruthy();
  expect(screen.getByText("10.43")).toBeTruthy();
  fireEvent.click(screen.getByText("Rows before"));
  expect(screen.getByText("rows 1 to 200 of 400")).toBeTruthy();
});
