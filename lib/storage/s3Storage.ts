import "server-only";
import type { S3Client } from "@aws-sdk/client-s3";
import { checkStorageKey } from "./checkStorageKey";
import type { Storage } from "./storage";

/** A bucket of any S3-compatible service; keys of the service come from the environment, as its SDK reads them. */
export function s3Storage(url: URL): Storage {
  const Bucket = url.hostname;
  const prefix = url.pathname.replace(/^\/+|\/+$/g, "");
  const place = (key: string) => ({ Bucket, Key: [prefix, checkStorageKey(key)].filter(Boolean).join("/") });
  let client: Promise<S3Client> | undefined;
  const connect = () => (client ??= newClient(url));
  return {
    async put(key, bytes, mediaType) {
      const at = place(key);
      const { PutObjectCommand } = await sdk();
      await (await connect()).send(new PutObjectCommand({ ...at, Body: bytes, ContentType: mediaType }));
    },
    async get(key) {
      const at = place(key);
      const { GetObjectCommand, NoSuchKey } = await sdk();
      try {
        const { Body } = await (await connect()).send(new GetObjectCommand(at));
        return Body ? await Body.transformToByteArray() : new Uint8Array();
      } catch (error) {
        if (error instanceof NoSuchKey) return null;
        throw error;
      }
    },
    async delete(key) {
      const at = place(key);
      const { DeleteObjectCommand } = await sdk();
      await (await connect()).send(new DeleteObjectCommand(at));
    },
  };
}

// Loaded at first use: an installation on local disk never pays for it.
const sdk = () => import("@aws-sdk/client-s3");

async function newClient(url: URL): Promise<S3Client> {
  const { S3Client } = await sdk();
  const endpoint = url.searchParams.get("endpoint") ?? undefined;
  return new S3Client({
    region: url.searchParams.get("region") ?? "us-east-1",
    endpoint,
    forcePathStyle: endpoint !== undefined,
    // Other services than the first one often refuse the newer checksum headers.
    requestChecksumCalculation: "WHEN_REQUIRED",
    responseChecksumValidation: "WHEN_REQUIRED",
  });
}
