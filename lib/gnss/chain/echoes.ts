import { pow10 } from "@/lib/numeric/elementary";
import { delayNsPerM } from "./cableDelay";

/**
 * What stands at one place of a line: a resistance across it (a crushed or wet place), one in series (a bad joint), its
 * end.
 */
export type LineFault = { distanceM: number; kind: "across" | "series" | "end"; ohm: number };

/** A line as the reflectometer sees it. */
export type Line = {
  impedanceOhm: number;
  velocityFactor: number;
  /** One way, at the frequencies that make up the edge. */
  lossDbPer100M: number;
  /** In any order, all at different places; at most one end, the farthest of them. */
  faults: readonly LineFault[];
};

/** One echo: time after the sent edge, and height as a share of it (an open end without loss gives +1). */
export type Echo = { delayNs: number; height: number; ghost: boolean };

/**
 * Echoes of a step sent into a matched line: each fault once, weakened by the loss there and back and by the faults it
 * passes, and the ghosts that bounce once more between two faults. Reflection: across -Z/(2R + Z), series R/(R + 2Z),
 * end (R - Z)/(R + Z); textbook. Ghosts of more bounces are left out.
 * @returns earliest first
 */
export function echoes(line: Line): Echo[] {
  const faults = [...line.faults].sort((a, b) => a.distanceM - b.distanceM);
  checkFaults(faults);
  const nsPerM = delayNsPerM(line.velocityFactor);
  const reflections = faults.map((fault) => reflectionOf(fault, line.impedanceOhm));
  const passes = faults.map((fault, n) => passageOf(fault, reflections[n]));
  const found: Echo[] = [];
  const add = (turns: readonly number[], ghost: boolean) => {
    let height = 1;
    let pathM = 0;
    let at = -1; // index of the last turning point, the reflectometer first
    for (const turn of [...turns, -1]) {
      for (let n = Math.min(at, turn) + 1; n < Math.max(at, turn); n++) height *= passes[n];
      pathM += Math.abs(placeOf(faults, turn) - placeOf(faults, at));
      if (turn >= 0) height *= reflections[turn];
      at = turn;
    }
    found.push({ delayNs: pathM * nsPerM, height: height * pow10((-line.lossDbPer100M * pathM) / 2000), ghost });
  };
  for (let far = 0; far < faults.length; far++) {
    add([far], false);
    for (let near = 0; near < far; near++)
      for (let last = near + 1; last < faults.length; last++) add([far, near, last], true);
  }
  return found.sort((a, b) => a.delayNs - b.delayNs);
}

const placeOf = (faults: readonly LineFault[], index: number): number => (index < 0 ? 0 : faults[index].distanceM);

/** Share of a wave's voltage that comes back, the same from either side of a resistance in an even line. */
export function reflectionOf({ kind, ohm }: LineFault, impedanceOhm: number): number {
  if (!(ohm >= 0)) throw new RangeError(`reflectionOf: resistance from 0 ohm, got ${ohm}`);
  if (kind === "across") return -impedanceOhm / (2 * ohm + impedanceOhm);
  if (ohm === Infinity) return 1;
  return kind === "series" ? ohm / (ohm + 2 * impedanceOhm) : (ohm - impedanceOhm) / (ohm + impedanceOhm);
}

/** Share of a wave's voltage that goes on: 1 + r beside a resistance across, 1 - r through one in series. */
const passageOf = ({ kind }: LineFault, reflection: number): number =>
  kind === "across" ? 1 + reflection : kind === "series" ? 1 - reflection : 0;

function checkFaults(sorted: readonly LineFault[]): void {
  sorted.forEach(({ distanceM, kind }, n) => {
    if (!(distanceM > (n === 0 ? 0 : sorted[n - 1].distanceM)))
      throw new RangeError(`echoes: faults at different places beyond 0 m, got ${distanceM} m`);
    if (kind === "end" && n < sorted.length - 1)
      throw new RangeError(`echoes: nothing stands behind the end at ${distanceM} m`);
  });
}
