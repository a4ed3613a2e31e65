/** Classes of clocks with published limits. */
export type ClockClass = "PRTC-A" | "PRTC-B" | "ePRTC-A" | "PRC";

/** Largest |TE| in ns against UTC while locked: ITU-T G.8272 (PRTC) and G.8272.1 (ePRTC-A). A PRC has none. */
export const MAX_TIME_ERROR_NS: Readonly<Record<Exclude<ClockClass, "PRC">, number>> = {
  "PRTC-A": 100,
  "PRTC-B": 40,
  "ePRTC-A": 30,
};

/** Observation intervals for which the masks are drawn. */
const SHORTEST_MTIE_S = 0.1;

/** The line that PRC and PRTC masks begin with: 0.275e-3 tau + 0.025 us; ITU-T G.811 and G.8272. */
const firstLineNs = (tauS: number): number => 0.275 * tauS + 25;

/**
 * Largest MTIE in ns over an interval.
 * - PRTC-A: the first line up to 273 s, then 100 ns; PRTC-B: up to 54.5 s, then 40 ns. ITU-T G.8272, Fig. 1
 * - PRC: the first line below 1000 s, then 1e-5 tau + 0.29 us. ITU-T G.811
 * @param tauS above 0.1 s
 */
export function mtieLimitNs(clock: Exclude<ClockClass, "ePRTC-A">, tauS: number): number {
  if (!(tauS > SHORTEST_MTIE_S)) throw new RangeError(`mtieLimitNs: above 0.1 s, got ${tauS}`);
  if (clock === "PRC") return tauS < 1000 ? firstLineNs(tauS) : 0.01 * tauS + 290;
  const [bendS, flatNs] = clock === "PRTC-A" ? [273, 100] : [54.5, 40];
  return tauS <= bendS ? firstLineNs(tauS) : flatNs;
}

/**
 * Largest TDEV in ns.
 * - PRTC-A: 3 up to 100 s, 0.03 tau to 1000 s, then 30. ITU-T G.8272, Fig. 2; the same figures in G.811 for a PRC
 * - PRTC-B: 1 up to 100 s, 0.01 tau to 500 s, then 5; end points printed in G.8272, the slope between from memory
 * @param tauS above 0.1 s
 */
export function tdevLimitNs(clock: Exclude<ClockClass, "ePRTC-A">, tauS: number): number {
  if (!(tauS > SHORTEST_MTIE_S)) throw new RangeError(`tdevLimitNs: above 0.1 s, got ${tauS}`);
  const [lowNs, bendS] = clock === "PRTC-B" ? [1, 500] : [3, 1000];
  return tauS <= 100 ? lowNs : (lowNs * Math.min(tauS, bendS)) / 100;
}

/**
 * Largest |TE| in ns of an ePRTC-A after a time in holdover: straight from 30 to 100 ns over H. ITU-T G.8272.1.
 * @param learningDays that it was locked before; H is 6 days from 6 days on, 40 days from 40 days on, 70 000 s below 6
 *   days
 */
export function holdoverLimitNs(holdoverS: number, learningDays: number): number {
  const lastS = learningDays >= 40 ? 3_456_000 : learningDays >= 6 ? 518_400 : 70_000;
  if (!(holdoverS >= 0 && holdoverS <= lastS))
    throw new RangeError(`holdoverLimitNs: 0 to ${lastS} s after ${learningDays} days of learning, got ${holdoverS}`);
  return 30 + (70 * holdoverS) / lastS;
}

/**
 * Corners of the MTIE masks for the network limit at reference point C and its enhanced form, [s, ns]. ITU-T G.8271.1,
 * read in a public copy of the figures; what runs between the corners stands in the recommendation and is not given
 * here.
 */
export const NETWORK_LIMIT_MTIE: Readonly<Record<"plain" | "enhanced", ReadonlyArray<readonly [number, number]>>> = {
  plain: [
    [2.4, 280],
    [275, 580],
  ],
  enhanced: [
    [2.4, 60.67],
    [20.2, 100.72],
    [211.11, 200],
  ],
};
