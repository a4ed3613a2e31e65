"use server";
import { revalidatePath } from "next/cache";
import { z } from "zod";
import { personAction } from "@/lib/auth/action";
import { actOnJob } from "@/lib/commands/actOnJob";

const acted = z.object({
  job: z.uuid(),
  act: z.enum(["try again", "leave"]),
  reason: z.string().trim().max(1000, "Write at most 1000 characters.").default(""),
});

export const actOnJobAction = personAction(acted, async ({ job, act, reason }, person) => {
  await actOnJob(person, { jobId: job, act, reason });
  revalidatePath("/operator/stopped-jobs");
});
