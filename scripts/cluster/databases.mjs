import { randomBytes } from "node:crypto";
import fs from "node:fs";
import path from "node:path";
import { mustRun } from "../setup/run.mjs";
import { paths, SUPERUSER } from "./server.mjs";

const ROLES = ["lagmark_owner", "lagmark_web", "lagmark_worker"];

/** Makes the three roles of the product once; each has a password of its own, kept beside the data folder. */
export async function createRoles(bin, folder) {
  const file = path.join(folder, "roles.json");
  const known = fs.existsSync(file);
  const passwords = known ? JSON.parse(fs.readFileSync(file, "utf8")) : newPasswords();
  const rows = ROLES.map((role) => `('${role}', '${passwords[role]}')`).join(", ");
  await sql(bin, folder, "postgres", [
    `SELECT format('CREATE ROLE %I LOGIN', role) FROM (VALUES ${rows}) AS wanted (role, password)`,
    "  WHERE role NOT IN (SELECT rolname FROM pg_roles) \\gexec",
    // Only with a new file: the passwords of an old one are already set.
    known
      ? ""
      : `SELECT format('ALTER ROLE %I PASSWORD %L', role, password) FROM (VALUES ${rows}) AS wanted (role, password) \\gexec`,
  ]);
  if (!known) fs.writeFileSync(file, JSON.stringify(passwords), { mode: 0o600 });
  return passwords;
}

/** Makes a database owned by the owner role, closed to everybody else but the other two. */
export async function createDatabase(bin, folder, name) {
  await sql(bin, folder, "postgres", [
    `SELECT 'CREATE DATABASE ${name} OWNER lagmark_owner'`,
    `  WHERE NOT EXISTS (SELECT FROM pg_database WHERE datname = '${name}') \\gexec`,
    `REVOKE ALL ON DATABASE ${name} FROM PUBLIC;`,
    `GRANT CONNECT ON DATABASE ${name} TO lagmark_web, lagmark_worker;`,
  ]);
}

export const dropDatabase = (bin, folder, name) =>
  sql(bin, folder, "postgres", [`DROP DATABASE IF EXISTS ${name} WITH (FORCE);`]);

/** Statements go in on standard input, so that no password stands in the list of processes. */
export async function sql(bin, folder, database, lines) {
  const at = paths(folder);
  const port = fs.readFileSync(at.port, "utf8");
  const args = ["-qAtX", "-v", "ON_ERROR_STOP=1", "-h", "127.0.0.1", "-p", port, "-U", SUPERUSER, "-d", database];
  const env = {
    ...process.env,
    PGPASSWORD: fs.readFileSync(at.password, "utf8"),
    PGOPTIONS: "",
    PGCONNECT_TIMEOUT: "30",
  };
  return mustRun("A statement of the set-up", path.join(bin, "psql"), args, { env, input: `${lines.join("\n")}\n` });
}

const newPasswords = () => Object.fromEntries(ROLES.map((role) => [role, randomBytes(18).toString("base64url")]));
