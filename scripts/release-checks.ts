// `npm run release-checks [-- KIND]`: computes the release checks of the demonstration's first module and keeps them in
// content/release-checks, so that its first release need not wait minutes for them; one is left to the worker. To be run again when a test says so.
import { mkdir, readFile, writeFile } from "node:fs/promises";
import path from "node:path";
import { ENGINE_VERSION } from "@/lib/checks/engineVersion";
import type { CheckPlan } from "@/lib/checks/kind";
import type { TriedKind } from "@/lib/checks/release-check/tryCase";
import { readModule } from "@/lib/mdx/readModule";
import { computePart, LEFT_TO_THE_WORKER, partsOf, type ComputedCheck } from "@/lib/release-checks/computedCheck";
import { releaseCheckFingerprint } from "@/lib/release-checks/releaseCheckFingerprint";
import { triedKind } from "@/lib/release-checks/triedKind";

const only = process.argv[2];
const CONTENT = path.join(import.meta.dirname, "..", "content");

const { module: demonstration } = await readModule(await readFile(path.join(CONTENT, "modules", "sbw-r2.mdx"), "utf8"));
if (!demonstration) throw new Error("release-checks: the demonstration's module has an error in it");
await mkdir(path.join(CONTENT, "release-checks"), { recursive: true });
for (const plan of demonstration.checks) {
  const kind = triedKind(plan);
  if (kind && (only ? only === plan.kind : plan.kind !== LEFT_TO_THE_WORKER)) await compute(plan, kind);
}

/** Takes up an unfinished file where it ends. */
async function compute(plan: CheckPlan, kind: TriedKind): Promise<void> {
  const file = path.join(CONTENT, "release-checks", `${plan.kind}.json`);
  const fingerprint = releaseCheckFingerprint(plan);
  const earlier = await readFile(file, "utf8").then(
    (text) => JSON.parse(text) as ComputedCheck,
    () => null,
  );
  const { version, parameters, quantities, needs } = plan;
  const empty = { cases: [], whole: [] };
  const computed: ComputedCheck = {
    ...{
      fingerprint,
      engineVersion: ENGINE_VERSION,
      plan: { kind: plan.kind, version, parameters, quantities, needs },
    },
    ...(earlier?.fingerprint === fingerprint ? earlier : empty),
  };
  const parts = partsOf(kind);
  for (const part of ["cases", "whole"] as const) {
    for (const range of parts[part].slice(computed[part].length)) {
      computed[part].push(computePart(kind, plan, part, range));
      await writeFile(file, `${JSON.stringify(computed)}\n`);
      console.log(`${plan.kind}: ${part} to ${range.to}`);
    }
  }
}
