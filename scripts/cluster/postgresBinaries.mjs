import { spawnSync } from "node:child_process";
import fs from "node:fs";
import path from "node:path";
import { installDebianPackages } from "../setup/installDebianPackages.mjs";
import { Refusal, say } from "../setup/say.mjs";

/** The folder with initdb, pg_ctl, postgres and psql; installs Debian's package where that is allowed. */
export async function postgresBinaries() {
  const found = findBinaries();
  if (found) return found;
  say("PostgreSQL is not installed yet; installing Debian's package ...");
  await installDebianPackages(["postgresql"]);
  const installed = findBinaries();
  if (!installed) throw new Refusal("Debian's postgresql package is installed but holds no server programs.");
  return installed;
}

function findBinaries() {
  const root = "/usr/lib/postgresql";
  const versions = fs.existsSync(root) ? fs.readdirSync(root).sort((a, b) => Number(b) - Number(a)) : [];
  const folders = [
    ...versions.map((version) => path.join(root, version, "bin")),
    ...(process.env.PATH ?? "").split(":"),
  ];
  return folders.find((folder) => ["initdb", "pg_ctl", "psql"].every((name) => isProgram(path.join(folder, name))));
}

/** A wrapper that only complains about a missing version is no program: it has to answer. */
const isProgram = (file) => fs.existsSync(file) && spawnSync(file, ["--version"], { stdio: "ignore" }).status === 0;
