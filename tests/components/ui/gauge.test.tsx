// @vitest-environment jsdom
import { cleanup, render } from "@testing-library/react";
import { afterEach, expect, test } from "vitest";
import { Gauge } from "@/components/ui/Gauge";
import { expectNear } from "../../support/expectNear";

afterEach(cleanup);

const blockOf = (container: HTMLElement) => {
  const block = container.querySelector("[data-block]")!;
  return { x: Number(block.getAttribute("x")), y: Number(block.getAttribute("y")) };
};

// Places of the block in the three drawings of the identity, 180 px wide, tolerance 33.6 px from the centre.
test.each([
  ["within, 0.52 tolerances above", 0.52, true, 103.972, 2.5],
  ["outside, 1.8 tolerances below", -1.8, false, 26.02, 13.75],
  ["far outside", 35.55, false, 167, 13.75],
])("%s stands where the drawing has it", (_what, off, within, x, y) => {
  const { container } = render(<Gauge offByTolerances={off} within={within} />);
  const block = blockOf(container);
  expectNear(block.x, x, 1e-9, "left edge of the block, px");
  expectNear(block.y, y, 1e-9, "upper edge of the block, px");
});

test("an arrow stands only beyond 2.5 tolerances, at the side of the difference", () => {
  const arrow = (off: number) =>
    render(<Gauge offByTolerances={off} within={false} />)
      .container.querySelector("[data-arrow]")
      ?.getAttribute("d");
  expect(arrow(2.5)).toBeUndefined();
  expect(arrow(2.6)).toBe("M174 12.25l6 6.2-6 6.2z");
  expect(arrow(-2.6)).toBe("M6 12.25l-6 6.2 6 6.2z");
});

test("the outer edge of the tolerance is 2.5 times as far from the end as from the centre, whatever the width", () => {
  for (const width of [80, 110, 180]) {
    const { container } = render(<Gauge offByTolerances={1} within width={width} />);
    expectNear(
      blockOf(container).x + 3.5,
      width / 2 + (width / 2 - 6) / 2.5,
      1e-9,
      `centre of the block at ${width} px`,
    );
  }
});

test.each([null, NaN])("draws nothing where there is no difference (%s)", (off) => {
  expect(render(<Gauge offByTolerances={off} within={false} />).container.innerHTML).toBe("");
});
