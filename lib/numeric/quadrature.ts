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
  if (!(Number.isInteger(panels) && panels >= 1))
    throw new RangeError(`integrate: whole number of panels from 1, got ${panels}`);
  const half = (to - from) / (2 * panels);
  let sum = 0;
  for (let panel = 0; panel < panels; panel++) {
    const middle = from + (2 * panel + 1) * half;
    for (let n = 0; n < NODES.length; n++)
      sum += WEIGHTS[n] * (of(middle - half * NODES[n]) + of(middle + half * NODES[n]));
  }
  return sum * half;
}
