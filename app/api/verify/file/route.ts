import { throttlePublic } from "@/lib/auth/throttlePublic";
import { LARGEST_PDF_BYTES } from "@/lib/certificates/verifyPdf";
import { verifyPublicFile } from "@/lib/queries/verifyPublicFile";

/** The PDF as the body. Read, answered, not kept. */
export async function POST(request: Request): Promise<Response> {
  if (!(await throttlePublic(request.headers))) return new Response("too many look-ups", { status: 429 });
  const length = Number(request.headers.get("content-length") ?? 0);
  if (length > LARGEST_PDF_BYTES) return new Response("a certificate is never this large", { status: 413 });
  const pdf = await readAtMost(request, LARGEST_PDF_BYTES);
  if (!pdf) return new Response("a certificate is never this large", { status: 413 });
  return Response.json(await verifyPublicFile(pdf), { headers: { "cache-control": "no-store" } });
}

/** The length header is only what the sender says. */
async function readAtMost(request: Request, limit: number): Promise<Uint8Array | null> {
  const parts: Uint8Array[] = [];
  let length = 0;
  const reader = request.body?.getReader();
  for (let read = await reader?.read(); read && !read.done; read = await reader!.read()) {
    length += read.value.length;
    if (length > limit) {
      await reader!.cancel();
      return null;
    }
    parts.push(read.value);
  }
  return Buffer.concat(parts);
}
