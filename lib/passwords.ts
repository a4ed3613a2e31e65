import { hash, verify } from "@node-rs/argon2";
import { LONGEST_PASSWORD } from "@/lib/policies/passwordRule";

// OWASP Password Storage Cheat Sheet, Argon2id (the package's default kind): 19 MiB, two passes, one lane.
const SETTINGS = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** A password is the same whichever way a keyboard composes its letters. */
export const hashPassword = (password: string): Promise<string> => hash(password.normalize("NFKC"), SETTINGS);

/**
 * Whether the password belongs to the hash. Without a hash a dummy is verified, so that the time of the answer does not
 * tell whether there is such a person.
 */
export async function verifyPassword(passwordHash: string | null, password: string): Promise<boolean> {
  if (password.length > LONGEST_PASSWORD) return false;
  const against = passwordHash ?? (await (dummy ??= hashPassword("no password has this hash")));
  const fits = await verify(against, password.normalize("NFKC"));
  return fits && passwordHash !== null;
}

let dummy: Promise<string> | undefined;
