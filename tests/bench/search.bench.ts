import { writeFileSync } from "node:fs";
import path from "node:path";
import { searchSatellites } from "@/lib/gnss/search/searchSatellites";
import { searchSignalOf } from "@/lib/gnss/search/searchSignal";
import { gpsL1Ca } from "@/lib/gnss/signals/gpsL1Ca";
import { synthesizeCi8 } from "@/lib/gnss/synthesize";
import { seededRandom } from "@/lib/numeric/random";
import type { Bench } from "./bench";
import { eightSatellites } from "./eightSatellites";
import { createSearchWorkers } from "./searchWorkers";

const RATE_HZ = 4.092e6;
const SUMS = 10;
const REQUEST = {
  coherentMs: 1,
  sums: SUMS,
  dopplerHalfWidthHz: 5000,
  dopplerStepHz: 500,
  falseAlarmPerSearch: 1e-3,
};
const PRNS = Array.from({ length: 32 }, (_, n) => n + 1);

type Found = { prn: number; codePhaseChips: number; dopplerHz: number; cn0DbHz: number };

export const bench: Bench = {
  title: "search for GPS L1 C/A 1-32, +-5 kHz by 500 Hz, 10 x 1 ms, 4.092 Msps ci8",
  async prepare(folder) {
    const satellites = eightSatellites();
    const scene = { rateHz: RATE_HZ, durationMs: SUMS, ifHz: 0 as const, satellites };
    const { samples } = synthesizeCi8(scene, seededRandom("5e".repeat(32), "noise"));
    writeFileSync(path.join(folder, "capture.ci8"), samples);
    const inputs = {
      rateHz: RATE_HZ,
      sums: SUMS,
      halfWidthHz: 5000,
      stepHz: 500,
      falseAlarmPerSearch: 1e-3,
      prns: PRNS,
    };
    writeFileSync(path.join(folder, "inputs.json"), JSON.stringify(inputs));
    const capture = { samples, complex: true, rateHz: RATE_HZ, ifHz: 0 };
    const signal = searchSignalOf(gpsL1Ca);
    const workers = await createSearchWorkers(2);
    const found = (all: readonly (Found & { found: boolean })[]): Found[] => all.filter((one) => one.found);
    return {
      contenders: [
        { name: "one core", target: 1, run: () => found(searchSatellites(capture, signal, PRNS, REQUEST)) },
        { name: "two workers", target: 0.6, run: async () => found(await workers.search(capture, PRNS, REQUEST)) },
      ],
      differences: (ours, reference) =>
        ours.flatMap((one) => differences(one as Found[], reference as Found[], satellites)),
      close: () => workers.end(),
    };
  },
};

/** The same satellites, and no worse against the truth: within a tenth of a chip, 100 Hz and 2 dB wherever the reference is. */
function differences(ours: Found[], reference: Found[], truth: readonly Found[]): string[] {
  const names = (list: Found[]) => list.map(({ prn }) => prn).join(" ");
  if (names(ours) !== names(reference)) return [`ours found ${names(ours)}, the reference ${names(reference)}`];
  return ours.flatMap((one, n) => {
    const real = truth.find(({ prn }) => prn === one.prn);
    if (!real) return [`PRN ${one.prn} is not in the scene`];
    const [mine, theirs] = [one, reference[n]].map((found) => ({
      chips: Math.abs(found.codePhaseChips - real.codePhaseChips),
      hertz: Math.abs(found.dopplerHz - real.dopplerHz),
      decibels: Math.abs(found.cn0DbHz - real.cn0DbHz),
    }));
    const worse: string[] = [];
    if (mine.chips > theirs.chips + 0.1) worse.push(`code phase off by ${mine.chips}, reference ${theirs.chips} chips`);
    if (mine.hertz > theirs.hertz + 100) worse.push(`Doppler off by ${mine.hertz}, reference ${theirs.hertz} Hz`);
    if (mine.decibels > theirs.decibels + 2)
      worse.push(`C/N0 off by ${mine.decibels}, reference ${theirs.decibels} dB`);
    return worse.map((what) => `PRN ${one.prn}: ${what}`);
  });
}
