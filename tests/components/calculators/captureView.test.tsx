// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { pairOf } from "@/components/calculators/CaptureChooser";
import { CaptureView } from "@/components/calculators/CaptureView";
import { gridOverview } from "@/components/plots/gridOverview";
import type { CaptureAnswer, CaptureOrder } from "@/components/calculators/workers/capture.worker";
import { shownSpectrogram } from "@/components/calculators/shownSpectrogram";
import { startValues, type ValuesOf } from "@/lib/calculators/calculator";
import { CAPTURE_VIEW } from "@/lib/calculators/captureView";
import { describeSamples } from "@/lib/formats/describeSamples";
import { sampleFormatNamed } from "@/lib/formats/sampleFormat";
import { powerSpectrum } from "@/lib/gnss/interference/spectrum";
import { searchMap } from "@/lib/gnss/search/searchMap";
import { searchSignalOf } from "@/lib/gnss/search/searchSignal";
import { gpsL1Ca } from "@/lib/gnss/signals/gpsL1Ca";
import { rawCapture } from "@/tests/gnss/search/rawCapture";

// Written down from the definition of the signal, apart from the engine: PRN 12 at 46 dB-Hz, 400.3 chip, 1240 Hz.
const satellite = { prn: 12, codePhaseChips: 400.3, dopplerHz: 1240, cn0DbHz: 46 };
const scene = { seed: "5a".repeat(32), rateHz: 4.092e6, ifHz: 0, complex: true, durationMs: 12 };
const capture = rawCapture({ ...scene, satellites: [satellite] });
const facts = describeSamples(Float32Array.from(capture.samples), sampleFormatNamed("cf32_le")!);
const spectrum = powerSpectrum(capture, { points: 1024, window: "blackman-harris", step: 512 });

let orders: CaptureOrder[] = [];
let stopped = 0;

/** Answers at once what the worker would answer a moment later; a search of all never ends. */
class AnsweringWorker {
  private listen: (event: { data: CaptureAnswer }) => void = () => {};
  addEventListener(_: string, listen: (event: { data: CaptureAnswer }) => void) {
    this.listen = listen;
  }
  postMessage(order: CaptureOrder) {
    orders.push(order);
    const { job, source, task } = order;
    const answer = (message: CaptureAnswer) => this.listen({ data: message });
    if (source.data.name.startsWith("broken"))
      return answer({ job, kind: "refused", message: "byte 40: the samples end in the middle of one." });
    const readAsTyped = source.meta ? [] : (["format", "rateHz", "carrierHz"] as const);
    const hash = source.meta ? "differs" : null;
    const read = {
      name: source.data.name,
      format: "cf32_le",
      rateHz: 4.092e6,
      carrierHz: 0,
      readAsTyped,
      hash,
    } as const;
    answer({ job, kind: "opened", description: { ...read, facts, spectrum } });
    if (task.kind === "spectrogram") {
      if (task.stretch.fromS > 0.012)
        return answer({ job, kind: "refused", message: "stretchSpectrogram: 32 samples at least, got 0 from 1 s on" });
      answer({ job, kind: "spectrogram", shown: shownSpectrogram(capture, task.stretch) });
    }
    if (task.kind === "all") return answer({ job, kind: "progress", step: "search", done: 3, total: 57 });
    if (task.kind === "one") {
      const map = searchMap(capture, searchSignalOf(gpsL1Ca), task.prn, task.request);
      const overview = gridOverview(map.power, map.lagsChips.length);
      answer({ job, kind: "one", map, overview, request: task.request });
    }
    answer({ job, kind: "done" });
  }
  terminate() {
    stopped += 1;
  }
}

