import type { SatelliteSearch } from "@/lib/gnss/acquire";
import type { SceneSatellite } from "@/lib/gnss/scene";
import { formatQuantity } from "../formatQuantity";
import type { Marking } from "../kind";
import { signalText } from "../signalText";
import { acceptedFalsePeaks, type FalseLockTruth, type ListedSatellite } from "./drawScene";
import { REFERENCE_SEARCH } from "./referenceSearch";
import { LARGEST_CELL_LOSS_DB, type GridPeak } from "./unborrowedPeak";

/** What the server's own search of the capture gives; `weakPeak` is the weak satellite's, away from all false peaks. */
export type Measured = { searched: readonly SatelliteSearch[]; weakPeak: GridPeak | null };

/** What was put into the capture and what the two codes predict, beside what the server's own search measures. */
export function workingsOf(truth: FalseLockTruth, measured: Measured): Marking["workings"] {
  const { coherentMs, sums, dopplerStepHz, dopplerHalfWidthHz } = REFERENCE_SEARCH;
  const { searched, weakPeak } = measured;
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
      value: `${putIn(present.get(satellite.prn))}; ${searchText(searched.find(({ prn }) => prn === satellite.prn))}`,
    })),
    ...(weakPeak
      ? [{ label: `PRN ${truth.weakPrn} where no false peak can lie`, value: weakText(truth, weakPeak) }]
      : []),
    { label: "Scene and search", value: agreement(truth, measured) },
  ];
}

const putIn = (signal: SceneSatellite | undefined) => (signal ? `put in ${signalText(signal)}` : "not put in");

function searchText(search: SatelliteSearch | undefined): string {
  if (!search) return "not searched";
  return search.found ? `highest peak measured ${signalText(search)}` : "no peak above the threshold";
}

/** A scene and a search that differ by more than a tolerance mean that one of them is wrong: said, never hidden. */
function agreement(truth: FalseLockTruth, measured: Measured): string {
  const apart = truth.listed.filter((satellite) => !agrees(truth, satellite, measured));
  if (apart.length === 0) return "agree for all satellites of the sky plot";
  return `differ by more than the tolerance for PRN ${apart.map(({ prn }) => prn).join(", ")}`;
}

function agrees(truth: FalseLockTruth, { prn, verdict }: ListedSatellite, { searched, weakPeak }: Measured): boolean {
  const search = searched.find((candidate) => candidate.prn === prn);
  const signal = truth.scene.satellites.find((candidate) => candidate.prn === prn);
  // Its highest peak may be a false one even when it is there.
  if (prn === truth.weakPrn) return weakPeak !== null && weakPeak.cn0DbHz >= leastSeenDbHz(truth) === Boolean(signal);
  if (signal) return near(search, signal.dopplerHz, signal.cn0DbHz);
  if (verdict === "absent") return search !== undefined;
  return acceptedFalsePeaks(truth).some(({ dopplerHz, apparentCn0DbHz }) => near(search, dopplerHz, apparentCn0DbHz));
}

const near = (search: SatelliteSearch | undefined, dopplerHz: number, cn0DbHz: number): boolean =>
  search !== undefined &&
  search.found &&
  Math.abs(search.dopplerHz - dopplerHz) <= 50 &&
  Math.abs(search.cn0DbHz - cn0DbHz) <= 1.5;

const leastSeenDbHz = ({ weakestDbHz }: FalseLockTruth) => weakestDbHz - LARGEST_CELL_LOSS_DB;

const weakText = (truth: FalseLockTruth, peak: GridPeak) =>
  `highest cell ${signalText(peak)}; a signal shows ${formatQuantity(leastSeenDbHz(truth), "dB-Hz", 1)} or more`;
