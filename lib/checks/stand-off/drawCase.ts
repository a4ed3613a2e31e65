import { CA_CHIP_RATE_HZ, L1_HZ } from "@/lib/gnss/constants";
import { distanceOfPowerM, milliwattsToDbm } from "@/lib/gnss/interference/standOff";
import { decibels, pow10Db } from "@/lib/numeric/elementary";
import { seededRandom, type Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import { Q_OF, type InterferenceType } from "./interference-types";
import type { StandOffParameters } from "./parameters";
import { decidingCn0DbHz, effectiveOf, interferenceDbm, NEEDED, recoveryM, type StandOffSite } from "./standOffOf";

export type StandOffTruth = {
  site: StandOffSite;
  type: InterferenceType;
  receivedDbm: number;
  effectiveDbHz: number[];
  recoveryM: number;
};

export type DrawnCase = { truth: StandOffTruth; draws: number };

const MILLIWATTS = [0.01, 0.02, 0.05, 0.1, 0.2, 0.5, 1, 2, 5, 10, 20, 50, 100, 200, 500, 1000, 2000, 5000, 10_000];
const NEAREST_M = 5;
const FARTHEST_M = 50_000;
const BELOW_THRESHOLD_DB = { from: 3, to: 12 } as const; // of the deciding satellite, at the distance given
const LEAST_RECOVERY = 1.3; // times the distance given
const CLEAR_OF_THRESHOLD_DB = 0.3; // so that rounding does not turn a satellite round
const TELLING_DISTANCE = 1.16; // a wrong step must move the distance by more than its tolerance
const TELLING_DB = 1.3; // and an effective C/N0 by more than its own

/** Draws until the site is one that can be worked at and no named wrong method lands on the right values by chance. */
export function drawCase(seedHex: string, parameters: StandOffParameters): DrawnCase {
  for (let draws = 1; draws <= 500; draws++) {
    const truth = drawTruth(parameters, seededRandom(seedHex, `stand-off@1/draw-${draws}`));
    if (truth && isFair(truth)) return { truth, draws };
  }
  throw new Error("stand-off: no fair site in 500 draws");
}

function drawTruth(parameters: StandOffParameters, random: Random): StandOffTruth | null {
  const type = random.pick(["carrier", "code", "noise"] as const);
  const inRange = MILLIWATTS.filter((mw) => isWithin(milliwattsToDbm(mw), parameters.eirp));
  const eirpMw = inRange.length > 0 ? random.pick(inRange) : pow10Db(parameters.eirp[0]);
  const open: StandOffSite = {
    eirpMw,
    distanceM: NaN,
    exponent: inSteps(random, parameters.exponent, 0.5),
    screenDb: random.integer(...parameters.screen),
    antennaGainDb: random.integer(...parameters.antennaGain),
    noiseDensityDbmHz: -random.integer(1695, 1725) / 10,
    thresholdDbHz: random.integer(...parameters.threshold),
    satellites: drawSatellites(parameters, random),
  };
  const distanceM = drawDistance(open, Q_OF[type], random);
  if (!(distanceM >= NEAREST_M && distanceM <= FARTHEST_M)) return null;
  const site = { ...open, distanceM };
  const receivedDbm = interferenceDbm(site);
  return {
    site,
    type,
    receivedDbm,
    effectiveDbHz: site.satellites.map(({ cn0DbHz }) => effectiveOf(site, receivedDbm, Q_OF[type], cn0DbHz)),
    recoveryM: recoveryM(site, Q_OF[type], decidingCn0DbHz(site)),
  };
}

function drawSatellites({ cn0 }: StandOffParameters, random: Random): StandOffSite["satellites"] {
  const all = Array.from({ length: 32 }, (_, n) => n + 1);
  const prns = random.shuffle(all).slice(0, random.integer(6, 8));
  return prns
    .sort((a, b) => a - b)
    .map((prn) => ({ prn, elevationDeg: random.integer(8, 85), cn0DbHz: inSteps(random, cn0, 0.5) }));
}

/** A distance, in two figures, at which the deciding satellite stands below the threshold by a few dB. */
function drawDistance(site: StandOffSite, q: number, random: Random): number {
  const cn0DbHz = decidingCn0DbHz(site);
  const aim = site.thresholdDbHz - between(random, BELOW_THRESHOLD_DB.from, BELOW_THRESHOLD_DB.to);
  const densityRoom = pow10Db(-aim) - pow10Db(-cn0DbHz);
  if (!(densityRoom > 0)) return NaN;
  const powerDbm = decibels(densityRoom * q * CA_CHIP_RATE_HZ) + cn0DbHz + site.noiseDensityDbmHz;
  const path = { ...site, eirpDbm: milliwattsToDbm(site.eirpMw), frequencyHz: L1_HZ };
  return Number(distanceOfPowerM(path, powerDbm).toPrecision(2));
}

function isFair({ site, type, receivedDbm, effectiveDbHz, recoveryM: right }: StandOffTruth): boolean {
  const q = Q_OF[type];
  const otherQ = Q_OF[otherType(type)];
  const strongest = Math.max(...site.satellites.map(({ cn0DbHz }) => cn0DbHz));
  const moved = site.satellites.map(({ cn0DbHz }, n) =>
    Math.abs(effectiveOf(site, receivedDbm, otherQ, cn0DbHz) - effectiveDbHz[n]),
  );
  return (
    right <= FARTHEST_M &&
    right >= LEAST_RECOVERY * site.distanceM &&
    effectiveDbHz.filter((value) => value >= site.thresholdDbHz).length < NEEDED &&
    effectiveDbHz.every((value) => Math.abs(value - site.thresholdDbHz) >= CLEAR_OF_THRESHOLD_DB) &&
    Math.max(...moved) >= TELLING_DB &&
    right / recoveryM(site, q, strongest) >= TELLING_DISTANCE &&
    recoveryM({ ...site, antennaGainDb: 0 }, q, decidingCn0DbHz(site)) / right >= TELLING_DISTANCE
  );
}

/** The row of the table of Q that is taken by mistake. */
export const otherType = (type: InterferenceType): InterferenceType => (type === "carrier" ? "noise" : "carrier");

const isWithin = (value: number, [from, to]: readonly [number, number]) => value >= from - 1e-9 && value <= to + 1e-9;

function inSteps(random: Random, [from, to]: readonly [number, number], step: number): number {
  const first = Math.ceil(from / step);
  const last = Math.max(first, Math.floor(to / step));
  return Math.min(to, random.integer(first, last) * step);
}
