import { spawn } from "node:child_process";
import { once } from "node:events";
import { createInterface } from "node:readline";
import { pythonCommand } from "./python";

/** The reference's process; one thread, whatever its libraries would like. */
export type Twin = {
  /** Does the work once. @returns seconds as it measured them itself */
  run(): Promise<number>;
  /** What the last run gave. */
  result(): Promise<unknown>;
  end(): void;
};

export async function startTwin(script: string, folder: string): Promise<Twin> {
  const single = { OMP_NUM_THREADS: "1", OPENBLAS_NUM_THREADS: "1", MKL_NUM_THREADS: "1" };
  const twin = spawn(pythonCommand(), [script, folder], {
    stdio: ["pipe", "pipe", "inherit"],
    env: { ...process.env, ...single, PYTHONDONTWRITEBYTECODE: "1" },
  });
  const lines = createInterface({ input: twin.stdout });
  const answers = lines[Symbol.asyncIterator]();
  const answer = async () => {
    const { value, done } = await answers.next();
    if (done) {
      const [code] = twin.exitCode === null ? await once(twin, "exit") : [twin.exitCode];
      throw new Error(`bench: the reference ${script} ended with code ${code}`);
    }
    return JSON.parse(value);
  };
  const ask = (what: string) => {
    twin.stdin.write(`${what}\n`);
    return answer();
  };
  await answer(); // ready
  return {
    run: async () => (await ask("run")).seconds,
    result: async () => (await ask("result")).result,
    end: () => twin.stdin.end(),
  };
}
