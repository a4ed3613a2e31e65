/*
 * Nodes and weights of the ten-point Gauss-Legendre rule on (-1, 1), one half of each symmetric pair:
 * Abramowitz & Stegun, "Handbook of Mathematical Functions" (1964), Table 25.4, n = 10.
 */
const NODES = [
  0.1488743389816312, 0.4333953941292472, 0.6794095682990244, 0.8650633666889845, 0.9739065285171717,
] as const;
const WEIGHTS = [
  0.2955242247147529, 0.2692667193099964, 0.219086362515982, 0.1494513491505806, 0.0666713443086881,
] as const;

/**
 * Integral of a smooth function between two limits: the interval is cut into equal panels and each is taken by the
 * ten-point Gauss-Legendre rule, exact for polynomials up to degree 19. With a panel per half period of an oscillating
 * integrand the relative error stays below 1e-12.
 * @param panels whole number from 1
 */
export function integrate(of: (x: number) => number, from: number, to: number, panels = 1): number {
  const { places, weights } = quadraturePoints(from, to, panels);
  let sum = 0;
  for (let n = 0; n < places.length; n++) sum += weights[n] * of(places[n]);
  return sum;
}

/** Places and weights of that rule, for functions that are needed at the same places again and again. */
export function quadraturePoints(
  from: number,
  to: number,
  panels: number,
): { places: Float64Array; weights: Float64Array } {
  if (!(Number.isInteger(panels) && panels >= 1))
    throw new RangeError(`integrate: whole number of panels from 1, got ${panels}`);
  const half = (to - from) / (2 * panels);
  const perPanel = 2 * NODES.length;
  const places = new Float64Array(panels * perPanel);
  const weights = new Float64Array(panels * perPanel);
  for (let n = 0; n < places.length; n++) {
    const middle = from + (2 * Math.floor(n / perPanel) + 1) * half;
    const pair = (n % perPanel) >> 1;
    places[n] = middle + (n % 2 === 0 ? -half : half) * NODES[pair];
    weights[n] = half * WEIGHTS[pair];
  }
  return { places, weights };
}
