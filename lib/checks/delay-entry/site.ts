/** What the papers of a part say of its delay; a run without papers is measured by its echo. */
export type Paper =
  | { says: "delay"; ns: number }
  | { says: "cable"; installedM: number; reelM: number | null; velocityFactor: number }
  | { says: "nothing" };

/** `limits`: the value lies within plus and minus so much, all places alike. */
export type StatedUncertainty = { as: "standard" | "limits"; value: number; unit: "ns" | "%" };

/** One row of the list of parts. `from` and `to` are joints of the drawing. */
export type SitePart = {
  id: string;
  name: string;
  from: string;
  to: string;
  paper: Paper;
  uncertainty: StatedUncertainty;
};

export const PHASE_CENTRE = "phase centre";
export const CLOCK_INPUT = "clock input";
export const PULSE_LEAD = "1PPS lead";

/** The parts between the antenna's phase centre and the input of the clock, walked back from the clock. */
export function wayOf(parts: readonly SitePart[]): SitePart[] {
  const way: SitePart[] = [];
  for (let at = CLOCK_INPUT; at !== PHASE_CENTRE; at = way[0].from) {
    const part = parts.find(({ to }) => to === at);
    if (!part || way.includes(part)) throw new RangeError(`wayOf: no part leads to ${at}`);
    way.unshift(part);
  }
  return way;
}
