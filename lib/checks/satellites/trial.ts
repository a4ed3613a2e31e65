import { expectedDetection } from "../search-trial/expectedDetection";
import { drawNoisePeak } from "../search-trial/drawNoisePeak";
import { drawPatch } from "../search-trial/drawPatch";
import { meanLossDb, readPatch } from "../search-trial/readPatch";
import type { SceneSatellite } from "@/lib/gnss/scene";
import { SEARCH_LAGS, searchDopplersHz } from "@/lib/gnss/searchSettings";
import { decibels } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { guessAnswers } from "../guessAnswers";
import type { Trial } from "../kind";
import { ALL_PRNS } from "../searchCapture";
import { drawScene, mustBeFound, type SatellitesTruth } from "./drawScene";
import { markAnswers } from "./markAnswers";
import type { SatellitesParameters } from "./parameters";
import { publicCase } from "./publicCase";
import { REFERENCE_SEARCH } from "./referenceSearch";
import { answersFor, LISTED_BELOW_DB, type Listed } from "./solve";

const LEAST_DETECTION = 0.999;
const WIDE_RATE_HZ = 4_092_000;
/** Power of a C/A code inside +-1.023 MHz, which a search keeps, to that inside +-2.046 MHz: 0.903 to 0.950. */
const WIDE_LOSS_DB = -decibels(0.903 / 0.95);

/** A search without its samples: only the cells around each signal are drawn, and the highest of all that hold noise. */
export const satellitesTrial: Trial<SatellitesParameters, SatellitesTruth> = {
  whole: false,
  build(seedHex, plan) {
    const { truth, draws } = drawScene(seedHex, plan.parameters);
    return { truth, publicCase: publicCase(truth, plan), files: [], draws };
  },
  judge: ({ truth }, plan, answers) => markAnswers(truth, plan, answers, []),
  solve: ({ truth }) => answersFor(truth.scene.satellites.filter(mustBeFound(truth))),
  read: ({ truth }, _plan, random) => answersFor(readList(truth, random)),
  guess: (shown, _plan, random) =>
    guessAnswers(
      shown.sections,
      {
        "search.bin": [50, 500],
        "satellites.prn": (own) => String(own.pick(ALL_PRNS)),
        "satellites.codePhase": [0, 1023],
        "satellites.doppler": [-(shown.data.windowHz as number), shown.data.windowHz as number],
        "satellites.cn0": [32, 46],
      },
      random,
      random.integer(4, 8),
    ),
  difficulty({ truth }) {
    const required = truth.scene.satellites.filter(mustBeFound(truth));
    const settings = { ...REFERENCE_SEARCH, dopplerHalfWidthHz: truth.windowHz };
    const chances = required.map((satellite) => expectedDetection(satellite, settings));
    return [
      { label: "satellites that must be found", unit: "1", value: required.length, from: 3, to: 12 },
      {
        label: "chance that the weakest of them is found",
        unit: "1",
        value: Math.min(...chances),
        from: LEAST_DETECTION,
        to: 1,
      },
    ];
  },
};

/** What a search of the whole window lists: all that stands high enough to be one of those asked for. */
function readList(truth: SatellitesTruth, random: Random): Listed[] {
  const { scene, foundFromDbHz } = truth;
  const listed = scene.satellites.map((satellite) => ({ prn: satellite.prn, ...readSignal(satellite, truth, random) }));
  // The codes of others raise nothing as high: 45 dB-Hz at most, and no two codes agree better than -19.4 dB.
  return [...listed, highestNoise(truth, random)]
    .filter(({ cn0DbHz }) => cn0DbHz >= foundFromDbHz - LISTED_BELOW_DB)
    .sort((a, b) => a.prn - b.prn);
}

/** The highest cell in the grids of all satellites that are not there. */
function highestNoise({ scene, windowHz }: SatellitesTruth, random: Random): Listed {
  const absent = ALL_PRNS.filter((prn) => !scene.satellites.some((satellite) => satellite.prn === prn));
  const rows = searchDopplersHz({ ...REFERENCE_SEARCH, dopplerHalfWidthHz: windowHz }).length;
  const level = drawNoisePeak(absent.length * rows * SEARCH_LAGS, REFERENCE_SEARCH.sums, random);
  return { prn: random.pick(absent), codePhaseChips: 0, dopplerHz: 0, cn0DbHz: asCn0DbHz(level) };
}

function readSignal(satellite: SceneSatellite, { scene }: SatellitesTruth, random: Random) {
  const { coherentMs } = REFERENCE_SEARCH;
  const wideLossDb = scene.rateHz >= WIDE_RATE_HZ ? WIDE_LOSS_DB : 0;
  const received = { ...satellite, cn0DbHz: satellite.cn0DbHz - wideLossDb };
  const reading = readPatch(drawPatch(received, REFERENCE_SEARCH, random), coherentMs, random);
  return { ...reading, cn0DbHz: reading.cn0DbHz + meanLossDb(coherentMs) };
}

const asCn0DbHz = (level: number) => decibels((Math.max(1e-3, level - 1) * 1000) / REFERENCE_SEARCH.coherentMs);
