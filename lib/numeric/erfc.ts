import { chiSquareInverseSurvival } from "./chiSquare";
import { upperGammaRatio } from "./gammaFunction";

/** Complementary error function, 2 at -infinity to 0 at +infinity: Q(1/2, x^2), Abramowitz & Stegun 6.5.17. */
export function erfc(x: number): number {
  const tail = upperGammaRatio(0.5, x * x);
  return x < 0 ? 2 - tail : tail;
}

/** The x of which `erfc` is p, 0 < p < 2, to 1e-12: twice its square is chi-square with one degree of freedom. */
export function erfcInverse(p: number): number {
  if (p === 1) return 0;
  return p > 1 ? -erfcInverse(2 - p) : Math.sqrt(chiSquareInverseSurvival(p, 1) / 2);
}
