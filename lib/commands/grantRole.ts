import "server-only";
import { ConflictError } from "@/lib/errors";
import type { Actor, Role } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { canPeople } from "@/lib/policies/people";
import { RoleGrant } from "@/models";
import { lockPerson } from "./lockPerson";
import { transact } from "./transact";

type Grant = { personId: string; role: Role; outsideLine: boolean };

/** Give a role to a person of the firm. */
export const grantRole = (actor: Actor, { personId, role, outsideLine }: Grant, now = new Date()) =>
  transact(actor, async (transaction) => {
    authorize(canPeople.grantRole(actor), "grant roles");
    const person = await lockPerson(actor, personId, transaction);
    const held = { personId, employerId: actor.employerId, role, endedAt: null };
    if (await RoleGrant.count({ where: held, transaction })) {
      throw new ConflictError(`${person.name} holds this role already.`);
    }
    await RoleGrant.create(
      { ...held, outsideLine: role === "decider" && outsideLine, grantedBy: actor.personId, grantedAt: now },
      { transaction },
    );
  });
