import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, test } from "vitest";
import type { CheckPlan } from "@/lib/checks/kind";
import { FULL_CASES, WHOLE_CASES } from "@/lib/checks/release-check/rule";
import { readModule } from "@/lib/mdx/readModule";
import { computePart, partsOf, sumOf, type ComputedCheck, type ComputedPart } from "@/lib/release-checks/computedCheck";
import { linesOf } from "@/lib/release-checks/judgeRelease";
import { releaseCheckFingerprint } from "@/lib/release-checks/releaseCheckFingerprint";
import { triedKind } from "@/lib/release-checks/triedKind";

const CONTENT = path.resolve(import.meta.dirname, "../../content");
const folder = path.join(CONTENT, "release-checks");
const computed = readdirSync(folder).map(
  (name) => [name, JSON.parse(readFileSync(path.join(folder, name), "utf8")) as ComputedCheck] as const,
);
const asPlan = ({ plan }: ComputedCheck): CheckPlan => ({ id: plan.kind, title: "", minutes: 1, ...plan });

// The first release of the demonstration takes these from its seed; `npm run release-checks` computes them again.
test("each is of a check of the demonstration's first module, of its very plan and this engine; no search kind is missing", async () => {
  const { checks } = await readModule(readFileSync(path.join(CONTENT, "modules", "sbw-r2.mdx"), "utf8"));
  const kept = computed.map(([, { fingerprint }]) => fingerprint);
  const tried = checks.filter((plan) => triedKind(plan));
  expect(tried.map(releaseCheckFingerprint)).toEqual(expect.arrayContaining(kept));
  const search = tried.filter((plan) => triedKind(plan)?.trial.whole === false);
  expect(kept).toEqual(expect.arrayContaining(search.map(releaseCheckFingerprint)));
});

describe.each(computed)("%s", (_name, check) => {
  const plan = asPlan(check);
  const kind = triedKind(plan)!;

  test("is stored under the fingerprint of its plan", () =>
    expect(releaseCheckFingerprint(plan)).toBe(check.fingerprint));

  test("is whole: every part once", () => {
    const ranges = (parts: readonly { from: number; to: number }[]) => parts.map(({ from, to }) => ({ from, to }));
    expect({ cases: ranges(check.cases), whole: ranges(check.whole) }).toEqual(partsOf(kind));
    const { lines } = sumOf(check);
    expect(lines.solvable!.tried).toBe(FULL_CASES);
    expect(lines.whole?.tried ?? 0).toBe(kind.trial.whole ? 0 : WHOLE_CASES);
  });

  test("one part of it, computed again, is the same", () => {
    const [part] = check.cases as [ComputedPart];
    expect(computePart(kind, plan, "cases", part)).toEqual(part);
  });

  test("keeps all its bounds", () => {
    const outside = linesOf(plan, sumOf(check)).filter(({ within }) => !within);
    expect(outside).toEqual([]);
  });
});
