"use server";
import { revalidatePath } from "next/cache";
import { redirect } from "next/navigation";
import { z } from "zod";
import { action } from "@/lib/auth/action";
import { judgeWritten } from "@/lib/commands/judgeWritten";

const verdict = z.object({ of: z.string().min(1).max(40), within: z.boolean(), reason: z.string().max(1000) }).strict();

/** The form sends its verdicts as one text, since their number differs from check to check. */
const verdicts = z
  .string()
  .max(20_000)
  .transform((text, context): unknown => {
    try {
      return JSON.parse(text);
    } catch {
      context.addIssue({ code: "custom", message: "Judge every line of this case." });
      return z.NEVER;
    }
  })
  .pipe(z.array(verdict).min(1).max(40));

const judgement = z.object({ case: z.uuid(), verdicts });

export const judgeWrittenAction = action(judgement, async ({ case: caseId, verdicts: judged }, actor) => {
  await judgeWritten(actor, { caseId, verdicts: judged });
  revalidatePath(`/${actor.employerSlug}/queue`, "layout");
  redirect(`/${actor.employerSlug}/records/${caseId}`);
});
