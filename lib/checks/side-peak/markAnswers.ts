import { answerOf } from "../answerOf";
import { askedQuantities, type AskedQuantity } from "../askedQuantities";
import { finishMarking } from "../finishMarking";
import { formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers, CheckPlan, MarkedRow, Marking } from "../kind";
import { markChoice } from "../markChoice";
import { markLockBias, markSideBias } from "./bias-rows";
import type { SidePeakTruth } from "./drawCase";
import { markLag, markSideLevel } from "./reading-rows";
import type { SidePeakParameters } from "./parameters";
import { sidePeakQuantities } from "./quantities";
import { biasM, levelDb, type Side } from "./readPeaks";

type Marker = (truth: SidePeakTruth, quantity: AskedQuantity, answers: Answers) => MarkedRow[];

const bothSides =
  (marker: (truth: SidePeakTruth, side: Side, quantity: AskedQuantity, answers: Answers) => MarkedRow): Marker =>
  (truth, quantity, answers) =>
    (["earlier", "later"] as const).map((side) => marker(truth, side, quantity, answers));

const MARKERS: Readonly<Record<string, Marker>> = {
  peak: (...line) => [markPeak(...line)],
  lag: (...line) => [markLag(...line)],
  bias: (...line) => [markLockBias(...line)],
  sideBias: bothSides(markSideBias),
  sideLevel: bothSides(markSideLevel),
};

/** Sets a hand-in against the peaks that were put in; biases against the candidate's own lag of the main peak. */
export function markAnswers(truth: SidePeakTruth, plan: CheckPlan<SidePeakParameters>, answers: Answers): Marking {
  const asked = askedQuantities(sidePeakQuantities, plan);
  const rows = [...asked.values()].flatMap((quantity) => MARKERS[quantity.id](truth, quantity, answers));
  return finishMarking({ id: "side-peak", version: 1 }, plan, asked, rows, workingsOf(truth));
}

function markPeak({ tracked, trackedLagChips, peaks }: SidePeakTruth, quantity: AskedQuantity, answers: Answers) {
  const away = formatQuantity(Math.abs(trackedLagChips - peaks.main.lagChips), "chip", 2);
  const at = `The highest peak stands at ${formatQuantity(peaks.main.lagChips, "chip", 3)}`;
  const place = {
    main: ", where the loop tracks",
    earlier: `, ${away} behind the tracked lag`,
    later: `, ${away} before the tracked lag`,
  };
  const twin =
    tracked === "main" ? "" : " A peak of the subcarrier has a twin as far on the other side; a reflection has none.";
  return markChoice({
    quantity,
    typed: answerOf(answers, "lock.peak"),
    right: [tracked === "main" ? "main" : "side"],
    explain: (value) => ({
      errorClass: errorOf(tracked === "main", value),
      reason: `${at}${place[tracked]}.${value === "reflection" ? twin : ""}`,
    }),
  });
}

function errorOf(mainShare: boolean, value: string): string {
  if (value === "reflection") return "taken for a reflection";
  return mainShare ? "main peak called false" : "side peak taken for the main one";
}

const workingsOf = (truth: SidePeakTruth): Marking["workings"] => [
  { label: "Main peak", value: formatQuantity(truth.peaks.main.lagChips, "chip", 3) },
  ...(["earlier", "later"] as const).map((side) => ({
    label: side === "earlier" ? "Side peak before it" : "Side peak behind it",
    value: [
      formatQuantity(truth.peaks[side].lagChips, "chip", 3),
      formatQuantity(biasM(truth.peaks, side), "m", 1),
      `${formatQuantity(levelDb(truth.peaks, side), "dB", 2)} under it`,
    ].join(", "),
  })),
  { label: "Tracked lag", value: formatUnderstood(truth.trackedLagChips, "chip") },
  {
    label: "Reflection put in",
    value: `${formatQuantity(truth.reflection.extraChips, "chip", 3)} behind the direct signal, ${formatQuantity(truth.reflection.ratio, "1", 2)} of its amplitude, phase ${formatQuantity(360 * truth.reflection.turns, "deg", 0)}`,
  },
  { label: "C/N0 times averaging time", value: formatQuantity(truth.cn0TDb, "dB", 1) },
  {
    label: "Undisturbed BOC(1,1)",
    value: "side peaks half a chip off, 146.5\u00a0m, and half as high, 6.0\u00a0dB under the main peak",
  },
];
