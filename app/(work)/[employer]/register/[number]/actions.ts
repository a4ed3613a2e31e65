"use server";
import { revalidatePath } from "next/cache";
import { z } from "zod";
import { action } from "@/lib/auth/action";
import { setStanding } from "@/lib/commands/setStanding";
import { GROUNDS } from "@/lib/policies/standing";

const standing = z.object({
  number: z.string().max(20),
  act: z.enum(["suspend", "reinstate", "withdraw"], "Choose what to do."),
  ground: z.enum(GROUNDS, "Choose a ground."),
  reason: z.string().trim().min(1, "Give your reason.").max(4000),
  group: z.string().trim().min(1, "Type the second group of the number.").max(10),
});

export const setStandingAction = action(standing, async (act, actor) => {
  await setStanding(actor, act);
  revalidatePath(`/${actor.employerSlug}/register`, "layout");
});
