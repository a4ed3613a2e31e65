import { expect, test } from "vitest";
import { plotGeometry } from "@/components/plots/geometry";
import { expectNear } from "../../support/expectNear";

const X = { name: "code phase, chip", from: 0, to: 1023 };
const Y = { name: "power, noise = 1", from: 0, to: 12 };

test("a value goes to its px and comes back", () => {
  const g = plotGeometry(640, 240, X, Y);
  for (const value of [0, 88.75, 511.5, 1023]) expectNear(g.xAt(g.x(value)), value, 1e-9, "code phase, chip");
  for (const value of [0, 3.95, 12]) expectNear(g.yAt(g.y(value)), value, 1e-9, "power");
});

test("the ends of both axes stand on the edges, with the greater value up", () => {
  const g = plotGeometry(640, 240, X, Y, { left: 60, right: 20 });
  expect([g.x(0), g.x(1023)]).toEqual([60, 620]);
  expect([g.y(0), g.y(12)]).toEqual([g.bottom, g.top]);
});

test("labels are signed where the axis asks for it, with a true minus", () => {
  const g = plotGeometry(640, 300, X, {
    name: "Doppler, Hz",
    from: -5000,
    to: 5000,
    signed: true,
    ticks: [-2500, 0, 2500],
  });
  expect(g.yTicks.major.map(g.yLabel)).toEqual(["\u22122\u2009500", "0", "+2\u2009500"]);
});

test("the left margin grows with the longest label", () => {
  const narrow = plotGeometry(640, 240, X, Y).left;
  const wide = plotGeometry(640, 240, X, { ...Y, to: 12_000_000 }).left;
  expect(wide).toBeGreaterThan(narrow);
});

test("own ticks drop where their labels would touch", () => {
  const ticks = Array.from({ length: 12 }, (_, at) => at + 1);
  const sittings = { name: "sitting of this module", from: 0.5, to: 12.5, ticks };
  expect(plotGeometry(640, 240, sittings, Y).xTicks.major).toEqual(ticks);
  expect(plotGeometry(200, 240, sittings, Y).xTicks.major.length).toBeLessThan(12);
});
