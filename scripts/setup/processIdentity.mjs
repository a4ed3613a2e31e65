import fs from "node:fs";

/**
 * Number and start time of a process together: a number alone may belong to somebody else by now.
 * @returns {{ pid: number, started: string } | null} null when no such process lives
 */
export function processIdentity(pid) {
  try {
    const stat = fs.readFileSync(`/proc/${pid}/stat`, "utf8");
    // Fields after the name, which may hold spaces and brackets: state is the 1st, start time the 20th (proc(5)).
    const fields = stat.slice(stat.lastIndexOf(")") + 2).split(" ");
    return fields[0] === "Z" ? null : { pid, started: fields[19] };
  } catch {
    return null;
  }
}

export const isAlive = (identity) => processIdentity(identity.pid)?.started === identity.started;
