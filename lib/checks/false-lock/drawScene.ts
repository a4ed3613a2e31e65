import { clockErrorHz } from "@/lib/gnss/doppler";
import { falsePeaks } from "@/lib/gnss/falseLock";
import type { Scene, SceneSatellite } from "@/lib/gnss/scene";
import { seededRandom, type Random } from "@/lib/numeric/random";
import { drawRateHz } from "../capture-rate";
import { between, drawSatellite } from "../drawSatellite";
import { drawStart } from "../drawStart";
import { ALL_PRNS } from "../searchCapture";
import { drawBehindWall, drawInOpenSky, drawWall, type SkyPlace, type Wall } from "./sky";
import { expectedDetection } from "../search-trial/expectedDetection";
import { offWholeKilohertz } from "./offWholeKilohertz";
import type { FalseLockParameters } from "./parameters";
import type { Verdict } from "./quantities";
import { REFERENCE_SEARCH, RESOLUTION_HZ } from "./referenceSearch";
import { EQUAL_WITHIN_DB, strongestFalsePeaks, type FalsePeakPlace } from "./strongestFalsePeaks";
import { STRONG_FROM_DBHZ } from "./unborrowedPeak";

/** One satellite of the sky plot, with what the receiver reports of it. */
export type ListedSatellite = SkyPlace & { prn: number; verdict: Verdict; reportedCn0DbHz: number | null };

export type FalseLockTruth = {
  scene: Scene;
  parentPrn: number;
  victimPrn: number;
  /** By PRN. */
  listed: ListedSatellite[];
  wall: Wall;
  /** False peaks of the victim, highest first; those within 1 dB of the first count as the one found. */
  falsePeaks: FalsePeakPlace[];
  /** The satellite in open sky that is there or not, and the least C/N0 it has when it is. */
  weakPrn: number;
  weakestDbHz: number;
  startedAt: string;
};

const DURATION_MS = 100;
const MOTION_HZ = 4500;
const CLOCK_PPM = 0.5; // a receiver that tracks knows its own clock; the search window is 6 kHz
const WORST_PEAK_DB = { from: -22, to: -21 } as const;
const CLEAR_OF_PARENT_HZ = 2 * RESOLUTION_HZ; // data bits spread a false peak over a bin to either side
export const LEAST_DETECTION = 0.99;
const VICTIMS_TRIED = 6;

/**
 * One scene, or null when it could not be judged: no genuine signal may lie where a false peak of the strong satellite may
 * lie (so none shares a bin with one, whatever their lags), the weak genuine one must be found by the search asked for, and
 * a satellite behind the wall must have a false peak of -21 to -22 dB.
 */
export function drawScene(seedHex: string, parameters: FalseLockParameters, draw: number): FalseLockTruth | null {
  const first = seededRandom(seedHex, "false-lock@1/case");
  const hasDecoy = first.uniform() * 100 < parameters.decoy; // before the draws, so that refusing does not move the share
  const random = seededRandom(seedHex, `false-lock@1/draw-${draw}`);
  const signals = drawSignals(parameters, random);
  if (!canBeToldApart(signals)) return null;
  const rateHz = drawRateHz(parameters.rate, random);
  const victim = drawVictim(signals, rateHz, random);
  return victim && assemble(signals, victim, hasDecoy, rateHz, parameters.decoyCn0[0], random);
}

type Signals = { parent: SceneSatellite; others: SceneSatellite[]; decoy: SceneSatellite; free: number[] };
type Victim = { prn: number; absentPrn: number; falsePeaks: FalsePeakPlace[] };

function drawSignals(parameters: FalseLockParameters, random: Random): Signals {
  const prns = random.shuffle(ALL_PRNS);
  const count = random.integer(...parameters.others);
  const clockHz = clockErrorHz(between(random, -CLOCK_PPM, CLOCK_PPM));
  const satellite = (prn: number, cn0: readonly [number, number]) =>
    drawSatellite(random, {
      prn,
      cn0DbHz: between(random, ...cn0),
      dopplerHz: between(random, -MOTION_HZ, MOTION_HZ) + clockHz,
    });
  const parent = satellite(prns[0], parameters.parentCn0);
  const decoy = satellite(prns[1], parameters.decoyCn0);
  const others = prns.slice(2, 2 + count).map((prn) => satellite(prn, parameters.othersCn0));
  return { parent, others, decoy, free: prns.slice(2 + count) };
}

