import { acquire, type Capture, type SatelliteSearch, type SearchSettings } from "@/lib/gnss/acquire";
import { readCapture } from "../captureFiles";
import type { Answers, CaseFile, PublicCase } from "../kind";
import { offWholeKilohertz } from "./offWholeKilohertz";
import type { Verdict } from "./quantities";
import { LARGEST_CELL_LOSS_DB, STRONG_FROM_DBHZ, unborrowedPeak } from "./unborrowedPeak";

const SAME_DOPPLER_HZ = 50;
const LEAST_BELOW_PARENT_DB = 18; // no pair of codes agrees better than 19.4 dB under the peak

/** The right method, from the public case and its files: search, then ask of every weak peak whether it is borrowed. */
export function solve({ publicCase, files }: { publicCase: PublicCase; files: readonly CaseFile[] }): Answers {
  const capture = readCapture(files);
  const settings = publicCase.data.search as SearchSettings;
  const weakestDbHz = publicCase.data.weakestDbHz as number;
  const report = publicCase.data.report as { prn: number; tracked: boolean }[];
  const searched = acquire(capture, { ...settings, prns: report.map(({ prn }) => prn) });
  const strong = searched.filter(({ found, cn0DbHz }) => found && cn0DbHz >= STRONG_FROM_DBHZ);
  const parent = strong.reduce((a, b) => (b.cn0DbHz > a.cn0DbHz ? b : a));
  const verdictOf = ({ prn, tracked }: { prn: number; tracked: boolean }): Verdict => {
    const search = searched.find((candidate) => candidate.prn === prn);
    if (search && isGenuine(capture, settings, search, strong, weakestDbHz)) return "genuine";
    return tracked ? "cross-correlation" : "absent";
  };
  const verdicts = report.map((line) => ({ prn: line.prn, verdict: verdictOf(line) }));
  const victim = verdicts.find(({ verdict }) => verdict === "cross-correlation");
  const falsePeak = searched.find(({ prn }) => prn === victim?.prn);
  return {
    ...verdictAnswers(verdicts),
    "falseLock.parent": String(parent.prn),
    "falseLock.doppler": falsePeak?.dopplerHz.toFixed(0) ?? "",
    "falseLock.cn0": falsePeak?.cn0DbHz.toFixed(1) ?? "",
    "falseLock.test": "doppler-modulo",
    "falseLock.remedy": "compare",
  };
}

export const verdictAnswers = (verdicts: readonly { prn: number; verdict: Verdict }[]): Answers =>
  Object.fromEntries(verdicts.map(({ prn, verdict }) => [`verdicts.prn${prn}`, verdict]));

/** The highest peak is its own, or there is one as high as a genuine satellite's where no strong satellite can put one. */
function isGenuine(
  capture: Capture,
  settings: SearchSettings,
  search: SatelliteSearch,
  strong: readonly SatelliteSearch[],
  weakestDbHz: number,
): boolean {
  if (!search.found) return false;
  const borrowed = strong.some(
    ({ prn, dopplerHz, cn0DbHz }) =>
      prn !== search.prn &&
      cn0DbHz - search.cn0DbHz >= LEAST_BELOW_PARENT_DB &&
      offWholeKilohertz(search.dopplerHz, dopplerHz) <= SAME_DOPPLER_HZ,
  );
  if (!borrowed) return search.cn0DbHz >= weakestDbHz - LARGEST_CELL_LOSS_DB;
  return unborrowedPeak(capture, search.prn, settings, strong).cn0DbHz >= weakestDbHz - LARGEST_CELL_LOSS_DB;
}
