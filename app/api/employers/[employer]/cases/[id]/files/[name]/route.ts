import { route } from "@/lib/auth/route";
import { NotFoundError } from "@/lib/errors";
import { getCaseFile } from "@/lib/queries/getCaseFile";

/** A file of a case. It never changes, so the browser may keep it. */
export const GET = route<{ employer: string; id: string; name: string }>(async ({ request, params, actor }) => {
  const file = await getCaseFile(actor, params.id, params.name);
  if (!file) throw new NotFoundError("file");
  const etag = `"${file.sha256}"`;
  if (request.headers.get("if-none-match") === etag) return new Response(null, { status: 304, headers: { etag } });
  return new Response(new Uint8Array(file.bytes), {
    headers: {
      "content-type": file.mediaType,
      "content-length": String(file.bytes.length),
      "content-disposition": `attachment; filename="${params.name}"`,
      "cache-control": "private, max-age=86400",
      etag,
    },
  });
});
