import type { Spectrum } from "./spectrum";

/**
 * Power of a spectrum between two offsets in squared units of the samples; a bin that is cut counts by what lies inside.
 * @param fromHz below `toHz`
 */
export function bandPower({ offsetsHz, densityPerHz }: Spectrum, fromHz: number, toHz: number): number {
  const binHz = offsetsHz[1] - offsetsHz[0];
  let power = 0;
  for (let k = 0; k < offsetsHz.length; k++) {
    const inside = Math.min(toHz, offsetsHz[k] + binHz / 2) - Math.max(fromHz, offsetsHz[k] - binHz / 2);
    if (inside > 0) power += densityPerHz[k] * inside;
  }
  return power;
}

/** Where a spectrum crosses a level, between bins by a straight line: the lowest and the highest such place. */
export type BandEdges = { lowHz: number; highHz: number };

/**
 * Edges of what stands at or above a level: with a level so many dB under the top, the x-dB bandwidth of Recommendation
 * ITU-R SM.328 (from memory).
 * @param perHz a density, as a rule with its floor taken off
 * @throws RangeError when nothing reaches the level
 */
export function edgesAtLevel(offsetsHz: Float64Array, perHz: Float64Array, level: number): BandEdges {
  const first = perHz.findIndex((value) => value >= level);
  const last = perHz.findLastIndex((value) => value >= level);
  if (first < 0) throw new RangeError(`edgesAtLevel: nothing reaches ${level}`);
  return { lowHz: crossing(first, first - 1), highHz: crossing(last, last + 1) };

  function crossing(inside: number, outside: number): number {
    if (outside < 0 || outside >= offsetsHz.length) return offsetsHz[inside];
    const part = (perHz[inside] - level) / (perHz[inside] - perHz[outside]);
    return offsetsHz[inside] + part * (offsetsHz[outside] - offsetsHz[inside]);
  }
}