/** The same whether the weak satellite will be in the capture or not. */
function canBeToldApart({ parent, others, decoy }: Signals): boolean {
  const clear = (a: SceneSatellite, b: SceneSatellite) => offWholeKilohertz(a.dopplerHz, b.dopplerHz) >= RESOLUTION_HZ;
  const strong = others.filter(({ cn0DbHz }) => cn0DbHz >= STRONG_FROM_DBHZ);
  return (
    others.every((satellite) => clear(satellite, parent)) &&
    offWholeKilohertz(decoy.dopplerHz, parent.dopplerHz) >= CLEAR_OF_PARENT_HZ &&
    strong.every((satellite) => clear(satellite, decoy)) &&
    expectedDetection(decoy, REFERENCE_SEARCH) >= LEAST_DETECTION
  );
}

function drawVictim({ parent, free }: Signals, rateHz: number, random: Random): Victim | null {
  const candidates = random.shuffle(free);
  const prn = candidates.slice(0, VICTIMS_TRIED).find((candidate) => isWorstPair(parent, candidate));
  if (prn === undefined) return null;
  return { prn, absentPrn: candidates[candidates.length - 1], falsePeaks: strongestFalsePeaks(parent, prn, rateHz) };
}

/** Chip by chip, as handbooks print the levels of code pairs. */
function isWorstPair({ prn, dopplerHz, cn0DbHz }: SceneSatellite, victimPrn: number): boolean {
  const { coherentMs, sums, dopplerHalfWidthHz } = REFERENCE_SEARCH;
  const [worst] = falsePeaks({
    parentPrn: prn,
    victimPrn,
    parentDopplerHz: dopplerHz,
    parentCn0DbHz: cn0DbHz,
    coherentMs,
    sums,
    dopplerHalfWidthHz,
  });
  return worst.levelDb >= WORST_PEAK_DB.from && worst.levelDb <= WORST_PEAK_DB.to;
}

function assemble(
  { parent, others, decoy }: Signals,
  victim: Victim,
  hasDecoy: boolean,
  rateHz: number,
  weakestDbHz: number,
  random: Random,
): FalseLockTruth {
  const wall = drawWall(random);
  const reported = (cn0DbHz: number) => Math.round(cn0DbHz + between(random, -0.7, 0.7));
  const listed: ListedSatellite[] = [
    ...[parent, ...others].map(({ prn, cn0DbHz }): ListedSatellite => ({
      prn,
      verdict: "genuine",
      reportedCn0DbHz: reported(cn0DbHz),
      ...drawInOpenSky(random, wall, 20, 85),
    })),
    {
      prn: victim.prn,
      verdict: "cross-correlation",
      reportedCn0DbHz: reported(victim.falsePeaks[0].apparentCn0DbHz),
      ...drawBehindWall(random, wall),
    },
    { prn: victim.absentPrn, verdict: "absent", reportedCn0DbHz: null, ...drawBehindWall(random, wall) },
    {
      prn: decoy.prn,
      verdict: hasDecoy ? "genuine" : "absent",
      reportedCn0DbHz: null,
      ...drawInOpenSky(random, wall, 8, 19),
    },
  ];
  const satellites = [parent, ...others, ...(hasDecoy ? [decoy] : [])].sort((a, b) => a.prn - b.prn);
  const scene: Scene = { rateHz, durationMs: DURATION_MS, ifHz: 0, satellites };
  return {
    scene,
    parentPrn: parent.prn,
    victimPrn: victim.prn,
    listed: listed.sort((a, b) => a.prn - b.prn),
    wall,
    falsePeaks: victim.falsePeaks,
    weakPrn: decoy.prn,
    weakestDbHz,
    startedAt: drawStart(random),
  };
}

/** The places that count as the false peak found. */
export const acceptedFalsePeaks = ({ falsePeaks }: FalseLockTruth): FalsePeakPlace[] =>
  falsePeaks.filter(({ levelDb }) => levelDb >= falsePeaks[0].levelDb - EQUAL_WITHIN_DB);
