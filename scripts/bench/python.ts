import { spawnSync } from "node:child_process";

const CANDIDATES = ["python3", "/usr/bin/python3"]; // the first on the path may be one without Debian's packages
const VERSIONS = "import numpy, scipy; print('numpy', numpy.__version__, 'scipy', scipy.__version__)";

/** The Python that has numpy and scipy, with their versions; null when none has. */
export function findPython(): { command: string; versions: string } | null {
  for (const command of CANDIDATES) {
    const probe = spawnSync(command, ["-c", VERSIONS], { encoding: "utf8" });
    if (probe.status === 0) return { command, versions: probe.stdout.trim() };
  }
  return null;
}

/** The same for who needs the command alone. @throws Error when there is none */
export function pythonCommand(): string {
  const python = findPython();
  if (!python) throw new Error("pythonCommand: no python3 with numpy and scipy");
  return python.command;
}
