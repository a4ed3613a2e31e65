import { describe, expect, test } from "vitest";
import { takeReading } from "@/components/checks/takeReading";
import { falseLock } from "@/lib/checks/false-lock/falseLock";
import { publicCase as falseLockCase } from "@/lib/checks/false-lock/publicCase";
import { drawScene } from "@/lib/checks/satellites/drawScene";
import { publicCase as satellitesCase } from "@/lib/checks/satellites/publicCase";
import { satellites } from "@/lib/checks/satellites/satellites";
import { sceneFor } from "@/tests/checks/false-lock/sceneFor";
import { planOf, seedOf } from "@/tests/checks/planOf";

const READING = { prn: 7, codePhaseChips: 88.5, dopplerHz: -2250, cn0DbHz: 31.46, binHz: 100 };
const written = (...given: Parameters<typeof takeReading>) =>
  Object.fromEntries(takeReading(...given).map(({ id, value }) => [id, value]));

describe("in the false-lock case", () => {
  const { sections } = falseLockCase(sceneFor(seedOf(1)).truth, planOf(falseLock));
  const FALSE = { "verdicts.prn7": "cross-correlation" };

  // A false-lock reading of another satellite was written over the right one.
  test("a reading of a satellite that nobody called false writes nothing", () => {
    const answers = { "falseLock.doppler": "1 250", "verdicts.prn12": "cross-correlation" };
    expect(written(sections, answers, READING, null)).toEqual({});
    expect(written(sections, { "verdicts.prn7": "genuine" }, READING, null)).toEqual({});
  });

  test("of the satellite called false its Doppler and level are written", () => {
    expect(written(sections, FALSE, READING, null)).toEqual({
      "falseLock.doppler": "−2250",
      "falseLock.cn0": "31.5",
    });
  });

  test.each([
    ["falseLock.doppler", "−2250"],
    ["falseLock.cn0", "31.5"],
    ["falseLock.parent", "7"],
  ])("with %s open that field alone is written, whichever satellite was searched", (open, value) => {
    for (const answers of [{}, FALSE, { [open]: "1" }])
      expect(written(sections, answers, READING, open)).toEqual({ [open]: value });
  });

  test("an open field that a reading has nothing for is left alone", () => {
    expect(written(sections, {}, READING, "falseLock.test")).toEqual({});
    expect(written(sections, {}, READING, "verdicts.prn7")).toEqual({});
    expect(written(sections, FALSE, READING, "verdicts.prn7")).toHaveProperty(["falseLock.doppler"]);
  });
});

describe("in a list of satellites", () => {
  const plan = planOf(satellites);
  const { sections } = satellitesCase(drawScene(seedOf(1), plan.parameters).truth, plan);
  const LINE = { codePhase: "88.50", doppler: "−2250", cn0: "31.5", prn: "7" };
  const row = (number: number) =>
    Object.fromEntries(Object.entries(LINE).map(([name, value]) => [`satellites.${number}.${name}`, value]));

  test("a reading goes into the row of its satellite, else into the first empty one, with the bin once", () => {
    expect(written(sections, {}, READING, null)).toEqual({ ...row(1), "search.bin": "100" });
    const two = { "satellites.1.prn": "3", "satellites.2.prn": "7", "search.bin": "50" };
    expect(written(sections, two, READING, null)).toEqual(row(2));
    expect(written(sections, { ...two, "satellites.2.prn": "9" }, READING, null)).toEqual(row(3));
  });

  test("an open field of another row does not draw it away", () => {
    const two = { "satellites.1.prn": "3", "satellites.2.prn": "7", "search.bin": "50" };
    expect(written(sections, two, READING, "satellites.1.doppler")).toEqual(row(2));
  });
});

test("a reading of a trace is written where it is asked for", () => {
  const sections = [
    {
      id: "reading",
      title: "Reading",
      fields: [
        { id: "lag", label: "Lag", input: "number", unit: "chip", quantity: "lag" },
        { id: "threshold", label: "Threshold", input: "number", unit: "1", quantity: "threshold" },
      ],
    },
  ] as const;
  const asked = sections as unknown as Parameters<typeof takeReading>[0];
  expect(written(asked, {}, { lagChips: 88.75, magnitude: 0.5 }, null)).toEqual({ "reading.lag": "88.750" });
  expect(written(asked, {}, { lagChips: 88.75 }, "reading.threshold")).toEqual({ "reading.lag": "88.750" });
});

test("an echo is written into the open field only: which echo it is, the person says", () => {
  const fields = ["lead", "end"].map((id) => ({ id, label: id, input: "number", unit: "ns", quantity: "echo" }));
  const sections = [{ id: "trace", title: "Echoes", fields }] as unknown as Parameters<typeof takeReading>[0];
  expect(written(sections, {}, { timeNs: 430.5 }, null)).toEqual({});
  expect(written(sections, {}, { timeNs: 430.5 }, "trace.end")).toEqual({ "trace.end": "430.5" });
});

test("a reading of a log gives its time in minutes or its size, whichever is open", () => {
  const fields = ["time", "maxTe", "mean"].map((id) => ({ id, label: id, input: "number", unit: "ns", quantity: id }));
  const sections = [{ id: "log", title: "Log", fields }] as unknown as Parameters<typeof takeReading>[0];
  const reading = { timeS: 43_230, levelNs: -87.25 };
  expect(written(sections, {}, reading, "log.time")).toEqual({ "log.time": "720.5" });
  expect(written(sections, {}, reading, "log.maxTe")).toEqual({ "log.maxTe": "87.3" });
  expect(written(sections, {}, reading, "log.mean")).toEqual({});
});
