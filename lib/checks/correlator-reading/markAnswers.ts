import type { AskedQuantity } from "../askedQuantities";
import { askedQuantities } from "../askedQuantities";
import { answerOf } from "../answerOf";
import { finishMarking } from "../finishMarking";
import { formatNumber, formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers, CheckPlan, MarkedRow, Marking } from "../kind";
import { markChoice } from "../markChoice";
import type { CorrelatorReadingTruth } from "./drawCase";
import { markLag, markLagLength, markLagTime } from "./lag-rows";
import { markNoiseMean, markPeakRatio, markThreshold } from "./level-rows";
import type { CorrelatorReadingParameters } from "./parameters";
import { correlatorReadingQuantities } from "./quantities";

type Marker = (truth: CorrelatorReadingTruth, quantity: AskedQuantity, answers: Answers) => MarkedRow;

const MARKERS: Readonly<Record<string, Marker>> = {
  detection: markDetection,
  lag: markLag,
  lagTime: markLagTime,
  lagLength: markLagLength,
  peakRatio: markPeakRatio,
  noiseMean: markNoiseMean,
  threshold: markThreshold,
};

/** Sets a hand-in against the trace's own readings; conversions and threshold against the candidate's own earlier values. */
export function markAnswers(
  truth: CorrelatorReadingTruth,
  plan: CheckPlan<CorrelatorReadingParameters>,
  answers: Answers,
): Marking {
  const asked = askedQuantities(correlatorReadingQuantities, plan);
  const rows = [...asked.values()].map((quantity) => MARKERS[quantity.id](truth, quantity, answers));
  return finishMarking({ id: "correlator-reading", version: 1 }, plan, asked, rows, workingsOf(truth));
}

function markDetection(
  { reading, signal }: CorrelatorReadingTruth,
  quantity: AskedQuantity,
  answers: Answers,
): MarkedRow {
  const highest = formatNumber(reading.highest, 2);
  const threshold = formatNumber(reading.threshold, 2);
  const reason = reading.detected
    ? `The highest cell is ${highest}, above the threshold of ${threshold}: a signal is detected.`
    : `The highest cell is ${highest}, under the threshold of ${threshold}: noise alone reaches as high.`;
  return markChoice({
    quantity,
    typed: answerOf(answers, "reading.detection"),
    right: [reading.detected ? "yes" : "no"],
    explain: () => ({ errorClass: signal ? "signal missed" : "noise taken for a signal", reason }),
  });
}

const workingsOf = ({ signal, reading, prn, falseAlarmPerCell }: CorrelatorReadingTruth): Marking["workings"] => [
  { label: "PRN", value: String(prn) },
  {
    label: "Put into the trace",
    value: signal ? `a signal at ${formatQuantity(signal.delayChips, "chip", 1)}` : "noise alone",
  },
  ...(signal ? [{ label: "C/N0 times coherent time", value: formatQuantity(signal.cn0TDb, "dB", 1) }] : []),
  {
    label: "Highest cell",
    value: `${formatNumber(reading.highest, 4)} at ${formatUnderstood(reading.highestLagChips, "chip")}`,
  },
  {
    label: "Second peak",
    value: `${formatNumber(reading.second, 4)} at ${formatUnderstood(reading.secondLagChips, "chip")}`,
  },
  { label: "Noise mean", value: formatNumber(reading.noiseMean, 4) },
  {
    label: "Noise sigma in I or Q",
    value: `${formatNumber(reading.noiseMean / MEAN_OF_SIGMA, 4)} = noise mean / 1.2533`,
  },
  {
    label: "Threshold",
    value: `${formatNumber(reading.threshold, 4)} = sigma times the root of -2 ln ${formatUnderstood(falseAlarmPerCell, "1")}`,
  },
];

const MEAN_OF_SIGMA = Math.sqrt(Math.PI / 2);
