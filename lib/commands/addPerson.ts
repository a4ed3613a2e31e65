import "server-only";
import { db } from "@/lib/db";
import { webEnv } from "@/lib/env";
import { ConflictError } from "@/lib/errors";
import type { Actor, Role } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { canPeople } from "@/lib/policies/people";
import { Person, RoleGrant } from "@/models";
import { transact } from "./transact";
import { writeMail } from "./writeMail";
import { writeSignInLink } from "./writeSignInLink";

const INVITATION_DAYS = 7;

type Newcomer = { name: string; email: string; roles: readonly Role[]; outsideLine: boolean };

/** Bring a person into the firm and mail how to sign in. Whoever has an account already keeps name and password. */
export const addPerson = (actor: Actor, { name, email, roles, outsideLine }: Newcomer, now = new Date()) =>
  transact(actor, async (transaction) => {
    authorize(canPeople.add(actor), "add people");
    const { employerId, employerName } = actor;
    await db.query(ADD_UNLESS_KNOWN, { replacements: { name, email, now }, transaction });
    const lock = transaction.LOCK.UPDATE;
    const person = await Person.findOne({ where: { email }, transaction, lock, rejectOnEmpty: true });
    if (await RoleGrant.count({ where: { personId: person.id, employerId, endedAt: null }, transaction })) {
      throw new ConflictError(`${person.name} is in your firm already. Grant the role in the list.`);
    }
    for (const role of new Set(roles)) {
      const grant = { personId: person.id, employerId, role, outsideLine: role === "decider" && outsideLine };
      await RoleGrant.create({ ...grant, grantedBy: actor.personId, grantedAt: now }, { transaction });
    }
    const expiresAt = new Date(now.getTime() + INVITATION_DAYS * 86_400_000);
    const how = person.passwordHash
      ? `Sign in as before.\n\n${webEnv().PUBLIC_ORIGIN}/sign-in`
      : `Sign in with this link. It works once, within ${INVITATION_DAYS} days; set a password then, or ask for a new link whenever you sign in.\n\n${await writeSignInLink({ email, back: "/account", expiresAt }, now, transaction)}`;
    const body = `${actor.name} added you to ${employerName} on Lagmark: ${[...new Set(roles)].join(", ")}.\n\n${how}\n`;
    await writeMail({ to: email, subject: `${employerName} added you on Lagmark`, body }, transaction);
    return { id: person.id };
  });

const ADD_UNLESS_KNOWN = `
  INSERT INTO people (name, email, created_at) VALUES (:name, :email, :now) ON CONFLICT (email) DO NOTHING`;
