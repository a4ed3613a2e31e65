import type { Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import type { Amplifier, Arrester, Cable, Splitter, SplitterFeed } from "./site";

/* Ranges of figures as data sheets print them: common practice, no source. */

/** Cables from thick to thin: dB per 100 m at 1 GHz, ohm per km of both conductors, velocity factor. */
const CABLES = [
  [4.4, 3.4, 0.88],
  [7.2, 6.2, 0.87],
  [10.8, 9.5, 0.85],
  [14.5, 14, 0.83],
  [22, 33, 0.8],
  [33, 56, 0.66],
  [48, 95, 0.7],
  [72, 160, 0.7],
] as const;
const LOSS_DB = { from: 1.7, to: 17 } as const; // over the run at 1 GHz: what somebody would think of for it

export function drawCables(runM: number, random: Random): Cable[] {
  const sensible = CABLES.filter(([lossDb]) => {
    const overRunDb = (lossDb * runM) / 100;
    return overRunDb >= LOSS_DB.from && overRunDb <= LOSS_DB.to;
  });
  const chosen = random.shuffle(sensible).slice(0, random.integer(3, 6));
  return chosen.map(([lossDb, ohm, velocityFactor], n) => ({
    kind: "cable",
    id: `C${n + 1}`,
    dbPer100M: inTenths(lossDb * between(random, 0.95, 1.05)),
    loopOhmPerKm: inTenths(ohm * between(random, 0.92, 1.08)),
    velocityFactor,
  }));
}

/** What an amplifier is on the list for: to do, to be too strong, too noisy, too hungry for this feed, or too weak. */
type AmplifierRole = "fit" | "strong" | "noisy" | "hungry" | "weak";
type Range = readonly [number, number];
type AmplifierRanges = { gain: Range; noise: Range; compression: Range; current: Range; belowSupplyV: Range };

const AMPLIFIERS: Readonly<Record<AmplifierRole, AmplifierRanges>> = {
  fit: { gain: [24, 36], noise: [1, 2.2], compression: [4, 12], current: [20, 40], belowSupplyV: [0.8, 1.6] },
  strong: { gain: [46, 54], noise: [1, 1.8], compression: [6, 12], current: [25, 45], belowSupplyV: [0.8, 1.6] },
  noisy: { gain: [20, 34], noise: [4.5, 7], compression: [8, 16], current: [25, 45], belowSupplyV: [0.8, 1.6] },
  hungry: { gain: [24, 36], noise: [0.8, 1.5], compression: [8, 14], current: [70, 120], belowSupplyV: [0.1, 0.2] },
  weak: { gain: [10, 14], noise: [1.5, 2.5], compression: [-4, 2], current: [8, 15], belowSupplyV: [0.8, 1.6] },
};

const LARGEST_FIT_DBM = 20; // at the output of an amplifier that one would still mount at an antenna

/** Four amplifiers, the one that stands the neighbour and fits named first; ids are dealt at random. */
export function drawAmplifiers(
  supplyV: number,
  neighbourDbm: number,
  random: Random,
): [fit: Amplifier, ...others: Amplifier[]] {
  const ids = random.shuffle(["A1", "A2", "A3", "A4"]);
  const draw = (role: AmplifierRole, id: string): Amplifier => {
    const { gain, noise, compression, current, belowSupplyV } = AMPLIFIERS[role];
    const mostDb = role === "fit" ? Math.max(gain[0], Math.min(gain[1], LARGEST_FIT_DBM - neighbourDbm - 3)) : gain[1];
    const gainDb = Math.round(2 * between(random, gain[0], mostDb)) / 2;
    const standsDbm = Math.ceil(neighbourDbm + gainDb + between(random, 2, 5));
    const drawnDbm = random.integer(...compression);
    return {
      kind: "amplifier",
      id,
      gainDb,
      noiseFigureDb: inTenths(between(random, ...noise)),
      compressionDbm: role === "fit" ? Math.max(drawnDbm, standsDbm) : drawnDbm,
      currentMa: random.integer(...current),
      minimumV: inTenths(supplyV - between(random, ...belowSupplyV)),
      delayNs: random.integer(8, 40),
    };
  };
  const last = random.pick(["fit", "hungry", "weak"] as const);
  const [first, ...others] = ids;
  return [draw("fit", first), ...(["strong", "noisy", last] as const).map((role, n) => draw(role, others[n]))];
}

/** Two that let the feed through and one, with least loss, that blocks it. */
export function drawArresters(random: Random): Arrester[] {
  const blockingDb = random.integer(10, 20) / 100;
  return random.shuffle([true, true, false]).map((passesDc, n) => ({
    kind: "arrester",
    id: `S${n + 1}`,
    lossDb: passesDc ? random.integer(25, 60) / 100 : blockingDb,
    passesDc,
    ohm: passesDc ? random.integer(1, 5) / 10 : 0,
    delayNs: random.integer(2, 9) / 10,
  }));
}

/** One that passes the feed of one port, one of all, one of none, which has least loss. */
export function drawSplitters(random: Random): Splitter[] {
  const lossDb: Readonly<Record<SplitterFeed, Range>> = { one: [36, 42], all: [35, 40], none: [32, 34] };
  return random.shuffle(["one", "all", "none"] as const).map((feed, n) => ({
    kind: "splitter",
    id: `D${n + 1}`,
    lossDb: random.integer(...lossDb[feed]) / 10,
    feed,
    ohm: feed === "none" ? 0 : random.integer(1, 6) / 10,
    delayNs: random.integer(4, 20) / 10,
  }));
}

const inTenths = (value: number) => Math.round(value * 10) / 10;
