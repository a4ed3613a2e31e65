import { createServer, type Server } from "node:http";
import type { AddressInfo } from "node:net";

/** What a bucket of an S3-compatible service does with PUT, GET and DELETE of one object (path style). */
export async function startBucket() {
  const objects = new Map<string, { bytes: Buffer; mediaType: string }>();
  const server = createServer(async (request, response) => {
    const key = new URL(request.url ?? "/", "http://bucket").pathname;
    const chunks: Buffer[] = [];
    for await (const chunk of request) chunks.push(chunk as Buffer);
    const stored = objects.get(key);
    if (!request.headers.authorization?.startsWith("AWS4-HMAC-SHA256 ")) response.writeHead(403).end();
    else if (request.method === "PUT") {
      objects.set(key, { bytes: Buffer.concat(chunks), mediaType: request.headers["content-type"] ?? "" });
      response.writeHead(200, { etag: '"1"' }).end();
    } else if (request.method === "DELETE") {
      objects.delete(key);
      response.writeHead(204).end();
    } else if (stored) response.writeHead(200, { "content-type": stored.mediaType }).end(stored.bytes);
    else {
      response.writeHead(404, { "content-type": "application/xml" });
      response.end("<?xml version='1.0'?><Error><Code>NoSuchKey</Code><Message>no such key</Message></Error>");
    }
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const { port } = server.address() as AddressInfo;
  return { objects, endpoint: `http://127.0.0.1:${port}`, close: () => closeServer(server) };
}

const closeServer = (server: Server) =>
  new Promise<void>((resolve) => {
    server.closeAllConnections();
    server.close(() => resolve());
  });
