import "server-only";
import { createHash, randomBytes } from "node:crypto";
import type { Transaction } from "sequelize";
import { fingerprintOf } from "@/lib/certificates/canonicalJson";
import { ENGINE_VERSION } from "@/lib/checks/engineVersion";
import type { BuiltCase, CaseFile } from "@/lib/checks/kind";
import { enqueue } from "@/lib/jobs/enqueue";
import type { Storage } from "@/lib/storage/storage";
import { Capture, Case, CaseSecret, CaseView, Progress } from "@/models";
import { sealSecret } from "./caseSecret";
import type { Engine } from "./engine";
import { findCase } from "./findCase";
import { plainTruth } from "./plainTruth";
import { GRACE_MS } from "./saveAnswers";
import { transact } from "./transact";

export type BuildTools = { engine: Engine; storage: Storage; seedKey: string };

/**
 * Draw the data of a case: seed, truth, public part and files. The clock starts when they are stored.
 * Run twice, the first one stored stays; killed in between, nothing of it is left but files that no row names.
 */
export async function buildCase(
  caseId: string,
  tools: BuildTools,
  now = () => new Date(),
): Promise<"built" | "was built"> {
  const { sitting, plan } = await findCase(caseId);
  if (await CaseView.count({ where: { caseId } })) return "was built";
  const seedHex = randomBytes(32).toString("hex");
  const built = await tools.engine.build(seedHex, plan);
  const files = built.files.map((file) => storedFile(caseId, file));
  for (const { key, mediaType, bytes } of files) await tools.storage.put(key, bytes, mediaType);
  const jobActor = { personId: "", employerId: sitting.employerId };
  const result = await transact(jobActor, async (transaction) => {
    await Case.findByPk(caseId, { transaction, lock: transaction.LOCK.UPDATE });
    if (await CaseView.count({ where: { caseId }, transaction })) return "was built";
    const openedAt = now();
    const endsAt = new Date(openedAt.getTime() + plan.minutes * 60_000);
    await store({ caseId, built, files, openedAt, endsAt }, transaction);
    const truth = plainTruth(built.truth);
    const sealed = sealSecret({ seedHex, truth }, caseId, tools.seedKey);
    const truthSha256 = fingerprintOf(truth);
    await CaseSecret.create({ caseId, sealed, truthSha256, engineVersion: ENGINE_VERSION }, { transaction });
    await enqueue("close-case", { caseId }, transaction, new Date(endsAt.getTime() + GRACE_MS));
    await Progress.destroy({ where: { subjectId: caseId, job: "build-case" }, transaction });
    return "built";
  });
  if (result === "was built") await discardUnused(caseId, files, tools.storage);
  return result;
}

type StoredFile = CaseFile & { key: string; sha256: string };

// The hash is part of the key: a slower run of the same job writes beside the files of the run that counts, never over them.
function storedFile(caseId: string, file: CaseFile): StoredFile {
  const sha256 = createHash("sha256").update(file.bytes).digest("hex");
  return { ...file, sha256, key: `cases/${caseId}/${sha256.slice(0, 16)}/${file.name}` };
}

type Drawn = { caseId: string; built: BuiltCase; files: StoredFile[]; openedAt: Date; endsAt: Date };

async function store({ caseId, built, files, openedAt, endsAt }: Drawn, transaction: Transaction): Promise<void> {
  const { publicCase: view, draws } = built;
  const told = files.map(({ name, mediaType, bytes, sha256 }) => ({
    name,
    mediaType,
    sizeBytes: bytes.length,
    sha256,
  }));
  await CaseView.create({ caseId, view, files: told, draws, openedAt, endsAt }, { transaction });
  for (const { key, name, mediaType, bytes, sha256 } of files) {
    const sizeBytes = String(bytes.length);
    const labels = labelsOf(name);
    await Capture.create({ caseId, name, storageKey: key, mediaType, sizeBytes, sha256, labels }, { transaction });
  }
}

const labelsOf = (name: string): Record<string, string> => ({
  origin: "generated",
  signal: "GPS L1 C/A",
  ...(name.endsWith(".sigmf-data") && { datatype: "ci8" }),
});

// Only after the other run is known to be stored, and never a key that it has too: equal files have equal keys.
async function discardUnused(caseId: string, files: readonly StoredFile[], storage: Storage): Promise<void> {
  const used = new Set((await Capture.findAll({ where: { caseId } })).map(({ storageKey }) => storageKey));
  const unused = files.filter(({ key }) => !used.has(key));
  await Promise.allSettled(unused.map(({ key }) => storage.delete(key)));
}
