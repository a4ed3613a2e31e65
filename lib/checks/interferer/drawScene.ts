import { CA_CHIP_RATE_HZ, CA_LENGTH_CHIPS } from "@/lib/gnss/constants";
import type { Interferer } from "@/lib/gnss/interference/interferer";
import { decibels, exp, log, PI, pow10Db } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import type { InterfererClass } from "./classes";
import type { InterfererParameters } from "./parameters";

export const RATE_HZ = 8_184_000;
export const MHZ = 1e6;
/** Half power of a rectangular pulse's sinc² by 6 dB: sin(x)/x = 1/2 at x = 1.8955, so 2 x/pi over the pulse's length. */
const SINC_6_DB = 1.2067;
/** The twelve-pole edge is 6 dB down at (10^0.6 - 1)^(1/24) of its half-power width. */
const EDGE_6_DB = 1.0462;

/** Numbers that a hand-in is set against; 0 where a class has none. */
export type InterfererFigures = { centreHz: number; bandwidthHz: number; periodS: number; levelDb: number };

export type InterfererScene = {
  class: InterfererClass;
  /** Null when nothing is there. */
  interferer: Interferer | null;
  /** Counts per standard deviation of the noise in I or Q. */
  sigma: number;
  /** The receiver's own line at 0 Hz, as an offset of I and Q in counts. */
  offsetI: number;
  offsetQ: number;
  /** What the receiver's unequal I and Q put at the mirrored frequency: a share of the amplitude. */
  imageShare: number;
  figures: InterfererFigures;
  /** Noise density in squared counts per Hz, rounding to whole counts included. */
  floorPerHz: number;
  /** Own line over the floor in 1 MHz. */
  ownLineDb: number;
};

export const FULL_SCALE = 127;
const ROUNDING = 1 / 12; // variance of rounding to whole counts; textbook
const SIGMAS_KEPT = 4.5; // so far the noise may swing without clipping: one sample in 150 000
const SIGMA_COUNTS = { least: 1.2, most: 18 } as const;

/** Everything but the noise's own draws. */
export function drawScene(cls: InterfererClass, parameters: InterfererParameters, random: Random): InterfererScene {
  const drawn = cls === "nothing" ? null : drawInterferer(cls, parameters, random);
  const ownLineDb = between(random, -5, 10);
  const imageShare = between(random, 0.02, 0.05);
  const onRatio = drawn ? Math.sqrt(drawn.powerOverNoise) * (cls === "noise" ? 3.2 : 1.1) : 0;
  const lineRatio = Math.sqrt((2 * pow10Db(ownLineDb) * MHZ) / RATE_HZ);
  const most = Math.min(SIGMA_COUNTS.most, FULL_SCALE / (onRatio + lineRatio + SIGMAS_KEPT));
  const sigma = SIGMA_COUNTS.least * exp(random.uniform() * log(Math.max(1, most / SIGMA_COUNTS.least)));
  const floorPerHz = (2 * (sigma * sigma + ROUNDING)) / RATE_HZ;
  const line = Math.sqrt(pow10Db(ownLineDb) * floorPerHz * MHZ);
  const turned = random.pick([-1, 1]) * between(random, 0.4, 0.9); // the share of it in I
  return {
    class: cls,
    interferer: drawn && { ...drawn.interferer, power: drawn.powerOverNoise * sigma * sigma },
    sigma,
    offsetI: line * turned,
    offsetQ: line * Math.sqrt(1 - turned * turned),
    imageShare,
    figures: drawn ? { ...drawn.figures, levelDb: levelOf(drawn, sigma, floorPerHz) } : NOTHING,
    floorPerHz,
    ownLineDb,
  };
}

const NOTHING: InterfererFigures = { centreHz: 0, bandwidthHz: 0, periodS: 0, levelDb: 0 };

type Drawn = {
  interferer: Interferer;
  /** While it is on, in sigma squared of I or Q. */
  powerOverNoise: number;
  onShare: number;
  figures: Omit<InterfererFigures, "levelDb">;
};

/** Mean power over the capture to the noise in 1 MHz. */
const levelOf = ({ powerOverNoise, onShare }: Drawn, sigma: number, floorPerHz: number): number =>
  decibels((powerOverNoise * sigma * sigma * onShare) / (floorPerHz * MHZ));

/** In sigma squared, from a mean level over the noise in 1 MHz. */
const powerOf = (levelDb: number, onShare: number): number => (2 * pow10Db(levelDb) * MHZ) / RATE_HZ / onShare;

