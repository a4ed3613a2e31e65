import { SignInAfreshError } from "@/lib/errors";

const AFRESH_MS = 5 * 60_000;

/** Signing needs the password given within the last five minutes of this very session. */
export function requireAfresh(actor: { passwordAt: Date | null }, now: Date): Date {
  const givenAt = actor.passwordAt;
  if (!givenAt || !(now.getTime() - givenAt.getTime() <= AFRESH_MS)) throw new SignInAfreshError();
  return givenAt;
}
