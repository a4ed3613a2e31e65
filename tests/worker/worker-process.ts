import { type ChildProcess, spawn } from "node:child_process";
import { mkdtemp, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { pathToFileURL } from "node:url";
import { freshIssuer } from "./issuer-keys";
import { PUBLIC_ORIGIN, SEED_KEY } from "./tools";

const root = path.resolve(import.meta.dirname, "../..");

/** All that a worker process is given, with files and keys of the test's own. */
export async function workerSettings(SMTP_URL: string): Promise<Record<string, string>> {
  const folder = await mkdtemp(path.join(tmpdir(), "worker-"));
  const issuer = await freshIssuer();
  const files = { key: issuer.keyPem, certificate: issuer.certificatePem, root: issuer.rootPem };
  for (const [name, pem] of Object.entries(files)) await writeFile(path.join(folder, `${name}.pem`), pem);
  return {
    WORKER_DATABASE_URL: process.env.WORKER_DATABASE_URL!,
    PUBLIC_ORIGIN,
    SMTP_URL,
    MAIL_FROM: "Register <register@lagmark.example>",
    ISSUER_KEY_FILE: path.join(folder, "key.pem"),
    ISSUER_CERTIFICATE_FILE: path.join(folder, "certificate.pem"),
    ISSUER_ROOT_FILE: path.join(folder, "root.pem"),
    SEED_KEY,
    STORAGE_URL: pathToFileURL(path.join(folder, "files")).href,
  };
}

/** The worker as it runs in earnest: a process of its own. */
export class WorkerProcess {
  output = "";
  #child: ChildProcess;
  readonly ended: Promise<{ code: number | null; signal: string | null }>;

  private constructor(settings: Record<string, string>) {
    const args = ["--import", "./scripts/register.mjs", "lib/worker/main.ts"];
    const env = { PATH: process.env.PATH, ...settings } as unknown as NodeJS.ProcessEnv;
    this.#child = spawn(process.execPath, args, { cwd: root, env });
    for (const stream of [this.#child.stdout!, this.#child.stderr!])
      stream.setEncoding("utf8").on("data", (text: string) => (this.output += text));
    this.ended = new Promise((resolve) => this.#child.once("exit", (code, signal) => resolve({ code, signal })));
  }

  /** Resolves when it says that it is ready. */
  static async start(settings: Record<string, string>): Promise<WorkerProcess> {
    const worker = new WorkerProcess(settings);
    await Promise.race([worker.#ready(), worker.ended]);
    if (!worker.output.includes("worker ready")) throw new Error(`the worker did not start:\n${worker.output}`);
    return worker;
  }

  kill(signal: "SIGKILL" | "SIGTERM") {
    this.#child.kill(signal);
    return this.ended;
  }

  #ready(): Promise<void> {
    return new Promise((resolve) => {
      this.#child.stdout!.on("data", () => this.output.includes("worker ready") && resolve());
    });
  }
}
