import { gridOverview, type GridOverview } from "@/components/plots/gridOverview";
import type { Stretch } from "@/lib/gnss/interference/stretchSpectrogram";
import { searchMap, type SearchMap } from "@/lib/gnss/search/searchMap";
import type { SampledCapture } from "@/lib/gnss/search/sampledCapture";
import type { SearchRequest } from "@/lib/gnss/search/searchPlanOf";
import { searchSignalOf } from "@/lib/gnss/search/searchSignal";
import { searchSky, type SkySearch } from "@/lib/gnss/search/searchSky";
import { gpsL1Ca } from "@/lib/gnss/signals/gpsL1Ca";
import { FormatError } from "@/lib/formats/FormatError";
import { readCapture, type CaptureDescription, type CaptureSource } from "../readCapture";
import { shownSpectrogram, type ShownSpectrogram } from "../shownSpectrogram";
import "./tellFiles";

export type CaptureTask =
  | { kind: "open" }
  | { kind: "one"; prn: number; request: SearchRequest }
  | { kind: "all"; request: SearchRequest }
  | { kind: "spectrogram"; stretch: Stretch };
/** A worker that begins anew after a cancelled task has no samples; so each task brings its file, which is read when it is new. */
export type CaptureOrder = { job: number; file: number; source: CaptureSource; task: CaptureTask };
export type CaptureAnswer = { job: number } & (
  | { kind: "progress"; step: "read" | "search"; done: number; total: number }
  | { kind: "opened"; description: CaptureDescription }
  | { kind: "one"; map: SearchMap; overview: GridOverview; request: SearchRequest }
  | { kind: "all"; sky: SkySearch; request: SearchRequest }
  | { kind: "spectrogram"; shown: ShownSpectrogram }
  | { kind: "done" }
  | { kind: "refused"; message: string }
);

const SIGNAL = searchSignalOf(gpsL1Ca);
const PRNS = Array.from({ length: 32 }, (_, n) => n + 1);
const EVERY_MS = 100; // more often nobody sees it, and each message is work for the page

let open: { file: number; capture: SampledCapture } | null = null;
/** A file is read in slices: the next order waits until it is whole. */
let before: Promise<void> = Promise.resolve();

addEventListener("message", ({ data }: MessageEvent<CaptureOrder>) => {
  before = before.then(() => carryOut(data));
});

async function carryOut({ job, file, source, task }: CaptureOrder): Promise<void> {
  const answer = (message: CaptureAnswer, transfer: Transferable[] = []) => postMessage(message, { transfer });
  let told = 0;
  const progress = (step: "read" | "search") => (done: number, total: number) => {
    if (performance.now() - told < EVERY_MS) return;
    told = performance.now();
    answer({ job, kind: "progress", step, done: Math.floor(done), total });
  };
  try {
    if (open?.file !== file) {
      const { description, capture } = await readCapture(source, progress("read"));
      open = { file, capture };
      answer({ job, kind: "opened", description });
    }
    if (task.kind === "one") {
      const map = searchMap(open.capture, SIGNAL, task.prn, task.request, progress("search"));
      const overview = gridOverview(map.power, map.lagsChips.length);
      answer({ job, kind: "one", map, overview, request: task.request }, [map.power.buffer]);
    } else if (task.kind === "all") {
      const sky = searchSky(open.capture, SIGNAL, PRNS, [], task.request, progress("search"));
      answer({ job, kind: "all", sky, request: task.request });
    } else if (task.kind === "spectrogram") {
      const shown = shownSpectrogram(open.capture, task.stretch);
      answer({ job, kind: "spectrogram", shown }, [shown.power.buffer]);
    }
    answer({ job, kind: "done" });
  } catch (error) {
    if (!(error instanceof RangeError || error instanceof FormatError)) throw error;
    answer({ job, kind: "refused", message: error.message });
  }
}
