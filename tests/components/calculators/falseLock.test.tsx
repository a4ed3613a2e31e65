// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { FalseLock } from "@/components/calculators/FalseLock";
import { gridOverview } from "@/components/plots/gridOverview";
import { startValues, type ValuesOf } from "@/lib/calculators/calculator";
import { FALSE_LOCK } from "@/lib/calculators/falseLock";
import { falsePeaks } from "@/lib/gnss/falseLock";
import { falsePeakMap } from "@/lib/gnss/falsePeakMap";
import type { FalseLockAnswer, FalseLockRequest } from "@/components/calculators/workers/falseLock.worker";

/** Answers at once what the worker would answer a moment later. */
class AnsweringWorker {
  private listen: (event: { data: FalseLockAnswer }) => void = () => {};
  addEventListener(_: string, listen: (event: { data: FalseLockAnswer }) => void) {
    this.listen = listen;
  }
  postMessage({ run, question }: FalseLockRequest) {
    const map = falsePeakMap(question);
    const overview = gridOverview(map.power, map.lagsChips.length);
    this.listen({ data: { run, peaks: falsePeaks(question), map, overview } });
  }
  terminate() {}
}

beforeEach(() => {
  vi.stubGlobal("Worker", AnsweringWorker);
  vi.spyOn(HTMLCanvasElement.prototype, "getContext").mockReturnValue(null);
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

const shown = (values: Partial<ValuesOf<typeof FALSE_LOCK>>) =>
  render(<FalseLock values={{ ...startValues(FALSE_LOCK), ...values }} onChange={() => {}} />).container;
const reading = (label: RegExp) => screen.getByText(label).parentElement!.textContent;

// PRN 5 at 52 dB-Hz in the grid of PRN 4: 21.0806 dB below its own peak, as computed by a second program.
test("a strong satellite fills the place of one that is not there", () => {
  shown({});
  expect(reading(/^Apparent C\/N0 of/)).toContain("30.9 dB-Hz");
  expect(reading(/^Apparent C\/N0 of/)).toContain("21.1 dB below");
  expect(screen.getByRole("status").textContent).toBe("The search takes a false peak for PRN 4");
  expect(screen.getAllByRole("row").length).toBe(13);
});

// A false peak of 27 dB-Hz is seen by 4 ms x 20 with 0.62, one of 24 with 0.02: simulated by a second program, +-5 kHz.
test.each([
  [48.0806, "62", "The search may take a false peak for PRN 4"],
  [45.0806, "2", "The search hardly sees the false peaks"],
])("at %d dB-Hz the chance is %s %%", (cn0DbHz, percent, verdict) => {
  shown({ cn0DbHz, coherentMs: 4, sums: 20, windowHz: 5000 });
  expect(reading(/^Chance/)).toMatch(new RegExp(`search takes it(${percent}\\.\\d|${Number(percent) - 1}\\.[5-9])`));
  expect(screen.getByRole("status").textContent).toBe(verdict);
});

test("the cursor begins at the highest peak and moves by keyboard", async () => {
  const user = userEvent.setup();
  shown({});
  const tag = () => document.querySelector(".plot-tag")!.textContent!;
  expect(tag()).toContain("30.9 dB-Hz");
  screen.getByRole("application").focus();
  await user.keyboard("{Home}");
  expect(tag()).toContain(", 0 chip");
});

test("the same satellite twice is said in words", () => {
  shown({ strongPrn: 4 });
  expect(screen.getByText("Both are the same satellite")).toBeTruthy();
  expect(screen.queryByRole("application")).toBeNull();
});
