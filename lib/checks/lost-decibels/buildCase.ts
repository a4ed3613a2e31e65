import { csvFile } from "../receiver-log/csvFile";
import { nmeaFile } from "../receiver-log/nmeaFile";
import type { BuiltCase, CheckPlan } from "../kind";
import { drawCase, type LostDecibelsTruth } from "./drawCase";
import type { LostDecibelsParameters } from "./parameters";
import { COLUMNS_FILE, LOG_FILE, publicCase } from "./publicCase";

/** One log with its form and its two files. */
export function buildCase(seedHex: string, plan: CheckPlan<LostDecibelsParameters>): BuiltCase<LostDecibelsTruth> {
  const built = buildWithoutFiles(seedHex, plan);
  const { log, gainDb, currentMa } = built.truth;
  const columns = csvFile(COLUMNS_FILE, log, [
    { name: "gain_control_db", values: gainDb, decimals: 1 },
    { name: "antenna_current_ma", values: currentMa, decimals: 1 },
  ]);
  return { ...built, files: [nmeaFile(LOG_FILE, log), columns] };
}

/** The files say what stands in the public case already; the release check does without them. */
export function buildWithoutFiles(
  seedHex: string,
  plan: CheckPlan<LostDecibelsParameters>,
): BuiltCase<LostDecibelsTruth> {
  const { truth, draws } = drawCase(seedHex, plan.parameters);
  return { truth, publicCase: publicCase(truth, plan), files: [], draws };
}
