import "server-only";
import { select } from "@/lib/db";
import { needsPresentPassword } from "@/lib/policies/passwordRule";
import { homeOf } from "@/lib/policies/stations";
import type { SignedIn } from "./getSignedIn";
import { iso, isoOrNull } from "./findOwn";

export type SessionView = { id: string; startedAt: string; endsAt: string; passwordAt: string | null; isThis: boolean };
export type AccountView = {
  name: string;
  email: string;
  hasPassword: boolean;
  needsPresentPassword: boolean;
  employers: { slug: string; name: string; roles: string[]; home: string }[];
  /** Those not ended, this one first. */
  sessions: SessionView[];
};
type Row = { id: string; startedAt: Date; endsAt: Date; passwordAt: Date | null };

/** A person's own account. */
export async function getAccount(person: SignedIn, now: Date): Promise<AccountView> {
  const { personId, sessionId } = person;
  const rows = await select<Row>(SESSIONS, { personId, sessionId, now });
  return {
    name: person.name,
    email: person.email,
    hasPassword: person.hasPassword,
    needsPresentPassword: needsPresentPassword(person, now),
    employers: person.employers.map(({ slug, name, roles }) => ({
      slug,
      name,
      roles,
      home: homeOf({ employerSlug: slug, roles }),
    })),
    sessions: rows.map(({ id, startedAt, endsAt, passwordAt }) => ({
      id,
      startedAt: iso(startedAt),
      endsAt: iso(endsAt),
      passwordAt: isoOrNull(passwordAt),
      isThis: id === sessionId,
    })),
  };
}

const SESSIONS = `
  SELECT id, created_at AS "startedAt", expires_at AS "endsAt", password_at AS "passwordAt" FROM sessions
  WHERE person_id = :personId AND ended_at IS NULL AND expires_at > :now
  ORDER BY id = :sessionId DESC, created_at DESC`;
