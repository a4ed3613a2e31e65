import type { Actor, Role } from "./actor";

const holdsOne = (actor: Actor, ...roles: Role[]): boolean => roles.some((role) => actor.roles.includes(role));

/** Who may do what about the people of the own firm. Commands look for the rows inside the actor's employer only. */
export const canPeople = {
  read: (actor: Actor) => holdsOne(actor, "lead", "administrator"),
  add: (actor: Actor) => holdsOne(actor, "administrator"),
  grantRole: (actor: Actor) => holdsOne(actor, "administrator"),
  endRole: (actor: Actor) => holdsOne(actor, "administrator"),
  recordTraining: (actor: Actor) => holdsOne(actor, "lead", "administrator"),
} as const;

/** Without an administrator nobody could ever grant a role again. */
export const endsLastAdministrator = (
  grant: { id: string; role: Role },
  administrators: readonly { id: string }[],
): boolean => grant.role === "administrator" && administrators.every(({ id }) => id === grant.id);
