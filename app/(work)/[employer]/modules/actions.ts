"use server";
import { revalidatePath } from "next/cache";
import { redirect } from "next/navigation";
import { z } from "zod";
import { action } from "@/lib/auth/action";
import { askReleaseCheck } from "@/lib/commands/askReleaseCheck";
import { createModule } from "@/lib/commands/createModule";
import { releaseModule } from "@/lib/commands/releaseModule";
import { stopReleaseCheck } from "@/lib/commands/stopReleaseCheck";

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

const why = z.string().trim().max(2000);

const release = z.object({
  module: z.uuid(),
  revision: z.coerce.number<string>().int().min(1),
  kind: z.enum(["editorial", "minor", "major"], "Choose what kind of release it is."),
  reason: z.string().trim().min(1, "Say what changed and why.").max(2000),
  /** JSON: why a check, or the sitting, is released outside a bound. */
  outside: z
    .string()
    .max(40_000)
    .transform((text, context) => {
      try {
        return JSON.parse(text) as unknown;
      } catch {
        context.addIssue({ code: "custom", message: "The reasons cannot be read." });
        return z.NEVER;
      }
    })
    .pipe(z.strictObject({ checks: z.record(z.string().max(64), why), sitting: why })),
});

const tried = z.object({ module: z.uuid(), preview: z.enum(["yes", "no"]) });

export const askReleaseCheckAction = action(tried, async ({ module, preview }, actor) => {
  const { asked } = await askReleaseCheck(actor, { moduleId: module, preview: preview === "yes" });
  return { asked };
});

export const stopReleaseCheckAction = action(z.object({ module: z.uuid() }), async ({ module }, actor) =>
  stopReleaseCheck(actor, { moduleId: module }),
);

export const releaseModuleAction = action(release, async ({ module, ...order }, actor) => {
  const { number } = await releaseModule(actor, { moduleId: module, ...order });
  revalidatePath(`/${actor.employerSlug}/modules`, "layout");
  redirect(`/${actor.employerSlug}/modules/${module}/releases/${number}`);
});
