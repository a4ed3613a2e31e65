import { z } from "zod";
import { readBody } from "@/lib/auth/readBody";
import { route } from "@/lib/auth/route";
import { saveDraft } from "@/lib/commands/saveDraft";

const draft = z
  .object({ source: z.string().max(70_000), title: z.string().trim().min(1).max(120), revision: z.int().min(1) })
  .strict();

/** Autosave of a draft. */
export const PUT = route<{ employer: string; id: string }>(async ({ request, params, actor }) =>
  saveDraft(actor, { moduleId: params.id, ...(await readBody(request, draft)) }),
);
