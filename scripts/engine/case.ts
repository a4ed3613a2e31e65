import { createHash } from "node:crypto";
import { readFileSync } from "node:fs";
import { mkdir, writeFile } from "node:fs/promises";
import path from "node:path";
import { ENGINE_VERSION } from "@/lib/checks/engineVersion";
import type { CheckKind, CheckPlan } from "@/lib/checks/kind";
import { readParameters } from "@/lib/checks/readParameters";
import { KINDS, kindOf } from "@/lib/checks/registry";
import { readArgs } from "./readArgs";
import type { Print } from "./Subcommand";
import { UsageError } from "./UsageError";

const USAGE = "engine case KIND --seed HEX [--version N] [--plan FILE.json] [--out FOLDER]";
const OPTIONS = {
  seed: { type: "string" },
  version: { type: "string" },
  plan: { type: "string" },
  out: { type: "string" },
} as const;

/**
 * `case KIND --seed HEX`: the case of that seed again, bit for bit: what its technician sees, what is true, and the hash of
 * each file; `--out` writes the files. `--plan` is a check of a release as JSON; without it the kind's own defaults hold.
 */
export async function drawCase(args: string[], print: Print): Promise<void> {
  const { positionals, values } = readArgs(USAGE, args, OPTIONS);
  const [name, ...more] = positionals;
  if (name === undefined || more.length > 0) throw new UsageError(`one kind of check, please; usage: ${USAGE}`);
  if (!/^[0-9a-f]{64}$/i.test(values.seed ?? ""))
    throw new UsageError(`--seed is 64 hexadecimal digits; usage: ${USAGE}`);
  const kind = kindNamed(name, values.version);
  const plan = values.plan === undefined ? defaultPlan(kind) : planIn(values.plan, kind);
  const { publicCase, truth, files, draws } = kind.build(values.seed!.toLowerCase(), plan);
  for (const { name: file, bytes } of values.out === undefined ? [] : files) {
    await mkdir(values.out!, { recursive: true });
    await writeFile(path.join(values.out!, file), bytes);
  }
  await print({
    ...{ kind: kind.id, version: kind.version, engine: ENGINE_VERSION, draws, publicCase, truth },
    files: files.map(({ name: file, mediaType, bytes }) => ({
      ...{ name: file, mediaType, bytes: bytes.length },
      sha256: createHash("sha256").update(bytes).digest("hex"),
    })),
  });
}

function kindNamed(name: string, version: string | undefined): CheckKind {
  if (version !== undefined && !/^[1-9]\d{0,3}$/.test(version))
    throw new UsageError(`--version is a whole number, not ${version}`);
  try {
    return kindOf(name, version === undefined ? undefined : Number(version));
  } catch {
    const known = KINDS.map((kind) => `${kind.id}@${kind.version}`).join(", ");
    throw new UsageError(`case: no kind ${name}${version ? `@${version}` : ""}; the kinds are ${known}`);
  }
}

function defaultPlan(kind: CheckKind): CheckPlan {
  if (kind.quantities.length === 0)
    throw new UsageError(`case: what is asked by ${kind.id} stands in the check itself; give it with --plan`);
  const { parameters } = readParameters(kind.parameters, {});
  return {
    ...{ id: kind.id, kind: kind.id, version: kind.version, title: kind.title, minutes: kind.defaultMinutes },
    ...{ needs: null, parameters, quantities: [] },
  };
}

function planIn(file: string, kind: CheckKind): CheckPlan {
  const plan = JSON.parse(readFileSync(file, "utf8")) as CheckPlan;
  if (plan.kind !== kind.id || plan.version !== kind.version)
    throw new UsageError(
      `--plan ${file} is a check of ${plan.kind}@${plan.version}, not of ${kind.id}@${kind.version}`,
    );
  return plan;
}
