import type { SatelliteSearch } from "@/lib/gnss/acquire";
import { CA_LENGTH_CHIPS } from "@/lib/gnss/constants";
import { clockErrorHz } from "@/lib/gnss/doppler";
import { circularDifference } from "../circularDifference";
import { formatQuantity } from "../formatQuantity";
import type { Marking } from "../kind";
import { signalText, type Signal } from "../signalText";
import { mustBeFound, type SatellitesTruth } from "./drawScene";
import { REFERENCE_SEARCH } from "./referenceSearch";

/** What was put into the capture beside what the server's own search measures in it. */
export function workingsOf(truth: SatellitesTruth, searched: readonly SatelliteSearch[]): Marking["workings"] {
  const { scene, clockPpm, windowHz } = truth;
  const { coherentMs, sums, dopplerStepHz } = REFERENCE_SEARCH;
  const measured = new Map(searched.map((search) => [search.prn, search]));
  const present = new Set(scene.satellites.map(({ prn }) => prn));
  const ghosts = searched.filter(({ prn, found }) => found && !present.has(prn));
  return [
    {
      label: "Common offset",
      value: `${formatQuantity(clockPpm, "ppm", 2)}, ${formatQuantity(clockErrorHz(clockPpm), "Hz", 0)}`,
    },
    {
      label: "Search by the server",
      value: `${coherentMs}\u00a0ms × ${sums}, bins of ${dopplerStepHz}\u00a0Hz, ±${formatQuantity(windowHz, "Hz", 0)}`,
    },
    ...scene.satellites.map((satellite) => ({
      label: `PRN ${satellite.prn}${mustBeFound(truth)(satellite) ? "" : " (extra)"}`,
      value: `put in ${signalText(satellite)}; ${searchText(measured.get(satellite.prn))}`,
    })),
    ...ghosts.map((search) => ({ label: `PRN ${search.prn}`, value: `not put in; ${searchText(search)}` })),
    { label: "Scene and search", value: agreement(truth, measured) },
  ];
}

function searchText(search: SatelliteSearch | undefined): string {
  if (!search) return "not searched";
  return search.found ? `measured ${signalText(search)}` : "no peak above the threshold";
}

/** A scene and a search that differ by more than a tolerance mean that one of them is wrong: said, never hidden. */
function agreement(truth: SatellitesTruth, measured: ReadonlyMap<number, SatelliteSearch>): string {
  const required = truth.scene.satellites.filter(mustBeFound(truth));
  const apart = required.filter((satellite) => {
    const search = measured.get(satellite.prn);
    return !search?.found || !agrees(satellite, search);
  });
  if (apart.length === 0) return `agree for all ${required.length} satellites that must be found`;
  return `differ by more than the tolerance for PRN ${apart.map(({ prn }) => prn).join(", ")}`;
}

const agrees = (scene: Signal, search: Signal) =>
  Math.abs(circularDifference(scene.codePhaseChips, search.codePhaseChips, CA_LENGTH_CHIPS)) <= 0.5 &&
  Math.abs(scene.dopplerHz - search.dopplerHz) <= REFERENCE_SEARCH.dopplerStepHz / 2 &&
  Math.abs(scene.cn0DbHz - search.cn0DbHz) <= 2;
