import fs from "node:fs";
import { mustRun } from "./run.mjs";
import { Refusal } from "./say.mjs";
import { onStop } from "./shutdown.mjs";

/** Installs Debian packages as root, without starting the services they bring; anybody else is told what to type. */
export async function installDebianPackages(names) {
  if (process.getuid() !== 0 || !fs.existsSync("/usr/bin/apt-get")) {
    throw new Refusal(
      `Not installed: ${names.join(", ")}. On Debian, type this once and start again:\n` +
        `  sudo apt-get update && sudo apt-get install -y --no-install-recommends ${names.join(" ")}`,
    );
  }
  const env = { ...process.env, DEBIAN_FRONTEND: "noninteractive" };
  const release = forbidServiceStarts();
  try {
    await mustRun("apt-get update", "apt-get", ["update"], { env });
    await mustRun("apt-get install", "apt-get", ["install", "-y", "--no-install-recommends", ...names], { env });
  } finally {
    release();
  }
}

/** Debian starts a server of its own on installing one; this project brings up its own and wants no second. */
function forbidServiceStarts() {
  const file = "/usr/sbin/policy-rc.d";
  if (fs.existsSync(file)) return () => {};
  fs.writeFileSync(file, "#!/bin/sh\nexit 101\n", { mode: 0o755 });
  const remove = () => fs.rmSync(file, { force: true });
  const forget = onStop(remove);
  return () => {
    forget();
    remove();
  };
}
