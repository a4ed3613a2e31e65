import { readBody } from "@/lib/auth/readBody";
import { route } from "@/lib/auth/route";
import { saveAnswers } from "@/lib/commands/saveAnswers";
import { saveAnswersInput } from "@/lib/schemas/answers";

/** Autosave of an open case. */
export const PUT = route<{ employer: string; id: string }>(async ({ request, params, actor }) =>
  saveAnswers(actor, { caseId: params.id, ...(await readBody(request, saveAnswersInput)) }),
);
