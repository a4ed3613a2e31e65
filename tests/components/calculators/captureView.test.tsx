// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { pairOf } from "@/components/calculators/CaptureChooser";
import { CaptureView } from "@/components/calculators/CaptureView";
import { gridOverview } from "@/components/plots/gridOverview";
import type { CaptureAnswer, CaptureOrder } from "@/components/calculators/workers/capture.worker";
import { startValues } from "@/lib/calculators/calculator";
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
    const description = { name: source.data.name, format: "cf32_le", rateHz: 4.092e6, carrierHz: 0, facts, spectrum };
    answer({ job, kind: "opened", description });
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

const shown = (prn: number) =>
  render(<CaptureView values={{ ...startValues(CAPTURE_VIEW), prn }} onChange={() => {}} />).container;
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
