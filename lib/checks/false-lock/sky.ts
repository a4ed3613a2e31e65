import type { Random } from "@/lib/numeric/random";

/** Where a satellite stands, whole degrees; azimuth from north over east. */
export type SkyPlace = { azimuthDeg: number; elevationDeg: number };

/** A wall as seen from the antenna: nothing is received from this sector under this elevation. The sector may cross north. */
export type Wall = { fromAzimuthDeg: number; toAzimuthDeg: number; topElevationDeg: number };

const MARGIN_DEG = 6; // so that no satellite stands on the edge

export function drawWall(random: Random): Wall {
  const fromAzimuthDeg = random.integer(0, 359);
  const toAzimuthDeg = (fromAzimuthDeg + random.integer(70, 120)) % 360;
  return { fromAzimuthDeg, toAzimuthDeg, topElevationDeg: random.integer(42, 60) };
}

export const drawBehindWall = (random: Random, wall: Wall): SkyPlace => ({
  azimuthDeg: (wall.fromAzimuthDeg + random.integer(MARGIN_DEG, sectorDeg(wall) - MARGIN_DEG)) % 360,
  elevationDeg: random.integer(14, wall.topElevationDeg - MARGIN_DEG),
});

export const drawInOpenSky = (random: Random, wall: Wall, lowestDeg: number, highestDeg: number): SkyPlace => ({
  azimuthDeg: (wall.toAzimuthDeg + random.integer(MARGIN_DEG, 360 - sectorDeg(wall) - MARGIN_DEG)) % 360,
  elevationDeg: random.integer(lowestDeg, highestDeg),
});

const sectorDeg = ({ fromAzimuthDeg, toAzimuthDeg }: Wall) => (toAzimuthDeg - fromAzimuthDeg + 360) % 360;
