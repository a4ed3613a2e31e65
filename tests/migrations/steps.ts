import { readdirSync } from "node:fs";
import { createRequire } from "node:module";
import path from "node:path";
import type { PoolClient } from "pg";

type Step = { up: Run; down: Run };
type Run = (q: { sequelize: { query: (sql: string) => Promise<unknown> } }) => Promise<unknown>;

const folder = path.resolve(import.meta.dirname, "../../migrations");
const load = createRequire(import.meta.url);
const STEPS = readdirSync(folder)
  .filter((name) => /^\d{14}-.*\.js$/.test(name))
  .sort()
  .map((name) => load(path.join(folder, name)) as Step);

const through = (client: PoolClient) => ({ sequelize: { query: (sql: string) => client.query(sql) } });

export async function runUp(client: PoolClient): Promise<void> {
  for (const step of STEPS) await step.up(through(client));
}

export async function runDown(client: PoolClient): Promise<void> {
  for (const step of [...STEPS].reverse()) await step.down(through(client));
}
