import { spawnSync } from "node:child_process";
import fs from "node:fs";
import os from "node:os";
import { Refusal } from "../setup/say.mjs";

/**
 * PostgreSQL refuses to run as root. Once the data folder exists its owner decides; a new one goes to the postgres
 * account, or, where that account cannot reach the folder, stays root's inside a user namespace that calls root 1000.
 * @returns {{ prefix: string[], owner: { uid: number, gid: number } | null }} words to put before every server command;
 *   owner is who must own the data folder, null when nothing has to be handed over
 */
export function serverAccount(folder, data) {
  if (process.getuid() !== 0) return ordinaryAccount(data);
  const owner = fs.existsSync(data) ? fs.statSync(data) : (postgresAccount(folder) ?? { uid: 0, gid: 0 });
  if (owner.uid !== 0) {
    const prefix = ["setpriv", `--reuid=${owner.uid}`, `--regid=${owner.gid}`, "--clear-groups", "env", "HOME=/"];
    return { prefix, owner: { uid: owner.uid, gid: owner.gid } };
  }
  const namespace = ["unshare", "-U", "--map-user=1000", "--map-group=1000"];
  if (succeeds([...namespace, "true"])) return { prefix: namespace, owner: null };
  throw new Refusal(
    `PostgreSQL cannot run as root, its account cannot reach ${folder}, and user namespaces are switched off.\n` +
      "Move the project to a folder that other accounts may enter, or start it as an ordinary user.",
  );
}

function ordinaryAccount(data) {
  if (fs.existsSync(data) && fs.statSync(data).uid !== process.getuid()) {
    throw new Refusal(
      `${data} belongs to another account (${fs.statSync(data).uid}) than yours (${os.userInfo().username}).\n` +
        "Start as that account or as root, or remove the folder to begin with an empty database.",
    );
  }
  return { prefix: [], owner: null };
}

function postgresAccount(folder) {
  const line = fs.readFileSync("/etc/passwd", "utf8").match(/^postgres:[^:]*:(\d+):(\d+):/m);
  if (!line) return null;
  const [uid, gid] = [Number(line[1]), Number(line[2])];
  const reaches = succeeds(["setpriv", `--reuid=${uid}`, `--regid=${gid}`, "--clear-groups", "test", "-x", folder]);
  return reaches ? { uid, gid } : null;
}

const succeeds = ([command, ...args]) => spawnSync(command, args, { cwd: "/", stdio: "ignore" }).status === 0;
