import { writeFileSync } from "node:fs";
import path from "node:path";
import { synthesizeBlocks } from "@/lib/gnss/synthesize";
import { seededRandom } from "@/lib/numeric/random";
import type { Bench } from "./bench";
import { eightSatellites } from "./eightSatellites";
import { inFreshProcess } from "./inFreshProcess";

const RATE_HZ = 4.092e6;
const DURATION_MS = 1000;
const SEED = "5e".repeat(32);

/** One second, block by block, as a capture that goes to a file is made. @returns mean square of the samples */
export function synthesizeSecond(): number {
  let squares = 0;
  let counted = 0;
  const scene = { rateHz: RATE_HZ, durationMs: DURATION_MS, ifHz: 0 as const, satellites: eightSatellites() };
  for (const block of synthesizeBlocks(scene, seededRandom(SEED, "noise"))) {
    for (let n = 0; n < block.length; n += 97, counted++) squares += block[n] * block[n];
  }
  return squares / counted;
}

export const bench: Bench = {
  title: "synthesis of 1 s, 8 satellites, 4.092 Msps ci8",
  async prepare(folder) {
    const satellites = eightSatellites().map((one) => ({ ...one, dataBits: [...one.dataBits!] }));
    const inputs = { rateHz: RATE_HZ, durationMs: DURATION_MS, satellites };
    writeFileSync(path.join(folder, "inputs.json"), JSON.stringify(inputs));
    return {
      contenders: [{ name: "streamed", target: 0.25, run: () => synthesizeSecond() }],
      differences: ([power], reference) => {
        // The noise of the two comes from different dice: 84,000 values scatter by half a per cent.
        const ratio = (power as number) / (reference as { power: number }).power;
        return Math.abs(ratio - 1) < 0.02 ? [] : [`the power of the samples is ${ratio} of the reference's`];
      },
      notes: async () => {
        const { megabytes } = inFreshProcess("./synthesis.bench.ts", "synthesizeSecond");
        return [`peak memory of a process that does nothing else: ${megabytes.toFixed(0)} MB (limit 200)`];
      },
    };
  },
};
