import "server-only";
import { verifyPassword } from "@/lib/passwords";
import { signInInput } from "@/lib/schemas/people";
import { Person } from "@/models";
import { fromAddress } from "./fromAddress";
import { forgive, throttle, type Limit } from "./throttle";

const QUARTER_HOUR = 900;
/** Common practice, no source: a person who mistypes gets on, a program that guesses does not. */
const FROM_ONE_PLACE: Limit = { points: 8, seconds: QUARTER_HOUR };
/** A firm's people share an address; so does a list of stolen passwords that is tried out from one machine. */
const FROM_THE_MACHINE: Limit = { points: 60, seconds: QUARTER_HOUR };
/** Guesses at one account from many places. A mailed link still lets its owner in. */
const AT_THE_ACCOUNT: Limit = { points: 60, seconds: 3600 };

/**
 * Who signs in with this address and password; null when they do not belong together.
 * @throws ThrottledError before anything is looked up
 */
export async function signInWithPassword(
  given: unknown,
  headers: Pick<Headers, "get">,
): Promise<{ id: string } | null> {
  const { data } = signInInput.safeParse(given);
  if (!data) return null;
  const counts: [string, Limit][] = [
    fromAddress(`sign-in ${data.email}`, headers, FROM_ONE_PLACE),
    fromAddress("sign-in", headers, FROM_THE_MACHINE),
    [`sign-in ${data.email}`, AT_THE_ACCOUNT],
  ];
  // Counted before the password is looked at, so that guesses made at once do not slip through together.
  for (const [key, limit] of counts) await throttle(key, limit);
  const person = await Person.findOne({ where: { email: data.email } });
  if (!(await verifyPassword(person?.passwordHash ?? null, data.password)) || !person) return null;
  for (const [key, limit] of counts) await forgive(key, limit);
  return { id: person.id };
}
