import { describe, expect, test } from "vitest";
import { REFERENCE_SLOTS, SIDEREAL_DAY_S, slotPlaceM } from "@/lib/gnss/sky/constellation";
import { directionsFrom } from "@/lib/gnss/sky/direction";
import { expectNear } from "@/tests/support/expectNear";

const EPOCH_S = Date.UTC(1993, 6, 1) / 1000;
const DEG = 180 / Math.PI;
const slot = (name: string) => REFERENCE_SLOTS.find((one) => one.name === name)!;

test("24 slots, six planes 60 deg apart", () => {
  expect(REFERENCE_SLOTS).toHaveLength(24);
  expect([...new Set(REFERENCE_SLOTS.map(({ nodeDeg }) => nodeDeg))].sort((a, b) => a - b)).toEqual(
    [0, 1, 2, 3, 4, 5].map((n) => expect.closeTo(32.847 + 60 * n, 9)),
  );
});

// GPS SPS Performance Standard, October 2001: Greenwich hour angle at the epoch 18 h 36 min 14.4 s, so the node of plane A
// stands at 272.847 - 279.06 = -6.213 deg of longitude. The nominal plan's table A2-1 gives it likewise.
describe("at the epoch", () => {
  test.each(["A3", "B1", "F2"])("%s stands where its elements say", (name) => {
    const { nodeDeg, latitudeArgumentDeg } = slot(name);
    const [x, y, z] = slotPlaceM(slot(name), EPOCH_S);
    const u = latitudeArgumentDeg / DEG;
    expectNear(Math.hypot(x, y, z), 26_559_700, 1e-3, "radius, m");
    // Spherical triangle: sin lat = sin u sin i; longitude from the node atan(tan u cos i).
    expectNear(
      Math.asin(z / 26_559_700) * DEG,
      Math.asin(Math.sin(u) * Math.sin(55 / DEG)) * DEG,
      1e-9,
      "latitude, deg",
    );
    const fromNode = Math.atan2(Math.sin(u) * Math.cos(55 / DEG), Math.cos(u)) * DEG;
    const longitude = Math.atan2(y, x) * DEG;
    const off = (longitude - (nodeDeg - 279.06 + fromNode)) / 360;
    expectNear(off - Math.round(off), 0, 1e-9, "longitude, turns");
  });

  test("the ground track comes again after a sidereal day", () => {
    const [at, later] = [0, SIDEREAL_DAY_S].map((s) => slotPlaceM(slot("C4"), EPOCH_S + s));
    later.forEach((value, axis) => expectNear(value, at[axis], 0.05, "place, m"));
  });
});

describe("direction from a site", () => {
  test("along the plumb line is the zenith", () => {
    // Outward normal of the ellipsoid at latitude 50 deg, longitude 10 deg, from a point far out on it.
    const [lat, lon] = [50 / DEG, 10 / DEG];
    const e2 = (1 / 298.257223563) * (2 - 1 / 298.257223563);
    const n = 6_378_137 / Math.sqrt(1 - e2 * Math.sin(lat) ** 2);
    const far = 2e7;
    const place = [
      (n + far) * Math.cos(lat) * Math.cos(lon),
      (n + far) * Math.cos(lat) * Math.sin(lon),
      (n * (1 - e2) + far) * Math.sin(lat),
    ] as const;
    expectNear(directionsFrom({ latitudeDeg: 50, longitudeDeg: 10 })(place).elevationDeg, 90, 1e-5, "elevation");
  });

  // On the equator the vertical has no deflection: tan el = (cos g - R/r) / sin g for the central angle g.
  test.each([
    [30, 0, "east", 90],
    [-30, 0, "west", 270],
    [0, 40, "north", 0],
    [0, -40, "south", 180],
  ])("seen %i deg of longitude and %i deg of latitude away: %s", (lon, lat, _side, azimuthDeg) => {
    const r = 26_559_700;
    const place = [
      r * Math.cos(lat / DEG) * Math.cos(lon / DEG),
      r * Math.cos(lat / DEG) * Math.sin(lon / DEG),
      r * Math.sin(lat / DEG),
    ] as const;
    const g = Math.max(Math.abs(lon), Math.abs(lat)) / DEG;
    const seen = directionsFrom({ latitudeDeg: 0, longitudeDeg: 0 })(place);
    expectNear(seen.elevationDeg, Math.atan2(Math.cos(g) - 6_378_137 / r, Math.sin(g)) * DEG, 1e-9, "elevation, deg");
    expectNear(seen.azimuthDeg, azimuthDeg, 1e-9, "azimuth, deg");
  });
});
