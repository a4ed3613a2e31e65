import { describe, expect, test } from "vitest";
import { corrected, CORRECTIONS, markingName, newestCorrections, type Correction } from "@/lib/checks/corrections";
import { KINDS, kindOf } from "@/lib/checks/registry";
import { planOf } from "./planOf";

// No published value: this is the register's own bookkeeping.
const KIND = kindOf("correlator-reading");
const PLAN = planOf(KIND);
const SEED = "5e".repeat(32);
const ANSWERS = KIND.solve(KIND.build(SEED, PLAN), PLAN);

/** Marks as the version does and says that nothing is met. */
const correction = (revision: number, over: Partial<Correction> = {}): Correction => ({
  ...{ kind: KIND.id, version: KIND.version, revision, reason: "It was too kind." },
  mark: (...given) => ({ ...KIND.mark(...given), met: false }),
  judge: (...given) => ({ ...KIND.trial!.judge(...given), met: false }),
  ...over,
});

test("the corrections that there are name a kind, and count from 2 on without a gap", () => {
  for (const { kind, version, revision, reason, judge } of CORRECTIONS) {
    const found = KINDS.find((one) => one.id === kind && one.version === version);
    expect(found, markingName({ kind, version, revision })).toBeDefined();
    expect(reason).not.toBe("");
    expect(Boolean(judge)).toBe(Boolean(found!.trial));
    const revisions = CORRECTIONS.filter((one) => one.kind === kind && one.version === version).map(
      (one) => one.revision,
    );
    expect(revisions).toEqual(revisions.map((_, at) => at + 2));
  }
});

test("a kind without a correction is the kind itself", () => {
  expect(corrected(KIND, [])).toBe(KIND);
  expect(corrected(KIND, [correction(2, { version: 99 }), correction(2, { kind: "chain" })])).toBe(KIND);
});

describe("a corrected kind", () => {
  const again = corrected(KIND, [correction(2)]);

  test("marks and judges by the correction, under its name", () => {
    expect(KIND.mark(SEED, PLAN, ANSWERS)).toMatchObject({ marking: "correlator-reading@1", met: true });
    expect(again.mark(SEED, PLAN, ANSWERS)).toMatchObject({ marking: "correlator-reading@1.2", met: false });
    const { judge, build } = again.trial!;
    expect(judge(build(SEED, PLAN), PLAN, ANSWERS)).toMatchObject({ marking: "correlator-reading@1.2", met: false });
  });

  test("draws as ever", () => {
    expect(again.build).toBe(KIND.build);
    expect(again.trial!.build).toBe(KIND.trial!.build);
  });

  test("marks by the newest of several", () => {
    expect(corrected(KIND, [correction(3), correction(2)]).mark(SEED, PLAN, ANSWERS).marking).toBe(
      "correlator-reading@1.3",
    );
  });
});

test("of each version the newest correction counts", () => {
  const all = [correction(2), correction(3), correction(2, { version: 2 }), correction(2, { kind: "chain" })];
  expect(newestCorrections(all).map(markingName)).toEqual([
    "correlator-reading@1.3",
    "correlator-reading@2.2",
    "chain@1.2",
  ]);
});
