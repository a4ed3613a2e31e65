import "server-only";
import type { Transaction } from "sequelize";
import { NotFoundError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { Person, RoleGrant } from "@/models";
import { requireId } from "./lockOwn";

/** A person who holds or held a role at the actor's employer; anyone else looks like nobody. */
export async function lockPerson(actor: Actor, personId: string, transaction: Transaction): Promise<Person> {
  requireId(personId, "person");
  const known = await RoleGrant.count({ where: { personId, employerId: actor.employerId }, transaction });
  const person = known ? await Person.findByPk(personId, { transaction, lock: transaction.LOCK.UPDATE }) : null;
  if (!person) throw new NotFoundError("person");
  return person;
}
