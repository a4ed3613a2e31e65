import { momentsCn0DbHz } from "@/lib/gnss/tracking/cn0Estimators";
import { answerOf } from "../answerOf";
import { askedQuantities, type AskedQuantity } from "../askedQuantities";
import { finishMarking } from "../finishMarking";
import { formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers, CheckPlan, MarkedRow, Marking } from "../kind";
import { markChoice } from "../markChoice";
import { markNumber } from "../markNumber";
import { WEAK_DB_HZ, type Cn0Channel, type Cn0Truth } from "./drawCase";
import { PROMPT_S } from "./estimates";
import { levelError } from "./levelError";
import type { Cn0Parameters } from "./parameters";
import { cn0Quantities, SOUND_METHODS } from "./quantities";

/** Sets a hand-in against the C/N0 that was put in. */
export function markAnswers(truth: Cn0Truth, plan: CheckPlan<Cn0Parameters>, answers: Answers): Marking {
  const asked = askedQuantities(cn0Quantities, plan);
  const rows = [...asked.values()].flatMap((quantity) =>
    quantity.id === "method"
      ? [markMethod(truth, quantity, answers)]
      : truth.channels.map((_, n) => markLevel(truth, n, quantity, answers)),
  );
  return finishMarking({ id: "cn0", version: 1 }, plan, asked, rows, truth.channels.map(workingOf));
}

function markLevel({ channels }: Cn0Truth, n: number, quantity: AskedQuantity, answers: Answers): MarkedRow {
  const channel = channels[n];
  const tolerance = channel.cn0DbHz < WEAK_DB_HZ ? 2 * quantity.tolerance : quantity.tolerance;
  return markNumber({
    quantity,
    subject: `channel ${n + 1}`,
    label: `${quantity.label} of channel ${n + 1}, PRN ${channel.prn}`,
    typed: answerOf(answers, `channels.ch${n + 1}`),
    computed: channel.cn0DbHz,
    unit: "dB-Hz",
    decimals: 1,
    tolerance,
    toleranceText: `±${formatUnderstood(tolerance, "dB")}`,
    explain: (value) => levelError(value, channel, channels),
  });
}

function markMethod({ channels }: Cn0Truth, quantity: AskedQuantity, answers: Answers): MarkedRow {
  const weakest = channels.reduce((low, one) => (one.cn0DbHz < low.cn0DbHz ? one : low));
  const level = formatQuantity(weakest.cn0DbHz, "dB-Hz", 1);
  const moments = momentsCn0DbHz(weakest.prompts, PROMPT_S);
  const reads = Number.isFinite(moments) ? `reads ${formatQuantity(moments, "dB-Hz", 1)}` : "finds no signal";
  const reasons: Readonly<Record<string, string>> = {
    moments: `On PRN ${weakest.prn} the method of moments ${reads}, where ${level} was put in.`,
    branches: "The carrier turns by its residual, so both branches hold signal and both hold noise.",
    "decibel-mean":
      "Powers are averaged, not decibels: the mean of the decibels of noise lies 2.5\u00a0dB under its power.",
  };
  return markChoice({
    quantity,
    typed: answerOf(answers, "channels.method"),
    right: SOUND_METHODS,
    computed: "Sums over whole data bits",
    explain: (value) => ({ errorClass: "method", reason: reasons[value] }),
  });
}

const workingOf = ({ prn, cn0DbHz, edge, residualHz, estimate }: Cn0Channel, n: number) => ({
  label: `Channel ${n + 1}, PRN ${prn}`,
  value: [
    `${formatQuantity(cn0DbHz, "dB-Hz", 1)} put in`,
    `narrow over wide power reads ${formatQuantity(estimate.cn0DbHz, "dB-Hz", 1)}`,
    `bits begin at ${formatQuantity(edge, "ms", 0)}`,
    `residual ${formatQuantity(residualHz, "Hz", 1)}`,
  ].join("; "),
});
