import { decibels } from "@/lib/numeric/elementary";
import { answerOf } from "../answerOf";
import { askedQuantities, type AskedQuantity } from "../askedQuantities";
import { finishMarking } from "../finishMarking";
import { formatNumber, formatQuantity } from "../formatQuantity";
import type { Answers, CheckPlan, MarkedRow, Marking } from "../kind";
import { markChoice } from "../markChoice";
import { CLASS_CHOICES } from "./classes";
import type { InterfererTruth } from "./drawCase";
import { fullScaleDb, MHZ } from "./drawScene";
import { markFigure } from "./figure-rows";
import type { InterfererParameters } from "./parameters";
import { interfererQuantities } from "./quantities";

/** Sets a hand-in against what was put into the capture. */
export function markAnswers(truth: InterfererTruth, plan: CheckPlan<InterfererParameters>, answers: Answers): Marking {
  const asked = askedQuantities(interfererQuantities, plan);
  const mark = (quantity: AskedQuantity): MarkedRow =>
    quantity.id === "class" ? markClass(truth, quantity, answers) : markFigure(truth, quantity, answers);
  return finishMarking({ id: "interferer", version: 1 }, plan, asked, [...asked.values()].map(mark), workingsOf(truth));
}

function markClass({ scene }: InterfererTruth, quantity: AskedQuantity, answers: Answers): MarkedRow {
  return markChoice({
    quantity,
    typed: answerOf(answers, "interference.class"),
    right: [scene.class],
    explain: (value) => {
      const centre = answerOf(answers, "interference.centre").trim();
      if (value === "carrier" && scene.class === "nothing")
        return {
          errorClass: "own line called a carrier",
          reason: "The line at 0\u00a0Hz is the receiver's own; besides it there is noise alone.",
        };
      if (value === "carrier" && centre === "0")
        return { errorClass: "own line called a carrier", reason: "The line at 0\u00a0Hz is the receiver's own." };
      if (value === "nothing")
        return {
          errorClass: "interference missed",
          reason: "There is interference in the capture. An overloaded amplifier clips; these samples do not.",
        };
      return { errorClass: null, reason: HOW_TO_TELL[scene.class] };
    },
  });
}

const HOW_TO_TELL: Readonly<Record<string, string>> = {
  carrier: "A single line, as narrow as any resolution shows it, always on.",
  "narrow-fm": "A line that swings to and fro: two horns in the averaged spectrum, some tens of kHz apart.",
  sweep: "The frequency runs over a wide band and starts again; fast sweeps show lines one over the period apart.",
  pulse: "The power is off most of the time and comes on at even intervals.",
  noise: "An even hump whose samples never repeat.",
  code: "A hump with its first nulls 1.023\u00a0MHz off, of lines 1\u00a0kHz apart: it repeats each millisecond.",
  nothing: "Besides the line at 0\u00a0Hz there is noise alone.",
};

function workingsOf({ scene, reading }: InterfererTruth): Marking["workings"] {
  const { figures } = scene;
  const label = CLASS_CHOICES.find(({ value }) => value === scene.class)!.label;
  return [
    { label: "Put in", value: label },
    { label: "Centre, put in and read", value: pair(figures.centreHz / 1000, reading.centreHz / 1000, "kHz", 0) },
    {
      label: "Bandwidth at 6 dB, put in and read",
      value: pair(figures.bandwidthHz / 1000, reading.bandwidthHz / 1000, "kHz", 0),
    },
    { label: "Repetition, put in and read", value: pair(figures.periodS * 1e6, reading.periodS * 1e6, "us", 1) },
    { label: "Level, put in and read", value: pair(figures.levelDb, reading.levelDb, "dB", 1) },
    {
      label: "Noise floor, put in and read",
      value: pair(fullScaleDb(scene.floorPerHz * MHZ), reading.floorDb, "dB", 1),
    },
    { label: "Own line, put in and read", value: pair(scene.ownLineDb, reading.ownLineDb, "dB", 1) },
    { label: "Mirrored frequency", value: `${formatNumber(-2 * decibels(scene.imageShare), 0)}\u00a0dB weaker` },
    { label: "Noise in I or Q", value: `${formatNumber(scene.sigma, 2)} counts` },
  ];
}

const pair = (put: number, read: number, unit: "kHz" | "us" | "dB", decimals: number) =>
  `${formatQuantity(put, unit, decimals)}, ${formatQuantity(read, unit, decimals)}`;
