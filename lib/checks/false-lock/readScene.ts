import type { SceneSatellite } from "@/lib/gnss/scene";
import { SEARCH_LAGS, searchDopplersHz } from "@/lib/gnss/searchSettings";
import { decibels } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import type { Answers } from "../kind";
import { drawNoisePeak } from "../search-trial/drawNoisePeak";
import { drawPatch, type Patch } from "../search-trial/drawPatch";
import { highestCell, readPatch } from "../search-trial/readPatch";
import { acceptedFalsePeaks, type FalseLockTruth, type ListedSatellite } from "./drawScene";
import { CLEAR_OF_WEAKEST_DB, LARGEST_OWN_ERROR_DB, LARGEST_OWN_ERROR_HZ } from "./isReadable";
import { RIGHT_REMEDIES, RIGHT_TESTS, type Verdict } from "./quantities";
import { REFERENCE_SEARCH } from "./referenceSearch";
import { verdictAnswers } from "./solve";
import type { FalsePeakPlace } from "./strongestFalsePeaks";
import { LARGEST_CELL_LOSS_DB, STRONG_FROM_DBHZ } from "./unborrowedPeak";

const MOST_REDRAWS = 200;
/** No two C/A codes agree better (65 of 1023 chips, at any whole lag and equal Doppler). */
const HIGHEST_CROSS_PEAK_DB = -19.4;
const EYE_DB = 0.1;
/**
 * What the highest of several false peaks has lost on average, and a competent person adds: 1.2 dB to data bits and between cells
 * (`meanLossDb`), less what it owes to the noise that made it the highest; measured on drawn patches.
 */
const LOSS_OF_HIGHEST_DB = 0.5;

/** A capture as a competent person reads it in the search asked for. Its noise is drawn as the builder accepts it. */
export function readScene(truth: FalseLockTruth, random: Random): Answers {
  const falsePeak = drawUntil(
    random,
    () => drawFalsePeak(truth, random),
    (drawn) => showsFalsePeak(truth, drawn),
  );
  const verdicts = truth.listed.map(({ prn, verdict }) => ({
    prn,
    verdict: readVerdict(truth, { prn, verdict }, random),
  }));
  const read = readPatch(falsePeak.patch, REFERENCE_SEARCH.coherentMs, random);
  return {
    ...verdictAnswers(verdicts),
    "falseLock.parent": String(truth.parentPrn),
    "falseLock.doppler": read.dopplerHz.toFixed(0),
    "falseLock.cn0": (read.cn0DbHz + LOSS_OF_HIGHEST_DB).toFixed(1),
    "falseLock.test": random.pick(RIGHT_TESTS),
    "falseLock.remedy": random.pick(RIGHT_REMEDIES),
  };
}

/** As the builder does, a capture that does not show what it must is drawn again. */
function drawUntil<D>(random: Random, draw: () => D, accept: (drawn: D) => boolean): D {
  let drawn = draw();
  for (let n = 1; n < MOST_REDRAWS && !accept(drawn); n++) drawn = draw();
  return drawn;
}

type DrawnPeak = { place: FalsePeakPlace; patch: Patch };

/** The highest of the false peaks; a person who searches sees that one first. */
function drawFalsePeak(truth: FalseLockTruth, random: Random): DrawnPeak {
  const parent = truth.scene.satellites.find(({ prn }) => prn === truth.parentPrn)!;
  const drawn = truth.falsePeaks.map((place): DrawnPeak => {
    // Its lag is any between the cells; its data bits are the strong satellite's.
    const codePhaseChips = parent.codePhaseChips + random.uniform();
    const signal = { ...parent, codePhaseChips, dopplerHz: place.dopplerHz, cn0DbHz: place.apparentCn0DbHz };
    return { place, patch: drawPatch(signal, REFERENCE_SEARCH, random) };
  });
  return drawn.reduce((a, b) => (highestCell(b.patch).power > highestCell(a.patch).power ? b : a));
}

const showsFalsePeak = (truth: FalseLockTruth, { place, patch }: DrawnPeak): boolean =>
  acceptedFalsePeaks(truth).includes(place) &&
  Math.abs(highestCell(patch).dopplerHz - place.dopplerHz) <=
    LARGEST_OWN_ERROR_HZ + REFERENCE_SEARCH.dopplerStepHz / 2 &&
  Math.abs(patch.refinedDbHz - place.apparentCn0DbHz) <= LARGEST_OWN_ERROR_DB;

/** There is a peak as high as a genuine satellite's where no strong satellite can put one, or there is none. */
function readVerdict(
  truth: FalseLockTruth,
  { prn, verdict }: Pick<ListedSatellite, "prn" | "verdict">,
  random: Random,
): Verdict {
  const signal = truth.scene.satellites.find((satellite) => satellite.prn === prn);
  const seenFromDbHz = truth.weakestDbHz - LARGEST_CELL_LOSS_DB;
  const limitDbHz = signal ? seenFromDbHz + CLEAR_OF_WEAKEST_DB / 2 : seenFromDbHz - CLEAR_OF_WEAKEST_DB;
  const level = signal
    ? drawUntil(
        random,
        () => signalLevel(signal, random),
        (drawn) => drawn >= limitDbHz,
      )
    : drawUntil(
        random,
        () => emptyLevel(truth, random),
        (drawn) => prn !== truth.weakPrn || drawn <= limitDbHz,
      );
  if (level + EYE_DB * random.gaussian() >= seenFromDbHz) return "genuine";
  return verdict === "genuine" ? "absent" : verdict;
}

const signalLevel = (signal: SceneSatellite, random: Random): number =>
  asCn0DbHz(highestCell(drawPatch(signal, REFERENCE_SEARCH, random)).power);

/** Noise, or the false peak of a satellite that is not taken for a strong one, whichever is higher. */
function emptyLevel({ scene }: FalseLockTruth, random: Random): number {
  const cells = searchDopplersHz(REFERENCE_SEARCH).length * SEARCH_LAGS;
  const noise = asCn0DbHz(drawNoisePeak(cells, REFERENCE_SEARCH.sums, random));
  const others = scene.satellites.filter(({ cn0DbHz }) => cn0DbHz < STRONG_FROM_DBHZ);
  if (others.length === 0) return noise;
  const strongest = others.reduce((a, b) => (b.cn0DbHz > a.cn0DbHz ? b : a));
  return Math.max(noise, signalLevel({ ...strongest, cn0DbHz: strongest.cn0DbHz + HIGHEST_CROSS_PEAK_DB }, random));
}

const asCn0DbHz = (level: number) => decibels((Math.max(1e-3, level - 1) * 1000) / REFERENCE_SEARCH.coherentMs);