function drawInterferer(
  cls: Exclude<InterfererClass, "nothing">,
  parameters: InterfererParameters,
  random: Random,
): Drawn {
  const [nearestKhz, farthestKhz] = parameters.centre;
  const offsetHz = random.pick([-1, 1]) * Math.round(between(random, nearestKhz, farthestKhz)) * 1000;
  const level = ([least, most]: readonly [number, number]) => between(random, ...within(parameters.level, least, most));
  const steady = (interferer: Interferer, bandwidthHz: number, periodS: number, levelDb: number): Drawn => ({
    interferer,
    powerOverNoise: powerOf(levelDb, 1),
    onShare: 1,
    figures: { centreHz: "offsetHz" in interferer ? interferer.offsetHz : 0, bandwidthHz, periodS },
  });
  switch (cls) {
    case "carrier":
      return steady({ kind: "tone", power: 1, offsetHz, phaseCycles: random.uniform() }, 0, 0, level([10, 35]));
    case "narrow-fm": {
      const deviationHz = random.integer(30, 60) * 1000;
      const modulationHz = random.integer(10, 30) * 100;
      const interferer = { kind: "narrow-fm", power: 1, offsetHz, deviationHz, modulationHz } as const;
      // Carson, "Notes on the theory of modulation" (1922): twice deviation and modulation together.
      return steady(interferer, 2 * (deviationHz + modulationHz), 1 / modulationHz, level([10, 35]));
    }
    case "sweep": {
      const [from, to] = parameters.sweep;
      const periodS = (from * exp(random.uniform() * log(to / from))) / 1e6;
      const widthHz = Math.max(between(random, 0.6e6, 2.4e6), LEAST_CYCLES / periodS);
      const shape = random.pick(["saw", "triangle"] as const);
      return steady({ kind: "sweep", power: 1, offsetHz, widthHz, periodS, shape }, widthHz, periodS, level([10, 35]));
    }
    case "pulse":
      return drawPulse(offsetHz, parameters, random);
    case "noise": {
      const widthHz = random.integer(5, 24) * 1e5;
      return steady({ kind: "noise", power: 1, offsetHz, widthHz }, widthHz * EDGE_6_DB, 0, level([12, 28]));
    }
    case "code": {
      const dopplerHz = random.pick([-1, 1]) * random.integer(25_000, 60_000); // a jammer on a crystal of its own
      const codePhaseChips = random.uniform() * CA_LENGTH_CHIPS;
      const interferer = {
        kind: "matched-code",
        power: 1,
        prn: random.integer(1, 32),
        codePhaseChips,
        dopplerHz,
      } as const;
      const drawn = steady(interferer, SINC_6_DB * CA_CHIP_RATE_HZ, CA_LENGTH_CHIPS / CA_CHIP_RATE_HZ, level([11, 17]));
      return { ...drawn, figures: { ...drawn.figures, centreHz: dopplerHz } };
    }
  }
}

const LEAST_CYCLES = 18; // width times period: with fewer the lines of a fast sweep are too few to read a width from

/** Far side lobes of a short pulse lie over the whole band; so much of the floor they may be, 4 MHz off. */
const SIDE_LOBES = 0.07;

/** Pulses of 2.5 to 30 us; the level while on stays under 37 dB over the floor in 1 MHz. */
function drawPulse(offsetHz: number, parameters: InterfererParameters, random: Random): Drawn {
  const [from, to] = parameters.duty;
  const onShare = Math.round(10 * from * exp(random.uniform() * log(to / from))) / 1000;
  const onS = (2.5 * exp(random.uniform() * log(12))) / 1e6;
  const periodS = Math.min(1e-3, Math.max(40e-6, onS / onShare));
  const length = periodS * onShare;
  // sinc² far out is 1/(2 (pi f tau)²) in the mean, of a density P tau; textbook.
  const clear = decibels(SIDE_LOBES * 2 * PI * PI * 3.5 * 3.5 * 1e6 * length);
  const levelDb = between(random, ...within(parameters.level, 12, Math.min(37 + decibels(onShare), clear)));
  return {
    interferer: { kind: "pulse", power: 1, offsetHz, periodS, onShare },
    powerOverNoise: powerOf(levelDb, onShare),
    onShare,
    figures: { centreHz: offsetHz, bandwidthHz: SINC_6_DB / length, periodS },
  };
}

/** The part of a range that a class can take; its own nearest end where the two do not meet. */
function within([from, to]: readonly [number, number], least: number, most: number): [number, number] {
  const low = Math.min(Math.max(from, least), most);
  return [low, Math.max(low, Math.min(to, most))];
}

/** Level against a full scale of 127 counts in magnitude. */
export const fullScaleDb = (squaredCounts: number): number => decibels(squaredCounts / (FULL_SCALE * FULL_SCALE));
