import "server-only";

/** The body of a request; null when it is longer than the limit. The length header is only what the sender says. */
export async function readAtMost(request: Request, limitBytes: number): Promise<Buffer | null> {
  if (Number(request.headers.get("content-length") ?? 0) > limitBytes) return null;
  const parts: Uint8Array[] = [];
  let length = 0;
  const reader = request.body?.getReader();
  for (let read = await reader?.read(); read && !read.done; read = await reader!.read()) {
    length += read.value.length;
    if (length > limitBytes) {
      await reader!.cancel();
      return null;
    }
    parts.push(read.value);
  }
  return Buffer.concat(parts);
}
