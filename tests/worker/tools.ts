import { mkdtempSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { pathToFileURL } from "node:url";
import { openStorage } from "@/lib/storage/storage";
import { ownerRows } from "../support/owner";

export const SEED_KEY = Buffer.alloc(32, 7).toString("base64url");
export const PUBLIC_ORIGIN = "https://register.example";

/** Files on this machine, in a folder of the test's own. */
export const storage = openStorage(pathToFileURL(mkdtempSync(path.join(tmpdir(), "storage-"))).href);

export const stop = (why = "the process is killed here"): never => {
  throw new Error(why);
};

type QueuedJob = { data: Record<string, string>; startAfter: Date };

/** Jobs that wait in a queue, oldest first. */
export const queued = (name: string) =>
  ownerRows<QueuedJob>(
    `SELECT data, start_after AS "startAfter" FROM jobs.job WHERE name = $1 AND state = 'created' ORDER BY created_on, id`,
    [name],
  );

export const rowsOf = <Row extends object>(table: string) => ownerRows<Row>(`SELECT * FROM ${table}`);
