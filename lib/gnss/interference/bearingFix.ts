import { atan2, cos, log, PI, sin } from "@/lib/numeric/elementary";

/** A place on a flat grid. */
export type Place = { eastM: number; northM: number };

/** A bearing taken at a place, clockwise from grid north, with the standard deviation of its error. */
export type BearingLine = Place & { bearingDeg: number; sigmaDeg: number };

/** Where bearings meet best. */
export type BearingFix = Place & {
  /** Of the place, in m^2, from the stated deviations. */
  covariance: { eastEast: number; eastNorth: number; northNorth: number };
  /** Of the residuals in standard deviations; chi-square of two degrees fewer than there are lines. */
  sumOfSquares: number;
};

/** An ellipse on the grid, its long half axis clockwise from north. */
export type Ellipse = Place & { semiMajorM: number; semiMinorM: number; azimuthDeg: number };

const DEGREES = 180 / PI;
const STEPS = 30;
const STILL_M = 1e-6;

/**
 * Place of an emitter from bearings: weighted least squares by Gauss's steps, begun where the straight lines meet best.
 * Torrieri, "Statistical theory of passive location systems" (1984); from memory.
 * @returns null where the lines do not meet in one place
 */
export function fixOfBearings(lines: readonly BearingLine[]): BearingFix | null {
  let place = meetingOfLines(lines);
  for (let n = 0; place && n < STEPS; n++) {
    const { normal, right } = normalEquations(lines, place);
    const step = solvePair(normal, right);
    if (!step) return null;
    place = { eastM: place.eastM + step[0], northM: place.northM + step[1] };
    if (Math.abs(step[0]) + Math.abs(step[1]) < STILL_M) return finished(lines, place);
  }
  return null;
}

/** Bearing in degrees from one place to another, 0 to 360 clockwise from north. */
export function bearingDegOf(from: Place, to: Place): number {
  const angle = atan2(to.eastM - from.eastM, to.northM - from.northM) * DEGREES;
  return angle < 0 ? angle + 360 : angle;
}

/** Observed bearing minus that to a place, in degrees, the short way round. */
export function bearingOffDeg(line: BearingLine, place: Place): number {
  const off = line.bearingDeg - bearingDegOf(line, place);
  return off - 360 * Math.floor(off / 360 + 0.5);
}

/** Sum of the squares of the residuals, each in its own standard deviation. */
export const sumOfSquares = (lines: readonly BearingLine[], place: Place): number =>
  lines.reduce((sum, line) => sum + square(bearingOffDeg(line, place) / line.sigmaDeg), 0);

/**
 * Ellipse that holds the true place with a probability: axes are the roots of the covariance's own values times
 * sqrt(-2 ln(1 - p)), 2.448 for 95 %. Two-dimensional normal law; textbook.
 */
export function errorEllipse({ eastM, northM, covariance }: BearingFix, probability: number): Ellipse {
  const { eastEast, eastNorth, northNorth } = covariance;
  const middle = (eastEast + northNorth) / 2;
  const apart = Math.sqrt(square((northNorth - eastEast) / 2) + square(eastNorth));
  const scale = Math.sqrt(-2 * log(1 - probability));
  const azimuthDeg = (atan2(2 * eastNorth, northNorth - eastEast) / 2) * DEGREES;
  return {
    eastM,
    northM,
    semiMajorM: scale * Math.sqrt(middle + apart),
    semiMinorM: scale * Math.sqrt(Math.max(0, middle - apart)),
    azimuthDeg: azimuthDeg < 0 ? azimuthDeg + 180 : azimuthDeg,
  };
}

/** Distance of a place from an ellipse's middle, 1 on its edge. */
export function reachInEllipse(ellipse: Ellipse, place: Place): number {
  const turn = ellipse.azimuthDeg / DEGREES;
  const [east, north] = [place.eastM - ellipse.eastM, place.northM - ellipse.northM];
  const along = (east * sin(turn) + north * cos(turn)) / ellipse.semiMajorM;
  const across = (east * cos(turn) - north * sin(turn)) / ellipse.semiMinorM;
  return Math.sqrt(square(along) + square(across));
}

export const ellipseAreaM2 = ({ semiMajorM, semiMinorM }: Ellipse): number => PI * semiMajorM * semiMinorM;

const square = (x: number) => x * x;

type Pair = readonly [number, number];
type Symmetric = { aa: number; ab: number; bb: number };

/** Least squares of the distances to straight lines: linear, so it needs no place to begin. */
function meetingOfLines(lines: readonly BearingLine[]): Place | null {
  const normal = { aa: 0, ab: 0, bb: 0 };
  let [first, second] = [0, 0];
  for (const { eastM, northM, bearingDeg, sigmaDeg } of lines) {
    const weight = 1 / square(sigmaDeg);
    const [c, s] = [cos(bearingDeg / DEGREES), sin(bearingDeg / DEGREES)];
    const across = eastM * c - northM * s;
    normal.aa += weight * c * c;
    normal.ab -= weight * c * s;
    normal.bb += weight * s * s;
    first += weight * c * across;
    second -= weight * s * across;
  }
  const meeting = solvePair(normal, [first, second]);
  return meeting && { eastM: meeting[0], northM: meeting[1] };
}

function normalEquations(lines: readonly BearingLine[], place: Place): { normal: Symmetric; right: Pair } {
  const normal = { aa: 0, ab: 0, bb: 0 };
  let [first, second] = [0, 0];
  for (const line of lines) {
    const [east, north] = [place.eastM - line.eastM, place.northM - line.northM];
    const distance2 = east * east + north * north;
    if (!(distance2 > 0)) continue; // a bearing to where one stands says nothing
    const sigma = line.sigmaDeg / DEGREES;
    const [byEast, byNorth] = [north / distance2 / sigma, -east / distance2 / sigma];
    const residual = bearingOffDeg(line, place) / line.sigmaDeg;
    normal.aa += byEast * byEast;
    normal.ab += byEast * byNorth;
    normal.bb += byNorth * byNorth;
    first += byEast * residual;
    second += byNorth * residual;
  }
  return { normal, right: [first, second] };
}

function finished(lines: readonly BearingLine[], place: Place): BearingFix | null {
  const { aa, ab, bb } = normalEquations(lines, place).normal;
  const determinant = aa * bb - ab * ab;
  if (!(determinant > 0)) return null;
  const covariance = { eastEast: bb / determinant, eastNorth: -ab / determinant, northNorth: aa / determinant };
  return { ...place, covariance, sumOfSquares: sumOfSquares(lines, place) };
}

/** Null where the two equations say nearly the same. */
function solvePair({ aa, ab, bb }: Symmetric, [first, second]: Pair): Pair | null {
  const determinant = aa * bb - ab * ab;
  if (!(determinant > 1e-9 * aa * bb)) return null;
  return [(bb * first - ab * second) / determinant, (aa * second - ab * first) / determinant];
}
