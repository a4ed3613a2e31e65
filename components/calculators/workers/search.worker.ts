import { gridOverview, type GridOverview } from "@/components/plots/gridOverview";
import { searchGrid, type SearchSettings } from "@/lib/gnss/acquire";

export type SearchRequest =
  | { kind: "capture"; samples: Int8Array; rateHz: number }
  | { kind: "search"; run: number; prn: number; settings: SearchSettings };
export type SearchedGrid = {
  dopplersHz: Float64Array;
  lagsChips: Float64Array;
  power: Float32Array;
  overview: GridOverview;
  threshold: number;
};
export type SearchAnswer =
  | { kind: "grid"; run: number; prn: number; settings: SearchSettings; grid: SearchedGrid }
  | { kind: "refused"; run: number; message: string };

let capture: { samples: Int8Array; rateHz: number } | null = null;

addEventListener("message", ({ data }: MessageEvent<SearchRequest>) => {
  if (data.kind === "capture") {
    capture = { samples: data.samples, rateHz: data.rateHz };
    return;
  }
  const { run, prn, settings } = data;
  const answer = (message: SearchAnswer, transfer: Transferable[] = []) => postMessage(message, { transfer });
  try {
    if (!capture) throw new RangeError("search: there is no capture yet");
    const grid = searchGrid(capture, prn, settings);
    const overview = gridOverview(grid.power, grid.lagsChips.length);
    answer({ kind: "grid", run, prn, settings, grid: { ...grid, overview } }, [grid.power.buffer]);
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    answer({ kind: "refused", run, message: error.message });
  }
});
