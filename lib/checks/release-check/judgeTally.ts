import { binomialBounds, type RateBounds } from "@/lib/numeric/binomialBounds";
import { wrongMethodsOf } from "../definitionsOf";
import type { CheckKind, CheckPlan } from "../kind";
import { CONFIDENCE, LEAST_RIGHT, MOST_GUESSED, MOST_WRONG } from "./rule";
import type { Count, LineId, Tally } from "./tally";

export type LineVerdict = Count &
  RateBounds & {
    id: LineId;
    label: string;
    /** What is asked, in words. */
    asked: string;
    rate: number;
    within: boolean;
  };

/** Every line of the table against its bound. Rates of a line that was never tried are 0. */
export function judgeTally(kind: CheckKind, plan: CheckPlan, { lines }: Tally): LineVerdict[] {
  const line = (id: LineId, label: string, asked: string, holds: (counted: Counted) => boolean): LineVerdict => {
    const counted = countedOf(lines[id]);
    return { id, label, asked, ...counted, within: holds(counted) };
  };
  const every = ({ tried, met }: Counted) => tried > 0 && met === tried;
  return [
    line("solvable", "Solvable and fair", "every case", every),
    ...(kind.trial?.whole === false && lines.whole
      ? [line("whole", "Whole cases worked from their files", "every case", every)]
      : []),
    line(
      "read",
      "Right method, read with care",
      `at least ${percent(LEAST_RIGHT.rate)}, lower bound ${percent(LEAST_RIGHT.lower)}`,
      ({ tried, rate, lower }) => tried > 0 && rate >= LEAST_RIGHT.rate && lower >= LEAST_RIGHT.lower,
    ),
    ...Object.entries(wrongMethodsOf(kind, plan)).map(([name, { label }]) =>
      line(`wrong/${name}`, label, `at most ${percent(MOST_WRONG)}`, ({ rate }) => rate <= MOST_WRONG),
    ),
    line(
      "guess",
      "Blind guess",
      `at most ${percent(MOST_GUESSED)}`,
      ({ tried, rate }) => tried > 0 && rate <= MOST_GUESSED,
    ),
  ];
}

type Counted = Count & RateBounds & { rate: number };

function countedOf({ tried, met }: Count = { tried: 0, met: 0 }): Counted {
  if (tried === 0) return { tried, met, rate: 0, lower: 0, upper: 1 };
  return { tried, met, rate: met / tried, ...binomialBounds(met, tried, CONFIDENCE) };
}

/** At most one decimal: 97 %, 95.5 %. */
const percent = (rate: number) => `${Number((100 * rate).toFixed(1))}\u00a0%`;
