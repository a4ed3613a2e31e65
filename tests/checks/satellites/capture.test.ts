import { describe, expect, test } from "vitest";
import { markAnswers } from "@/lib/checks/satellites/markAnswers";
import { satellites as kind } from "@/lib/checks/satellites/satellites";
import { planOf, seedOf } from "../planOf";

const SLOW = 600_000; // a search for 32 satellites takes seconds, more on a busy machine

describe.each([
  ["2.046", seedOf(11), 409_200],
  ["4.092", seedOf(12), 818_400],
] as const)("a capture of %s MHz", (rate, seed, bytes) => {
  const plan = planOf(kind, { rate });
  const built = kind.build(seed, plan);

  test("holds 100 ms of I and Q", () => {
    const [metadata, data] = built.files;
    expect(data.bytes).toHaveLength(bytes);
    expect(JSON.parse(new TextDecoder().decode(metadata.bytes)).global["core:sample_rate"]).toBe(bytes * 5);
    expect(built.publicCase.data).toMatchObject({ captureFile: data.name, samples: bytes / 2 });
  });

  test("the right method, searching the file alone, meets it", { timeout: SLOW }, () => {
    const answers = kind.solve(built, plan);
    const marking = markAnswers(built.truth, plan, answers, []);
    expect(marking.rows.filter(({ within }) => !within)).toEqual([]);
    expect(marking.met).toBe(true);
  });
});

test("marking searches the capture itself; twice gives the same bytes", { timeout: SLOW }, () => {
  const plan = planOf(kind, { rate: "2.046" });
  const answers = { "satellites.1.prn": "7", "satellites.1.doppler": "junk", "search.bin": "125" };
  const steps: [number, number, string][] = [];
  const first = kind.mark(seedOf(11), plan, answers, (...step) => steps.push(step));
  // The server's own search stands beside the scene, and agrees with it.
  expect(first.workings[first.workings.length - 1].value).toMatch(/^agree for all/);
  expect(new Set(steps.map(([, , step]) => step))).toEqual(new Set(["Making the capture", "Searching 32 satellites"]));
  expect(steps.every(([done, total]) => done <= total)).toBe(true);
  expect(JSON.stringify(kind.mark(seedOf(11), plan, answers))).toBe(JSON.stringify(first));
});
