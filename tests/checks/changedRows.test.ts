import { expect, test } from "vitest";
import { changedRows } from "@/lib/checks/changedRows";
import type { MarkedRow } from "@/lib/checks/kind";

// Bookkeeping of this product: the words are those of the rows, and no value is computed.
const row: MarkedRow = {
  ...{
    quantity: "lag",
    subject: null,
    label: "Lag of the highest cell",
    handedIn: "88.75 chip",
    understood: "88.75 chip",
  },
  ...{ computed: "88.8 chip", difference: "-0.05 chip", tolerance: "0.2 chip", offByTolerances: -0.25, within: true },
  ...{ critical: false, errorClass: null, reason: null },
};

test("the same rows in another order are no change", () => {
  const other = { ...row, quantity: "width", label: "Width" };
  expect(changedRows([row, other], [other, row])).toEqual([]);
});

test("a row that is outside now, or has another computed value, says both", () => {
  const outside = { ...row, within: false };
  const [change] = changedRows([row], [outside]);
  expect(change).toEqual({
    label: row.label,
    before: `within, computed ${row.computed}, tolerance ${row.tolerance}`,
    now: `outside, computed ${row.computed}, tolerance ${row.tolerance}`,
  });
  expect(changedRows([row], [{ ...row, computed: "1 chip" }])).toHaveLength(1);
});

test("rows of one quantity are told apart by what they are about", () => {
  const [prn7, prn9] = ["PRN 7", "PRN 9"].map((subject) => ({ ...row, subject }));
  const changes = changedRows([prn7!, prn9!], [prn7!, { ...prn9!, within: false }]);
  expect(changes.map(({ label }) => label)).toEqual([`PRN 9, ${row.label}`]);
});

test("a row that one marking does not have is null there", () => {
  expect(changedRows([row], [])).toMatchObject([{ label: row.label, now: null }]);
  expect(changedRows([], [row])).toMatchObject([{ label: row.label, before: null }]);
});
