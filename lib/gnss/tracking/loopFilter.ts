/**
 * Natural frequency over noise bandwidth of the usual loops: Bn = 0.25 w0, 0.53 w0 (a2 = 1.414) and 0.7845 w0 (a3 = 1.1,
 * b3 = 2.4). Kaplan & Hegarty, "Understanding GPS", 2nd edition, table of loop filters (from memory).
 */
export const BANDWIDTH_OVER_NATURAL: Readonly<Record<LoopOrder, number>> = { 1: 0.25, 2: 0.53, 3: 0.7845 };

export type LoopOrder = 1 | 2 | 3;
