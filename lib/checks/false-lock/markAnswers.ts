import { answerOf } from "../answerOf";
import { askedQuantities, type AskedQuantity } from "../askedQuantities";
import { finishMarking } from "../finishMarking";
import type { Answers, CheckPlan, MarkedRow, Marking } from "../kind";
import { markChoice } from "../markChoice";
import type { FalseLockTruth } from "./drawScene";
import { markFalseCn0, markFalseDoppler, markParent } from "./false-peak-rows";
import { markVerdicts } from "./markVerdicts";
import type { FalseLockParameters } from "./parameters";
import { falseLockQuantities, RIGHT_REMEDIES, RIGHT_TESTS } from "./quantities";
import { workingsOf, type Measured } from "./workings";

type Marker = (truth: FalseLockTruth, quantity: AskedQuantity, answers: Answers) => MarkedRow[];

const MARKERS: Readonly<Record<string, Marker>> = {
  verdict: markVerdicts,
  parent: (...given) => [markParent(...given)],
  falseDoppler: (...given) => [markFalseDoppler(...given)],
  falseCn0: (...given) => [markFalseCn0(...given)],
  test: (_, quantity, answers) => [markTest(quantity, answers)],
  remedy: (_, quantity, answers) => [markRemedy(quantity, answers)],
};

/** Sets a hand-in against the scene and the two codes; the search goes into the workings alone, so that noise decides nothing. */
export function markAnswers(
  truth: FalseLockTruth,
  plan: CheckPlan<FalseLockParameters>,
  answers: Answers,
  measured: Measured,
): Marking {
  const asked = askedQuantities(falseLockQuantities, plan);
  const rows = [...asked.values()].flatMap((quantity) => MARKERS[quantity.id](truth, quantity, answers));
  return finishMarking({ id: "false-lock", version: 1 }, plan, asked, rows, workingsOf(truth, measured));
}

const markTest = (quantity: AskedQuantity, answers: Answers) =>
  markChoice({
    quantity,
    typed: answerOf(answers, "falseLock.test"),
    right: RIGHT_TESTS,
    computed: listOf(quantity, RIGHT_TESTS),
    explain: (value) => ({ errorClass: TEST_ERRORS[value] ?? null, reason: TEST_REASONS[value] }),
  });

const TEST_ERRORS: Readonly<Record<string, string>> = {
  "highest-peak": "highest peak wins",
  "second-path": "multipath",
};
const TEST_REASONS: Readonly<Record<string, string>> = {
  "highest-peak": "A false peak can be higher than a genuine weak satellite's.",
  threshold: "A genuine weak satellite disappears with it.",
  "second-path": "Reflections arrive within about a chip and with the satellite's own Doppler; these peaks do not.",
};

const markRemedy = (quantity: AskedQuantity, answers: Answers) =>
  markChoice({
    quantity,
    typed: answerOf(answers, "falseLock.remedy"),
    right: RIGHT_REMEDIES,
    computed: listOf(quantity, RIGHT_REMEDIES),
    explain: (value) => ({ errorClass: REMEDY_ERRORS[value] ?? null, reason: REMEDY_REASONS[value] }),
  });

const REMEDY_ERRORS: Readonly<Record<string, string>> = { raise: "threshold raised", antenna: "multipath" };
const REMEDY_REASONS: Readonly<Record<string, string>> = {
  raise: "A higher threshold loses genuine weak satellites together with the false lock.",
  antenna: "There is no reflection to reject: the signal comes straight from another satellite.",
  longer: "Adding up for longer raises the false peak as much as a genuine one.",
  weight: "A range that is wrong by kilometres is wrong at any weight.",
};

const listOf = (quantity: AskedQuantity, values: readonly string[]) =>
  quantity.choices
    .filter(({ value }) => values.includes(value))
    .map(({ label }) => label)
    .join("; or: ");
