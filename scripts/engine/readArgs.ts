import { parseArgs, type ParseArgsConfig } from "node:util";
import { UsageError } from "./UsageError";

/** `parseArgs` of Node, strict; what it refuses is a fault of the call. Positions are always allowed. */
export function readArgs<T extends NonNullable<ParseArgsConfig["options"]>>(usage: string, args: string[], options: T) {
  try {
    return parseArgs({ args, options, allowPositionals: true, strict: true });
  } catch (error) {
    // Only the first sentence: the rest is advice on how to pass a position that begins with a dash.
    const reason = error instanceof Error ? error.message.split(". ")[0]! : String(error);
    throw new UsageError(`${reason.replace(/\.?$/, "")}; usage: ${usage}`);
  }
}
