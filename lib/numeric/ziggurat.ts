import { exp, log } from "./elementary";
import { erfc } from "./erfc";

/*
 * Ziggurat for the normal distribution, Marsaglia & Tsang, "The Ziggurat Method for Generating Random Variables",
 * Journal of Statistical Software 5(8), 2000, with 256 layers. The layer number and the position inside it are taken
 * from different bits, which removes the correlation that the printed program had.
 */
const LAYERS = 256;
const TAIL_START = 3.6541528853610088; // right edge of the lowest box, same paper
const UNIT = 1 / 0x80000000; // positions are signed 32-bit fractions
const LOW_UNIT = UNIT / 0x1000000; // and 24 more bits below

/** Area of each layer: the lowest box and the tail behind it. */
export const LAYER_AREA = TAIL_START * density(TAIL_START) + Math.sqrt(Math.PI / 2) * erfc(TAIL_START * Math.SQRT1_2);

/** Right edges of the layers, from the widest (index 0: the lowest box stretched to hold the tail) to 0. */
export const LAYER_EDGES = layerEdges();
const LAYER_TOPS = LAYER_EDGES.map(density);

/** One draw from the normal distribution of mean 0 and standard deviation 1. @param word source of uniform 32-bit words */
export function normalDraw(word: () => number): number {
  for (;;) {
    const low = word();
    const layer = low & 255;
    const x = ((word() | 0) * UNIT + (low >>> 8) * LOW_UNIT) * LAYER_EDGES[layer];
    if (Math.abs(x) < LAYER_EDGES[layer + 1]) return x;
    if (layer === 0) return x < 0 ? -tailDraw(word) : tailDraw(word);
    const height = LAYER_TOPS[layer] + (LAYER_TOPS[layer + 1] - LAYER_TOPS[layer]) * unitDraw(word);
    if (height < density(x)) return x;
  }
}

/** Beyond the lowest box: Marsaglia's tail method, quoted in the paper. */
function tailDraw(word: () => number): number {
  for (;;) {
    const x = -log(unitDraw(word)) / TAIL_START;
    const y = -log(unitDraw(word));
    if (y + y > x * x) return TAIL_START + x;
  }
}

/** In (0, 1): never 0, whose logarithm does not exist. */
const unitDraw = (word: () => number): number => ((word() >>> 0) + 0.5) / 0x100000000;

function density(x: number): number {
  return exp(-0.5 * x * x);
}

function layerEdges(): Float64Array {
  const edges = new Float64Array(LAYERS + 1);
  edges[0] = LAYER_AREA / density(TAIL_START);
  edges[1] = TAIL_START;
  for (let n = 1; n < LAYERS - 1; n++) edges[n + 1] = Math.sqrt(-2 * log(LAYER_AREA / edges[n] + density(edges[n])));
  return edges; // the last stays 0: the top layer ends at the peak
}
