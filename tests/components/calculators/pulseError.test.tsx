// @vitest-environment jsdom
import { act, cleanup, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { PulseError } from "@/components/calculators/PulseError";
import type { PulseAnswer, PulseQuestion } from "@/components/calculators/workers/pulse.worker";
import { startValues, type ValuesOf } from "@/lib/calculators/calculator";
import { PULSE_ERROR } from "@/lib/calculators/pulseError";
import { pulseReport } from "@/lib/gnss/timing/pulseReport";

let asked: (PulseQuestion & { run: number })[] = [];
let answer: (data: PulseAnswer) => void = () => {};

beforeEach(() => {
  asked = [];
  vi.stubGlobal(
    "Worker",
    class {
      addEventListener(_type: string, listener: (event: { data: PulseAnswer }) => void) {
        answer = (data) => listener({ data });
      }
      postMessage(question: PulseQuestion & { run: number }) {
        asked.push(question);
      }
      terminate() {}
    },
  );
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

type Values = ValuesOf<typeof PULSE_ERROR>;
const STILL: Partial<Values> = { startNs: 0, driftPerDay: 0, perKelvin: 0, frequencyUncertainty: 0 };
const shown = (values: Partial<Values>) =>
  render(<PulseError values={{ ...startValues(PULSE_ERROR), ...values }} onChange={() => {}} />);
const reading = (label: string | RegExp) => screen.getByText(label).parentElement!.textContent;

// x = y0 t, ITU-T G.810 by hand: 1e-11 runs 100 ns away in 10 000 s, 864 ns in a day.
test("holdover: time to the limit and error after the outage", () => {
  shown({ ...STILL, frequencyOffset: 1e-11, allowedNs: 100, hours: 24 });
  expect(reading(/^Time to ± 100 ns/)).toContain("2.8 h");
  expect(reading(/^Expected after 24\.0 h/)).toContain("+864.0 ns");
  expect(screen.getByRole("status").textContent).toBe("Does not last through the outage");
  cleanup();
  shown({ ...STILL, frequencyOffset: 0, hours: 10 });
  expect(reading(/^Time to/)).toContain("more than 240 h");
  expect(screen.getByRole("status").textContent).toBe("Lasts through the outage");
});

test("a pasted log is read at once and told against its limits", async () => {
  const user = userEvent.setup();
  shown({ source: "log", clock: "PRTC-B" });
  await user.click(screen.getByRole("textbox", { name: /Time and time error/ }));
  await user.paste("0 30\n1 41\n2 35\n3 20");
  expect(asked.at(-1)).toMatchObject({ text: "0 30\n1 41\n2 35\n3 20", clock: "PRTC-B", leaveOut: false, offsetNs: 0 });
  const { report, series } = pulseReport({ intervalS: 1, valuesNs: Float64Array.of(30, 41, 35, 20) }, "PRTC-B", false);
  act(() =>
    answer({ run: asked.at(-1)!.run, kind: "report", report, readings: 4, intervalS: 1, valuesNs: series.valuesNs }),
  );
  expect(reading("max|TE|")).toContain("41.0 nsof 40 ns");
  expect(screen.getAllByRole("status")[0].textContent).toContain("max|TE|");
  expect(screen.getByRole("application", { name: /^Time error over/ })).toBeTruthy();
});

test("a fault of the log is told with its line", async () => {
  const user = userEvent.setup();
  shown({ source: "log" });
  await user.click(screen.getByRole("textbox", { name: /Time and time error/ }));
  await user.paste("0 30\nx");
  act(() =>
    answer({ run: asked.at(-1)!.run, kind: "refused", line: 2, message: "“x” is not a time and a time error in ns." }),
  );
  expect(screen.getByText(/Line 2: “x” is not a time/)).toBeTruthy();
});

test("a file is read and named, and can be taken out", async () => {
  const user = userEvent.setup();
  shown({ source: "log" });
  const lines = "0 1\n1 2\n2 3";
  // This DOM has no File.text yet.
  const file = Object.assign(new File([lines], "roof.csv", { type: "text/csv" }), { text: async () => lines });
  await user.upload(screen.getByLabelText("Log as a file"), file);
  expect(await screen.findByText("roof.csv")).toBeTruthy();
  expect(asked.at(-1)?.text).toBe("0 1\n1 2\n2 3");
  await user.click(screen.getByRole("button", { name: "Take the log out" }));
  expect(screen.getByText("No log yet")).toBeTruthy();
});

test("the log is there again after another calculator was looked at", async () => {
  const user = userEvent.setup();
  shown({ source: "log" });
  await user.click(screen.getByRole("textbox", { name: /Time and time error/ }));
  await user.paste("0 1\n1 2\n2 4");
  cleanup();
  shown({ source: "log" });
  expect(screen.getByRole("textbox", { name: /Time and time error/ })).toHaveProperty("value", "0 1\n1 2\n2 4");
  expect(asked.at(-1)).toMatchObject({ text: "0 1\n1 2\n2 4" });
});
