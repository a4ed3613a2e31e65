import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import type { Answers, MarkedRow } from "../kind";
import { markNumber } from "../markNumber";
import type { PulseAcceptanceTruth } from "./drawCase";
import type { LogFigures } from "./judgeLog";
import { maxMistakes, meanMistakes, mtieMistakes, type Mistake } from "./mistakes";
import { toleranceNs } from "./toleranceNs";

type Figure = { of: keyof LogFigures; mistakes: (truth: PulseAcceptanceTruth) => Mistake[] };

const FIGURES: Readonly<Record<string, Figure>> = {
  mean: { of: "meanNs", mistakes: meanMistakes },
  maxTe: { of: "maxTeNs", mistakes: maxMistakes },
  mtieShort: { of: "mtieShortNs", mistakes: (truth) => mtieMistakes(truth, "short") },
  mtieLong: { of: "mtieLongNs", mistakes: (truth) => mtieMistakes(truth, "long") },
};

/** One figure of the log. */
export function markFigure(truth: PulseAcceptanceTruth, quantity: AskedQuantity, answers: Answers): MarkedRow {
  const { of, mistakes } = FIGURES[quantity.id];
  const computed = truth.figures[of];
  const tolerance = toleranceNs(quantity.tolerance, computed);
  return markNumber({
    quantity,
    typed: answerOf(answers, `log.${quantity.id}`),
    computed,
    unit: "ns",
    decimals: 1,
    tolerance,
    explain: (value) => {
      const known = mistakes(truth).find(({ ns }) => Math.abs(value - ns()) <= tolerance);
      return known ? { errorClass: known.errorClass, reason: known.reason } : null;
    },
  });
}
