import { describe, expect, test } from "vitest";
import { markAnswers } from "@/lib/checks/satellites/markAnswers";
import { satellites as kind } from "@/lib/checks/satellites/satellites";
import { GOLDEN } from "../goldenHashes";
import { goldenFigures } from "../goldenOf";
import { planOf, seedOf } from "../planOf";

// A narrow window, since time goes with it; the release check works whole captures of the default one.
const NARROW = { motion: 1000, clock: 0 } as const;

const worked = (rate: "2.046" | "4.092", seed: string) => {
  const plan = planOf(kind, { ...NARROW, rate });
  const built = kind.build(seed, plan);
  return { plan, seed, built, answers: kind.solve(built, plan) };
};
const narrowBand = worked("2.046", seedOf(11));
const wideBand = worked("4.092", seedOf(12));

describe.each([
  ["2.046", narrowBand, 409_200],
  ["4.092", wideBand, 818_400],
] as const)("a capture of %s MHz", (_rate, { built, plan, answers }, bytes) => {
  test("holds 100 ms of I and Q", () => {
    const [metadata, data] = built.files;
    expect(data!.bytes).toHaveLength(bytes);
    expect(JSON.parse(new TextDecoder().decode(metadata!.bytes)).global["core:sample_rate"]).toBe(bytes * 5);
    expect(built.publicCase.data).toMatchObject({ captureFile: data!.name, samples: bytes / 2 });
  });

  test("the right method, searching the file alone, meets it", () => {
    const marking = markAnswers(built.truth, plan, answers, []);
    expect(marking.rows.filter(({ within }) => !within)).toEqual([]);
    expect(marking.met).toBe(true);
  });
});

describe("marking", () => {
  const answers = { "satellites.1.prn": "7", "satellites.1.doppler": "junk", "search.bin": "125" };
  const steps: [number, number, string][] = [];
  const marking = kind.mark(narrowBand.seed, narrowBand.plan, answers, (...step) => steps.push(step));

  test("searches the capture itself, and its search agrees with the scene", () => {
    expect(marking.workings[marking.workings.length - 1]!.value).toMatch(/^agree for all/);
    expect(new Set(steps.map(([, , step]) => step))).toEqual(
      new Set(["Making the capture", "Searching 32 satellites"]),
    );
    expect(steps.every(([done, total]) => done <= total)).toBe(true);
  });

  // In any process and on any day, which marking it twice here would not show.
  test("has the same figures for ever", () => expect(goldenFigures(marking)).toBe(GOLDEN.satellitesMarking));
});
