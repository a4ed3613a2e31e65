// `npm run -s engine -- SUBCOMMAND ...`: the computing core on the command line; answers are JSON lines on standard output.
// Exit code 0 when done, 2 when the call itself is wrong (with a sentence on standard error), 1 when something else fails.
import { once } from "node:events";
import type { Print, Subcommand } from "./engine/Subcommand";
import { UsageError } from "./engine/UsageError";

// Loaded when asked for, so that one subcommand does not wait for the code of another.
const SUBCOMMANDS: Readonly<Record<string, () => Promise<Subcommand>>> = {
  codes: async () => (await import("./engine/codes")).codes,
  case: async () => (await import("./engine/case")).drawCase,
  mark: async () => (await import("./engine/mark")).mark,
  search: async () => (await import("./engine/search")).search,
};

// A reader such as `head` that has seen enough closes the pipe; that is no failure.
process.stdout.on("error", (error: NodeJS.ErrnoException) => process.exit(error.code === "EPIPE" ? 0 : 1));

const print: Print = async (line) => {
  if (!process.stdout.write(`${JSON.stringify(line)}\n`)) await once(process.stdout, "drain");
};

try {
  const [name, ...args] = process.argv.slice(2);
  if (name === undefined || !Object.hasOwn(SUBCOMMANDS, name))
    throw new UsageError(
      `engine: ${name ?? "nothing"} is no subcommand; there is ${Object.keys(SUBCOMMANDS).join(", ")}`,
    );
  await (
    await SUBCOMMANDS[name]!()
  )(args, print);
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = error instanceof UsageError ? 2 : 1;
}
