import path from "node:path";
import { TYPESCRIPT } from "./demonstration.mjs";
import { mustRun } from "./run.mjs";

/** Brings a database up to date as its owner: the product's tables, then the job queue's. */
export async function prepareDatabase(root, env) {
  await migrate(root, env, "db:migrate");
  await prepareJobs(root, env);
}

/** @param step a command of sequelize-cli: db:migrate, db:migrate:undo:all */
export const migrate = (root, env, step) =>
  mustRun(step, "node", [path.join("node_modules", "sequelize-cli", "lib", "sequelize"), step], { cwd: root, env });

export const prepareJobs = (root, env) =>
  mustRun("Preparing the job queue", "node", [...TYPESCRIPT, "scripts/prepare-jobs.ts"], { cwd: root, env });
