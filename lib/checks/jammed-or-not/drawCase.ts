import { meanChangeDb } from "@/lib/gnss/sky/cn0Change";
import { directionAt, type ReceiverLog } from "@/lib/gnss/sky/receiverLog";
import { seededRandom, type Random } from "@/lib/numeric/random";
import { mean } from "@/lib/numeric/statistics";
import { between } from "../drawSatellite";
import { drawStart } from "../drawStart";
import { drawSky, lengthOf, type SkyPass, type SkyTimes } from "../receiver-log/drawSky";
import { drawPattern, drawReadings, patternDbHz, type Loss, type Pattern } from "../receiver-log/levels";
import { isInSector } from "../receiver-log/sector";
import { drawColumns, type Columns } from "./drawColumns";
import { BLOCKED_BELOW_DEG, drawEvent, type Event } from "./drawEvent";
import type { JammedOrNotParameters } from "./parameters";
import { VERDICTS, type Verdict } from "./quantities";

export type JammedOrNotTruth = {
  verdict: Verdict;
  event: Event;
  /** Mean over the satellites, after the start less before it. */
  cn0ChangeDb: number;
  /** Reading at which the receiver itself raised an alarm. */
  alarm: number;
  log: ReceiverLog;
  columns: Columns;
};

export type DrawnCase = { truth: JammedOrNotTruth; draws: number };

const INTERVAL_S = 5;
const TRACK_EVERY = 60;
const MOST_DRAWS = 300;
const ALARM_S = [90, 400] as const; // a receiver waits before it believes what it sees

/** Draws until the log shows the one cause clearly in every instrument that it touches. */
export function drawCase(seedHex: string, parameters: JammedOrNotParameters): DrawnCase {
  const verdict = seededRandom(seedHex, "jammed-or-not@1/case").pick(VERDICTS).value; // refusing moves no share
  for (let draws = 1; draws <= MOST_DRAWS; draws++) {
    const truth = drawTruth(parameters, verdict, seededRandom(seedHex, `jammed-or-not@1/draw-${draws}`));
    if (truth && isFair(truth)) return { truth, draws };
  }
  throw new Error(`jammed-or-not: no fair log in ${MOST_DRAWS} draws`);
}

function drawTruth(parameters: JammedOrNotParameters, verdict: Verdict, random: Random): JammedOrNotTruth | null {
  const times: SkyTimes = {
    startUnixMs: Date.parse(drawStart(random)),
    intervalS: INTERVAL_S,
    readings: (random.integer(...parameters.span) * 60) / INTERVAL_S,
    trackEvery: TRACK_EVERY,
  };
  const sky = drawSky(random, times);
  const pattern = drawPattern(random);
  const drawn = drawEvent(random, verdict, sky, times, parameters);
  if (!drawn) return null;
  const event = drawn.levelDbHz === null ? drawn : { ...drawn, levelDbHz: levelOf(drawn, sky, times, pattern) };
  const log = { ...times, passes: drawReadings(random, sky, times, pattern, lossOf(event, times, pattern)) };
  const alarm = event.first + Math.round(between(random, ...ALARM_S) / INTERVAL_S);
  const columns = drawColumns(random, times, event);
  return { verdict, event, cn0ChangeDb: meanChangeDb(log, event.first), alarm, log, columns };
}

/** False signals come from one antenna, so that all have one level: above the mean of the true ones. */
function levelOf({ first, lossDb }: Event, sky: readonly SkyPass[], times: SkyTimes, pattern: Pattern): number {
  const there = sky.filter((pass) => first >= pass.first && first < pass.first + lengthOf(pass, times));
  const levels = there.map((pass) => patternDbHz(pattern, directionAt(pass, times.trackEvery, first).elevationDeg));
  return mean(levels) - lossDb;
}

const lossOf =
  (event: Event, { trackEvery }: SkyTimes, pattern: Pattern): Loss =>
  (reading, pass) => {
    if (reading < event.first) return 0;
    const { azimuthDeg, elevationDeg } = directionAt(pass, trackEvery, reading);
    if (event.levelDbHz !== null) return patternDbHz(pattern, elevationDeg) - event.levelDbHz;
    if (!event.sector) return event.lossDb;
    return elevationDeg < BLOCKED_BELOW_DEG && isInSector(event.sector, azimuthDeg) ? event.lossDb : 0;
  };

const LEAST_CHANGE_DB = 1; // of a C/N0 that fell or rose: or a mean of a few satellites would not show it

function isFair({ verdict, event, cn0ChangeDb }: JammedOrNotTruth): boolean {
  if (Number.isNaN(cn0ChangeDb)) return false;
  if (verdict === "deceived") return cn0ChangeDb >= LEAST_CHANGE_DB;
  return event.lossDb === 0 || cn0ChangeDb <= -LEAST_CHANGE_DB;
}
