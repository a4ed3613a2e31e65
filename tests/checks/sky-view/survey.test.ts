import { describe, expect, test } from "vitest";
import { choiceOf, roomsM, survey, type Roof, type Rules } from "@/lib/checks/sky-view/survey";
import { degreesShare, planeShare } from "@/lib/checks/sky-view/wrong-shares";
import { expectNear } from "@/tests/support/expectNear";

const RULES: Rules = { maskDeg: 10, totalPercent: 25, quadrantPercent: 12.5 };
const open = [{ fromDeg: 0, toDeg: 360, topDeg: 3 }];
const wall = [
  { fromDeg: 0, toDeg: 90, topDeg: 3 },
  { fromDeg: 90, toDeg: 180, topDeg: 45 },
  { fromDeg: 180, toDeg: 360, topDeg: 3 },
];
const ROOF: Roof = {
  hatch: { eastM: 0, northM: 0 },
  emitters: [
    { name: "dish", eastM: 3, northM: 4, keepOutM: 2 },
    { name: "panel", eastM: 10, northM: 0, keepOutM: 8 },
  ],
  positions: [
    { id: "A", eastM: 0, northM: 0, horizon: wall },
    { id: "B", eastM: 0, northM: 12, horizon: open },
    { id: "C", eastM: 4, northM: 0, horizon: open },
  ],
};
const [a, b, c] = survey(ROOF, RULES);

describe("a survey", () => {
  // By hand: a quarter of (sin 45 - sin 10)/(1 - sin 10) = 0.53346/0.82635, sines of printed five-figure tables.
  test("a wall up to 45 deg over one quadrant hides 16.14 % of the sky", () => {
    expectNear(a.blockedPercent, 16.14, 0.005, "in all");
    expect(a.worst).toBe(1);
    expect(a.quadrantsPercent[1]).toBe(a.blockedPercent);
  });
  test("breaks the limit of one quadrant and not the limit in all", () => {
    expect(a.blockedPercent <= RULES.totalPercent).toBe(true);
    expect(a.fits).toBe(false);
  });
  // 3-4-5: 5 m to the dish; 10 m to the panel, of which 8 must be kept.
  test("room is what is left beyond the keep-out distance, to the tightest and not the nearest", () => {
    expect(roomsM(ROOF.positions[0], ROOF.emitters)).toEqual([
      { name: "panel", distanceM: 10, roomM: 2 },
      { name: "dish", distanceM: 5, roomM: 3 },
    ]);
    expect(a.tightest).toBe("panel");
  });
  test("below zero where a position stands too near", () => {
    expectNear(c.roomM, -2, 1e-12, "6 m to the panel");
    expect(c.fits).toBe(false);
  });
  test("of those that fit the one with least sky blocked is chosen, else none", () => {
    expect(b.fits).toBe(true);
    expect(choiceOf([a, b, c])).toBe("B");
    expect(choiceOf([a, c])).toBe("none");
    expect(choiceOf([b, { ...b, id: "C", blockedPercent: b.blockedPercent + 1 }])).toBe("B");
  });
});

// 1 - (60/80)^2 and (30 - 10)/80, by hand.
test("what is not a solid angle: the plot's area and degrees", () => {
  expectNear(planeShare(30, 10), 0.4375, 1e-15, "plot");
  expectNear(degreesShare(30, 10), 0.25, 1e-15, "degrees");
  for (const share of [planeShare, degreesShare]) {
    expect(share(5, 10)).toBe(0);
    expect(share(90, 10)).toBe(1);
  }
});