beforeEach(() => {
  orders = [];
  stopped = 0;
  vi.stubGlobal("Worker", AnsweringWorker);
  vi.spyOn(HTMLCanvasElement.prototype, "getContext").mockReturnValue(null);
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

type Values = ValuesOf<typeof CAPTURE_VIEW>;
const view = (values: Partial<Values>) => (
  <CaptureView values={{ ...startValues(CAPTURE_VIEW), ...values }} onChange={() => {}} />
);
const shown = (prn: number, values: Partial<Values> = {}) => {
  const { rerender } = render(view({ prn, ...values }));
  orders = []; // of a file that lay open before
  return (changed: Partial<Values>) => rerender(view({ prn, ...changed }));
};
const choose = (...names: string[]) =>
  fireEvent.change(screen.getByLabelText("Recording"), {
    target: { files: names.map((name) => new File(["x"], name)) },
  });
const reading = (label: RegExp) => screen.getByText(label).parentElement!.textContent;

test("before a file is there it says so, and no search can be started", async () => {
  shown(12);
  expect(screen.getByText("No file yet")).toBeTruthy();
  expect(screen.getByText(/nothing is uploaded/)).toBeTruthy();
  await userEvent.setup().click(screen.getByRole("button", { name: /^Search PRN 12/ }));
  expect(orders).toEqual([]);
});

test("a file is described, and one satellite of it is found where it stands", async () => {
  const user = userEvent.setup();
  shown(12);
  choose("roof.bin");
  expect(orders[0].source.typed).toEqual({ format: "ci8", rateHz: 4.092e6, carrierHz: 0 });
  expect(screen.getByText("12.0 ms")).toBeTruthy();
  expect(screen.getByText("cannot be told")).toBeTruthy(); // floating point has no ends
  expect(screen.getByText(/^Resolution 8\.\d\d kHz/)).toBeTruthy(); // two bins of 3.996 kHz: Harris, 1978
  await user.click(screen.getByRole("button", { name: "Search PRN 12" }));
  expect(screen.getByText("PRN 12 passes the threshold")).toBeTruthy();
  expect(reading(/^Code phase at the first/)).toMatch(/400\.[23]/);
  expect(reading(/^Doppler$/)).toMatch(/\+1.?2[0-9]{2} Hz/);
});

test("a satellite that is not there does not pass", async () => {
  shown(20);
  choose("roof.bin");
  await userEvent.setup().click(screen.getByRole("button", { name: "Search PRN 20" }));
  expect(screen.getByText("PRN 20 does not pass the threshold")).toBeTruthy();
});

test("a change of what is typed in is read at once; what the metadata say is not asked for", () => {
  const change = shown(12);
  choose("roof.bin");
  change({ format: "ci16_le", rateMHz: 2.046 });
  expect(orders.filter(({ task }) => task.kind === "open").map(({ source }) => source.typed)).toEqual([
    { format: "ci8", rateHz: 4.092e6, carrierHz: 0 },
    { format: "ci16_le", rateHz: 2.046e6, carrierHz: 0 },
  ]);
  choose("roof.sigmf-meta", "roof.sigmf-data");
  expect(screen.queryByLabelText(/Sample rate/)).toBeNull();
  orders = [];
  change({ format: "cu8" });
  expect(orders).toEqual([]);
});

test("the file is there again after another calculator was looked at", () => {
  shown(12);
  choose("north.bin");
  cleanup();
  render(view({}));
  expect(screen.getByText("north.bin")).toBeTruthy();
});

test("a hash that differs is told, and the recording is shown all the same", () => {
  shown(12);
  choose("roof.sigmf-meta", "roof.sigmf-data");
  expect(screen.getByText(/not the samples that the metadata were written for/)).toBeTruthy();
  expect(screen.getByText("Spectrum")).toBeTruthy();
});

// 12 ms at 4.092 MHz are 49 104 samples, 222 squared: 256 points, two bins of 16 kHz (Harris, 1978).
test("the spectrogram says its resolution, and a stretch beyond the end is refused in words", async () => {
  const change = shown(12);
  choose("roof.bin");
  const plot = screen.getByRole("application", { name: /^Spectrogram of the recording/ });
  expect(screen.getByText(/^Resolution 32\.\d\d kHz and 0\.\d+ ms/)).toBeTruthy();
  fireEvent.keyDown(plot, { key: "Home" });
  expect(plot.getAttribute("aria-label")).toMatch(/\u22122\.046 MHz, \d+\.\d+ ms, [+\u2212]\d+\.\d dB$/);
  change({ fromMs: 1000 });
  expect(screen.getByText(/^32 samples at least, got 0/)).toBeTruthy();
});

test("a long search tells how far it is and can be stopped", async () => {
  const user = userEvent.setup();
  shown(12);
  choose("roof.bin");
  await user.click(screen.getByRole("button", { name: "Search all 1 to 32" }));
  expect(screen.getByRole("progressbar").getAttribute("aria-valuenow")).toBe("3");
  await user.click(screen.getByRole("button", { name: "Stop the search" }));
  expect(stopped).toBe(1);
  expect(screen.queryByRole("progressbar")).toBeNull();
});

test("a fault of the file is told with its place", () => {
  shown(12);
  choose("broken.bin");
  expect(screen.getByText(/Byte 40: the samples end/)).toBeTruthy();
});

test("samples and metadata are chosen together", () => {
  const files = (...names: string[]) => names.map((name) => new File([], name));
  expect(pairOf(files("a.sigmf-meta"))).toMatch(/together with its/);
  expect(pairOf(files("a.sigmf-data"))).toMatch(/sigmf-meta/);
  expect(pairOf(files("a.bin", "b.bin"))).toMatch(/one recording/);
  expect(pairOf(files("a.sigmf-meta", "a.sigmf-data"))).toMatchObject({ data: { name: "a.sigmf-data" } });
  expect(pairOf(files("a.bin"))).toMatchObject({ data: { name: "a.bin" }, meta: null });
});
