import { askedQuantities, type AskedQuantity } from "../askedQuantities";
import { finishMarking } from "../finishMarking";
import { formatNumber, formatQuantity } from "../formatQuantity";
import type { Answers, CheckPlan, MarkedRow, Marking } from "../kind";
import type { ChainTruth } from "./drawCase";
import { figuresOf, type Figures } from "./figures";
import { markDesign } from "./markDesign";
import { markOwn } from "./markOwn";
import type { ChainParameters } from "./parameters";
import { chainQuantities } from "./quantities";
import { readChain } from "./readChain";
import type { Part } from "./site";

/** Computes what the handed-in chain does and sets it against the site and against the candidate's own figures. */
export function markAnswers(truth: ChainTruth, plan: CheckPlan<ChainParameters>, answers: Answers): Marking {
  const { site } = truth;
  const asked = askedQuantities(chainQuantities, plan);
  const read = readChain(answers, site);
  const figures = read.chain.length > 0 ? figuresOf(read.chain, site) : null;
  const mark = (quantity: AskedQuantity): MarkedRow =>
    quantity.id.startsWith("own")
      ? markOwn(quantity, answers, read, figures, site)
      : markDesign(quantity, read, figures, site);
  const rows = [...asked.values()].map(mark);
  return finishMarking({ id: "chain", version: 1 }, plan, asked, rows, workingsOf(truth, figures));
}

const workingsOf = (
  { site, best, goodChains, possibleChains }: ChainTruth,
  figures: Figures | null,
): Marking["workings"] => [
  ...(figures ? [{ label: "Your chain", value: figuresText(figures) }] : []),
  { label: "A chain that keeps every limit", value: `${chainText(best)}: ${figuresText(figuresOf(best, site))}` },
  {
    label: "Chains tried by the server",
    value: `${formatNumber(goodChains, 0)} of ${formatNumber(possibleChains, 0)} with one amplifier or two keep every limit`,
  },
];

const chainText = (chain: readonly Part[]) => chain.map(({ id }) => id).join(", ");

const figuresText = ({ gainDb, noiseFigureDb, delayNs, amplifiers, totalMa }: Figures) =>
  [
    `net gain ${formatQuantity(gainDb, "dB", 2)}`,
    `noise figure ${formatQuantity(noiseFigureDb, "dB", 2)}`,
    ...amplifiers.map(
      ({ part, headroomDb, volts }) =>
        `${part.id} headroom ${formatQuantity(headroomDb, "dB", 2)}, ${volts === null ? "no feed" : formatQuantity(volts, "V", 3)}`,
    ),
    `delay ${formatQuantity(delayNs, "ns", 2)}`,
    formatQuantity(totalMa, "mA", 0),
  ].join(", ");
