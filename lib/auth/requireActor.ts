import "server-only";
import { notFound } from "next/navigation";
import type { Actor } from "@/lib/policies/actor";
import { actorAt } from "@/lib/policies/actorAt";
import { requirePerson } from "./requirePerson";

/**
 * Who asks, as a person of this employer (of the first one when none is named). Signed out goes to sign in and comes
 * back; an employer at which the person holds no role looks like none at all.
 */
export const requireActor = async (employerSlug?: string): Promise<Actor> =>
  actorAt(await requirePerson(), employerSlug) ?? notFound();
