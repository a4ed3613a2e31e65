import "server-only";

/** A truth as JSON can say it: typed arrays, such as data bits, become lists. The same from the kind and out of the seal. */
export function plainTruth(truth: unknown): unknown {
  if (typeof truth !== "object" || truth === null) return truth;
  if (ArrayBuffer.isView(truth)) return Array.from(truth as unknown as Iterable<number>);
  if (Array.isArray(truth)) return truth.map(plainTruth);
  return Object.fromEntries(Object.entries(truth).map(([name, value]) => [name, plainTruth(value)]));
}
