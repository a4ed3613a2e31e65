import "server-only";
import { storageEnv } from "@/lib/env";
import { diskStorage } from "./diskStorage";
import { s3Storage } from "./s3Storage";

export interface Storage {
  /** Stores the bytes under the key, whole or not at all; what was there is replaced. */
  put(key: string, bytes: Uint8Array, mediaType: string): Promise<void>;
  /** @returns null when nothing is stored under the key */
  get(key: string): Promise<Uint8Array | null>;
  /** Deleting what is not there is no error. */
  delete(key: string): Promise<void>;
}

let opened: Storage | undefined;

/** The file storage of this installation, as STORAGE_URL names it. */
export const storage = (): Storage => (opened ??= openStorage(storageEnv().STORAGE_URL));

/** @param address `file:///folder` or `s3://bucket/prefix?region=...&endpoint=...` */
export function openStorage(address: string): Storage {
  const url = new URL(address);
  if (url.protocol === "file:") return diskStorage(url);
  if (url.protocol === "s3:") return s3Storage(url);
  throw new Error(`openStorage: no driver for ${url.protocol}`);
}
