import { acquire, searchGrid, type Capture, type SatelliteSearch, type SearchSettings } from "@/lib/gnss/acquire";
import { readCapture } from "../captureFiles";
import type { Answers, CaseFile, PublicCase } from "../kind";
import { offWholeKilohertz } from "./offWholeKilohertz";
import type { Verdict } from "./quantities";

const STRONG_FROM_DBHZ = 42; // weaker satellites raise no false peak that this search finds
const PARENT_FROM_DBHZ = 47;
const SAME_DOPPLER_HZ = 40;
const CLEAR_OF_PARENT_HZ = 160; // data bits spread its false peaks over 100 Hz to either side, and a bin is 50 Hz
const CLEAR_OF_STRONG_HZ = 75;
const LEAST_BELOW_PARENT_DB = 18; // no pair of codes agrees better than 19.4 dB under the peak

/** The right method, from the public case and its files: search, then ask of every weak peak whether it is borrowed. */
export function solve({ publicCase, files }: { publicCase: PublicCase; files: readonly CaseFile[] }): Answers {
  const capture = readCapture(files);
  const settings = publicCase.data.search as SearchSettings;
  const report = publicCase.data.report as { prn: number; tracked: boolean }[];
  const searched = acquire(capture, { ...settings, prns: report.map(({ prn }) => prn) });
  const strong = searched.filter(({ found, cn0DbHz }) => found && cn0DbHz >= STRONG_FROM_DBHZ);
  const parent = strong.reduce((a, b) => (b.cn0DbHz > a.cn0DbHz ? b : a));
  const verdictOf = ({ prn, tracked }: { prn: number; tracked: boolean }): Verdict => {
    const search = searched.find((candidate) => candidate.prn === prn);
    if (search && isGenuine(capture, settings, search, strong)) return "genuine";
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

/** The highest peak is its own, or there is another one above the threshold where no strong satellite can put one. */
function isGenuine(
  capture: Capture,
  settings: SearchSettings,
  search: SatelliteSearch,
  strong: readonly SatelliteSearch[],
): boolean {
  if (!search.found) return false;
  const borrowed = strong.some(
    ({ prn, dopplerHz, cn0DbHz }) =>
      prn !== search.prn &&
      cn0DbHz - search.cn0DbHz >= LEAST_BELOW_PARENT_DB &&
      offWholeKilohertz(search.dopplerHz, dopplerHz) <= SAME_DOPPLER_HZ,
  );
  if (!borrowed) return true;
  const { dopplersHz, power, threshold } = searchGrid(capture, search.prn, settings);
  const lags = power.length / dopplersHz.length;
  return power.some((level, cell) => {
    if (!(level > threshold)) return false;
    const rowHz = dopplersHz[Math.floor(cell / lags)];
    return strong.every((other) => offWholeKilohertz(rowHz, other.dopplerHz) > clearOf(other));
  });
}

const clearOf = ({ cn0DbHz }: SatelliteSearch) =>
  cn0DbHz >= PARENT_FROM_DBHZ ? CLEAR_OF_PARENT_HZ : CLEAR_OF_STRONG_HZ;
