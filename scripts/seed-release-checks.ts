// Stores the release checks that were computed before (release-checks.ts; a test computes a part of them again) under the
// fingerprint of plan and engine, as the worker would: by its role alone such a record comes in.
import { readdir, readFile } from "node:fs/promises";
import path from "node:path";
import type { CheckPlan } from "@/lib/checks/kind";
import { transact } from "@/lib/commands/transact";
import { db } from "@/lib/db";
import { sumOf, type ComputedCheck } from "@/lib/release-checks/computedCheck";
import { ReleaseCheck } from "@/models";

const folder = path.join(import.meta.dirname, "..", "content", "release-checks");

await transact(null, async (transaction) => {
  for (const name of await readdir(folder)) {
    const computed = JSON.parse(await readFile(path.join(folder, name), "utf8")) as ComputedCheck;
    const { fingerprint, engineVersion } = computed;
    if (await ReleaseCheck.count({ where: { fingerprint }, transaction })) continue;
    const plan: CheckPlan = { id: computed.plan.kind, title: "", minutes: 1, ...computed.plan };
    const record = { fingerprint, plan, engineVersion, tally: sumOf(computed), finishedAt: new Date() };
    await ReleaseCheck.create(record, { transaction });
  }
});
await db.close();
