import { route } from "@/lib/auth/route";
import { NotFoundError } from "@/lib/errors";
import { getReleaseCheck } from "@/lib/queries/getReleaseCheck";

/** How the checks of a draft stand with their release check, and how far a running one is. */
export const GET = route<{ employer: string; id: string }>(async ({ params, actor }) => {
  const view = await getReleaseCheck(actor, params.id);
  if (!view) throw new NotFoundError("module");
  return view;
});
