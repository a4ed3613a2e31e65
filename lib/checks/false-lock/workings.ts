import type { SatelliteSearch } from "@/lib/gnss/acquire";
import type { SceneSatellite } from "@/lib/gnss/scene";
import { formatQuantity } from "../formatQuantity";
import type { Marking } from "../kind";
import { acceptedFalsePeaks, type FalseLockTruth, type ListedSatellite } from "./drawScene";
import { REFERENCE_SEARCH } from "./referenceSearch";
import { LARGEST_CELL_LOSS_DB, type GridPeak } from "./unborrowedPeak";

/** What the server's own search of the capture gives; `weakPeak` is the weak satellite's, away from all false peaks. */
export type Measured = { searched: readonly SatelliteSearch[]; weakPeak: GridPeak | null };

type Signal = { codePhaseChips: number; dopplerHz: number; cn0DbHz: number };
type ByPrn = ReadonlyMap<number, SatelliteSearch>;

/** What was put into the capture and what the two codes predict, beside what the server's own search measures. */
export function workingsOf(truth: FalseLockTruth, { searched, weakPeak }: Measured): Marking["workings"] {
  const { coherentMs, sums, dopplerStepHz, dopplerHalfWidthHz } = REFERENCE_SEARCH;
  const measured: ByPrn = new Map(searched.map((search) => [search.prn, search]));
  const present = new Map(truth.scene.satellites.map((satellite) => [satellite.prn, satellite]));
  const accepted = acceptedFalsePeaks(truth);
  return [
    {
      label: "Search by the server",
      value: `${coherentMs}\u00a0ms × ${sums}, bins of ${dopplerStepHz}\u00a0Hz, ±${formatQuantity(dopplerHalfWidthHz, "Hz", 0)}`,
    },
    {
      label: "Pair of codes",
      value: `PRN ${truth.parentPrn} seen through the code of PRN ${truth.victimPrn}, at most ${formatQuantity(accepted[0].levelDb, "dB", 1)}`,
    },
    ...accepted.map(({ dopplerHz, apparentCn0DbHz }, n) => ({
      label: `False peak ${n + 1} of ${accepted.length} that count`,
      value: `${formatQuantity(dopplerHz, "Hz", 0)}, ${formatQuantity(apparentCn0DbHz, "dB-Hz", 1)}`,
    })),
    ...truth.listed.map((satellite) => ({
      label: `PRN ${satellite.prn}`,
      value: `${putIn(present.get(satellite.prn))}; ${searchText(measured.get(satellite.prn))}`,
    })),
    ...(weakPeak
      ? [{ label: `PRN ${truth.weakPrn} where no false peak can lie`, value: weakText(truth, weakPeak) }]
      : []),
    { label: "Scene and search", value: agreement(truth, present, measured) },
  ];
}

const signalText = ({ codePhaseChips, dopplerHz, cn0DbHz }: Signal) =>
  [
    formatQuantity(codePhaseChips, "chip", 2),
    formatQuantity(dopplerHz, "Hz", 0),
    formatQuantity(cn0DbHz, "dB-Hz", 1),
  ].join(", ");

const putIn = (signal: SceneSatellite | undefined) => (signal ? `put in ${signalText(signal)}` : "not put in");

function searchText(search: SatelliteSearch | undefined): string {
  if (!search) return "not searched";
  return search.found ? `highest peak measured ${signalText(search)}` : "no peak above the threshold";
}

/** A scene and a search that differ by more than a tolerance mean that one of them is wrong: said, never hidden. */
function agreement(truth: FalseLockTruth, present: ReadonlyMap<number, SceneSatellite>, measured: ByPrn): string {
  const apart = truth.listed.filter((satellite) => {
    const search = measured.get(satellite.prn);
    const signal = present.get(satellite.prn);
    if (signal && satellite.reportedCn0DbHz !== null)
      return !search?.found || !near(search, signal.dopplerHz, signal.cn0DbHz);
    return satellite.verdict === "cross-correlation" && !search?.found
      ? true
      : !agreesWithCodes(truth, satellite, search);
  });
  if (apart.length === 0) return "agree for all satellites of the sky plot";
  return `differ by more than the tolerance for PRN ${apart.map(({ prn }) => prn).join(", ")}`;
}

/** The victim's highest peak is one of the predicted ones; a weak or absent satellite's may be its own or a false one. */
const agreesWithCodes = (truth: FalseLockTruth, satellite: ListedSatellite, search: SatelliteSearch | undefined) =>
  satellite.verdict !== "cross-correlation" ||
  acceptedFalsePeaks(truth).some(
    ({ dopplerHz, apparentCn0DbHz }) => search !== undefined && near(search, dopplerHz, apparentCn0DbHz),
  );

const near = (search: SatelliteSearch, dopplerHz: number, cn0DbHz: number) =>
  Math.abs(search.dopplerHz - dopplerHz) <= 50 && Math.abs(search.cn0DbHz - cn0DbHz) <= 1.5;

function weakText({ weakestDbHz }: FalseLockTruth, peak: GridPeak): string {
  const least = formatQuantity(weakestDbHz - LARGEST_CELL_LOSS_DB, "dB-Hz", 1);
  return `highest cell ${signalText(peak)}; a signal shows ${least} or more`;
}
