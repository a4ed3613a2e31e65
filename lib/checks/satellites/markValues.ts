import { clockErrorHz } from "@/lib/gnss/doppler";
import type { SceneSatellite } from "@/lib/gnss/scene";
import type { AskedQuantities, AskedQuantity } from "../askedQuantities";
import { codePhaseLine } from "../codePhaseLine";
import { formatQuantity } from "../formatQuantity";
import type { MarkedRow } from "../kind";
import { markNumber, type Finding, type NumberLine } from "../markNumber";
import { wrongSign } from "../wrongSign";
import { mustBeFound, type SatellitesTruth } from "./drawScene";
import { twice } from "./list-rows";
import type { ListedLine } from "./readLines";

/** Code phase, Doppler and C/N0 of one satellite of the scene, as far as they are asked. */
export function markValues(
  asked: AskedQuantities,
  truth: SatellitesTruth,
  satellite: SceneSatellite,
  lines: readonly ListedLine[],
  dopplerToleranceHz: number,
): MarkedRow[] {
  const extra = mustBeFound(truth)(satellite) ? "" : " (extra, not counted)";
  const mark = (id: "codePhase" | "doppler" | "cn0", line: (quantity: AskedQuantity) => ValueLine): MarkedRow[] => {
    const quantity = asked.get(id);
    if (!quantity) return [];
    const typed = lines.map((listed) => listed[id]).join(" / ");
    const problem = twice(satellite.prn, lines);
    const row = {
      quantity,
      subject: `PRN ${satellite.prn}`,
      label: `${quantity.label}${extra}`,
      typed,
      ...line(quantity),
    };
    return [markNumber(problem ? { ...row, read: () => ({ problem: problem.reason }) } : row)];
  };
  return [
    ...mark("codePhase", ({ tolerance }) => codePhaseLine(satellite.codePhaseChips, tolerance, truth.scene.rateHz)),
    ...mark("doppler", () => dopplerLine(satellite, dopplerToleranceHz, truth)),
    ...mark("cn0", ({ tolerance }) => cn0Line(satellite, tolerance)),
  ];
}

type ValueLine = Omit<NumberLine, "quantity" | "subject" | "label" | "typed">;

const dopplerLine = ({ dopplerHz }: SceneSatellite, tolerance: number, truth: SatellitesTruth): ValueLine => ({
  computed: dopplerHz,
  unit: "Hz",
  decimals: 0,
  tolerance,
  explain: (value) => wrongSign(value, dopplerHz, tolerance) ?? offsetTakenOut(value, dopplerHz, tolerance, truth),
});

function offsetTakenOut(
  value: number,
  dopplerHz: number,
  tolerance: number,
  { clockPpm }: SatellitesTruth,
): Finding | null {
  const offsetHz = clockErrorHz(clockPpm);
  if (!(Math.abs(value - (dopplerHz - offsetHz)) <= tolerance)) return null;
  return {
    errorClass: "clock offset taken out",
    reason: `The common offset of ${formatQuantity(offsetHz, "Hz", 0)} was taken out. Asked is the received frequency minus 1\u2009575.42\u00a0MHz, whatever moved it.`,
  };
}

const cn0Line = ({ cn0DbHz }: SceneSatellite, tolerance: number): ValueLine => ({
  computed: cn0DbHz,
  unit: "dB-Hz",
  decimals: 1,
  tolerance,
  explain: (value) => (Math.abs(value + 30 - cn0DbHz) <= tolerance ? SNR_IN_ONE_KILOHERTZ : null),
});

const SNR_IN_ONE_KILOHERTZ: Finding = {
  errorClass: "SNR in 1 kHz",
  reason: "This is the signal-to-noise ratio after 1\u00a0ms, in 1\u00a0kHz. C/N0 is 30\u00a0dB more.",
};
