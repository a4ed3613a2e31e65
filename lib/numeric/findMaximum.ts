const GOLDEN = (Math.sqrt(5) - 1) / 2;

/**
 * Place of the largest value of a function with a single peak between two limits, by golden section: Kiefer,
 * "Sequential minimax search for a maximum" (1953). A flat peak cannot be placed better than the square root of the
 * rounding error.
 * @param precision width of the last interval, in the unit of x
 */
export function findMaximum(of: (x: number) => number, low: number, high: number, precision: number): number {
  let left = high - GOLDEN * (high - low);
  let right = low + GOLDEN * (high - low);
  let atLeft = of(left);
  let atRight = of(right);
  while (high - low > precision) {
    if (atLeft >= atRight) {
      [high, right, atRight] = [right, left, atLeft];
      left = high - GOLDEN * (high - low);
      atLeft = of(left);
    } else {
      [low, left, atLeft] = [left, right, atRight];
      right = low + GOLDEN * (high - low);
      atRight = of(right);
    }
  }
  return (low + high) / 2;
}
