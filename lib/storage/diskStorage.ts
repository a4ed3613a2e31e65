import "server-only";
import { randomUUID } from "node:crypto";
import { mkdir, open, readFile, rename, rm } from "node:fs/promises";
import path from "node:path";
import { fileURLToPath } from "node:url";
import { checkStorageKey } from "./checkStorageKey";
import type { Storage } from "./storage";

/** Files below one folder of this machine; the media type is not kept, rows of the database know it. */
export function diskStorage(url: URL): Storage {
  const folder = fileURLToPath(url);
  const fileOf = (key: string) => path.join(folder, checkStorageKey(key));
  return {
    async put(key, bytes) {
      const file = fileOf(key);
      await mkdir(path.dirname(file), { recursive: true, mode: 0o700 });
      await writeWhole(file, bytes);
    },
    async get(key) {
      try {
        return new Uint8Array(await readFile(fileOf(key)));
      } catch (error) {
        if (isMissing(error)) return null;
        throw error;
      }
    },
    delete: (key) => rm(fileOf(key), { force: true }),
  };
}

/** Readers see the old bytes or the new ones, never a part, even when the machine stops in between. */
async function writeWhole(file: string, bytes: Uint8Array): Promise<void> {
  // A name that starts with a dot is no key, so it meets no stored file.
  const unfinished = path.join(path.dirname(file), `.${randomUUID()}`);
  try {
    const handle = await open(unfinished, "wx", 0o600);
    try {
      await handle.writeFile(bytes);
      await handle.sync();
    } finally {
      await handle.close();
    }
    await rename(unfinished, file);
  } catch (error) {
    await rm(unfinished, { force: true });
    throw error;
  }
}

const isMissing = (error: unknown) => error instanceof Error && "code" in error && error.code === "ENOENT";
