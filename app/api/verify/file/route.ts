import { readAtMost } from "@/lib/auth/readAtMost";
import { throttlePublic } from "@/lib/auth/throttlePublic";
import { LARGEST_PDF_BYTES } from "@/lib/certificates/verifyPdf";
import { verifyPublicFile } from "@/lib/queries/verifyPublicFile";

/** The PDF as the body. Read, answered, not kept. */
export async function POST(request: Request): Promise<Response> {
  if (!(await throttlePublic(request.headers))) return new Response("too many look-ups", { status: 429 });
  const pdf = await readAtMost(request, LARGEST_PDF_BYTES);
  if (!pdf) return new Response("a certificate is never this large", { status: 413 });
  return Response.json(await verifyPublicFile(pdf), { headers: { "cache-control": "no-store" } });
}
