import { directionAt, wrapDeg, type Pass, type ReceiverLog, type Readings } from "@/lib/gnss/sky/receiverLog";
import { BLOCKED_BELOW_DEG } from "./blockedSector";
import { stepOf } from "./readDepth";
import { mean } from "@/lib/numeric/statistics";
import { findSteps, type Step } from "../receiver-log/findSteps";

export type BlockageReading = { readings: Readings; fromDeg: number; toDeg: number; depthDb: number };

const LEAST_STEP_DB = 2.2;
/** One obstacle takes about the same from every satellite: what steps by less than half of the largest step is something else. */
const LEAST_SHARE = 0.5;
const NOT_TRACKED_DBHZ = 22; // stands for an empty field: somewhere below the weakest that is tracked

/** Satellites that fall and come back at a step, one by one; null when none does. */
export function readBlockage(log: ReceiverLog): BlockageReading | null {
  const stepped = log.passes.map((pass) => ({ pass, steps: findSteps(levelsOf(pass), LEAST_STEP_DB) }));
  const largest = Math.max(0, ...stepped.flatMap(({ steps }) => steps.map(({ size }) => Math.abs(size))));
  const spans = stepped.flatMap(({ pass, steps }) =>
    fallenSpans(
      pass,
      steps.filter(({ size }) => Math.abs(size) >= LEAST_SHARE * largest),
    ).map((span) => ({ pass, span })),
  );
  if (spans.length === 0) return null;
  const first = Math.min(...spans.map(({ span }) => span[0]));
  const last = Math.max(...spans.map(({ span }) => span[1]));
  return { readings: [first, last], depthDb: depthOf(spans), ...azimuthsOf(log, spans, [first, last]) };
}

const levelsOf = (pass: Pass) => pass.cn0DbHz.map((cn0) => cn0 ?? NOT_TRACKED_DBHZ);

type Span = { pass: Pass; span: Readings };

/** From each step down to the next step up; a pass may begin or end fallen. */
function fallenSpans(pass: Pass, steps: readonly Step[]): Readings[] {
  const spans: Readings[] = [];
  let from: number | null = steps.length > 0 && steps[0].size > 0 ? 0 : null;
  for (const { at, size } of steps) {
    if (size < 0) from ??= at;
    else if (from !== null) {
      spans.push([pass.first + from, pass.first + at - 1]);
      from = null;
    }
  }
  if (from !== null) spans.push([pass.first + from, pass.first + pass.cn0DbHz.length - 1]);
  return spans;
}

/** Mean over every fall and every return of a satellite that stays tracked, wherever it meets an edge. */
function depthOf(spans: readonly Span[]): number {
  const falls = spans.flatMap(({ pass, span: [from, to] }) => {
    const fell = stepOf(pass, from - pass.first);
    const rose = stepOf(pass, to + 1 - pass.first);
    return [...(fell === null ? [] : [-fell]), ...(rose === null ? [] : [rose])];
  });
  return falls.length > 0 ? mean(falls) : NaN;
}

/** The arc that holds every fallen reading, each edge half way to the next one that is not. */
function azimuthsOf({ passes, trackEvery }: ReceiverLog, spans: readonly Span[], [first, last]: Readings) {
  const fallen = Array.from({ length: 360 }, () => false);
  const clear = Array.from({ length: 360 }, () => false);
  for (const pass of passes)
    for (let at = 0; at < pass.cn0DbHz.length; at++) {
      const reading = pass.first + at;
      if (reading < first || reading > last) continue;
      const { azimuthDeg, elevationDeg } = directionAt(pass, trackEvery, reading);
      if (!(elevationDeg < BLOCKED_BELOW_DEG - 3)) continue; // the top of what stands there is not asked
      const own = spans.some(({ pass: one, span }) => one === pass && reading >= span[0] && reading <= span[1]);
      (own ? fallen : clear)[Math.floor(wrapDeg(azimuthDeg))] = true;
    }
  // Going round, the longest stretch without a fallen reading is what is not blocked.
  const held = fallen.flatMap((isFallen, azimuthDeg) => (isFallen ? [azimuthDeg] : []));
  let widest = { gap: -1, after: 0, before: 0 };
  held.forEach((after, n) => {
    const before = held[(n + 1) % held.length];
    const gap = wrapDeg(before - after) || 360;
    if (gap > widest.gap) widest = { gap, after, before };
  });
  return { fromDeg: edge(clear, widest.before, -1), toDeg: edge(clear, widest.after + 1, 1) };
}

const FAR_DEG = 12;

function edge(clear: readonly boolean[], fallenDeg: number, side: 1 | -1): number {
  for (let off = 1; off <= FAR_DEG; off++)
    if (clear[Math.floor(wrapDeg(fallenDeg + side * off))]) return wrapDeg(fallenDeg + (side * off) / 2);
  return wrapDeg(fallenDeg);
}
