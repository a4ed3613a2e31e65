import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import { formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers, MarkedRow } from "../kind";
import { markNumber, type Finding, type NumberLine } from "../markNumber";
import { markWord } from "../markWord";
import type { FedAmplifier, Figures } from "./figures";
import type { ReadChain } from "./readChain";
import type { Part, Site } from "./site";
import { delayLeftOutNs, lossLeftOutDb, noiseFiguresAddedDb } from "./wrongFigures";

const FIELD_OF: Readonly<Record<string, string>> = {
  ownGain: "figures.gain",
  ownNoise: "figures.noise",
  ownHeadroom: "figures.headroom",
  ownDelay: "figures.delay",
  ownVolts: "figures.volts",
};

type Own = { chain: readonly Part[]; figures: Figures; site: Site; first: FedAmplifier | undefined };
type OwnLine = Pick<NumberLine, "computed" | "unit" | "decimals" | "explain"> & { tolerance?: number };

const LINES: Readonly<Record<string, (own: Own, quantity: AskedQuantity) => OwnLine | null>> = {
  ownGain: gainLine,
  ownNoise: noiseLine,
  ownHeadroom: headroomLine,
  ownDelay: delayLine,
  ownVolts: voltsLine,
};

/** The candidate's own figure against what the handed-in chain comes to, whether that chain will do or not. */
export function markOwn(
  quantity: AskedQuantity,
  answers: Answers,
  { chain, problem }: ReadChain,
  figures: Figures | null,
  site: Site,
): MarkedRow {
  const typed = answerOf(answers, FIELD_OF[quantity.id]);
  const without = (reason: string) =>
    markWord({
      quantity,
      handedIn: typed,
      computed: "not computed",
      tolerance: "",
      finding: { errorClass: null, reason },
    });
  if (!figures) return without(`There is no chain to compare with. ${problem}`);
  const line = LINES[quantity.id]({ chain, figures, site, first: figures.amplifiers[0] }, quantity);
  if (!line) return without("Your chain has no amplifier.");
  return markNumber({ quantity, typed, tolerance: quantity.tolerance, ...line });
}

const isNear = (value: number, other: number, by: number) => Math.abs(value - other) <= by;
const found = (yes: boolean, errorClass: string, reason: string): Finding | null =>
  yes ? { errorClass, reason } : null;

function gainLine({ chain, figures, site }: Own, { tolerance }: AskedQuantity): OwnLine {
  const { gainDb } = figures;
  const amplifiersDb = figures.amplifiers.reduce((sum, { part }) => sum + part.gainDb, 0);
  return {
    computed: gainDb,
    unit: "dB",
    decimals: 1,
    explain: (value) =>
      found(
        isNear(value, gainDb + lossLeftOutDb(chain, site), tolerance),
        "loss at 1 GHz",
        "The sheet's loss is at 1 GHz. At L1 it is greater by the root of the frequencies' ratio, 1.255.",
      ) ??
      found(
        isNear(value, amplifiersDb, tolerance),
        "losses left out",
        "This is the amplifiers' gain. Take the losses off.",
      ),
  };
}

function noiseLine({ chain, figures, site }: Own, { tolerance }: AskedQuantity): OwnLine {
  const { noiseFigureDb } = figures;
  const addedDb = noiseFiguresAddedDb(chain, site);
  return {
    computed: noiseFigureDb,
    unit: "dB",
    decimals: 2,
    explain: (value) =>
      found(
        isNear(value, addedDb, tolerance) || isNear(value, addedDb + site.receiverNoiseDb, tolerance),
        "noise figures added in dB",
        "Noise figures in dB do not add. What stands behind a gain counts less by that gain.",
      ),
  };
}

function headroomLine({ first, site }: Own, { tolerance }: AskedQuantity): OwnLine | null {
  if (!first) return null;
  const { part, headroomDb } = first;
  return {
    computed: headroomDb,
    unit: "dB",
    decimals: 1,
    explain: (value) =>
      found(
        isNear(value, headroomDb + part.gainDb, tolerance),
        "gain left out",
        `The 1 dB point of ${part.id} is at its output; the neighbour comes out ${formatUnderstood(part.gainDb, "dB")} stronger than it went in.`,
      ) ??
      found(
        isNear(value, -headroomDb, tolerance),
        "sign",
        "The size agrees; the sign does not. Below zero is overdriven.",
      ) ??
      found(
        isNear(value, part.compressionDbm - site.neighbourDbm - part.gainDb, tolerance),
        "loss before the amplifier left out",
        `${formatQuantity(first.lossBeforeDb, "dB", 1)} of loss stand before ${part.id}.`,
      ),
  };
}

const LEAST_TOLERANCE_NS = 1;

function delayLine({ chain, figures, site }: Own, quantity: AskedQuantity): OwnLine {
  const { delayNs } = figures;
  const tolerance = Math.max(LEAST_TOLERANCE_NS, (quantity.tolerance / 100) * delayNs);
  const partsNs = chain.reduce((sum, part) => sum + (part.kind === "cable" ? 0 : part.delayNs), 0);
  return {
    computed: delayNs,
    unit: "ns",
    decimals: 1,
    tolerance,
    explain: (value) =>
      found(
        isNear(value, delayNs - delayLeftOutNs(chain, site), tolerance),
        "speed of light in air",
        "In the cable the signal runs slower, by the velocity factor of its sheet.",
      ) ??
      found(
        isNear(value, delayNs - partsNs, tolerance),
        "delays of the parts left out",
        "This is the run alone. The other parts delay as well.",
      ),
  };
}

function voltsLine({ first, site }: Own, { tolerance }: AskedQuantity): OwnLine | null {
  if (!first) return null;
  const fed = first.volts !== null;
  return {
    computed: first.volts ?? 0,
    unit: "V",
    decimals: 2,
    explain: (value) =>
      found(!fed, "no feed", `No feed reaches ${first.part.id}.`) ??
      found(
        isNear(value, site.supplyV, tolerance),
        "drop left out",
        "These are the volts at the receiver. The feed's own resistance, run and parts drop some.",
      ),
  };
}
