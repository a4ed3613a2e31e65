/** Of a drawing of the sky with the zenith in the middle, in its own units. */
export const SKY_SIZE = 300;
export const SKY_CENTRE = SKY_SIZE / 2;
const RADIUS = 118;

/** The radius runs evenly from zenith to horizon. */
export const skyRadius = (elevationDeg: number): number => (RADIUS * (90 - elevationDeg)) / 90;

/** North up, east at the right; a little below the horizon there is room for a name. */
export function skyPlace(azimuthDeg: number, elevationDeg: number): [x: number, y: number] {
  const angle = (azimuthDeg * Math.PI) / 180;
  return [
    SKY_CENTRE + skyRadius(elevationDeg) * Math.sin(angle),
    SKY_CENTRE - skyRadius(elevationDeg) * Math.cos(angle),
  ];
}

/** A piece of horizon in whole degrees; one whose end is not beyond its beginning crosses north. */
export type SkyPiece = { fromDeg: number; toDeg: number; topDeg: number };

/** What pieces of a horizon hide: from the horizon up to each one's top. */
export const hiddenPath = (pieces: readonly SkyPiece[]): string => pieces.map(piecePath).join("");

function piecePath({ fromDeg, toDeg, topDeg }: SkyPiece): string {
  const span = toDeg > fromDeg ? toDeg - fromDeg : toDeg - fromDeg + 360;
  const azimuths = Array.from({ length: span + 1 }, (_, step) => fromDeg + step);
  const points = [
    ...azimuths.map((azimuth) => skyPlace(azimuth, 0)),
    ...azimuths.reverse().map((azimuth) => skyPlace(azimuth, topDeg)),
  ];
  return `M${points.map(([x, y]) => `${x.toFixed(1)} ${y.toFixed(1)}`).join("L")}Z`;
}
