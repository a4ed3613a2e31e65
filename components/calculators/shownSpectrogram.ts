import { gridOverview, type GridOverview } from "@/components/plots/gridOverview";
import { stretchSpectrogram, type Stretch } from "@/lib/gnss/interference/stretchSpectrogram";
import type { SampledCapture } from "@/lib/gnss/search/sampledCapture";

/** A spectrogram as it is drawn. */
export type ShownSpectrogram = {
  /** Of each cell's middle. */
  fromL1MHz: Float64Array;
  timesMs: Float64Array;
  /** Density row after row, the median of all cells = 1. */
  power: Float32Array;
  overview: GridOverview;
  resolutionKHz: number;
  rowMs: number;
  averaged: number;
};

export function shownSpectrogram(capture: SampledCapture, stretch: Stretch): ShownSpectrogram {
  const { offsetsHz, densityPerHz, timesS, resolutionHz, rowS, averaged } = stretchSpectrogram(capture, stretch);
  const median = Float64Array.from(densityPerHz).sort()[densityPerHz.length >> 1];
  const power = Float32Array.from(densityPerHz, (density) => density / Math.max(median, 1e-300));
  return {
    fromL1MHz: offsetsHz.map((hz) => hz / 1e6),
    timesMs: timesS.map((s) => 1000 * s),
    power,
    overview: gridOverview(power, offsetsHz.length),
    resolutionKHz: resolutionHz / 1000,
    rowMs: 1000 * rowS,
    averaged,
  };
}
