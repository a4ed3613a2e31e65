import { askedQuantities, type AskedQuantity } from "../askedQuantities";
import { finishMarking } from "../finishMarking";
import { formatDifference } from "../formatDifference";
import { formatQuantity } from "../formatQuantity";
import type { Answers, CheckPlan, MarkedRow, Marking } from "../kind";
import { standardNs } from "./budget";
import type { DelayEntryTruth } from "./drawCase";
import { markEntry, markTotal, markUncertainty } from "./entry-rows";
import { ownValues, type OwnValues } from "./ownValues";
import type { DelayEntryParameters } from "./parameters";
import { markEchoes, markParts } from "./part-rows";
import { delayEntryQuantities } from "./quantities";

type Marker = (
  truth: DelayEntryTruth,
  quantity: AskedQuantity,
  answers: Answers,
  own: OwnValues,
) => MarkedRow | MarkedRow[];

const MARKERS: Readonly<Record<string, Marker>> = {
  echo: markEchoes,
  parts: markParts,
  total: markTotal,
  entry: markEntry,
  uncertainty: markUncertainty,
};

/** Sets a hand-in against the papers; sum, entry, uncertainty and measured run against the candidate's own earlier values. */
export function markAnswers(truth: DelayEntryTruth, plan: CheckPlan<DelayEntryParameters>, answers: Answers): Marking {
  const asked = askedQuantities(delayEntryQuantities, plan);
  const own = ownValues(truth, answers);
  const rows = [...asked.values()].flatMap((quantity) => MARKERS[quantity.id](truth, quantity, answers, own));
  return finishMarking({ id: "delay-entry", version: 1 }, plan, asked, rows, workingsOf(truth));
}

const workingsOf = ({
  parts,
  delaysNs,
  totalNs,
  entryNs,
  uncertaintyNs,
  note,
}: DelayEntryTruth): Marking["workings"] => [
  ...parts.map((part, n) => ({
    label: `${part.id.toUpperCase()} ${part.name}`,
    value:
      delaysNs[n] === 0
        ? `not on the way: ${part.from} to ${part.to}`
        : `${formatQuantity(delaysNs[n], "ns", 1)}, u ${formatQuantity(standardNs(part.uncertainty, delaysNs[n]), "ns", 2)}`,
  })),
  { label: "Total", value: formatQuantity(totalNs, "ns", 1) },
  { label: "Standard uncertainty", value: formatQuantity(uncertaintyNs, "ns", 2) },
  { label: "Receiver's sheet", value: note },
  { label: "To enter", value: formatDifference(entryNs, "ns", 1) },
];
