import type { Capture } from "@/lib/gnss/searchSettings";
import { seededRandom } from "@/lib/numeric/random";
import { drawStart } from "../drawStart";
import { analyse, type CaptureReading } from "./analyse";
import { PRESENT_CLASSES } from "./classes";
import { drawScene, fullScaleDb, MHZ, type InterfererScene } from "./drawScene";
import { makeCapture } from "./makeCapture";
import type { InterfererParameters } from "./parameters";
import { centreToleranceHz } from "./tolerances";

export type InterfererTruth = {
  scene: InterfererScene;
  durationMs: number;
  startedAt: string;
  /** What the server's own careful analysis reads from the samples, for the workings. */
  reading: CaptureReading;
};

export type DrawnCase = { truth: InterfererTruth; capture: Capture; draws: number };

/** Draws until a careful analysis of the samples reads every figure to about half of its tolerance. */
export function drawCase(seedHex: string, parameters: InterfererParameters): DrawnCase {
  const first = seededRandom(seedHex, "interferer@1/case");
  const cls = first.uniform() * 100 < parameters.nothing ? "nothing" : first.pick(PRESENT_CLASSES); // before the draws, so that refusing does not move the shares
  const startedAt = drawStart(first);
  const { durationMs } = parameters;
  for (let draws = 1; draws <= 50; draws++) {
    const scene = drawScene(cls, parameters, seededRandom(seedHex, `interferer@1/draw-${draws}`));
    const capture = makeCapture(scene, durationMs, seededRandom(seedHex, `interferer@1/noise-${draws}`));
    const reading = analyse(capture);
    if (isFair(scene, reading)) return { truth: { scene, durationMs, startedAt, reading }, capture, draws };
  }
  throw new Error("interferer: no fair capture in 50 draws");
}

function isFair({ class: cls, figures, floorPerHz, ownLineDb }: InterfererScene, reading: CaptureReading): boolean {
  const near = (value: number, truth: number, allowed: number) => Math.abs(value - truth) <= allowed;
  return (
    reading.class === cls &&
    near(reading.centreHz, figures.centreHz, 0.4 * centreToleranceHz(figures)) &&
    near(reading.bandwidthHz, figures.bandwidthHz, 0.1 * figures.bandwidthHz) &&
    near(reading.periodS, figures.periodS, 0.01 * figures.periodS) &&
    near(reading.levelDb, figures.levelDb, 0.5) &&
    near(reading.floorDb, fullScaleDb(floorPerHz * MHZ), 0.4) &&
    near(reading.ownLineDb, ownLineDb, 0.5)
  );
}
