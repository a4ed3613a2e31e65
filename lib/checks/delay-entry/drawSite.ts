import type { Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import type { DelayEntryParameters } from "./parameters";
import { CLOCK_INPUT, PHASE_CENTRE, PULSE_LEAD, type Paper, type SitePart, type StatedUncertainty } from "./site";

type Papers = Pick<SitePart, "paper" | "uncertainty">;
type Slot = {
  name: string;
  optional: boolean;
  draw: (random: Random, parameters: DelayEntryParameters) => Papers;
};

/** The way in its order. Delays of parts: common practice, no source. */
const SLOTS: readonly Slot[] = [
  { name: "Antenna with amplifier", optional: false, draw: (random) => sheet(random, [22, 60], [2, 5]) },
  { name: "Band filter", optional: true, draw: (random) => sheet(random, [10, 30], [0.5, 1.5]) },
  { name: "Jumper cable", optional: true, draw: (random, { velocityFactor }) => lead(random, [1, 4], velocityFactor) },
  { name: "Antenna cable", optional: false, draw: reeledCable },
  { name: "Arrester", optional: true, draw: (random) => sheet(random, [0.3, 1.5], [0.1, 0.4]) },
  { name: "Line amplifier", optional: true, draw: (random) => sheet(random, [3, 10], [0.3, 1]) },
  { name: "Cable in the building", optional: false, draw: unknownCable },
  { name: "Splitter", optional: true, draw: (random) => sheet(random, [1.2, 6], [0.2, 0.8]) },
  { name: "Receiver, antenna input to 1PPS output", optional: false, draw: calibrated },
  { name: PULSE_LEAD, optional: false, draw: (random, { velocityFactor }) => lead(random, [4, 15], velocityFactor) },
  { name: "Pulse distributor", optional: true, draw: (random) => sheet(random, [3, 12], [0.5, 1.5]) },
];

/** What hangs on the site and is not on the pulse's way. */
const STRAYS: readonly { name: string; from: string; to: string; lengthM: Range; needs?: string }[] = [
  { name: "Spare cable in the same duct", from: "capped end", to: "capped end in the rack", lengthM: [20, 90] },
  { name: "10 MHz lead", from: "10 MHz output", to: "counter", lengthM: [2, 12] },
  {
    name: "Cable to the second receiver",
    from: "second output",
    to: "second receiver",
    lengthM: [4, 40],
    needs: "Splitter",
  },
];

/** The list of parts of one site: the way from antenna to clock, and one or two strays between its rows. */
export function drawSite(random: Random, parameters: DelayEntryParameters): SitePart[] {
  const kept = drawSlots(random, random.integer(...parameters.parts));
  const way = kept.map(({ name, draw }) => ({ name, ...draw(random, parameters) }));
  const joints = [PHASE_CENTRE, ...way.slice(1).map((_, n) => `joint ${n + 1}`), CLOCK_INPUT];
  const rows: Omit<SitePart, "id">[] = way.map((part, n) => ({ ...part, from: joints[n], to: joints[n + 1] }));
  const strays = STRAYS.filter(({ needs }) => !needs || kept.some(({ name }) => name === needs));
  for (const { name, from, to, lengthM } of random.shuffle(strays).slice(0, random.integer(1, 2))) {
    const stray = { name, from, to, ...lead(random, lengthM, parameters.velocityFactor) };
    rows.splice(random.integer(1, rows.length - 1), 0, stray);
  }
  return rows.map((row, n) => ({ id: String.fromCharCode(97 + n), ...row }));
}

function drawSlots(random: Random, count: number): Slot[] {
  const optional = SLOTS.filter((slot) => slot.optional);
  const chosen = random.shuffle(optional).slice(0, count - (SLOTS.length - optional.length));
  return SLOTS.filter((slot) => !slot.optional || chosen.includes(slot));
}

type Range = readonly [number, number];

/** To so many parts of a unit, as a sheet prints it. */
const printed = (random: Random, [from, to]: Range, parts: number): number =>
  Math.round(between(random, from, to) * parts) / parts;

const limits = (value: number, unit: "ns" | "%"): StatedUncertainty => ({ as: "limits", value, unit });

const sheet = (random: Random, ns: Range, within: Range): Papers => ({
  paper: { says: "delay", ns: printed(random, ns, 10) },
  uncertainty: limits(printed(random, within, 10), "ns"),
});

function calibrated(random: Random): Papers {
  const paper: Paper = { says: "delay", ns: printed(random, [12, 70], 10) };
  return { paper, uncertainty: { as: "standard", value: printed(random, [0.6, 1.8], 10), unit: "ns" } };
}

function lead(random: Random, lengthM: Range, velocityFactor: Range): Papers {
  const installedM = printed(random, lengthM, 10);
  const paper: Paper = { says: "cable", installedM, reelM: null, velocityFactor: printed(random, velocityFactor, 100) };
  return { paper, uncertainty: limits(printed(random, [1, 3], 2), "%") };
}

/** Cut from a drum whose label still hangs on it: a whole number of 25 m, a tenth longer at least. */
function reeledCable(random: Random, { length, velocityFactor }: DelayEntryParameters): Papers {
  const installedM = printed(random, length, 10);
  const reelM = 25 * (Math.ceil((installedM * 1.1) / 25) + random.integer(0, 2));
  const paper: Paper = { says: "cable", installedM, reelM, velocityFactor: printed(random, velocityFactor, 100) };
  return { paper, uncertainty: limits(printed(random, [1, 3], 2), "%") };
}

function unknownCable(random: Random): Papers {
  return {
    paper: { says: "nothing" },
    uncertainty: { as: "standard", value: printed(random, [0.5, 1], 10), unit: "ns" },
  };
}
