export type Rgb = readonly [number, number, number];

/** Colour at a place of the ramp, 0 to 1, straight between its stops; outside, the end colours. */
export function heatAt(stops: readonly Rgb[], place: number): Rgb {
  const at = Math.min(1, Math.max(0, place)) * (stops.length - 1);
  const low = Math.min(stops.length - 2, Math.floor(at));
  const part = at - low;
  const mixed = [0, 1, 2].map((channel) =>
    Math.round(stops[low][channel] + part * (stops[low + 1][channel] - stops[low][channel])),
  );
  return [mixed[0], mixed[1], mixed[2]];
}

/** "#5F86CE" as three numbers. */
export function rgbOf(hex: string): Rgb {
  const value = parseInt(hex.trim().slice(1, 7), 16);
  return [(value >> 16) & 255, (value >> 8) & 255, value & 255];
}

/** From a power of 1 at the end of the sheet, which `from` names, to `topDb` above it, in even steps of amplitude or of level. */
export type HeatRamp = { steps: "amplitude" | "level"; topDb: number; from: string };

/** Place of a power on the ramp: 0 and 1 at its ends, beyond them outside. */
export const heatPlace = (power: number, { steps, topDb }: HeatRamp): number =>
  steps === "amplitude"
    ? (Math.sqrt(power) - 1) / (10 ** (topDb / 20) - 1)
    : (10 * Math.log10(Math.max(power, 1e-30))) / topDb;
