import type { GlyphName } from "@/components/ui/Glyph";
import type { ValuesOf } from "@/lib/calculators/calculator";
import type { DELAY_BUDGET } from "@/lib/calculators/delayBudget";
import {
  delayBudget,
  delayLeftNs,
  entryValueNs,
  type DelayBudget,
  type DelayPart,
} from "@/lib/gnss/timing/delayBudget";
import { evenSkyBand } from "@/lib/gnss/timing/evenSkyBand";

type Values = ValuesOf<typeof DELAY_BUDGET>;

export type Delays = {
  list: DelayPart[];
  budget: DelayBudget;
  entryNs: number;
  /** Delay not accounted for by the value in the receiver; all of it while nothing is typed in. */
  leftNs: number;
  /** `share` of a height error that stays in the mean. */
  position: { meanNs: number; spreadNs: number; share: number };
  /** What may be wrong at the worst: left, position and two uncertainties. */
  largestNs: number;
  verdict: { glyph: GlyphName; text: string };
};

/** What the parts, the value in the receiver and the held position come to. */
export function delaysOf(values: Values): Delays {
  const list = values.parts.map(({ figures }) => partOf(figures));
  const budget = delayBudget(list);
  const entryNs = entryValueNs(budget.totalNs, values.sign);
  const leftNs = delayLeftNs(budget.totalNs, values.enteredNs ?? 0, values.sign);
  const [lowest, highest] = [values.lowestDeg, Math.max(values.lowestDeg, values.highestDeg)];
  const band = evenSkyBand(values, lowest, highest);
  const share = evenSkyBand({ eastM: 0, northM: 0, upM: LIGHT_M_NS }, lowest, highest).meanNs;
  const largestNs = Math.abs(leftNs + band.meanNs) + budget.expandedNs;
  return {
    list,
    budget,
    entryNs,
    leftNs,
    position: { ...band, share },
    largestNs,
    verdict: verdictOf(values, budget, entryNs, largestNs),
  };
}

const LIGHT_M_NS = 0.299792458; // c, SI: a height error of one nanosecond

/** In the order of the columns: delay, uncertainty, cause. */
const partOf = ([delay, uncertainty, cause]: readonly (number | null)[]): DelayPart => ({
  ns: delay ?? 0,
  uncertaintyNs: uncertainty ?? 0,
  sharedCause: cause ? `${cause}` : null,
});

function verdictOf(
  { enteredNs, allowedNs }: Values,
  budget: DelayBudget,
  entryNs: number,
  largestNs: number,
): Delays["verdict"] {
  if (enteredNs === null) return { glyph: "todo", text: "Nothing is typed in yet" };
  const near = Math.max(1, budget.expandedNs);
  if (Math.abs(enteredNs - entryNs) > near && Math.abs(enteredNs + entryNs) <= near)
    return { glyph: "outside", text: "The sign is turned: the error is twice the delay" };
  if (!(largestNs <= allowedNs)) return { glyph: "outside", text: "More than is allowed" };
  return { glyph: "within", text: "Within what is allowed" };
}
