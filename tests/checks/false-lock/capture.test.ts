import { describe, expect, test } from "vitest";
import { falseLock as kind } from "@/lib/checks/false-lock/falseLock";
import type { CheckPlan, Marking } from "@/lib/checks/kind";
import { markAnswers } from "@/lib/checks/false-lock/markAnswers";
import type { FalseLockParameters } from "@/lib/checks/false-lock/parameters";
import { GOLDEN } from "../goldenHashes";
import { goldenFigures, goldenOf } from "../goldenOf";
import { planOf, seedOf } from "../planOf";

const UNSEARCHED = { searched: [], weakPeak: null };
const SLOW = 600_000; // a search for 32 satellites takes seconds, more on a busy machine

/** Made and worked once for all that is to be seen of it. */
function worked(seed: string, plan: CheckPlan<FalseLockParameters>) {
  const built = kind.build(seed, plan);
  return { built, answers: kind.solve(built, plan) };
}

function expectMet(marking: Marking): void {
  expect(marking.rows.filter(({ within }) => !within)).toEqual([]);
  expect(marking.met).toBe(true);
}

test(
  "a capture with a weak genuine satellite is judged by the right method, searching the file alone",
  { timeout: SLOW },
  () => {
    const plan = planOf(kind, { decoy: 100 });
    const { built, answers } = worked(seedOf(21), plan);
    expect(built.truth.scene.satellites.map(({ prn }) => prn)).toContain(built.truth.weakPrn);
    expectMet(markAnswers(built.truth, plan, answers, UNSEARCHED));
  },
);

describe("a capture without one", () => {
  const plan = planOf(kind);
  const { built, answers } = worked(seedOf(0), plan);
  const steps: [number, number, string][] = [];
  const marking = kind.mark(seedOf(0), plan, answers, (...step) => steps.push(step));

  test("is the one of the first release, 100 ms of I and Q at 2.046 MHz", () => {
    expect(built.truth.scene.satellites.map(({ prn }) => prn)).not.toContain(built.truth.weakPrn);
    expect(built.files.map(({ name }) => name)).toEqual(["capture.sigmf-meta", "capture.sigmf-data"]);
    expect(built.files[1]!.bytes).toHaveLength(409_200);
    expect(goldenOf(built)).toBe(GOLDEN.falseLockCaptures[0]);
  });

  test("is judged by the right method; the marking makes it again from its seed and searches it", () => {
    expectMet(marking);
    // The server's own search stands beside the scene and the two codes, and agrees with them.
    expect(marking.workings[marking.workings.length - 1]!.value).toMatch(/^agree for all/);
    expect(new Set(steps.map(([, , step]) => step))).toEqual(
      new Set(["Making the capture", "Searching 32 satellites"]),
    );
  });

  // In any process and on any day, which marking it twice here would not show.
  test("is marked with the same figures for ever", () => {
    expect(goldenFigures(marking)).toBe(GOLDEN.falseLockMarking);
  });
});
