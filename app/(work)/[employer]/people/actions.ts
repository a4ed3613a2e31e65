"use server";
import "server-only";
import { revalidatePath } from "next/cache";
import { action } from "@/lib/auth/action";
import { addPerson } from "@/lib/commands/addPerson";
import { endRole } from "@/lib/commands/endRole";
import { grantRole } from "@/lib/commands/grantRole";
import { recordTraining } from "@/lib/commands/recordTraining";
import type { Actor } from "@/lib/policies/actor";
import { addPersonInput, endRoleInput, grantRoleInput, recordTrainingInput } from "@/lib/schemas/people";

const show = (actor: Actor) => revalidatePath(`/${actor.employerSlug}/people`);

export const addPersonAction = action(addPersonInput, async (newcomer, actor) => {
  await addPerson(actor, newcomer);
  show(actor);
});

export const grantRoleAction = action(grantRoleInput, async (grant, actor) => {
  await grantRole(actor, grant);
  show(actor);
});

export const endRoleAction = action(endRoleInput, async ({ grantId }, actor) => {
  await endRole(actor, grantId);
  show(actor);
});

export const recordTrainingAction = action(recordTrainingInput, async (training, actor) => {
  await recordTraining(actor, training);
  show(actor);
});
