import type { HorizonSector } from "@/lib/gnss/siting/skyMask";
import type { Random } from "@/lib/numeric/random";

const CELL_DEG = 5;
const CELLS = 360 / CELL_DEG;

/** How a roof may look round a position; all in whole numbers. */
export type Surroundings = {
  obstacles: readonly [number, number];
  /** In cells of 5 deg. */
  width: readonly [number, number];
  topDeg: readonly [number, number];
  /** All obstacles in one quadrant: a tower beside the position. */
  oneSide?: true;
};

/** Horizon pieces of a position, 0 to 360 deg without a gap: low roofs all round and some obstacles before them. */
export function drawHorizon({ obstacles, width, topDeg, oneSide }: Surroundings, random: Random): HorizonSector[] {
  const tops = lowRoofs(random);
  const quarter = random.integer(0, 3) * (CELLS / 4);
  const count = random.integer(...obstacles);
  for (let n = 0; n < count; n++) {
    const cells = random.integer(...width);
    const first = oneSide ? quarter + random.integer(0, Math.max(0, CELLS / 4 - cells)) : random.integer(0, CELLS - 1);
    const top = random.integer(...topDeg);
    for (let cell = first; cell < first + cells; cell++) tops[cell % CELLS] = Math.max(tops[cell % CELLS], top);
  }
  return sectorsOf(tops);
}

/** Far roofs and trees below every mask. */
function lowRoofs(random: Random): number[] {
  const tops: number[] = [];
  while (tops.length < CELLS) {
    const cells = random.integer(8, 20);
    const top = random.integer(1, 5);
    for (let n = 0; n < cells && tops.length < CELLS; n++) tops.push(top);
  }
  return tops;
}

function sectorsOf(tops: readonly number[]): HorizonSector[] {
  const sectors: HorizonSector[] = [];
  tops.forEach((topDeg, cell) => {
    const last = sectors[sectors.length - 1];
    if (last?.topDeg === topDeg) last.toDeg += CELL_DEG;
    else sectors.push({ fromDeg: cell * CELL_DEG, toDeg: (cell + 1) * CELL_DEG, topDeg });
  });
  return sectors;
}
