import { pdfDownload } from "@/lib/auth/pdfDownload";
import { throttlePublic } from "@/lib/auth/throttlePublic";
import { getPublicVerificationFile } from "@/lib/queries/getPublicVerificationRecord";

/** The signed record of a verification, for whoever knows its id, on the day it was asked for. */
export async function GET(request: Request, { params }: { params: Promise<{ id: string }> }): Promise<Response> {
  if (!(await throttlePublic(request.headers))) return new Response("too many look-ups", { status: 429 });
  const file = await getPublicVerificationFile((await params).id);
  if (!file) return new Response("No such record, or not signed yet", { status: 404 });
  return pdfDownload(file.pdf, `verification-${file.number}-${file.signedAt.slice(0, 10)}.pdf`);
}
