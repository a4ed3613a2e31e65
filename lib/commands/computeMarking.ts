import "server-only";
import { fingerprintOf } from "@/lib/certificates/canonicalJson";
import { ENGINE_VERSION } from "@/lib/checks/engineVersion";
import type { Marking } from "@/lib/checks/kind";
import { CaseSecret, HandIn } from "@/models";
import { openSecret } from "./caseSecret";
import type { Engine } from "./engine";
import type { FoundCase } from "./findCase";
import { plainTruth } from "./plainTruth";

/** The engine of this process does not re-create the case that was drawn, so it cannot mark it. */
export class EngineDiffersError extends Error {
  override name = "EngineDiffersError";
}

type Computed = { marking: Marking; handIn: HandIn; durationMs: number };

/** The newest marking of what was handed in, against the truth worked out again from the seed. Stores nothing. */
export async function computeMarking(
  { found: { id: caseId }, plan }: Pick<FoundCase, "found" | "plan">,
  { engine, seedKey }: { engine: Engine; seedKey: string },
): Promise<Computed> {
  const handIn = await HandIn.findByPk(caseId, { rejectOnEmpty: true });
  const secret = await CaseSecret.findByPk(caseId, { rejectOnEmpty: true });
  const { seedHex } = openSecret(secret.sealed, caseId, seedKey);
  const started = performance.now();
  const { truth, marking } = await engine.mark(seedHex, plan, handIn.answers);
  if (fingerprintOf(plainTruth(truth)) !== secret.truthSha256) {
    const versions = `drawn by engine ${secret.engineVersion}, this one is ${ENGINE_VERSION}`;
    throw new EngineDiffersError(`computeMarking: case ${caseId} is not re-created: ${versions}`);
  }
  return { marking, handIn, durationMs: Math.round(performance.now() - started) };
}

/** The columns of a marking record that a marking fills. */
export const markingColumns = ({ marking, rows, quantities, withinCount, needs, met, workings }: Marking) => ({
  ...{ marking, rows, quantities, withinCount, needs, met, workings },
});
