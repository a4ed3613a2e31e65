// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, expect, test } from "vitest";
import { CableEcho } from "@/components/calculators/CableEcho";
import { CABLE_ECHO } from "@/lib/calculators/cableEcho";
import { startValues, type ValuesOf } from "@/lib/calculators/calculator";

afterEach(cleanup);

const shown = (values: Partial<ValuesOf<typeof CABLE_ECHO>>) =>
  render(<CableEcho values={{ ...startValues(CABLE_ECHO), ...values }} onChange={() => {}} />).container;
const reading = (label: RegExp) => screen.getByText(label).parentElement!.textContent;

// 25 m of foam cable of 0.85 are 98 ns: common practice, no source. Their echo comes back after twice that.
test("a run of 25 m and the echo of its end", () => {
  shown({ lengthM: 25, velocityFactor: 0.85, echoNs: 196.2 });
  expect(reading(/^Delay of the run/)).toContain("98.11 ns");
  expect(reading(/^The echo comes from/)).toContain("25.00 m");
  expect(screen.getByRole("status").textContent).toBe("The echo is the end of the run");
});

// d = VF c t/2 and the factor's whole share: definition, by hand.
test("an echo from inside the run is a fault, one from beyond it a wrong length or factor", () => {
  shown({ lengthM: 45, velocityFactor: 0.8, echoNs: 100 });
  expect(reading(/^The echo comes from/)).toContain("11.99 m");
  expect(reading(/^The echo comes from/)).toContain("moves it by 0.15 m");
  expect(screen.getByRole("status").textContent).toBe("Something reflects inside the run");
  cleanup();
  shown({ lengthM: 45, velocityFactor: 0.8, echoNs: 600 });
  expect(screen.getByRole("status").textContent).toMatch(/farther than the run/);
});

// Skin effect: four times the frequency loses twice; Ohm's law: 0.1 A through 2 ohm.
test("loss and feed of the run", () => {
  shown({ lengthM: 100, lossDbPer100M: 10, sheetMHz: 500, frequencyMHz: 2000, currentMa: 100, loopOhmPerKm: 20 });
  expect(reading(/^Loss of/)).toContain("20.00 dB");
  expect(reading(/^Voltage lost/)).toContain("0.200 V");
});

test("the cursor reads length, loss and delay by keyboard", async () => {
  const user = userEvent.setup();
  shown({ lengthM: 100, velocityFactor: 0.8, lossDbPer100M: 10, sheetMHz: 1000, frequencyMHz: 1000, echoNs: 0 });
  screen.getByRole("application").focus();
  await user.keyboard("{End}");
  expect(document.querySelector(".plot-tag")!.textContent).toBe("112.0 m\n11.20 dB\n467.0 ns one way");
  await user.keyboard("t");
  expect(screen.getByRole("columnheader", { name: "echo, ns" })).toBeTruthy();
});
