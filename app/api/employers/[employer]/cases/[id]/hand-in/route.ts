import { readBody } from "@/lib/auth/readBody";
import { route } from "@/lib/auth/route";
import { handIn } from "@/lib/commands/handIn";
import { handInInput } from "@/lib/schemas/answers";

/** Hand a case in, once and for good. */
export const POST = route<{ employer: string; id: string }>(async ({ request, params, actor }) =>
  handIn(actor, { caseId: params.id, ...(await readBody(request, handInInput)) }),
);
