import { meanChangeDb } from "@/lib/gnss/sky/cn0Change";
import { utcOf, type ReceiverLog } from "@/lib/gnss/sky/receiverLog";
import { mean } from "@/lib/numeric/statistics";
import type { Answers, PublicCase } from "../kind";
import { findSteps } from "../receiver-log/findSteps";
import type { Indication, Verdict } from "./quantities";

/** What a careful person reads off the instruments. */
export type InstrumentReading = {
  verdict: Verdict;
  start: number;
  gainDb: number;
  cn0Db: number;
  indications: readonly [Indication, Indication];
  /** First reading at which clock or position has plainly left, for those who look there first. */
  pulled: number;
  /** What the pull is seen in, twice over; null where nothing is pulled. */
  pulledTwice: readonly [Indication, Indication] | null;
};

/** The right method, from the public case alone: gain control and C/N0 together, then clock, position and Doppler. */
export const solve = (publicCase: PublicCase): Answers => answersFor(logOf(publicCase), readCase(publicCase));

export const logOf = ({ data }: PublicCase): ReceiverLog => data.log as ReceiverLog;

const LEAST_GAIN_DB = 1;
const LEAST_CN0_DB = 2.2;
const LEAST_DOPPLER_HZ = 0.9;
const NOT_TRACKED_DBHZ = 22;

export function readCase({ data }: PublicCase): InstrumentReading {
  const log = data.log as ReceiverLog;
  const gain = findSteps(data.gainDb as number[], LEAST_GAIN_DB)[0];
  const shift = findSteps(data.dopplerMeanHz as number[], LEAST_DOPPLER_HZ)[0];
  const apart = findSteps(data.dopplerSpreadHz as number[], LEAST_DOPPLER_HZ)[0];
  const pull = shift ?? apart;
  const pulledTwice = shift
    ? (["clock-ran", "doppler-common"] as const)
    : apart
      ? (["position-ran", "doppler-apart"] as const)
      : null;
  const found = (start: number, gainDb: number, verdict: Verdict, indications: readonly [Indication, Indication]) => ({
    ...{ verdict, start, indications, gainDb, cn0Db: meanChangeDb(log, start), pulled: pull?.at ?? start, pulledTwice },
  });
  if (gain) {
    const gainDb = levelChange(data.gainDb as number[], gain.at);
    const rose = meanChangeDb(log, gain.at) > 0;
    if (gainDb > 0) return found(gain.at, gainDb, "faulty", ["cn0-all-fell", "gain-up"]);
    if (rose) return found(gain.at, gainDb, "deceived", ["cn0-alike", "gain-down"]);
    return found(gain.at, gainDb, "jammed", ["cn0-all-fell", "gain-down"]);
  }
  if (shift) return found(shift.at, 0, "faulty", ["clock-ran", "cn0-stayed"]);
  return found(firstFall(log), 0, "blocked", ["cn0-one-side", "gain-stayed"]);
}

/** Of a level that stepped once: mean after less mean before. */
const levelChange = (values: readonly number[], at: number): number =>
  mean(values.slice(at)) - mean(values.slice(0, at));

/** The reading at which most satellites that fell did so: one alone may pass an edge. */
function firstFall({ passes }: ReceiverLog): number {
  const falls = passes.flatMap(({ first, cn0DbHz }) =>
    findSteps(
      cn0DbHz.map((cn0) => cn0 ?? NOT_TRACKED_DBHZ),
      LEAST_CN0_DB,
    )
      .filter(({ size }) => size < 0)
      .map(({ at, size }) => ({ reading: first + at, size })),
  );
  const deepest = Math.min(0, ...falls.map(({ size }) => size));
  const plain = falls.filter(({ size }) => size <= deepest / 2).map(({ reading }) => reading);
  return plain.length > 0 ? Math.min(...plain) : 0;
}

/** Written down as people do. */
export function answersFor(log: ReceiverLog, reading: InstrumentReading): Answers {
  return {
    "finding.verdict": reading.verdict,
    "finding.start": utcOf(log, reading.start),
    "finding.gainChange": reading.gainDb.toFixed(1),
    "finding.cn0Change": reading.cn0Db.toFixed(1),
    "finding.first": reading.indications[0],
    "finding.second": reading.indications[1],
  };
}
