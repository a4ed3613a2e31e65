import { cableDelayNs } from "@/lib/gnss/chain/cableDelay";
import { echoes } from "@/lib/gnss/chain/echoes";
import { echoTrace } from "@/lib/gnss/chain/echoTrace";
import type { Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import type { DelayEntryParameters } from "./parameters";

/** Two traces of one reflectometer: its test lead alone with the far end open, and the run connected, its far end open. */
export type Echoes = {
  /** There and back, from the sent edge. */
  leadNs: number;
  endNs: number;
  stepNs: number;
  leadTrace: number[];
  endTrace: number[];
};

const IMPEDANCE_OHM = 50;
const TEST_LEAD_FACTOR = 0.66; // solid polyethylene; common practice, no source
const STEP_NS = 0.5;
const LOSS_DB_PER_100M = [1, 3] as const; // of an edge; common practice, no source
const NOISE = 0.004; // of the sent step; common practice, no source

export function drawEcho(random: Random, { length, velocityFactor }: DelayEntryParameters): Echoes {
  const leadOneWayNs = between(random, 9, 20);
  const runNs = cableDelayNs(between(random, ...length), between(random, ...velocityFactor));
  const [leadNs, endNs] = [2 * leadOneWayNs, 2 * (leadOneWayNs + runNs)];
  const riseNs = between(random, 2, 4);
  const lossDbPer100M = between(random, ...LOSS_DB_PER_100M);
  const points = Math.ceil((endNs * 1.12 + 20) / STEP_NS);
  const traceTo = (echoNs: number) => {
    const distanceM = echoNs / cableDelayNs(2, TEST_LEAD_FACTOR);
    const faults = [{ distanceM, kind: "end", ohm: Infinity } as const];
    const line = { impedanceOhm: IMPEDANCE_OHM, velocityFactor: TEST_LEAD_FACTOR, lossDbPer100M, faults };
    const trace = echoTrace(echoes(line), { points, stepNs: STEP_NS, riseNs }, { sigma: NOISE, random });
    return Array.from(trace, (value) => Math.round(value * 1000) / 1000 + 0); // + 0: no minus zero
  };
  return { leadNs, endNs, stepNs: STEP_NS, leadTrace: traceTo(leadNs), endTrace: traceTo(endNs) };
}
