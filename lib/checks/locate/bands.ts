import type { Random } from "@/lib/numeric/random";

export type Band = { value: string; label: string; fromMhz: number; toMhz: number };

/**
 * What a report names as hit, with carriers drawn near the middle of each. IS-GPS-200, 3.3.1.1 (L1, L2); IS-GPS-705,
 * 3.3.1.1 (L5); GLONASS interface control document, 3.3.1.1 (L1 band about 1602 MHz; from memory).
 */
export const BANDS: readonly Band[] = [
  { value: "L1", label: "GPS L1 and Galileo E1", fromMhz: 1574.4, toMhz: 1576.4 },
  { value: "L2", label: "GPS L2", fromMhz: 1226.6, toMhz: 1228.6 },
  { value: "L5", label: "GPS L5 and Galileo E5a", fromMhz: 1175.4, toMhz: 1177.4 },
  { value: "G1", label: "GLONASS G1", fromMhz: 1599, toMhz: 1605 },
  { value: "none", label: "No band of a satellite navigation system", fromMhz: 1535, toMhz: 1550 },
];

/** A carrier in MHz, to one hundredth as a portable receiver shows it. */
export const drawBand = ({ fromMhz, toMhz }: Band, random: Random): number =>
  random.integer(Math.round(fromMhz * 100), Math.round(toMhz * 100)) / 100;
