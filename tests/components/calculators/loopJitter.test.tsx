// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import { afterEach, expect, test } from "vitest";
import { LoopJitter } from "@/components/calculators/LoopJitter";
import { loopsOf } from "@/components/calculators/loopsOf";
import { startValues, type ValuesOf } from "@/lib/calculators/calculator";
import { LOOP_JITTER } from "@/lib/calculators/loopJitter";
import { pllThresholdDbHz } from "@/lib/gnss/tracking/carrierJitter";
import { expectNear } from "@/tests/support/expectNear";

afterEach(cleanup);

type Values = ValuesOf<typeof LOOP_JITTER>;
const QUIET = { ...startValues(LOOP_JITTER), jerkGPerS: 0, vibrationDeg: 0, oscillatorDeg: 0 };
const shown = (values: Partial<Values>) => render(<LoopJitter values={{ ...QUIET, ...values }} onChange={() => {}} />);
const reading = (label: string) => screen.getByText(label).parentElement!.textContent;

// Kaplan & Hegarty, 2nd edition, 5.6.1, by hand: 57.296 sqrt(18/10^3.5 (1 + 1/(0.04 10^3.5))) at 35 dB-Hz, 20 ms.
test("the carrier's jitter and its margin", () => {
  const values = { ...QUIET, cn0DbHz: 35, coherentMs: 20, carrierLoopHz: 18 };
  const ratio = 10 ** 3.5;
  const byHand = (180 / Math.PI) * Math.sqrt((18 / ratio) * (1 + 1 / (2 * 0.02 * ratio)));
  expectNear(loopsOf(values).thermalDeg, byHand, 1e-9, "jitter");
  expectNear(loopsOf(values).phaseMarginDeg, 45 - 3 * byHand, 1e-9, "margin");
});

// Rule of thumb of the same place: 15 degrees of noise alone use the margin up; the closed form says where.
test("the margin ends where noise alone makes 15 degrees", () => {
  const loops = loopsOf({ ...QUIET, coherentMs: 10, carrierLoopHz: 12 });
  expectNear(loops.phaseThresholdDbHz!, pllThresholdDbHz(12, 0.01), 1e-5, "threshold");
  expectNear(loops.phaseAt(loops.phaseThresholdDbHz!), 45, 1e-5, "error there");
});

// 360 f/c * jerk/(B/0.7845)^3, the same source: 10 g/s on 18 Hz are 15.4 degrees.
test("jerk strains the loop, and too much of it alone breaks it", () => {
  const byHand = ((360 * 1575.42e6) / 299_792_458) * (98.0665 / (18 / 0.7845) ** 3);
  expectNear(loopsOf({ ...QUIET, carrierLoopHz: 18, jerkGPerS: 10 }).stressDeg, byHand, 1e-9, "stress");
  shown({ carrierLoopHz: 5, jerkGPerS: 10 });
  expect(screen.getByRole("status").textContent).toBe("The carrier loop is expected to lose lock");
  expect(reading("Margin of the carrier loop")).toContain("gone at any C/N0");
});

// Kaplan & Hegarty, 2nd edition, (5.23) for a wide front end, by hand; a chip of C/A is 293.05 m.
test("the code's jitter in metres", () => {
  shown({ cn0DbHz: 40, codeLoopHz: 1, spacingChips: 1, coherentMs: 20 });
  const byHand = Math.sqrt((1 / 2e4) * (1 + 2 / (0.02 * 1e4)));
  expect(reading("Code jitter, 1 sigma")).toContain(`${(byHand * 293.0523).toFixed(2)} m`);
  expect(screen.getByRole("status").textContent).toBe("Both loops hold");
});

test("shows what decides, the code's jitter and the S-curve, each with a spoken finding", () => {
  shown({ cn0DbHz: 22, codeLoopHz: 5, spacingChips: 0.05, coherentMs: 1, frontEndMHz: 8 });
  const plots = screen.getAllByRole("application").map((plot) => plot.getAttribute("aria-label"));
  expect(plots).toHaveLength(3);
  expect(plots[0]).toMatch(/^Phase error against C\/N0; at 22\.0 dB-Hz/);
  expect(plots[2]).toMatch(/crosses zero at 0 chip/);
});
