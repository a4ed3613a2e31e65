import "server-only";
import { select } from "@/lib/db";
import type { Role } from "@/lib/policies/actor";
import { isId } from "./findOwn";

/** An employer at which the person holds a role today. */
export type EmployerOf = { id: string; slug: string; name: string; roles: Role[]; outsideLine: boolean };

/** Whose session it is. Read on every request, so that what has ended is refused at once. */
export type SignedIn = {
  sessionId: string;
  personId: string;
  name: string;
  email: string;
  isOperator: boolean;
  hasPassword: boolean;
  passwordAt: Date | null;
  startedAt: Date;
  /** In the order of their names. */
  employers: EmployerOf[];
};

/** Null when the session has ended, has expired or never was. */
export async function getSignedIn(sessionId: string, now: Date): Promise<SignedIn | null> {
  if (!isId(sessionId)) return null;
  const [signedIn] = await select<SignedIn>(SIGNED_IN, { sessionId, now });
  return signedIn ?? null;
}

const SIGNED_IN = `
  SELECT s.id AS "sessionId", p.id AS "personId", p.name, p.email, p.is_operator AS "isOperator",
    p.password_hash IS NOT NULL AS "hasPassword", s.password_at AS "passwordAt", s.created_at AS "startedAt",
    coalesce((
      SELECT json_agg(json_build_object(
        'id', e.id, 'slug', e.slug, 'name', e.name, 'roles', held.roles, 'outsideLine', held.outside_line) ORDER BY e.name)
      FROM employers e JOIN (
        SELECT employer_id, array_agg(role ORDER BY role) AS roles, bool_or(role = 'decider' AND outside_line) AS outside_line
        FROM role_grants WHERE person_id = p.id AND ended_at IS NULL GROUP BY employer_id
      ) held ON held.employer_id = e.id
    ), '[]') AS employers
  FROM sessions s JOIN people p ON p.id = s.person_id
  WHERE s.id = :sessionId AND s.ended_at IS NULL AND s.expires_at > :now`;
