import type { AskedQuantity } from "../askedQuantities";
import { formatDifference } from "../formatDifference";
import { formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { MarkedRow } from "../kind";
import type { Finding } from "../markNumber";
import { markWord } from "../markWord";
import type { Figures } from "./figures";
import { feedFault, isSupplied, marginsOf, MARGIN_DB } from "./limits";
import { orderFault } from "./orderFault";
import type { ReadChain } from "./readChain";
import type { Part, Site } from "./site";

type Judged = { computed: string; marginDb?: number; tolerance: string; finding: Finding | null };
type Design = { chain: readonly Part[]; figures: Figures; site: Site };
type Judge = (design: Design, quantity: AskedQuantity) => Judged;

const JUDGES: Readonly<Record<string, Judge>> = {
  order: judgeOrder,
  feed: judgeFeed,
  supply: judgeSupply,
  gain: judgeGain,
  noise: judgeNoise,
  overload: judgeOverload,
};

/** What the handed-in chain does, set against the site, or why it could not be computed. */
export function markDesign(quantity: AskedQuantity, read: ReadChain, figures: Figures | null, site: Site): MarkedRow {
  if (!figures) {
    const finding = { errorClass: null, reason: read.problem };
    return markWord({ quantity, handedIn: read.typed, computed: "not computed", tolerance: "", finding });
  }
  const { computed, marginDb, tolerance, finding } = JUDGES[quantity.id](
    { chain: read.chain, figures, site },
    quantity,
  );
  const row = markWord({ quantity, handedIn: read.typed, computed, tolerance, finding });
  const measurable = marginDb !== undefined && Number.isFinite(marginDb);
  return { ...row, difference: measurable ? formatDifference(marginDb - MARGIN_DB, "dB", 1) : null };
}

const dB = (value: number) => formatQuantity(value, "dB", 1);
const volts = (value: number) => formatQuantity(value, "V", 2);
const milliamperes = (value: number) => formatQuantity(value, "mA", 0);

function judgeOrder({ chain, site }: Design): Judged {
  const fault = orderFault(chain, site);
  return {
    computed: fault ? "no chain for this site" : "in order",
    tolerance: "same",
    finding: fault ? { errorClass: null, reason: fault } : null,
  };
}

function judgeFeed({ chain, figures }: Design): Judged {
  const fault = feedFault(chain, figures);
  const finding = (errorClass: string | null, reason: string): Judged => ({
    computed: "broken",
    tolerance: "one feed, to every amplifier",
    finding: { errorClass, reason },
  });
  if (!fault) return { computed: "intact", tolerance: "one feed, to every amplifier", finding: null };
  if (!fault.part) return finding(null, "The chain has no amplifier to feed.");
  if (fault.two)
    return finding("two feeds", `${fault.part.id} passes the feed of all its ports: two receivers feed one line.`);
  return finding(
    "direct current blocked",
    `${fault.part.id} lets no direct current through, so the amplifiers above it are dead.`,
  );
}

function judgeSupply({ figures, site }: Design): Judged {
  const { amplifiers, totalMa } = figures;
  const starved = amplifiers.find(({ part, volts: at }) => !(at !== null && at >= part.minimumV));
  const computed = [
    milliamperes(totalMa),
    ...amplifiers.map((one) => `${one.part.id} ${one.volts === null ? "no feed" : volts(one.volts)}`),
  ];
  const overMa = `The chain draws ${milliamperes(totalMa)}; the receiver feeds ${milliamperes(site.limitMa)}.`;
  return {
    computed: computed.join(", "),
    tolerance: `at most ${milliamperes(site.limitMa)}, least volts of each amplifier`,
    finding:
      amplifiers.length > 0 && isSupplied(figures, site)
        ? null
        : amplifiers.length === 0
          ? { errorClass: null, reason: "The chain has no amplifier to feed." }
          : starved
            ? { errorClass: starved.volts === null ? null : "too few volts", reason: starvedReason(starved) }
            : { errorClass: "too much current", reason: overMa },
  };
}

const starvedReason = ({ part, volts: at }: Figures["amplifiers"][number]) =>
  at === null
    ? `No feed reaches ${part.id}.`
    : `${part.id} gets ${volts(at)} and needs ${formatUnderstood(part.minimumV, "V")}.`;

function judgeGain({ figures, site }: Design, { tolerance }: AskedQuantity): Judged {
  const { gainDb } = figures;
  const margin = marginsOf(figures, site).gainDb;
  const [from, to] = [site.gainFromDb + MARGIN_DB, site.gainToDb - MARGIN_DB];
  const much = gainDb > to;
  const reason = `The receiver takes ${dB(site.gainFromDb)} to ${dB(site.gainToDb)}; with 1 dB left the net gain is from ${dB(from)} to ${dB(to)}.`;
  return {
    computed: dB(gainDb),
    marginDb: margin,
    tolerance: `from ${formatUnderstood(from, "dB")} to ${formatUnderstood(to, "dB")}`,
    finding:
      margin >= MARGIN_DB - tolerance ? null : { errorClass: much ? "too much gain" : "too little gain", reason },
  };
}

function judgeNoise({ figures, site }: Design, { tolerance }: AskedQuantity): Judged {
  const { noiseFigureDb, amplifiers } = figures;
  const margin = marginsOf(figures, site).noiseDb;
  const most = site.noiseLimitDb - MARGIN_DB;
  const lossDb = amplifiers[0]?.lossBeforeDb ?? 0;
  const behind = lossDb > 0;
  const reason = behind
    ? `${dB(lossDb)} of loss stand before the first amplifier and go whole into the noise figure.`
    : `With 1 dB left the noise figure is at most ${dB(most)}; the first amplifier and the loss behind it decide.`;
  return {
    computed: formatQuantity(noiseFigureDb, "dB", 2),
    marginDb: margin,
    tolerance: `at most ${formatUnderstood(Number(most.toFixed(1)), "dB")}`,
    finding:
      margin >= MARGIN_DB - tolerance
        ? null
        : { errorClass: behind ? "amplifier behind the loss" : "noise figure too high", reason },
  };
}

function judgeOverload({ figures, site }: Design, { tolerance }: AskedQuantity): Judged {
  const margin = marginsOf(figures, site).overloadDb;
  const tight = figures.amplifiers.find(({ headroomDb }) => headroomDb === margin);
  if (!tight) {
    const finding = { errorClass: null, reason: "The chain has no amplifier." };
    return { computed: "no amplifier", tolerance: `at least ${formatUnderstood(MARGIN_DB, "dB")}`, finding };
  }
  const reason = `The neighbour reaches ${formatQuantity(tight.part.compressionDbm - tight.headroomDb, "dBm", 1)} at the output of ${tight.part.id}, whose 1 dB point is ${formatQuantity(tight.part.compressionDbm, "dBm", 0)}.`;
  return {
    computed: `${dB(margin)} in ${tight.part.id}`,
    marginDb: margin,
    tolerance: `at least ${formatUnderstood(MARGIN_DB, "dB")}`,
    finding: margin >= MARGIN_DB - tolerance ? null : { errorClass: "amplifier overdriven", reason },
  };
}
