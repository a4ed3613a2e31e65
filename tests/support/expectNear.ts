/** Absolute tolerance in the quantity's own unit; NaN is never near anything. */
export function expectNear(actual: number, expected: number, tolerance: number, what: string): void {
  if (!(Math.abs(actual - expected) <= tolerance)) {
    throw new Error(`${what}: ${actual}, not ${expected} +- ${tolerance}`);
  }
}

/** The same with a tolerance relative to the expected value, for tables printed to so many figures. */
export function expectNearRelative(actual: number, expected: number, relative: number, what: string): void {
  expectNear(actual, expected, Math.abs(expected) * relative, what);
}
