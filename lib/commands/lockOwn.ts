import "server-only";
import type { Transaction } from "sequelize";
import { NotFoundError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { Certificate, Draft, Module, Release, Sitting, Case } from "@/models";

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i;

/** An id that is none would otherwise reach PostgreSQL and come back as a fault of ours. */
export function requireId(id: string, what: string): void {
  if (!UUID.test(id)) throw new NotFoundError(what);
}

/** Every look-up stays inside the tenant: another employer's id looks like no id at all. */
export async function lockOwnModule(actor: Actor, id: string, transaction: Transaction) {
  requireId(id, "module");
  const where = { id, employerId: actor.employerId };
  const found = await Module.findOne({ where, transaction });
  if (!found) throw new NotFoundError("module");
  const draft = await Draft.findByPk(id, { transaction, lock: transaction.LOCK.UPDATE });
  if (!draft) throw new NotFoundError("module");
  return { module: found, draft };
}

export async function findOwnRelease(actor: Actor, id: string, transaction: Transaction): Promise<Release> {
  requireId(id, "release");
  const release = await Release.findOne({ where: { id, employerId: actor.employerId }, transaction });
  if (!release) throw new NotFoundError("release");
  return release;
}

/** Whatever adds a case, a decision or anything else that depends on the sitting's state takes this lock first. */
export async function lockOwnSitting(actor: Actor, id: string, transaction: Transaction): Promise<Sitting> {
  requireId(id, "sitting");
  const where = { id, employerId: actor.employerId };
  const sitting = await Sitting.findOne({ where, transaction, lock: transaction.LOCK.UPDATE });
  if (!sitting) throw new NotFoundError("sitting");
  return sitting;
}

/** @param what the person asked for: a record of another employer's case looks like no record, not like a case */
export async function lockOwnCase(actor: Actor, id: string, transaction: Transaction, what = "case") {
  requireId(id, what);
  const found = await Case.findByPk(id, { transaction, lock: transaction.LOCK.UPDATE });
  const sitting = found && (await Sitting.findByPk(found.sittingId, { transaction }));
  if (!found || !sitting || sitting.employerId !== actor.employerId) throw new NotFoundError(what);
  return { case: found, sitting };
}

export async function lockOwnCertificate(actor: Actor, number: string, transaction: Transaction): Promise<Certificate> {
  const where = { number, employerId: actor.employerId };
  const attributes = { exclude: ["pdf", "recordText"] };
  const lock = transaction.LOCK.UPDATE;
  const certificate = await Certificate.findOne({ where, attributes, transaction, lock });
  if (!certificate) throw new NotFoundError("certificate");
  return certificate;
}
