import type { Capture } from "@/lib/gnss/searchSettings";
import { createInterference } from "@/lib/gnss/interference/addInterference";
import type { Random } from "@/lib/numeric/random";
import { FULL_SCALE, RATE_HZ, type InterfererScene } from "./drawScene";

/**
 * The capture of a scene as complex 8-bit integers: interference, noise, the mirrored share of both that unequal I and Q
 * give, the line at 0 Hz, rounding.
 */
export function makeCapture(scene: InterfererScene, durationMs: number, random: Random): Capture {
  const values = new Float64Array((2 * RATE_HZ * durationMs) / 1000);
  if (scene.interferer) createInterference(scene.interferer, RATE_HZ, random).addTo(values);
  const samples = new Int8Array(values.length);
  const { sigma, imageShare, offsetI, offsetQ } = scene;
  for (let n = 0; n < values.length; n += 2) {
    const i = values[n] + sigma * random.gaussian();
    const q = values[n + 1] + sigma * random.gaussian();
    samples[n] = rounded((1 + imageShare) * i + offsetI);
    samples[n + 1] = rounded((1 - imageShare) * q + offsetQ);
  }
  return { samples, rateHz: RATE_HZ };
}

const rounded = (counts: number) => Math.max(-FULL_SCALE, Math.min(FULL_SCALE, Math.floor(counts + 0.5)));
