import { hashPassword } from "@/lib/passwords";
import type { Actor, Role } from "@/lib/policies/actor";
import { daysFrom, minutesFrom, NOW } from "./clock";
import { insert, ownerRows } from "./owner";

/** Rows of people and firms, put in by the owner; the chain of records is in chain.ts. */
export type Employer = { id: string; slug: string; name: string; timeZone: string; issuerStanding: string };
export type Person = { id: string; email: string; name: string; passwordHash: string | null };

let count: number | undefined;

/** Numbers go on after what is stored: test files that share the running product's database do not meet. */
async function next(): Promise<number> {
  if (count === undefined) {
    const sql = "SELECT (SELECT count(*) FROM people) + (SELECT count(*) FROM employers) AS stored";
    const [{ stored } = { stored: 0 }] = await ownerRows<{ stored: number }>(sql);
    count ??= Number(stored);
  }
  return (count += 1);
}

export const makeEmployer = async (over: Partial<Employer> = {}): Promise<Employer> => {
  const n = await next();
  return insert<Employer>("employers", { slug: `firm-${n}`, name: `Firm ${n}`, timeZone: "Europe/London", ...over });
};

export const makePerson = async (
  over: { email?: string; name?: string; password?: string; isOperator?: boolean } = {},
) => {
  const n = await next();
  const { password, ...columns } = over;
  const passwordHash = password === undefined ? null : await hashPassword(password);
  return insert<Person>("people", { email: `person-${n}@example.test`, name: `Person ${n}`, passwordHash, ...columns });
};

export const grantTo = (personId: string, employerId: string, role: Role, over: object = {}) =>
  insert<{ id: string }>("role_grants", { personId, employerId, role, grantedAt: daysFrom(NOW, -30), ...over });

export const makeSession = (
  personId: string,
  over: { passwordAt?: Date | null; expiresAt?: Date; endedAt?: Date } = {},
) =>
  insert<{ id: string }>("sessions", {
    personId,
    createdAt: minutesFrom(NOW, -60),
    expiresAt: minutesFrom(NOW, 660),
    passwordAt: minutesFrom(NOW, -60),
    ...over,
  });

type ActorOptions = {
  person?: Person;
  name?: string;
  email?: string;
  password?: string;
  outsideLine?: boolean;
  passwordAt?: Date | null;
};

/** A signed-in person with these roles: person, grants and session exist as rows. */
export async function makeActor(employer: Employer, roles: Role[], options: ActorOptions = {}): Promise<Actor> {
  const { person: given, outsideLine = false, passwordAt = null, ...columns } = options;
  const person = given ?? (await makePerson(columns));
  for (const role of roles) {
    await grantTo(person.id, employer.id, role, { outsideLine: role === "decider" && outsideLine });
  }
  const session = await makeSession(person.id, { passwordAt });
  return {
    personId: person.id,
    name: person.name,
    sessionId: session.id,
    employerId: employer.id,
    employerSlug: employer.slug,
    employerName: employer.name,
    roles,
    outsideLine,
    isOperator: false,
    passwordAt,
  };
}

export type Firm = {
  employer: Employer;
  technician: Actor;
  lead: Actor;
  assessor: Actor;
  /** From outside the candidates' line, the password given a minute before NOW. */
  decider: Actor;
  administrator: Actor;
};

/** A firm with one person a role. */
export async function makeFirm(over: Partial<Employer> = {}): Promise<Firm> {
  const employer = await makeEmployer(over);
  return {
    employer,
    technician: await makeActor(employer, ["technician"]),
    lead: await makeActor(employer, ["lead"]),
    assessor: await makeActor(employer, ["assessor"]),
    decider: await makeActor(employer, ["decider"], { outsideLine: true, passwordAt: minutesFrom(NOW, -1) }),
    administrator: await makeActor(employer, ["administrator"]),
  };
}
