import { beforeEach, expect } from "vitest";
import "./settings";

// One process has one role. Tests of the worker's tasks are the worker, all others are the web process.
const isWorker = /[/\\]worker[/\\]|\.worker\.test\./.test(expect.getState().testPath ?? "");
const needed = isWorker ? "WORKER_DATABASE_URL" : "DATABASE_URL";
for (const name of ["OWNER_DATABASE_URL", needed]) {
  if (!process.env[name]) throw new Error(`${name} is not set: run the database tests through npm test`);
}
delete process.env[isWorker ? "DATABASE_URL" : "WORKER_DATABASE_URL"];

// The connections stay open from file to file; they end with the process.
const { emptyTables } = await import("./emptyTables");

beforeEach(emptyTables);
