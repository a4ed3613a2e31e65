// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeAll, expect, test, vi } from "vitest";
import { LinePlot } from "@/components/plots/LinePlot";
import { installPointerEvent } from "../../support/pointerEvent";

beforeAll(installPointerEvent);
afterEach(cleanup);

// A triangle at 10 with a lower one at 16, on a floor.
const X = Array.from({ length: 21 }, (_, at) => at);
const Y = X.map((x) => Math.max(1, 8 - 3 * Math.abs(x - 10), 4 - 2 * Math.abs(x - 16)));
const AXES = { x: { name: "code phase, chip", from: 0, to: 20 }, y: { name: "power, noise = 1", from: 0, to: 10 } };

type Given = { onMove?: (index: number) => void; onTake?: (index: number) => void };
const plot = (cursor: Given = {}) =>
  render(
    <LinePlot
      {...AXES}
      curves={[{ name: "power", role: "subject", x: X, y: Y }]}
      limits={[{ y: 3.95, name: "threshold 3.95" }]}
      summary="One peak above the threshold."
      cursor={{ ...cursor, lines: (at) => [`${X[at]} chip`, `power ${Y[at]}`] }}
    />,
  );
const reading = () => screen.getByRole("application").getAttribute("aria-label");

test("is one tab stop that says what is found and what the cursor reads", async () => {
  plot();
  await userEvent.tab();
  expect(document.activeElement).toBe(screen.getByRole("application"));
  expect(reading()).toBe("One peak above the threshold. 10 chip, power 8");
});

test("a missing value under the cursor is drawn nowhere, and the cursor stands at the foot", () => {
  const curves = [{ name: "power", x: [0, 1, 2], y: [5, NaN, 6] }];
  const { container } = render(
    <LinePlot {...AXES} curves={curves} summary="A gap." cursor={{ index: 1, lines: () => ["no reading"] }} />,
  );
  expect(container.innerHTML).not.toContain("NaN");
});

test.each([
  ["{ArrowRight}", 11],
  ["{ArrowLeft}", 9],
  ["{Shift>}{ArrowRight}{/Shift}", 20],
  ["{Shift>}{ArrowLeft}{/Shift}", 0],
  ["{Home}", 0],
  ["{End}", 20],
  ["p", 16],
  ["pp", 0],
])("from the peak %s goes to point %i", async (keys, index) => {
  const moved = vi.fn();
  plot({ onMove: moved });
  await userEvent.tab();
  await userEvent.keyboard(keys);
  expect(moved).toHaveBeenLastCalledWith(index);
  expect(reading()).toContain(`${index} chip`);
});

test("Enter takes the reading", async () => {
  const taken = vi.fn();
  plot({ onTake: taken });
  await userEvent.tab();
  await userEvent.keyboard("{ArrowRight}{Enter}");
  expect(taken).toHaveBeenCalledWith(11);
});

test("keys that are not the plot's are left to the page", async () => {
  plot();
  const stage = screen.getByRole("application");
  expect(fireEvent.keyDown(stage, { key: "x" })).toBe(true);
  expect(fireEvent.keyDown(stage, { key: "ArrowRight" })).toBe(false);
  expect(fireEvent.keyDown(stage, { key: "t", ctrlKey: true })).toBe(true);
});

test("T opens the same data as a table, and closes it", async () => {
  plot();
  await userEvent.tab();
  await userEvent.keyboard("t");
  const table = screen.getByRole("table", { name: "One peak above the threshold." });
  const rows = within(table).getAllByRole("row");
  expect(rows).toHaveLength(22);
  expect(
    within(rows[0])
      .getAllByRole("columnheader")
      .map((head) => head.textContent),
  ).toEqual(["code phase, chip", "power, noise = 1"]);
  expect(
    within(rows[11])
      .getAllByRole("cell")
      .map((cell) => cell.textContent),
  ).toEqual(["10.00", "8.00"]);
  await userEvent.keyboard("t");
  expect(screen.queryByRole("table")).toBeNull();
});

test("a pointer moves the cursor to the nearest point", () => {
  const moved = vi.fn();
  plot({ onMove: moved });
  const stage = screen.getByRole("application");
  // 640 px wide until measured; the plot begins at the left margin of 36 px and ends 12 px before the right edge.
  const px = 36 + (7 / 20) * (640 - 36 - 12);
  fireEvent.pointerDown(stage, { clientX: px, clientY: 50, button: 0, pointerType: "mouse" });
  expect(moved).toHaveBeenLastCalledWith(7);
  fireEvent.pointerMove(stage, { clientX: px + 60, clientY: 50, pointerType: "mouse" });
  expect(moved).toHaveBeenLastCalledWith(9);
});

test("a finger moves the cursor by as much as it moves itself", () => {
  const moved = vi.fn();
  plot({ onMove: moved });
  const stage = screen.getByRole("application");
  fireEvent.pointerDown(stage, { clientX: 500, clientY: 50, button: 0, pointerType: "touch" });
  expect(moved).not.toHaveBeenCalled();
  fireEvent.pointerMove(stage, { clientX: 560, clientY: 50, pointerType: "touch" });
  expect(moved).toHaveBeenLastCalledWith(12);
});

test("without a cursor it is a picture with its finding as text, and still has its table", async () => {
  render(<LinePlot {...AXES} curves={[{ name: "power", x: X, y: Y }]} summary="One peak above the threshold." />);
  expect(screen.getByRole("img", { name: "One peak above the threshold." })).toBeTruthy();
  await userEvent.click(screen.getByRole("button", { name: "Values as a table" }));
  expect(screen.getByRole("table")).toBeTruthy();
});

// A log with a gap put NaN into the drawing when the cursor came into it.
test("where there is no reading the cursor stands on the axis", () => {
  const { container } = render(
    <LinePlot
      {...AXES}
      curves={[{ name: "power", x: X, y: X.map(() => NaN) }]}
      summary="Nothing was read."
      cursor={{ index: 5, lines: () => ["no reading"] }}
    />,
  );
  expect(container.innerHTML).not.toContain("NaN");
});
