import "server-only";
import { actorAt } from "@/lib/policies/actorAt";
import { homeOf } from "@/lib/policies/stations";
import { signedIn } from "./signedIn";

/** Where a signed-in person begins: the first station at the first employer, the account without one; null signed out. */
export async function homeAddress(): Promise<string | null> {
  const person = await signedIn();
  if (!person) return null;
  const actor = actorAt(person);
  return actor ? homeOf(actor) : "/account";
}
