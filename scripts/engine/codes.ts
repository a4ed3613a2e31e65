import { createHash } from "node:crypto";
import { isSignalName, loadSignal, SIGNAL_NAMES } from "@/lib/gnss/signals/registry";
import { readArgs } from "./readArgs";
import type { Print } from "./Subcommand";
import { UsageError } from "./UsageError";

const USAGE = "engine codes SIGNAL";

/** `codes SIGNAL`: one line per satellite with a fingerprint of its code, to compare with another program's. */
export async function codes(args: string[], print: Print): Promise<void> {
  const { positionals } = readArgs(USAGE, args, {});
  const [name, ...more] = positionals;
  if (name === undefined || more.length > 0) throw new UsageError(`one signal, please; usage: ${USAGE}`);
  if (!isSignalName(name))
    throw new UsageError(`codes: no codes of ${name} here; the signals are ${SIGNAL_NAMES.join(", ")}`);
  const signal = await loadSignal(name);
  for (const prn of signal.prns) {
    const levels = signal.code(prn);
    const ascii = levels.map((level) => 48 + level);
    await print({
      prn,
      length: levels.length,
      sha256: createHash("sha256").update(ascii).digest("hex"),
      first24Octal: octal(levels.subarray(0, 24)),
      last24Octal: octal(levels.subarray(-24)),
      ones: levels.reduce((sum, level) => sum + level, 0),
    });
  }
}

/** Chips as octal digits, three each, the first chip in the highest place. */
function octal(levels: Uint8Array): string {
  let digits = "";
  for (let n = 0; n < levels.length; n += 3) digits += 4 * levels[n] + 2 * levels[n + 1] + levels[n + 2];
  return digits;
}
