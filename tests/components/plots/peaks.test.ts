import { expect, test } from "vitest";
import { columnCut, rowCut } from "@/components/plots/gridCuts";
import { heatAt, heatPlace, rgbOf } from "@/components/plots/heat";
import { mergeCells } from "@/components/plots/mergeCells";
import { gridPeaks, rowPeaks } from "@/components/plots/peaks";
import { expectNear } from "../../support/expectNear";

test("peaks of a row come strongest first; ends count, a flat top counts once", () => {
  expect(rowPeaks([9, 1, 5, 5, 2, 7, 8])).toEqual([0, 6, 2]);
  expect(rowPeaks([])).toEqual([]);
});

const COLUMNS = 40;
const grid = (cells: [row: number, column: number, power: number][]) => {
  const power = new Float32Array(5 * COLUMNS).fill(1);
  for (const [row, column, value] of cells) power[row * COLUMNS + column] = value;
  return power;
};
const APART = { rows: 2, columns: 5 };

test("a grid's peaks come strongest first", () => {
  const power = grid([
    [1, 10, 4],
    [3, 30, 9],
    [4, 20, 6],
  ]);
  expect(gridPeaks(power, COLUMNS, APART, 3)).toEqual([3 * COLUMNS + 30, 4 * COLUMNS + 20, COLUMNS + 10]);
});

test("what is close to a stronger peak is no peak of its own, across the ends of a row too", () => {
  const power = grid([
    [2, 1, 9],
    [2, 3, 8],
    [2, 38, 7],
    [2, 20, 5],
  ]);
  expect(gridPeaks(power, COLUMNS, APART, 2)).toEqual([2 * COLUMNS + 1, 2 * COLUMNS + 20]);
});

test("merged cells keep the strongest", () => {
  const merged = mergeCells(
    grid([
      [0, 7, 3],
      [4, 39, 9],
    ]),
    COLUMNS,
    10,
  );
  expect(merged).toHaveLength(50);
  expect(merged[1]).toBe(3);
  expect(merged[49]).toBe(9);
  expect(Math.max(...merged.slice(2, 48))).toBe(1);
});

test("as many columns shown as there are: nothing is merged", () => {
  const power = grid([[2, 13, 4]]);
  expect(mergeCells(power, COLUMNS, COLUMNS)).toEqual(power);
});

test("cuts go along one row and one column", () => {
  const power = grid([
    [1, 4, 5],
    [3, 4, 7],
  ]);
  expect(rowCut(power, COLUMNS, 1)[4]).toBe(5);
  expect(rowCut(power, COLUMNS, 1)).toHaveLength(COLUMNS);
  expect([...columnCut(power, COLUMNS, 4)]).toEqual([1, 5, 1, 7, 1]);
});

test("noise is at one end of the ramp, the given level above it at the other", () => {
  expectNear(heatPlace(1, 10), 0, 1e-12, "place of noise");
  expectNear(heatPlace(10, 10), 1, 1e-12, "place of +10 dB");
});

test("the ramp runs straight between its stops and stays inside them", () => {
  const stops = ["#FFFFFF", "#5F86CE", "#07184A"].map(rgbOf);
  expect(heatAt(stops, 0.25)).toEqual([175, 195, 231]);
  expect(heatAt(stops, -1)).toEqual([255, 255, 255]);
  expect(heatAt(stops, 7)).toEqual([7, 24, 74]);
});
