import type { GridOverview } from "@/components/plots/gridOverview";
import type { Stretch } from "@/lib/gnss/interference/stretchSpectrogram";
import type { SearchMap } from "@/lib/gnss/search/searchMap";
import type { SearchRequest } from "@/lib/gnss/search/searchPlanOf";
import type { SkySearch } from "@/lib/gnss/search/searchSky";
import type { CaptureDescription, CaptureSource, TypedFormat } from "./readCapture";
import type { ShownSpectrogram } from "./shownSpectrogram";
import { startCaptureWorker } from "./startWorkers";
import type { CaptureAnswer, CaptureOrder, CaptureTask } from "./workers/capture.worker";

export type CaptureBusy = { step: "read" | "search"; done?: number; total?: number };
export type CaptureFileState = {
  busy: CaptureBusy | null;
  description: CaptureDescription | null;
  one: { map: SearchMap; overview: GridOverview; request: SearchRequest } | null;
  all: { sky: SkySearch; request: SearchRequest } | null;
  refused: string | null;
  /** The newest, while the next one is being computed; null before the first. */
  spectrogram: ShownSpectrogram | null;
  spectrogramRefused: string | null;
};

const NOTHING: CaptureFileState = {
  busy: null,
  description: null,
  one: null,
  all: null,
  refused: null,
  spectrogram: null,
  spectrogramRefused: null,
};

/** The files chosen last on this page, for as long as it is open. */
let kept: Omit<CaptureSource, "typed"> | null = null;

/** A recording on this device and what is found in it, all of it computed off the page's own thread; one task at a time. */
export class CaptureReader {
  state: CaptureFileState = NOTHING;
  private listeners = new Set<() => void>();
  private worker: Worker | null = null;
  private source: CaptureSource | null = null;
  private file = 0;
  private orders = 0;
  private job = 0;
  private drawing = 0;
  private typed: TypedFormat | null = null;
  private stretch: Stretch = { fromS: 0, lengthS: null };

  readonly subscribe = (listener: () => void) => {
    this.listeners.add(listener);
    return () => void this.listeners.delete(listener);
  };

  /** What is typed in now. A file that was read as typed in is read again; one that lay open before is opened. */
  readAs(typed: TypedFormat): void {
    this.typed = typed;
    if (!this.source) {
      if (kept) this.open(kept);
      return;
    }
    const before = this.source.typed;
    const used = this.state.description?.readAsTyped ?? (["format", "rateHz", "carrierHz"] as const);
    if (used.some((key) => typed[key] !== before[key])) this.open(this.source);
  }

  open({ data, meta }: Omit<CaptureSource, "typed">): void {
    if (!this.typed) return;
    kept = { data, meta };
    this.source = { data, meta, typed: this.typed };
    this.file += 1;
    this.begin({ ...NOTHING, busy: { step: "read" } }, { kind: "open" });
    this.draw(this.stretch);
  }

  search(task: CaptureTask): void {
    this.begin({ ...this.state, busy: { step: "search" }, refused: null }, task);
    if (this.drawing) this.draw(this.stretch); // the worker that was at it has been stopped
  }

  /** Draws a stretch once what is under way is done. */
  draw(stretch: Stretch): void {
    this.stretch = stretch;
    if (!this.source) return;
    this.drawing = this.orders + 1;
    this.order({ kind: "spectrogram", stretch });
  }

  cancel(): void {
    this.stop();
    this.change({ ...this.state, busy: null });
    if (this.drawing && this.state.description) this.draw(this.stretch);
  }

  /** Nobody looks any more. */
  end(): void {
    this.stop();
    this.source = null;
  }

  private stop(): void {
    this.worker?.terminate();
    this.worker = null;
    this.job = 0;
  }

  /** What was under way is wanted no more. */
  private begin(state: CaptureFileState, task: CaptureTask): void {
    if (this.state.busy) this.stop();
    this.change(state);
    this.job = this.orders + 1;
    this.order(task);
  }

  private order(task: CaptureTask): void {
    if (!this.source) return;
    if (!this.worker) {
      const own = startCaptureWorker();
      own.addEventListener("message", ({ data }: MessageEvent<CaptureAnswer>) => {
        if (own === this.worker) this.take(data);
      });
      this.worker = own;
    }
    this.orders += 1;
    const order: CaptureOrder = { job: this.orders, file: this.file, source: this.source, task };
    this.worker.postMessage(order);
  }

  private take(answer: CaptureAnswer): void {
    if (answer.job === this.job) this.change(stateAfter(this.state, answer));
    else if (answer.kind === "opened") this.change({ ...this.state, description: answer.description });
    else if (answer.job === this.drawing) this.drawn(answer);
  }

  private drawn(answer: CaptureAnswer): void {
    if (answer.kind === "spectrogram")
      this.change({ ...this.state, spectrogram: answer.shown, spectrogramRefused: null });
    else if (answer.kind === "refused") this.change({ ...this.state, spectrogramRefused: answer.message });
    if (answer.kind === "done" || answer.kind === "refused") this.drawing = 0;
  }

  private change(state: CaptureFileState): void {
    this.state = state;
    for (const listener of this.listeners) listener();
  }
}

function stateAfter(before: CaptureFileState, answer: CaptureAnswer): CaptureFileState {
  switch (answer.kind) {
    case "progress":
      return { ...before, busy: answer };
    case "opened":
      return { ...before, description: answer.description };
    case "one":
      return { ...before, one: answer };
    case "all":
      return { ...before, all: answer };
    case "spectrogram":
      return before;
    case "done":
      return { ...before, busy: null };
    case "refused":
      return { ...before, busy: null, refused: answer.message };
  }
}
