import "server-only";
import type { Actor } from "@/lib/policies/actor";
import { actorAt } from "@/lib/policies/actorAt";
import { signedIn } from "./signedIn";

/** Who asks on a page that needs no account; null when signed out or without a role there. */
export async function optionalActor(employerSlug?: string): Promise<Actor | null> {
  const person = await signedIn();
  return person && actorAt(person, employerSlug);
}
