import { expect, test } from "vitest";
import { columnCut, rowCut } from "@/components/plots/gridCuts";
import { heatAt, heatPlace, rgbOf } from "@/components/plots/heat";
import { gridOverview } from "@/components/plots/gridOverview";
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
  const power = grid([
    [0, 7, 3],
    [4, 39, 9],
  ]);
  const merged = mergeCells({ power, columns: COLUMNS }, 2, 10);
  expect(merged.columns).toBe(10);
  expect(merged.power).toHaveLength(20);
  expect(merged.power[1]).toBe(3);
  expect(merged.power[19]).toBe(9);
  expect(Math.max(...merged.power.slice(2, 18))).toBe(1);
});

test("as many rows and columns shown as there are: nothing is merged", () => {
  const cells = { power: grid([[2, 13, 4]]), columns: COLUMNS };
  expect(mergeCells(cells, 5, COLUMNS)).toEqual(cells);
  expect(mergeCells(cells, 600, 900)).toEqual(cells);
});

test("an overview knows the highest cell and holds it, however fine the grid", () => {
  const [rows, columns] = [1000, 2048];
  const power = new Float32Array(rows * columns).fill(1);
  power[777 * columns + 1501] = 8;
  power[3 * columns + 2] = 5;
  const { peaks, cells } = gridOverview(power, columns);
  expect(peaks.slice(0, 2)).toEqual([777 * columns + 1501, 3 * columns + 2]);
  expect(cells.columns).toBe(512);
  expect(cells.power).toHaveLength(256 * 512);
  expect(cells.power[Math.floor((777 * 256) / 1000) * 512 + Math.floor(1501 / 4)]).toBe(8);
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
  for (const steps of ["amplitude", "level"] as const) {
    const ramp = { steps, topDb: 10, from: "noise" };
    expectNear(heatPlace(1, ramp), 0, 1e-12, "place of noise");
    expectNear(heatPlace(10, ramp), 1, 1e-12, "place of +10 dB");
  }
  // Half way: half the decibels, or half the amplitude, (1 + sqrt 10)/2 by hand.
  expectNear(heatPlace(10 ** 0.5, { steps: "level", topDb: 10, from: "noise" }), 0.5, 1e-12, "place of +5 dB");
  expectNear(heatPlace(4.3311388, { steps: "amplitude", topDb: 10, from: "noise" }), 0.5, 1e-7, "half the amplitude");
});

test("the ramp runs straight between its stops and stays inside them", () => {
  const stops = ["#FFFFFF", "#5F86CE", "#07184A"].map(rgbOf);
  expect(heatAt(stops, 0.25)).toEqual([175, 195, 231]);
  expect(heatAt(stops, -1)).toEqual([255, 255, 255]);
  expect(heatAt(stops, 7)).toEqual([7, 24, 74]);
});
