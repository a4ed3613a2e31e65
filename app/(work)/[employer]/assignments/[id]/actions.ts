"use server";
import { redirect } from "next/navigation";
import { z } from "zod";
import { action } from "@/lib/auth/action";
import { startSitting } from "@/lib/commands/startSitting";

export const startSittingAction = action(z.object({ assignment: z.uuid() }), async ({ assignment }, actor) => {
  const { id } = await startSitting(actor, assignment);
  redirect(`/${actor.employerSlug}/sittings/${id}`);
});
