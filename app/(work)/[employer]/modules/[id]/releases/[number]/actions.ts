"use server";
import { revalidatePath } from "next/cache";
import { z } from "zod";
import { action } from "@/lib/auth/action";
import { assignRelease } from "@/lib/commands/assignRelease";

const assignment = z.object({
  release: z.uuid(),
  technician: z.uuid("Choose a technician."),
  dueOn: z.iso.date("Give a day."),
});

export const assignReleaseAction = action(assignment, async ({ release, technician, dueOn }, actor) => {
  const { id } = await assignRelease(actor, { releaseId: release, technicianId: technician, dueOn });
  revalidatePath(`/${actor.employerSlug}/modules`, "layout");
  return { id };
});
