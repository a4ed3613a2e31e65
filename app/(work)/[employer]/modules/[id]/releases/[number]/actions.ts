"use server";
import { revalidatePath } from "next/cache";
import { z } from "zod";
import { action } from "@/lib/auth/action";
import { assignRelease } from "@/lib/commands/assignRelease";

const assignment = z.object({
  release: z.uuid(),
  technician: z.uuid("Choose a technician."),
  dueOn: z.iso.date("Give a day."),
  exposureNote: z.string().trim().max(1000, "Write at most 1000 characters.").optional(),
});

export const assignReleaseAction = action(assignment, async ({ release, technician, dueOn, exposureNote }, actor) => {
  const order = { releaseId: release, technicianId: technician, dueOn, exposureNote: exposureNote || null };
  const { id } = await assignRelease(actor, order);
  revalidatePath(`/${actor.employerSlug}/modules`, "layout");
  return { id };
});
