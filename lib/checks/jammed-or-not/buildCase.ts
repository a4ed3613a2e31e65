import type { BuiltCase, CheckPlan } from "../kind";
import { csvFile } from "../receiver-log/csvFile";
import { nmeaFile } from "../receiver-log/nmeaFile";
import { drawCase, type JammedOrNotTruth } from "./drawCase";
import type { JammedOrNotParameters } from "./parameters";
import { COLUMNS_FILE, LOG_FILE, publicCase } from "./publicCase";

/** One log with its form and its two files. */
export function buildCase(seedHex: string, plan: CheckPlan<JammedOrNotParameters>): BuiltCase<JammedOrNotTruth> {
  const built = buildWithoutFiles(seedHex, plan);
  const { log, columns } = built.truth;
  const instruments = csvFile(COLUMNS_FILE, log, [
    { name: "gain_control_db", values: columns.gainDb, decimals: 1 },
    { name: "clock_ns", values: columns.clockNs, decimals: 1 },
    { name: "east_m", values: columns.eastM, decimals: 1 },
    { name: "north_m", values: columns.northM, decimals: 1 },
    { name: "up_m", values: columns.upM, decimals: 1 },
    { name: "doppler_mean_hz", values: columns.dopplerMeanHz, decimals: 2 },
    { name: "doppler_deviation_hz", values: columns.dopplerSpreadHz, decimals: 2 },
  ]);
  return { ...built, files: [nmeaFile(LOG_FILE, log), instruments] };
}

/** The files say what stands in the public case already; the release check does without them. */
export function buildWithoutFiles(
  seedHex: string,
  plan: CheckPlan<JammedOrNotParameters>,
): BuiltCase<JammedOrNotTruth> {
  const { truth, draws } = drawCase(seedHex, plan.parameters);
  return { truth, publicCase: publicCase(truth, plan), files: [], draws };
}
