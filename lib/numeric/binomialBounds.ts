import { exp, log } from "./elementary";
import { logGamma } from "./gammaFunction";

const HALVINGS = 60;

/** Rates from 0 to 1. */
export type RateBounds = { lower: number; upper: number };

/**
 * Exact bounds of a rate seen as `met` of `tried`: the rates at which so many or more, so many or fewer, would be seen with
 * probability (1 - confidence)/2. Clopper & Pearson, "The use of confidence or fiducial limits illustrated in the case of the
 * binomial", Biometrika 26 (1934), 404-413. Error below 1e-12.
 * @param tried whole, from 1
 * @param met whole, 0 to `tried`
 * @param confidence above 0, below 1
 */
export function binomialBounds(met: number, tried: number, confidence: number): RateBounds {
  if (!(Number.isInteger(tried) && tried >= 1 && Number.isInteger(met) && met >= 0 && met <= tried))
    throw new RangeError(`binomialBounds: whole numbers, met from 0 to tried, got ${met} of ${tried}`);
  if (!(confidence > 0 && confidence < 1))
    throw new RangeError(`binomialBounds: confidence between 0 and 1, got ${confidence}`);
  const tail = (1 - confidence) / 2;
  return { lower: met === 0 ? 0 : lowerBound(met, tried, tail), upper: upperBound(met, tried, tail) };
}

/** Successes and failures change places: the upper bound of one is one minus the lower bound of the other. */
const upperBound = (met: number, tried: number, tail: number) =>
  met === tried ? 1 : 1 - lowerBound(tried - met, tried, tail);

/** The rate at which `met` or more of `tried` have this probability; it rises with the rate. */
function lowerBound(met: number, tried: number, tail: number): number {
  let [low, high] = [0, met / tried];
  for (let n = 0; n < HALVINGS; n++) {
    const middle = (low + high) / 2;
    if (chanceOfAtLeast(met, tried, middle) < tail) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** Terms above the mean fall at once and are all positive, so nothing cancels. */
function chanceOfAtLeast(met: number, tried: number, rate: number): number {
  if (rate <= 0) return 0;
  const odds = rate / (1 - rate);
  const ways = logGamma(tried + 1) - logGamma(met + 1) - logGamma(tried - met + 1);
  let term = exp(ways + met * log(rate) + (tried - met) * log(1 - rate));
  let sum = 0;
  for (let k = met; k <= tried && (term > sum * 1e-17 || k * (1 - rate) < rate * tried); k++) {
    sum += term;
    term *= ((tried - k) / (k + 1)) * odds;
  }
  return sum;
}
