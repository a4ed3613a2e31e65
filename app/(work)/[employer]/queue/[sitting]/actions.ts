"use server";
import { revalidatePath } from "next/cache";
import { z } from "zod";
import { action } from "@/lib/auth/action";
import { decide } from "@/lib/commands/decide";

const decision = z.object({
  sitting: z.uuid(),
  outcome: z.enum(["competent", "not yet competent"], "Choose an outcome."),
  reason: z.string().trim().min(1, "Give your reasons.").max(4000),
  declaration: z.string().trim().min(1).max(500),
});

export const decideAction = action(decision, async ({ sitting, ...signed }, actor) => {
  await decide(actor, { sittingId: sitting, ...signed });
  revalidatePath(`/${actor.employerSlug}/queue`, "layout");
});
