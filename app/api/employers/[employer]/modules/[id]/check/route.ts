import { z } from "zod";
import { readBody } from "@/lib/auth/readBody";
import { route } from "@/lib/auth/route";
import { checkDraft } from "@/lib/queries/checkDraft";

const draft = z.object({ source: z.string().max(70_000) }).strict();

/** Reads a draft as it stands in the editor: problems with their places, and the tree for the preview. Stores nothing. */
export const POST = route<{ employer: string; id: string }>(async ({ request, params, actor }) =>
  checkDraft(actor, params.id, (await readBody(request, draft, { stored: false })).source),
);
