import { CA_LENGTH_CHIPS, DATA_BIT_MS } from "@/lib/gnss/constants";
import { decibels } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { LAG_STEP_CHIPS, type Patch } from "./drawPatch";

export type PeakReading = { dopplerHz: number; codePhaseChips: number; cn0DbHz: number };

/** What eye and cursor add, standard deviations: a tenth of a bin or a lag, and a tenth of a decibel. Common practice, no source. */
const EYE = { cells: 0.1, db: 0.1 } as const;

/** What a parabola through cells half a chip and half a bin apart still leaves of the loss between them; measured on drawn patches. */
const LEFT_BETWEEN_CELLS_DB = 0.4;

/**
 * A peak as a competent person reads it: the highest cell, then between the cells by its neighbours in either cut, for place and
 * for height. C/N0 as the peak stands, search losses and all.
 */
export function readPatch(patch: Patch, coherentMs: number, random: Random): PeakReading {
  const { place, height } = betweenCells(patch);
  const dopplerStepHz = patch.dopplersHz[1] - patch.dopplersHz[0];
  const dopplerHz = place.dopplerHz + EYE.cells * dopplerStepHz * random.gaussian();
  const chips = place.codePhaseChips + EYE.cells * LAG_STEP_CHIPS * random.gaussian();
  return {
    dopplerHz: Math.round(dopplerHz),
    codePhaseChips: chips - CA_LENGTH_CHIPS * Math.floor(chips / CA_LENGTH_CHIPS),
    cn0DbHz: decibels((Math.max(1e-3, height - 1) * 1000) / coherentMs) + EYE.db * random.gaussian(),
  };
}

/**
 * Mean loss of such a reading of a genuine signal, in dB: half of the edges change the sign, and (1 - 2a)^2 is 1/3 on average over
 * their places a in a sum.
 */
export const meanLossDb = (coherentMs: number) =>
  LEFT_BETWEEN_CELLS_DB - decibels(1 - ((2 / 3) * coherentMs) / (2 * DATA_BIT_MS));

/** The highest cell that has neighbours on all sides. */
export function highestCell({ dopplersHz, lagsChips, power }: Patch) {
  const width = lagsChips.length;
  let top = width + 1;
  for (let row = 1; row < dopplersHz.length - 1; row++) {
    for (let at = row * width + 1; at < (row + 1) * width - 1; at++) if (power[at] > power[top]) top = at;
  }
  return {
    at: top,
    power: power[top],
    dopplerHz: dopplersHz[Math.floor(top / width)],
    lagChips: lagsChips[top % width],
  };
}

/** Vertex of the parabola through the highest cell and its neighbours, along either cut; the heights gained add up. */
function betweenCells(patch: Patch) {
  const { dopplersHz, lagsChips, power } = patch;
  const top = highestCell(patch);
  const width = lagsChips.length;
  const alongDoppler = vertex(power[top.at - width], top.power, power[top.at + width]);
  const alongLag = vertex(power[top.at - 1], top.power, power[top.at + 1]);
  return {
    height: top.power + alongDoppler.gain + alongLag.gain,
    place: {
      dopplerHz: top.dopplerHz + alongDoppler.at * (dopplersHz[1] - dopplersHz[0]),
      codePhaseChips: top.lagChips + alongLag.at * LAG_STEP_CHIPS,
    },
  };
}

/** Place from -1/2 to 1/2 of a step, and how far the vertex lies above the middle value. */
function vertex(before: number, middle: number, after: number): { at: number; gain: number } {
  const bend = before - 2 * middle + after;
  if (!(bend < 0)) return { at: 0, gain: 0 };
  const at = Math.max(-0.5, Math.min(0.5, (before - after) / (2 * bend)));
  return { at, gain: ((after - before) / 2) * at + (bend / 2) * at * at };
}
