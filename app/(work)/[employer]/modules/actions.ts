"use server";
import { revalidatePath } from "next/cache";
import { redirect } from "next/navigation";
import { z } from "zod";
import { action } from "@/lib/auth/action";
import { createModule } from "@/lib/commands/createModule";
import { releaseModule } from "@/lib/commands/releaseModule";

const begun = z.object({
  code: z
    .string()
    .trim()
    .max(24)
    .regex(/^[A-Z0-9]+(-[A-Z0-9]+)*$/, "A code is capitals, figures and dashes, as SBW-R2."),
  title: z.string().trim().min(1, "Give it a title.").max(120),
});

export const createModuleAction = action(begun, async (module, actor) => {
  const { id } = await createModule(actor, module);
  redirect(`/${actor.employerSlug}/modules/${id}`);
});

const release = z.object({
  module: z.uuid(),
  revision: z.coerce.number<string>().int().min(1),
  kind: z.enum(["editorial", "minor", "major"], "Choose what kind of release it is."),
  reason: z.string().trim().min(1, "Say what changed and why.").max(2000),
});

export const releaseModuleAction = action(release, async ({ module, ...order }, actor) => {
  const { number } = await releaseModule(actor, { moduleId: module, ...order });
  revalidatePath(`/${actor.employerSlug}/modules`, "layout");
  redirect(`/${actor.employerSlug}/modules/${module}/releases/${number}`);
});
