import "server-only";
import { ConflictError, NotFoundError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { canPeople, endsLastAdministrator } from "@/lib/policies/people";
import { RoleGrant } from "@/models";
import { requireId } from "./lockOwn";
import { transact } from "./transact";

/** End a role that a person of the firm holds. The next request made with it is refused. */
export const endRole = (actor: Actor, grantId: string, now = new Date()) =>
  transact(actor, async (transaction) => {
    authorize(canPeople.endRole(actor), "end roles");
    requireId(grantId, "role");
    const { employerId } = actor;
    const locked = { transaction, lock: transaction.LOCK.UPDATE };
    // All administrators are locked first: two of them who end each other at once wait here for one another.
    const administrators = await RoleGrant.findAll({
      where: { employerId, role: "administrator", endedAt: null },
      order: ["id"],
      ...locked,
    });
    const grant = await RoleGrant.findOne({ where: { id: grantId, employerId, endedAt: null }, ...locked });
    if (!grant) throw new NotFoundError("role");
    if (endsLastAdministrator(grant, administrators)) {
      throw new ConflictError("A firm keeps one administrator at least. Grant the role to another person first.");
    }
    await grant.update({ endedBy: actor.personId, endedAt: now }, { transaction });
  });
