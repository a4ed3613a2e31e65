import { describe, expect, test } from "vitest";
import type { ParameterSpec } from "@/lib/checks/kind";
import { readParameters } from "@/lib/checks/readParameters";

const specs: readonly ParameterSpec[] = [
  {
    name: "cn0",
    label: "C/N0",
    help: "",
    input: "range",
    unit: "dB-Hz",
    from: 30,
    to: 45,
    whole: false,
    default: [34, 43],
  },
  { name: "count", label: "Count", help: "", input: "range", unit: "1", from: 4, to: 12, whole: true, default: [5, 9] },
  {
    name: "window",
    label: "Window",
    help: "",
    input: "number",
    unit: "Hz",
    from: 500,
    to: 9000,
    whole: false,
    default: 4500,
  },
  {
    name: "rate",
    label: "Rate",
    help: "",
    input: "choice",
    choices: [
      { value: "2.046", label: "" },
      { value: "either", label: "" },
    ],
    default: "either",
  },
];
const read = (written: Record<string, unknown>) => readParameters(specs, written);

test("takes the defaults where nothing is written", () =>
  expect(read({})).toEqual({
    parameters: { cn0: [34, 43], count: [5, 9], window: 4500, rate: "either" },
    problems: [],
  }));

test.each<[string, unknown, unknown]>([
  ["cn0", "36 to 40 dB-Hz", [36, 40]],
  ["cn0", "36 dB-Hz to 40 dB-Hz", [36, 40]],
  ["cn0", "36 to 40", [36, 40]],
  ["cn0", [36, 40], [36, 40]],
  ["cn0", "40 dB-Hz", [40, 40]],
  ["cn0", 40, [40, 40]],
  ["count", [6, 6], [6, 6]],
  ["window", "1.5 kHz", 1500],
  ["window", 1500, 1500],
  ["rate", "2.046", "2.046"],
  ["rate", 2.046, "2.046"],
])("reads %s %j", (name, written, value) => {
  const { parameters, problems } = read({ [name]: written });
  expect(problems).toEqual([]);
  expect(parameters[name]).toEqual(value);
});

describe("says what is wrong", () => {
  test.each<[string, unknown, RegExp]>([
    ["cn0", "20 to 40 dB-Hz", /may be from 30.dB-Hz to 45.dB-Hz/],
    ["cn0", [40, 36], /from the smaller to the larger/],
    ["cn0", [36, 38, 40], /is a range: write "34 to 43.dB-Hz"/],
    ["cn0", "36 to 40 Hz", /Hz does not fit/],
    ["cn0", null, /is a range/],
    ["cn0", true, /is a range/],
    ["count", [5.5, 7], /is a whole number/],
    ["window", "much", /is not a number/],
    ["window", [1500], /may be from/],
    ["window", Number.NaN, /may be from/],
    ["rate", "10", /is one of 2\.046, either/],
    ["speed", "1", /has no attribute speed\. It has cn0, count, window, rate/],
  ])("%s %j", (name, written, message) =>
    expect(read({ [name]: written }).problems).toEqual([{ name, message: expect.stringMatching(message) }]),
  );

  test("an inherited name is not written", () => expect(read({ toString: undefined }).problems).toHaveLength(1));
});
