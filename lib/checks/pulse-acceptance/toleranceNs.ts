import { LEAST_NS } from "./quantities";

/** So many per cent of a time error, and never less than the least. */
export const toleranceNs = (percent: number, ns: number): number => Math.max(LEAST_NS, (percent / 100) * Math.abs(ns));
