import { expect, test } from "vitest";
import { FormatError } from "@/lib/formats/FormatError";
import { readTimeErrorLog } from "@/lib/formats/readTimeErrorLog";

const values = (text: string) => Array.from(readTimeErrorLog(text).series.valuesNs);

test.each([
  ["spaces", "0 12.5\n1 -3\n2 4e0"],
  ["tabs", "0\t12.5\n1\t-3\n2\t4"],
  ["commas", "0,12.5\n1,-3\n2,4"],
  ["semicolons and a true minus", "0; 12.5\n1; \u22123\n2; +4"],
  [
    "a heading, notes, empty lines and carriage returns",
    "\uFEFFtime s, error ns\r\n# locked\r\n0,12.5\r\n\r\n1,-3\r\n2,4\r\n",
  ],
])("reads lines with %s", (_how, text) => expect(values(text)).toEqual([12.5, -3, 4]));

// ISO 8601: seconds over midnight and the end of a leap year's February.
test("reads time stamps across a day", () => {
  const { series } = readTimeErrorLog(
    "2028-02-29T23:59:58Z 1\n2028-02-29T23:59:59Z 2\n2028-03-01 00:00:00 3\n2028-03-01T00:00:02.0Z 5",
  );
  expect(series.intervalS).toBe(1);
  expect(Array.from(series.valuesNs)).toEqual([1, 2, 3, NaN, 5]);
});

test("a missing reading leaves a gap, and the count says how many there are", () => {
  const log = readTimeErrorLog("100 1\n110 2\n140 5\n150 6");
  expect(log.readings).toBe(4);
  expect(log.series.intervalS).toBe(10);
  expect(Array.from(log.series.valuesNs)).toEqual([1, 2, NaN, NaN, 5, 6]);
});

test.each([
  ["0 1\n1 two\n2 3", 2, "“1 two” is not a time and a time error in ns."],
  ["0 1\n1 2\n# note\n1 3", 4, "This reading is not later than that of line 2."],
  ["0 1\n1 2\n2.5 3\n3 4\n4 5", 3, "between two places"],
  ["time error\nmore words\n0 1", 2, "“more words” is not"],
  ["0 1\n5", 2, "“5” is not"],
  ["0 1\n1 2", 1, "three readings at least, and here are 2"],
  ["0 1\n1 2\n2 3\n9e9 4", 4, "864000 can be read"],
  ["2026-13 1\n", 1, "is not a time"],
])("%j is refused at its line", (text, line, words) => {
  const refused = () => readTimeErrorLog(text);
  expect(refused).toThrow(FormatError);
  expect(refused).toThrow(words);
  expect(refused).toThrow(new RegExp(`^${line}:`));
});
