// @vitest-environment jsdom
import { cleanup, render } from "@testing-library/react";
import { afterEach, expect, test } from "vitest";
import { CodePeak } from "@/components/calculators/CodePeak";
import { delayedCorrelation } from "@/components/calculators/delayedCode";

afterEach(cleanup);

test.each([0, 1, 412, 1022])("a code received %i chips late agrees at that lag and nowhere else", (delayChips) => {
  const values = delayedCorrelation(7, delayChips);
  expect(values[delayChips]).toBe(1023);
  // Three-valued floor of the codes of degree 10: R. Gold, "Optimal binary sequences for spread spectrum multiplexing",
  // IEEE Transactions on Information Theory, 1967.
  const floor = new Set(values.filter((_, lag) => lag !== delayChips));
  expect([...floor].sort((a, b) => a - b)).toEqual([-65, -1, 63]);
});

test("what the drawing says is what was computed", () => {
  const { container } = render(<CodePeak prn={7} delayChips={412} height={446} />);
  expect(container.querySelector(".code-peak-top")!.textContent).toBe("1\u2009023at lag 412: all chips agree");
  expect(container.querySelector(".code-peak-right")!.textContent).toContain("floor 63, \u22121 and \u221265");
});
