import { formatUnderstood } from "../formatUnderstood";

/** A tolerance between two shares: points, since per cent of a share would be something else. */
export const pointsText = (tolerance: number): string =>
  `±${formatUnderstood(tolerance, "1")} ${tolerance === 1 ? "point" : "points"}`;
