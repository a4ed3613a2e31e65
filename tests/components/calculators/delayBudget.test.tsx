// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, expect, test } from "vitest";
import { DelayBudget } from "@/components/calculators/DelayBudget";
import { startValues, type ValuesOf } from "@/lib/calculators/calculator";
import { DELAY_BUDGET } from "@/lib/calculators/delayBudget";

afterEach(cleanup);

type Values = ValuesOf<typeof DELAY_BUDGET>;
const shown = (values: Partial<Values>) =>
  render(<DelayBudget values={{ ...startValues(DELAY_BUDGET), ...values }} onChange={() => {}} />);
const part = (name: string, ...figures: number[]) => ({ name, figures });
const reading = (label: string) => screen.getByText(label).parentElement!.textContent;
const verdict = () => screen.getByRole("status").textContent;

// JCGM 100:2008, 5.1.2 by hand: 3, 4 and 12 add to 13.
const PARTS = [part("antenna", 151.6, 3, 0), part("cable", 40, 4, 0), part("lead", -12, 12, 0)];

test("delays add, uncertainties add as squares, and the sign follows the receiver", () => {
  shown({ parts: PARTS });
  expect(reading("Value to type in")).toContain("+179.6 ns± 26.0 ns");
  expect(verdict()).toBe("Nothing is typed in yet");
  cleanup();
  shown({ parts: PARTS, sign: "delay-is-negative" });
  expect(reading("Value to type in")).toContain("\u2212179.6 ns");
});

// JCGM 100:2008, 5.2.2: what shares a cause adds up in full: 2 + 1 and 4 give 5.
test("a shared cause adds up in full", () => {
  shown({ parts: [part("a", 100, 2, 1), part("b", 50, 1, 1), part("c", 9, 4, 0)] });
  expect(reading("Delay of all parts")).toContain("standard uncertainty 5.00 ns");
});

// 25 m of uncorrected foam cable are 98 ns, and the wrong sign doubles them: common practice, no source.
test("the turned sign is told apart from a wrong value", () => {
  const foam = { parts: [part("25 m foam", 98, 1, 0)], allowedNs: 40 };
  shown({ ...foam, enteredNs: -98 });
  expect(verdict()).toBe("The sign is turned: the error is twice the delay");
  expect(reading("Left with what is typed in")).toContain("+196.0 ns");
  cleanup();
  shown({ ...foam, enteredNs: 0 });
  expect(verdict()).toBe("More than is allowed");
  cleanup();
  shown({ ...foam, enteredNs: 98 });
  expect(verdict()).toBe("Within what is allowed");
  expect(reading("Largest time error")).toContain("2.0 ns");
});

// 3 m up are 10 ns overhead: Chadsey, Precise Time and Time Interval meeting 1995, abstract.
test("a height error moves the pulse", () => {
  shown({ parts: [part("a", 0, 0, 0)], enteredNs: 0, upM: 3, lowestDeg: 80, highestDeg: 90 });
  expect(reading("Held position adds")).toContain("+9.9 ns");
});

test("the cursor walks over the bars by keyboard", async () => {
  const user = userEvent.setup();
  const { container } = shown({ parts: PARTS });
  screen.getByRole("application").focus();
  await user.keyboard("{Home}");
  // The cursor is the calculator's own: it moves without any input being changed.
  expect(container.querySelector(".plot-tag")!.textContent).toBe("antenna\n+151.6 ns\n± 6.0 ns");
  await user.keyboard("t");
  expect(screen.getByRole("columnheader", { name: "2 u, ns" })).toBeTruthy();
});
