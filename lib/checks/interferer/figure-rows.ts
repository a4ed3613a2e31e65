import { decibels } from "@/lib/numeric/elementary";
import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import { formatNumber, formatQuantity } from "../formatQuantity";
import type { Answers, MarkedRow } from "../kind";
import { markNumber, type Finding, type NumberLine } from "../markNumber";
import type { InterfererTruth } from "./drawCase";
import { fullScaleDb, MHZ, RATE_HZ, type InterfererScene } from "./drawScene";
import { centreToleranceHz, LINE_WIDTH_HZ } from "./tolerances";

type FigureLine = Pick<NumberLine, "computed" | "unit" | "decimals" | "tolerance" | "explain">;

const SECTION: Readonly<Record<string, string>> = { floor: "receiver", ownLine: "receiver" };

/** One of the numbers of the form. */
export function markFigure({ scene }: InterfererTruth, quantity: AskedQuantity, answers: Answers): MarkedRow {
  const line = LINES[quantity.id](scene, quantity.tolerance);
  const typed = answerOf(answers, `${SECTION[quantity.id] ?? "interference"}.${quantity.id}`);
  return markNumber({ quantity, typed, ...line });
}

const LINES: Readonly<Record<string, (scene: InterfererScene, tolerance: number) => FigureLine>> = {
  centre: centreLine,
  bandwidth: bandwidthLine,
  period: periodLine,
  level: levelLine,
  floor: floorLine,
  ownLine: ({ ownLineDb }, tolerance) => ({ computed: ownLineDb, unit: "dB", decimals: 1, tolerance }),
};

function centreLine({ class: cls, figures }: InterfererScene, toleranceKhz: number): FigureLine {
  const computed = figures.centreHz / 1000;
  const tolerance = centreToleranceHz(figures, toleranceKhz * 1000) / 1000;
  return {
    computed,
    unit: "kHz",
    decimals: 0,
    tolerance,
    explain(value): Finding | null {
      const near = (other: number) => Math.abs(value - other) <= tolerance;
      if (cls === "nothing") return { errorClass: null, reason: "Nothing is there, so its centre is 0." };
      if (near(-computed))
        return {
          errorClass: "mirror image",
          reason: "The size agrees; the sign does not. The weaker copy at the mirrored frequency is the receiver's.",
        };
      if (near(0)) return { errorClass: "own line", reason: "At 0\u00a0Hz stands the receiver's own line." };
      if (near(computed * 1000)) return { errorClass: "Hz for kHz", reason: "The field is in kHz." };
      return null;
    },
  };
}

function bandwidthLine({ class: cls, figures }: InterfererScene, tolerancePercent: number): FigureLine {
  const computed = figures.bandwidthHz / 1000;
  const tolerance = cls === "carrier" ? LINE_WIDTH_HZ / 1000 : (tolerancePercent / 100) * computed;
  return {
    computed,
    unit: "kHz",
    decimals: 0,
    tolerance,
    explain(value): Finding | null {
      if (cls === "carrier" || cls === "nothing")
        return { errorClass: null, reason: "There is no width to measure here: 0." };
      if (Math.abs(2 * value - computed) <= tolerance)
        return {
          errorClass: "half of the width",
          reason: "This is from the middle to one edge; asked is edge to edge.",
        };
      return null;
    },
  };
}

function periodLine({ class: cls, figures }: InterfererScene, tolerancePercent: number): FigureLine {
  const computed = figures.periodS * 1e6;
  const tolerance = (tolerancePercent / 100) * computed;
  return {
    computed,
    unit: "us",
    decimals: computed < 100 ? 2 : 0,
    tolerance,
    explain(value): Finding | null {
      const near = (other: number) => Math.abs(value - other) <= tolerance;
      if (computed === 0) return { errorClass: null, reason: "Nothing of it repeats: 0." };
      if (near(2 * computed) || near(3 * computed))
        return {
          errorClass: "more than one repetition",
          reason: "This is more than one of them; the shortest is asked.",
        };
      if (near(computed / 2))
        return { errorClass: "half of a repetition", reason: "This is half of one: there and back is one." };
      const kilohertz = 1000 / computed;
      if (Math.abs(value - kilohertz) <= (tolerancePercent / 100) * kilohertz)
        return {
          errorClass: "rate for time",
          reason: `It repeats ${formatNumber(kilohertz, 1)} thousand times a second; the time is asked.`,
        };
      return { errorClass: null, reason: `${NAMES[cls] ?? "It"} takes ${formatQuantity(computed, "us", 1)}.` };
    },
  };
}

const NAMES: Readonly<Record<string, string>> = {
  "narrow-fm": "One swing",
  sweep: "One sweep",
  pulse: "From pulse to pulse it",
  code: "One code",
};

function levelLine({ class: cls, figures, interferer }: InterfererScene, tolerance: number): FigureLine {
  const computed = figures.levelDb;
  const wholeBandDb = decibels(RATE_HZ / MHZ);
  return {
    computed,
    unit: "dB",
    decimals: 1,
    tolerance,
    explain(value): Finding | null {
      if (cls === "nothing") return { errorClass: null, reason: "Nothing is there, so its level is 0 here." };
      if (Math.abs(value - (computed - wholeBandDb)) <= tolerance)
        return {
          errorClass: "noise of the whole band",
          reason: "This is over the noise of the whole capture, not of 1\u00a0MHz.",
        };
      if (interferer?.kind === "pulse" && Math.abs(value - computed + decibels(interferer.onShare)) <= tolerance)
        return {
          errorClass: "level while on",
          reason: "This is the level while a pulse is on; the mean over the capture is asked.",
        };
      return null;
    },
  };
}

function floorLine({ floorPerHz }: InterfererScene, tolerance: number): FigureLine {
  const computed = fullScaleDb(floorPerHz * MHZ);
  return {
    computed,
    unit: "dB",
    decimals: 1,
    tolerance,
    explain(value): Finding | null {
      if (Math.abs(value + computed) <= tolerance)
        return { errorClass: "sign", reason: "The size agrees; the floor is under full scale, so negative." };
      if (Math.abs(value - fullScaleDb(floorPerHz * RATE_HZ)) <= tolerance)
        return {
          errorClass: "noise of the whole band",
          reason: "This is the noise of the whole capture, not of 1\u00a0MHz.",
        };
      return null;
    },
  };
}
