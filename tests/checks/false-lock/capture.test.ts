import { describe, expect, test } from "vitest";
import { falseLock as kind } from "@/lib/checks/false-lock/falseLock";
import { markAnswers } from "@/lib/checks/false-lock/markAnswers";
import { planOf, seedOf } from "../planOf";

const UNSEARCHED = { searched: [], weakPeak: null };
const SLOW = 600_000; // a search for 32 satellites takes seconds, more on a busy machine

describe.each([
  ["with a weak genuine satellite", seedOf(21), 100],
  ["without one", seedOf(22), 0],
])("a capture %s", (_what, seed, decoy) => {
  const plan = planOf(kind, { decoy });

  test("is judged by the right method, searching the file alone", { timeout: SLOW }, () => {
    const built = kind.build(seed, plan);
    expect(built.files.map(({ name }) => name)).toEqual(["capture.sigmf-meta", "capture.sigmf-data"]);
    expect(built.files[1].bytes).toHaveLength(409_200); // 100 ms, 2.046 MHz, I and Q
    const marking = markAnswers(built.truth, plan, kind.solve(built, plan), UNSEARCHED);
    expect(marking.rows.filter(({ within }) => !within)).toEqual([]);
    expect(marking.met).toBe(true);
  });
});

test("marking searches the capture itself; twice gives the same bytes", { timeout: SLOW }, () => {
  const plan = planOf(kind, { decoy: 0 });
  const answers = { "falseLock.doppler": "junk", "falseLock.parent": "7" };
  const steps: [number, number, string][] = [];
  const first = kind.mark(seedOf(22), plan, answers, (...step) => steps.push(step));
  // The server's own search stands beside the scene and the two codes, and agrees with them.
  expect(first.workings[first.workings.length - 1].value).toMatch(/^agree for all/);
  expect(new Set(steps.map(([, , step]) => step))).toEqual(new Set(["Making the capture", "Searching 32 satellites"]));
  expect(JSON.stringify(kind.mark(seedOf(22), plan, answers))).toBe(JSON.stringify(first));
});
