const MOST_STEPS = 200;

/**
 * Place where a continuous function changes its sign, by halving with a step of false position before each, so that a
 * straight function takes a few steps and none takes more than the halvings do.
 * @param low one end of the bracket
 * @param high the other end; the function has opposite signs at the two, or is 0 at one
 * @param precision width of the last bracket, in the unit of x
 * @throws RangeError when both ends lie on the same side
 */
export function findRoot(of: (x: number) => number, low: number, high: number, precision: number): number {
  let below = of(low);
  let above = of(high);
  if (below === 0) return low;
  if (above === 0) return high;
  if (!(below < 0 !== above < 0))
    throw new RangeError(`findRoot: opposite signs at the ends, got ${below} at ${low} and ${above} at ${high}`);
  const narrow = (x: number) => {
    const value = of(x);
    if (value < 0 === below < 0) [low, below] = [x, value];
    else [high, above] = [x, value];
  };
  for (let n = 0; n < MOST_STEPS && Math.abs(high - low) > precision; n++) {
    const straight = low - (below * (high - low)) / (above - below);
    const margin = precision / 4; // a step onto the end itself would narrow nothing
    const [left, right] = low < high ? [low, high] : [high, low];
    narrow(Math.max(left + margin, Math.min(right - margin, straight)));
    narrow((low + high) / 2);
  }
  return (low + high) / 2;
}
