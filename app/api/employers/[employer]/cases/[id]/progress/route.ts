import { route } from "@/lib/auth/route";
import { NotFoundError } from "@/lib/errors";
import { getCaseProgress } from "@/lib/queries/getCaseProgress";

/** How far building or marking has come. */
export const GET = route<{ employer: string; id: string }>(async ({ params, actor }) => {
  const progress = await getCaseProgress(actor, params.id);
  if (!progress) throw new NotFoundError("case");
  return progress;
});
