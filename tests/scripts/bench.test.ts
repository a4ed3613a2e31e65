import { expect, test } from "vitest";
import { comparisonRows } from "@/scripts/bench/comparisonRows";
import { median } from "@/scripts/bench/median";
import { printTable } from "@/scripts/bench/printTable";

// All values by hand.
test.each([
  [[3], 3],
  [[5, 1, 9], 5],
  [[4, 1, 10, 2], 3],
  [[0.2, 0.1, 100, 0.3, 0.15], 0.2],
])("the median of %j is %d, whatever their order", (values, middle) => {
  const given = [...values];
  expect(median(given)).toBe(middle);
  expect(given).toEqual(values); // the rounds keep their order
});

test("a ratio is of medians, beside it the fastest of both; a target that is missed is said", () => {
  const contenders = [
    { name: "ours", target: 1.5 },
    { name: "ours in two threads", target: 0.5 },
    { name: "without a limit", target: null },
  ];
  const ours = [
    [0.3, 0.2, 0.9],
    [0.15, 0.12, 0.11],
    [0.002, 0.004, 0.002],
  ];
  expect(comparisonRows(contenders, ours, [0.2, 0.1, 0.4])).toEqual([
    ["", "median ms", "ratio", "of the fastest", "target"],
    ["reference", "200", "1.00", "1.00", ""],
    ["ours", "300", "1.50", "2.00", "within 1.5"],
    ["ours in two threads", "120", "0.60", "1.10", "MISSED 0.5"],
    ["without a limit", "2.00", "0.01", "0.02", ""],
  ]);
});

test("a run that measured nothing keeps no target", () => {
  const [, , row] = comparisonRows([{ name: "ours", target: 1 }], [[NaN]], [0.1]);
  expect(row.at(-1)).toBe("MISSED 1");
});

test("columns stand under each other: the first to the left, figures to the right", () => {
  const lines: string[] = [];
  printTable(
    [
      ["", "ms", "ratio"],
      ["reference", "12.00", "1.00"],
      ["a", "7", "0.58"],
    ],
    (line) => lines.push(line),
  );
  expect(lines).toEqual([
    "                ms  ratio",
    "  ---------  -----  -----",
    "  reference  12.00   1.00",
    "  a              7   0.58",
  ]);
});
