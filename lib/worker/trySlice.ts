import type { SliceTask, TriedSlice } from "@/lib/commands/engine";
import { addTallies } from "@/lib/checks/release-check/tally";
import { tryCase } from "@/lib/checks/release-check/tryCase";
import { tryWholeCase } from "@/lib/checks/release-check/tryWholeCase";
import { triedKind } from "@/lib/release-checks/triedKind";

/** A sitting that is to be marked waits for one slice at most, and a worker that is stopped loses no more. */
const SLICE_MS = 1000;

/** As many cases as take about a second, at least one. */
export function trySlice({ plan, baseSeedHex, part, from, to }: SliceTask): TriedSlice {
  const kind = triedKind(plan);
  if (!kind) throw new Error(`trySlice: nobody tries ${plan.kind}`);
  const until = performance.now() + SLICE_MS;
  const one = part === "whole" ? tryWholeCase : tryCase;
  let tally = one(kind, plan, baseSeedHex, from);
  let n = from + 1;
  for (; n < to && performance.now() < until; n++) tally = addTallies(tally, one(kind, plan, baseSeedHex, n));
  return { tally, count: n - from };
}
