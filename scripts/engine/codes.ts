import { createHash } from "node:crypto";
import { CODE_NAMES, isCodeName, loadCodes } from "@/lib/gnss/signals/registry";
import { readArgs } from "./readArgs";
import type { Print } from "./Subcommand";
import { UsageError } from "./UsageError";

const USAGE = "engine codes SIGNAL";

/** `codes SIGNAL`: one line per satellite with a fingerprint of its code, to compare with another program's. */
export async function codes(args: string[], print: Print): Promise<void> {
  const { positionals } = readArgs(USAGE, args, {});
  const [name, ...more] = positionals;
  if (name === undefined || more.length > 0) throw new UsageError(`one signal, please; usage: ${USAGE}`);
  if (!isCodeName(name))
    throw new UsageError(`codes: no codes of ${name} here; the signals are ${CODE_NAMES.join(", ")}`);
  const table = await loadCodes(name);
  for (const prn of table.prns) {
    const levels = table.code(prn);
    await print({
      prn,
      length: levels.length,
      ...fingerprint(levels),
      first24Octal: octal(levels.subarray(0, 24)),
      last24Octal: octal(levels.subarray(-24)),
    });
  }
}

/** Hash of the levels written as "0" and "1", and how many are 1; one plain loop, for the longest code has 767,250. */
function fingerprint(levels: Uint8Array): { sha256: string; ones: number } {
  const text = new Uint8Array(levels.length);
  let ones = 0;
  for (let n = 0; n < levels.length; n++) {
    text[n] = 48 + levels[n];
    ones += levels[n];
  }
  return { sha256: createHash("sha256").update(text).digest("hex"), ones };
}

/** Chips as octal digits, three each, the first chip in the highest place. */
function octal(levels: Uint8Array): string {
  let digits = "";
  for (let n = 0; n < levels.length; n += 3) digits += 4 * levels[n] + 2 * levels[n + 1] + levels[n + 2];
  return digits;
}
