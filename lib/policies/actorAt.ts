import type { Actor, Role } from "./actor";

type Person = Pick<Actor, "personId" | "name" | "sessionId" | "isOperator" | "passwordAt"> & {
  employers: readonly { id: string; slug: string; name: string; roles: Role[]; outsideLine: boolean }[];
};

/** The person as one employer's; at the first when none is named. Null where the person holds no role. */
export function actorAt(person: Person, employerSlug?: string): Actor | null {
  const { personId, name, sessionId, isOperator, passwordAt } = person;
  const employer =
    employerSlug === undefined ? person.employers[0] : person.employers.find(({ slug }) => slug === employerSlug);
  if (!employer) return null;
  return {
    personId,
    name,
    sessionId,
    employerId: employer.id,
    employerSlug: employer.slug,
    employerName: employer.name,
    roles: employer.roles,
    outsideLine: employer.outsideLine,
    isOperator,
    passwordAt,
  };
}
