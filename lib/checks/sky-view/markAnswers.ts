import { answerOf } from "../answerOf";
import { askedQuantities, type AskedQuantity } from "../askedQuantities";
import { finishMarking } from "../finishMarking";
import { formatQuantity } from "../formatQuantity";
import type { Answers, CheckPlan, MarkedRow, Marking } from "../kind";
import { markChoice } from "../markChoice";
import type { SkyViewTruth } from "./drawCase";
import { markBlocked, markQuadrantBlocked, markRoom } from "./markFigures";
import { markPosition } from "./markPosition";
import type { SkyViewParameters } from "./parameters";
import { QUADRANTS, skyViewQuantities } from "./quantities";
import type { Surveyed } from "./survey";

/** One figure or word of one position. */
export type PositionMarker = (
  truth: SkyViewTruth,
  quantity: AskedQuantity,
  surveyed: Surveyed,
  answers: Answers,
) => MarkedRow;

const MARKERS: Readonly<Record<string, PositionMarker>> = {
  blocked: markBlocked,
  quadrant: markQuadrant,
  quadrantBlocked: markQuadrantBlocked,
  room: markRoom,
};

/** Sets a hand-in against the survey; the worst quadrant's share against the quadrant that the candidate named. */
export function markAnswers(truth: SkyViewTruth, plan: CheckPlan<SkyViewParameters>, answers: Answers): Marking {
  const asked = askedQuantities(skyViewQuantities, plan);
  const rows = [...asked.values()].flatMap((quantity) =>
    quantity.id === "choice"
      ? [markPosition(truth, quantity, answers)]
      : truth.surveyed.map((one) => MARKERS[quantity.id](truth, quantity, one, answers)),
  );
  return finishMarking({ id: "sky-view", version: 1 }, plan, asked, rows, workingsOf(truth));
}

function markQuadrant(
  _: SkyViewTruth,
  quantity: AskedQuantity,
  { id, quadrantsPercent, worst }: Surveyed,
  answers: Answers,
): MarkedRow {
  const share = (n: number) => formatQuantity(quadrantsPercent[n], "%", 1);
  return markChoice({
    quantity,
    subject: `Position ${id}`,
    typed: answerOf(answers, `${id}.quadrant`),
    right: [QUADRANTS[worst].value],
    explain: (value) => {
      const named = QUADRANTS.findIndex((one) => one.value === value);
      const reason = `The quadrant that you named has ${share(named)} blocked; ${QUADRANTS[worst].label.toLowerCase()} has ${share(worst)}.`;
      return { errorClass: null, reason };
    },
  });
}

const workingsOf = ({ surveyed }: SkyViewTruth): Marking["workings"] => [
  ...surveyed.map(({ id, blockedPercent, quadrantsPercent, roomM, tightest }) => ({
    label: `Position ${id}`,
    value: [
      `${formatQuantity(blockedPercent, "%", 2)} blocked`,
      ...quadrantsPercent.map((share, n) => `${QUADRANTS[n].label.toLowerCase()} ${formatQuantity(share, "%", 2)}`),
      `room ${formatQuantity(roomM, "m", 2)} to the ${tightest}`,
    ].join(", "),
  })),
  {
    label: "Share of one piece",
    value: "width / 360° × (sin top − sin mask) / (1 − sin mask)",
  },
];
