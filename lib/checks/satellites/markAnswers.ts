import type { SatelliteSearch } from "@/lib/gnss/acquire";
import { answerOf } from "../answerOf";
import { askedQuantities, type AskedQuantities } from "../askedQuantities";
import { finishMarking } from "../finishMarking";
import type { Answers, CheckPlan, MarkedRow, Marking } from "../kind";
import { markWord } from "../markWord";
import { parseQuantity } from "../parseQuantity";
import { mustBeFound, type SatellitesTruth } from "./drawScene";
import { markFound, markInvented } from "./list-rows";
import { markValues } from "./markValues";
import type { SatellitesParameters } from "./parameters";
import { satellitesQuantities } from "./quantities";
import { readLines } from "./readLines";
import { workingsOf } from "./workings";

const TOLERANCE_WITHOUT_BIN_HZ = 25; // half of the narrowest bin a 100 ms capture is likely searched with
const BIN_HZ = { from: 1, to: 1000 } as const;

/** Sets a hand-in against the scene; the search goes into the workings alone, so that noise decides nothing. */
export function markAnswers(
  truth: SatellitesTruth,
  plan: CheckPlan<SatellitesParameters>,
  answers: Answers,
  searched: readonly SatelliteSearch[],
): Marking {
  const asked = askedQuantities(satellitesQuantities, plan);
  const lines = readLines(answers);
  const bin = readBin(asked, answers);
  const uncounted = new Set<MarkedRow>();
  const rows = truth.scene.satellites.flatMap((satellite) => {
    const own = lines.byPrn.get(satellite.prn) ?? [];
    const required = mustBeFound(truth)(satellite);
    if (!required && own.length === 0) return [];
    const found = asked.get("found");
    const values = markValues(asked, truth, satellite, own, bin.toleranceHz);
    if (!required) values.forEach((row) => uncounted.add(row));
    return [...(found && required ? [markFound(found, satellite, own)] : []), ...values];
  });
  const all = [...rows, ...markInvented(asked, truth, lines), ...bin.rows];
  return finishMarking({ id: "satellites", version: 1 }, plan, asked, all, workingsOf(truth, searched), uncounted);
}

/** Half of the candidate's own bin, within the quantity's limit; a bin that cannot be read is a row of its own. */
function readBin(asked: AskedQuantities, answers: Answers): { toleranceHz: number; rows: MarkedRow[] } {
  const quantity = asked.get("doppler");
  if (!quantity) return { toleranceHz: NaN, rows: [] };
  const typed = answerOf(answers, "search.bin");
  const reading = parseQuantity(typed, "Hz");
  if ("value" in reading && reading.value >= BIN_HZ.from && reading.value <= BIN_HZ.to) {
    return { toleranceHz: Math.min(reading.value / 2, quantity.tolerance), rows: [] };
  }
  const problem = "problem" in reading ? reading.problem : "A Doppler bin is from 1 to 1\u2009000\u00a0Hz.";
  const reason = `${problem} Half of the bin is the tolerance; without it ±${TOLERANCE_WITHOUT_BIN_HZ}\u00a0Hz is taken.`;
  const row = markWord({
    quantity,
    label: "Your Doppler bin",
    handedIn: typed,
    computed: "1 to 1\u2009000\u00a0Hz",
    finding: { errorClass: null, reason },
  });
  return { toleranceHz: Math.min(TOLERANCE_WITHOUT_BIN_HZ, quantity.tolerance), rows: [row] };
}
