import { fingerprintOf } from "@/lib/certificates/canonicalJson";
import { ENGINE_VERSION } from "@/lib/checks/engineVersion";
import type { Marking } from "@/lib/checks/kind";
import { readArgs } from "./readArgs";
import type { Print } from "./Subcommand";
import { UsageError } from "./UsageError";

const USAGE = "engine mark CASE";
const CASE_ID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i;

/**
 * `mark CASE`: draws a case of the database again from its seed, marks what was handed in and says whether both are what the
 * register holds. It changes nothing. Needs WORKER_DATABASE_URL and SEED_KEY, as the worker has them.
 */
export async function mark(args: string[], print: Print): Promise<void> {
  const { positionals } = readArgs(USAGE, args, {});
  const [caseId, ...more] = positionals;
  if (caseId === undefined || more.length > 0 || !CASE_ID.test(caseId))
    throw new UsageError(`the id of one case, please; usage: ${USAGE}`);
  const { WORKER_DATABASE_URL, SEED_KEY } = process.env;
  if (!WORKER_DATABASE_URL || !SEED_KEY) throw new UsageError("mark: set WORKER_DATABASE_URL and SEED_KEY");

  // After the settings are known to be there: these modules connect when they are loaded.
  const { findCase } = await import("@/lib/commands/findCase");
  const { openSecret } = await import("@/lib/commands/caseSecret");
  const { plainTruth } = await import("@/lib/commands/plainTruth");
  const { computeCase } = await import("@/lib/worker/computeCase");
  const { db } = await import("@/lib/db");
  const { Case, CaseSecret, HandIn, MarkingRecord } = await import("@/models");
  try {
    if (!(await Case.count({ where: { id: caseId } }))) throw new UsageError(`mark: no case ${caseId}`);
    const { plan } = await findCase(caseId);
    const handIn = await HandIn.findByPk(caseId);
    if (!handIn) throw new UsageError(`mark: case ${caseId} is not handed in, so nothing of it is computed here`);
    const secret = await CaseSecret.findByPk(caseId, { rejectOnEmpty: true });
    const { seedHex } = openSecret(secret.sealed, caseId, SEED_KEY);
    const result = computeCase({ seedHex, plan, answers: handIn.answers }, () => undefined);
    if (!("marking" in result)) throw new Error("mark: the engine gave a case and no marking");
    const records = await MarkingRecord.findAll({ where: { caseId }, order: [["sequence", "ASC"]] });
    await print({
      ...{ caseId, engine: ENGINE_VERSION, drawnBy: secret.engineVersion },
      truthAsDrawn: fingerprintOf(plainTruth(result.truth)) === secret.truthSha256,
      recordsAlike: records.map((record) => ({
        ...{ sequence: record.sequence, marking: record.marking, engine: record.engineVersion },
        alike: fingerprintOf(outcome(record)) === fingerprintOf(outcome(result.marking)),
      })),
      ...result.marking,
    });
  } finally {
    await db.close();
  }
}

const outcome = ({ marking, rows, quantities, needs, withinCount, met, workings }: Marking) => ({
  ...{ marking, rows, quantities, needs, withinCount, met, workings },
});
