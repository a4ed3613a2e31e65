// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, expect, test, vi } from "vitest";
import { BarPlot } from "@/components/plots/BarPlot";
import { StemPlot } from "@/components/plots/StemPlot";
import { expectNear } from "../../support/expectNear";

afterEach(cleanup);

const AXES = { x: { name: "sitting", from: 0, to: 4 }, y: { name: "difference, chip", from: -1, to: 1, signed: true } };

test("within is a square and outside a cross, whatever the colour", () => {
  const stems = [
    { x: 1, y: 0.2, within: true },
    { x: 2, y: 0.8, within: false },
    { x: 3, y: -0.3 },
  ];
  const { container } = render(<StemPlot {...AXES} stems={stems} summary="One of three is outside." />);
  const points = [...container.querySelectorAll("[data-point]")];
  expect(points.map((point) => [point.getAttribute("data-point"), point.tagName])).toEqual([
    ["within", "rect"],
    ["outside", "path"],
    ["within", "rect"],
  ]);
});

test("bars are 6 px wide, and narrower only where they would touch", () => {
  const bars = (count: number) => ({
    x: Array.from({ length: count }, (_, at) => at),
    y: Array.from({ length: count }, () => 1),
  });
  const width = (count: number) => {
    const x = { name: "bin", from: 0, to: count };
    const { container } = render(
      <BarPlot x={x} y={{ name: "power", from: 0, to: 2 }} bars={bars(count)} summary="Flat." />,
    );
    return Number(container.querySelector("[data-bars]")!.getAttribute("stroke-width"));
  };
  expect(width(20)).toBe(6);
  // 420 px until measured, 372 between the axes: a bar every 3.72 px, one px free.
  expectNear(width(100), 2.72, 1e-9, "width of a bar, px");
});

test("of bars on one px the highest is drawn", () => {
  const x = Array.from({ length: 4000 }, (_, at) => at);
  const y = x.map((at) => (at === 2001 ? 2 : 1));
  const { container } = render(
    <BarPlot x={{ name: "bin", from: 0, to: 4000 }} y={{ name: "power", from: 0, to: 2 }} bars={{ x, y }} summary="" />,
  );
  const path = container.querySelector("[data-bars]")!.getAttribute("d")!;
  const tops = [...path.matchAll(/V([\d.]+)/g)].map(([, top]) => Number(top));
  expect(tops.length).toBeLessThan(400);
  expect(tops.filter((top) => top === 24)).toHaveLength(1); // the upper edge of the plot
});

test("the cursor of a bar plot reads a bin", async () => {
  const taken = vi.fn();
  const bars = { x: [-500, -250, 0, 250, 500], y: [1, 2, 9, 2, 1] };
  render(
    <BarPlot
      x={{ name: "Doppler, Hz", from: -600, to: 600 }}
      y={{ name: "power", from: 0, to: 10 }}
      bars={bars}
      summary="Peak at 0 Hz."
      cursor={{ onTake: taken, lines: (at) => [`${bars.x[at]} Hz`] }}
    />,
  );
  await userEvent.tab();
  await userEvent.keyboard("{ArrowRight}{Enter}");
  expect(screen.getByRole("application").getAttribute("aria-label")).toBe("Peak at 0 Hz. 250 Hz");
  expect(taken).toHaveBeenCalledWith(3);
});
