/** One chip of a fingerprint: bit 0 is +1 and stands above the line, bit 1 is -1 and hangs below it. */
export type Chip = { bit: 0 | 1 };
/** A chip as a rectangle; every length here is in chip widths u, y grows downwards. */
export type ChipRectangle = Chip & { x: number; y: number; width: number; height: number };
export type ChipGroup = { x: number; width: number; centre: number; hex: string; chips: ChipRectangle[] };
export type ChipLane = { number: 1 | 2; groups: ChipGroup[] };
/** `line` is where the line lies within a lane of height `laneHeight`. */
export type ChipStripDrawing = { width: number; laneHeight: number; line: number; lanes: [ChipLane, ChipLane] };
export type ChipBandDrawing = { width: number; height: number; line: number; chips: ChipRectangle[] };

const CHIPS_PER_GROUP = 8;
const GROUPS_PER_LANE = 4;
const GROUP_GAP = 1;
const CHIP_HEIGHT = 1.35;
/** The band at the foot of a page has narrow chips, so they stand taller. */
const BAND_CHIP_HEIGHT = 2.8;
export const CHIP_INSET = 0.07;

/** All 256 chips of a SHA-256 fingerprint, most significant bit first. */
export function chipsOf(fingerprintHex: string): Chip[] {
  return Array.from(checked(fingerprintHex)).flatMap((figure) => {
    const value = parseInt(figure, 16);
    return [3, 2, 1, 0].map((place): Chip => ({ bit: (value >> place) & 1 ? 1 : 0 }));
  });
}

/** The strip: the first 64 chips as two lanes of four groups of eight. `inset` is the air at each side of a chip. */
export function chipStrip(fingerprintHex: string, inset = CHIP_INSET): ChipStripDrawing {
  const lane = (number: 1 | 2): ChipLane => ({
    number,
    groups: Array.from({ length: GROUPS_PER_LANE }, (_, index) =>
      group(fingerprintHex, (number - 1) * GROUPS_PER_LANE + index, index * (CHIPS_PER_GROUP + GROUP_GAP), inset),
    ),
  });
  return {
    width: GROUPS_PER_LANE * (CHIPS_PER_GROUP + GROUP_GAP) - GROUP_GAP,
    laneHeight: 2 * CHIP_HEIGHT,
    line: CHIP_HEIGHT,
    lanes: [lane(1), lane(2)],
  };
}

/** The band: all 256 chips on one line without gaps. */
export function chipBand(fingerprintHex: string, inset = CHIP_INSET): ChipBandDrawing {
  const chips = chipsOf(fingerprintHex).map((chip, index) => rectangle(chip, index, BAND_CHIP_HEIGHT, inset));
  return { width: chips.length, height: 2 * BAND_CHIP_HEIGHT, line: BAND_CHIP_HEIGHT, chips };
}

function group(fingerprintHex: string, byte: number, x: number, inset: number): ChipGroup {
  const chips = chipsOf(fingerprintHex).slice(byte * CHIPS_PER_GROUP, (byte + 1) * CHIPS_PER_GROUP);
  return {
    x,
    width: CHIPS_PER_GROUP,
    centre: x + CHIPS_PER_GROUP / 2,
    hex: fingerprintHex.slice(2 * byte, 2 * byte + 2).toUpperCase(),
    chips: chips.map((chip, index) => rectangle(chip, x + index, CHIP_HEIGHT, inset)),
  };
}

const rectangle = ({ bit }: Chip, x: number, height: number, inset: number): ChipRectangle => ({
  bit,
  x: x + inset,
  y: bit === 0 ? 0 : height,
  width: 1 - 2 * inset,
  height,
});

function checked(fingerprintHex: string): string {
  if (/^[0-9a-f]{64}$/i.test(fingerprintHex)) return fingerprintHex;
  throw new RangeError(`chipsOf: a fingerprint is 64 hexadecimal figures, got ${JSON.stringify(fingerprintHex)}`);
}
