"use server";
import { redirect } from "next/navigation";
import { z } from "zod";
import { action } from "@/lib/auth/action";
import { openCase } from "@/lib/commands/openCase";

const wanted = z.object({ sitting: z.uuid(), check: z.string().min(1).max(64) });

export const openCaseAction = action(wanted, async ({ sitting, check }, actor) => {
  const { id } = await openCase(actor, { sittingId: sitting, checkId: check });
  redirect(`/${actor.employerSlug}/cases/${id}`);
});
