import { directionAt, turnDeg } from "@/lib/gnss/sky/receiverLog";
import type { Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import { lengthOf, type SkyPass, type SkyTimes } from "../receiver-log/drawSky";
import type { Sector } from "../receiver-log/sector";
import type { JammedOrNotParameters } from "./parameters";
import type { Indication, Verdict } from "./quantities";

/** What one cause does to each instrument, from its first reading to the end of the log. */
export type Event = {
  verdict: Verdict;
  first: number;
  gainDb: number;
  /** Loss of C/N0 of the satellites that it touches; negative for deception, where `levelDbHz` replaces what was there. */
  lossDb: number;
  levelDbHz: number | null;
  sector: Sector | null;
  clockNsS: number;
  speedMS: readonly [east: number, north: number];
  /** Reading from which clock or position is pulled. */
  pullsFrom: number;
  /** Factor on the noise of clock, position and Doppler. */
  noisier: number;
  seen: readonly Indication[];
};

/** What stands in the sector reaches so far up. */
export const BLOCKED_BELOW_DEG = 55;

type Drawn = Omit<Event, "verdict" | "first">;
const STILL: Drawn = {
  gainDb: 0,
  lossDb: 0,
  levelDbHz: null,
  sector: null,
  clockNsS: 0,
  speedMS: [0, 0],
  pullsFrom: Infinity,
  noisier: 1,
  seen: [],
};

/** One cause at one time; null when these tracks cannot show it. */
export function drawEvent(
  random: Random,
  verdict: Verdict,
  sky: readonly SkyPass[],
  times: SkyTimes,
  parameters: JammedOrNotParameters,
): Event | null {
  const first = Math.round(between(random, 0.25, 0.5) * times.readings);
  const lossDb = between(random, ...parameters.depth);
  const drawn = {
    jammed: () => jammed(random, lossDb),
    deceived: () => deceived(random, first, times.intervalS),
    blocked: () => blocked(random, Math.max(6, lossDb), first, sky, times),
    faulty: () => (random.uniform() < 0.5 ? weakAmplifier(random, lossDb) : runningOscillator(random, first)),
  }[verdict]();
  return drawn && { verdict, first, ...drawn };
}

/** More power comes in, so the gain backs off, and C/N0 falls on all sides; by how much each depends on the signal. */
const jammed = (random: Random, lossDb: number): Drawn => ({
  ...STILL,
  lossDb,
  gainDb: -Math.max(3, lossDb + between(random, -2, 4)),
  noisier: 3,
  seen: ["cn0-all-fell", "gain-down"],
});

/** False signals come in stronger than true ones and all alike; once they are tracked, time or place is pulled away. */
function deceived(random: Random, first: number, intervalS: number): Drawn {
  const pullsFrom = first + Math.round(between(random, 120, 420) / intervalS);
  const taken: Drawn = {
    ...STILL,
    gainDb: -between(random, 3, 8),
    lossDb: -between(random, 2, 6),
    levelDbHz: 0, // set from the level before
    pullsFrom,
    seen: ["cn0-alike", "gain-down"],
  };
  const way = random.pick([-1, 1]);
  if (random.uniform() < 0.5)
    return { ...taken, clockNsS: way * between(random, 1, 4), seen: [...taken.seen, "clock-ran", "doppler-common"] };
  const speed = way * between(random, 0.8, 2);
  const part = between(random, 0.3, 0.9);
  return {
    ...taken,
    speedMS: [speed * part, random.pick([-1, 1]) * speed * Math.sqrt(1 - part * part)],
    seen: [...taken.seen, "position-ran", "doppler-apart"],
  };
}

function blocked(
  random: Random,
  lossDb: number,
  first: number,
  sky: readonly SkyPass[],
  times: SkyTimes,
): Drawn | null {
  const width = random.integer(80, 150);
  const fromDeg = random.integer(0, 359);
  const middleDeg = fromDeg + width / 2;
  const there = sky.filter(
    (pass) => first > pass.first + MINUTE && first + MINUTE < pass.first + lengthOf(pass, times),
  );
  const off = there.map((pass) => directionAt(pass, times.trackEvery, first));
  const inside = off.filter(
    ({ azimuthDeg, elevationDeg }) =>
      Math.abs(turnDeg(middleDeg, azimuthDeg)) < width / 2 - 5 &&
      elevationDeg > 15 &&
      elevationDeg < BLOCKED_BELOW_DEG - 5,
  );
  const near = off.filter(({ azimuthDeg }) => Math.abs(Math.abs(turnDeg(middleDeg, azimuthDeg)) - width / 2) <= 5);
  const outside = off.length - inside.length - near.length;
  if (inside.length < 2 || outside < 3 || near.length > 0) return null;
  const sector = { fromDeg, toDeg: (fromDeg + width) % 360 };
  return { ...STILL, lossDb, sector, noisier: 1.6, seen: ["cn0-one-side", "gain-stayed"] };
}

const MINUTE = 18; // readings, with what is left free beside the start

/** Less comes out of the antenna, so the gain opens, and the receiver's own noise weighs more. */
const weakAmplifier = (random: Random, lossDb: number): Drawn => ({
  ...STILL,
  lossDb,
  gainDb: lossDb + between(random, 1.5, 4),
  noisier: 2,
  seen: ["cn0-all-fell", "gain-up"],
});

/** The oscillator jumps in frequency: clock and all Dopplers go with it, and nothing else does. */
const runningOscillator = (random: Random, first: number): Drawn => ({
  ...STILL,
  clockNsS: random.pick([-1, 1]) * between(random, 1.2, 6),
  pullsFrom: first,
  seen: ["cn0-stayed", "gain-stayed", "clock-ran", "doppler-common"],
});
