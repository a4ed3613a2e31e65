import { cosTurns, sinTurns } from "@/lib/numeric/elementary";

/** Place in the reference constellation: longitude of the ascending node and argument of latitude at the epoch, deg. */
export type Slot = { name: string; nodeDeg: number; latitudeArgumentDeg: number };

const plane = (letter: string, nodeDeg: number, places: readonly number[]): Slot[] =>
  places.map((latitudeArgumentDeg, n) => ({ name: `${letter}${n + 1}`, nodeDeg, latitudeArgumentDeg }));

/** GPS SPS Performance Standard, October 2001, Table 3-1: reference orbit slots at 0000Z, 1 July 1993. */
export const REFERENCE_SLOTS: readonly Slot[] = [
  ...plane("A", 272.847, [268.126, 161.786, 11.676, 41.806]),
  ...plane("B", 332.847, [80.956, 173.336, 309.976, 204.376]),
  ...plane("C", 32.847, [111.876, 11.796, 339.666, 241.556]),
  ...plane("D", 92.847, [135.226, 265.446, 35.156, 167.356]),
  ...plane("E", 152.847, [197.046, 302.596, 66.066, 333.686]),
  ...plane("F", 212.847, [238.886, 345.226, 105.206, 135.346]),
];

const SEMI_MAJOR_AXIS_M = 26_559_700; // the same table
const INCLINATION_TURNS = 55 / 360; // the same table
const GREENWICH_AT_EPOCH_DEG = (18 + 36 / 60 + 14.4 / 3600) * 15; // the same table: 18 h 36 min 14.4 s
const EPOCH_UNIX_S = 741_484_800; // 1993-07-01T00:00:00Z
export const SIDEREAL_DAY_S = 86_164.0905; // mean; The Astronomical Almanac, section B
const ORBIT_TURNS_PER_S = 2 / SIDEREAL_DAY_S; // two orbits a sidereal day: the ground track repeats

export type Place = readonly [x: number, y: number, z: number];

/**
 * Place of a slot in m, turning with the earth; circular orbit, no perturbation. It shows how satellites move over a site,
 * and is no almanac of satellites in service.
 */
export function slotPlaceM({ nodeDeg, latitudeArgumentDeg }: Slot, unixS: number): Place {
  const sinceS = unixS - EPOCH_UNIX_S;
  const along = latitudeArgumentDeg / 360 + sinceS * ORBIT_TURNS_PER_S;
  const node = (nodeDeg - GREENWICH_AT_EPOCH_DEG) / 360 - sinceS / SIDEREAL_DAY_S;
  const inPlane = SEMI_MAJOR_AXIS_M * cosTurns(along);
  const across = SEMI_MAJOR_AXIS_M * sinTurns(along);
  const level = across * cosTurns(INCLINATION_TURNS);
  const [cosNode, sinNode] = [cosTurns(node), sinTurns(node)];
  return [
    inPlane * cosNode - level * sinNode,
    inPlane * sinNode + level * cosNode,
    across * sinTurns(INCLINATION_TURNS),
  ];
}
