"use server";
import { revalidatePath } from "next/cache";
import { z } from "zod";
import { action } from "@/lib/auth/action";
import { actOnReview } from "@/lib/commands/actOnReview";
import { reviewMarking } from "@/lib/commands/reviewMarking";

const asked = z.object({ marking: z.string().min(1).max(80) });

export const reviewMarkingAction = action(asked, async ({ marking }, actor) => {
  await reviewMarking(actor, marking);
  revalidatePath(`/${actor.employerSlug}/modules/corrections`);
});

const acted = z.object({
  review: z.uuid(),
  sitting: z.uuid(),
  act: z.enum(["mark again", "leave"]),
  reason: z.string().trim().max(2000, "Write at most 2000 characters.").default(""),
});

export const actOnReviewAction = action(acted, async ({ review, sitting, act, reason }, actor) => {
  await actOnReview(actor, { reviewId: review, sittingId: sitting, act, reason });
  revalidatePath(`/${actor.employerSlug}/modules/corrections`);
});
