import { mergeCells, type Cells } from "./mergeCells";
import { gridPeaks } from "./peaks";

/** What a grid's drawing and its crosshair need to know of the whole of it. */
export type GridOverview = {
  /** Cells that P visits, strongest first: the first of them is the highest of all. */
  peaks: number[];
  /** The grid as far as a screen can show it. */
  cells: Cells;
};

/** Two peaks closer than this are one: a chip across, the width of the Doppler response up. */
const APART = { rows: 3, columns: 5 };
const MOST_COLUMNS = 512;
const MOST_ROWS = 256;

/**
 * Made where the grid is computed, in a worker: a fine grid has millions of cells, and a page that goes over all of them stands
 * still meanwhile.
 * @param power row after row
 */
export const gridOverview = (power: Float32Array, columns: number): GridOverview => ({
  peaks: gridPeaks(power, columns, APART),
  cells: mergeCells({ power, columns }, MOST_ROWS, MOST_COLUMNS),
});
