import { describe, expect, test } from "vitest";
import { startValues, type Calculator, type RowsInput, type ValuesOf } from "@/lib/calculators/calculator";
import { CALCULATORS } from "@/lib/calculators/calculators";
import { inputText, shownFigure } from "@/lib/calculators/inputText";
import { queryOf, readQuery } from "@/lib/calculators/link";
import { readFigure } from "@/lib/calculators/readFigure";
import { readInput } from "@/lib/calculators/readInput";
import { SEARCH_PLAN } from "@/lib/calculators/searchPlan";
import { TWO_CODES } from "@/lib/calculators/twoCodes";

const ALL: readonly Calculator[] = CALCULATORS;

describe.each(ALL.map((calculator) => [calculator.tag, calculator] as const))("%s", (_tag, calculator) => {
  test("begins with inputs that it would take itself", () => {
    for (const input of calculator.inputs)
      expect(readInput(input, inputText(input, input.start)), input.key).toEqual({ value: input.start });
  });

  test("names its inputs once, none of them like the calculator's own place in the address", () => {
    for (const names of [calculator.inputs.map(({ key }) => key), calculator.inputs.map(({ attribute }) => attribute)])
      expect(new Set([...names, "open"]).size).toBe(calculator.inputs.length + 1);
  });

  test("comes back from its own link, every input", () => {
    const values = startValues(calculator);
    const read = readQuery(calculator, new URLSearchParams(queryOf(calculator, values)));
    expect(read).toEqual({ values, carries: true, problems: [] });
  });
});

test("calculators are listed by number, each with a name of its own", () => {
  const numbers = ALL.map(({ number }) => number);
  expect(numbers).toEqual([...numbers].sort((a, b) => a - b));
  for (const names of [numbers, ALL.map(({ id }) => id), ALL.map(({ tag }) => tag)])
    expect(new Set<unknown>(names).size).toBe(ALL.length);
});

test("a link carries figures to the last place", () => {
  const values: ValuesOf<typeof SEARCH_PLAN> = {
    ...startValues(SEARCH_PLAN),
    cn0DbHz: 20 + 1 / 3,
    falseAlarmPerSearch: 1.25e-9,
    windowHz: 0.1 + 0.2,
  };
  expect(readQuery(SEARCH_PLAN, new URLSearchParams(queryOf(SEARCH_PLAN, values))).values).toEqual(values);
});

test("a link that names the calculator only carries nothing; one with a fault says so and keeps the rest", () => {
  expect(readQuery(TWO_CODES, new URLSearchParams("open=two-codes")).carries).toBe(false);
  const read = readQuery(TWO_CODES, new URLSearchParams("a=33&b=4&doppler=-1.5+kHz&lag=12"));
  expect(read.values).toEqual({ a: 7, b: 4, dopplerHz: -1500, coherentMs: 1, lagChips: 12 });
  expect(read.problems).toEqual([
    "Code a, PRN: The range is 1 to 32. These are the satellites whose C/A codes the interface specification lists first.",
  ]);
});

describe("a figure", () => {
  const bounds = { from: -5, to: 100, decimals: 1, why: "Because." };
  test.each([
    ["2,5", 2.5],
    ["\u22121", -1],
    ["0.1 km", 100],
  ])("%s is read as people write it", (text, value) => expect(readFigure(bounds, "m", text)).toEqual({ value }));

  test.each([
    ["", "Give a number from \u22125 to 100\u00a0m."],
    ["101", "The range is \u22125 to 100\u00a0m. Because."],
    ["3 Hz", "Hz does not fit. This quantity is in m."],
  ])("%j is refused with the reason", (text, problem) => expect(readFigure(bounds, "m", text)).toEqual({ problem }));

  // Symbols of the SI and of data sheets; a prefix is a factor of a thousand.
  test.each([
    ["13.5 dB/100 m", "dB/100m", 13.5],
    ["12 \u03a9/km", "ohm/km", 12],
    ["2 ohm", "ohm", 2],
    ["45 mA", "mA", 45],
    ["90 min", "h", 1.5],
    ["0.5 g/s", "g/s", 0.5],
  ] as const)("%s is read in %s", (text, unit, value) =>
    expect(readFigure({ from: 0, to: 100, decimals: 0 }, unit, text)).toEqual({ value }),
  );

  test("may be whole only, or stay empty", () => {
    expect(readFigure({ ...bounds, whole: true }, "1", "1.5")).toHaveProperty("problem");
    expect(readFigure({ ...bounds, absent: "none" }, "1", " ")).toEqual({ value: null });
  });

  test("is shown with at least its usual figures and never with fewer than were typed", () => {
    expect(shownFigure(bounds, 2)).toBe("2.0");
    expect(shownFigure(bounds, 2.125)).toBe("2.125");
    expect(shownFigure({ ...bounds, signed: true }, 2)).toBe("+2.0");
    expect(shownFigure({ ...bounds, scientific: true }, -2e-11)).toBe("\u22122e\u221211");
  });
});

describe("rows", () => {
  const parts: RowsInput = {
    input: "rows",
    key: "parts",
    attribute: "parts",
    label: "Parts",
    help: "parts of the chain",
    row: "part",
    columns: [
      { key: "gainDb", label: "Gain", unit: "dB", from: -40, to: 50, decimals: 1, start: 0 },
      { key: "limitDbm", label: "Limit", unit: "dBm", from: -30, to: 40, decimals: 0, absent: "none", start: null },
    ],
    most: 3,
    start: [],
  };

  test("are written and read back", () => {
    const rows = [
      { name: "amplifier", figures: [28.5, 0] },
      { name: "cable (foam)", figures: [-9.25, null] },
    ];
    const text = inputText(parts, rows);
    expect(text).toBe("amplifier: 28.5, 0; cable (foam): -9.25, -");
    expect(readInput(parts, text)).toEqual({ value: rows });
  });

  test("may leave out what stands at the end, and the name", () =>
    expect(readInput(parts, "x: 3;-4")).toEqual({
      value: [
        { name: "x", figures: [3, null] },
        { name: "part 2", figures: [-4, null] },
      ],
    }));

  test.each([
    ["", "Give at least one part."],
    ["a:1;b:1;c:1;d:1", "Give at most 3 parts."],
    ["a: 1, 2, 3", "a has 3 figures; a part has 2, with a comma between them."],
    ["a: 51", "a, Gain: The range is \u221240 to 50\u00a0dB."],
    ["a: x", "a, Gain: “x” is not a number."],
    ['a"b: 1', "The name of part 1 is 1 to 28 letters without : ; , or quotes."],
  ])("%j is refused with the reason", (text, problem) => expect(readInput(parts, text)).toEqual({ problem }));
});
