import { askedQuantities } from "../askedQuantities";
import { formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { CheckPlan, Choice, FieldSpec, PublicCase } from "../kind";
import { publicTolerances } from "../publicTolerances";
import type { ChainTruth } from "./drawCase";
import { MARGIN_DB } from "./limits";
import type { ChainParameters } from "./parameters";
import { chainCautions, chainQuantities } from "./quantities";
import { MOST_PARTS } from "./readChain";
import type { Part, Site } from "./site";

/** Field by field: the site and the parts at hand, and nothing of the chains that suit it. */
export function publicCase({ site }: ChainTruth, plan: CheckPlan<ChainParameters>): PublicCase {
  const asked = askedQuantities(chainQuantities, plan);
  const rounding = ({ tolerance }: { tolerance: number }) => `; ${formatUnderstood(tolerance, "dB")} for rounding`;
  const [from, to] = [site.gainFromDb + MARGIN_DB, site.gainToDb - MARGIN_DB].map((value) =>
    formatUnderstood(value, "dB"),
  );
  return {
    kind: "chain",
    version: 1,
    title: plan.title,
    brief: BRIEF,
    given: givenOf(site),
    cautions: [...chainCautions],
    sections: [
      {
        id: "chain",
        title: "Your chain, antenna first",
        repeat: { max: MOST_PARTS, add: "Add a part" },
        fields: [
          { id: "part", label: "Part", input: "choice" as const, choices: site.parts.map(choiceOf), quantity: "order" },
        ],
      },
      {
        id: "figures",
        title: "What you work out for it",
        fields: FIGURE_FIELDS.filter(({ quantity }) => asked.has(quantity)),
      },
    ].filter(({ fields }) => fields.length > 0),
    tolerances: publicTolerances(asked, {
      order: () => "one run, one arrester, a splitter where asked",
      feed: () => "one feed, to every amplifier",
      supply: () => `at most ${formatUnderstood(site.limitMa, "mA")}, least volts of each amplifier`,
      gain: (quantity) => `from ${from} to ${to}${rounding(quantity)}`,
      noise: (quantity) => `at most ${formatQuantity(site.noiseLimitDb - MARGIN_DB, "dB", 1)}${rounding(quantity)}`,
      overload: (quantity) => `at least ${formatUnderstood(MARGIN_DB, "dB")}${rounding(quantity)}`,
      ownDelay: ({ tolerance }) => `±${formatUnderstood(tolerance, "%")}, at least ±1\u00a0ns`,
    }),
    data: {
      runM: site.runM,
      needsSplitter: site.needsSplitter,
      neighbourDbm: site.neighbourDbm,
      gainFromDb: site.gainFromDb,
      gainToDb: site.gainToDb,
      noiseLimitDb: site.noiseLimitDb,
      receiverNoiseDb: site.receiverNoiseDb,
      supplyV: site.supplyV,
      limitMa: site.limitMa,
      sourceOhm: site.sourceOhm,
      parts: site.parts.map(shownPart),
    },
  };
}

/** What the public case says, as the design takes it. */
export const siteIn = ({ data }: PublicCase): Site => data as Site;

const givenOf = (site: Site) => [
  { label: "Signal", value: "GPS L1, 1\u2009575.42\u00a0MHz" },
  { label: "Run from antenna to entry", value: formatUnderstood(site.runM, "m") },
  {
    label: "Receivers",
    value: site.needsSplitter ? "two; each feeds its own port" : "one",
  },
  {
    label: "Net gain that the receiver takes",
    value: `${site.gainFromDb} to ${formatUnderstood(site.gainToDb, "dB")}`,
  },
  { label: "Noise figure, chain and receiver", value: `at most ${formatUnderstood(site.noiseLimitDb, "dB")}` },
  { label: "Noise figure of the receiver", value: formatUnderstood(site.receiverNoiseDb, "dB") },
  {
    label: "Feed of the receiver",
    value: `${formatUnderstood(site.supplyV, "V")} behind ${formatUnderstood(site.sourceOhm, "ohm")}, at most ${formatUnderstood(site.limitMa, "mA")}`,
  },
  { label: "Neighbour's signal at the antenna", value: formatUnderstood(site.neighbourDbm, "dBm") },
  { label: "Left on every limit in dB", value: formatUnderstood(MARGIN_DB, "dB") },
];

/** A part without anything that a data sheet would not say. */
function shownPart(part: Part): Part {
  switch (part.kind) {
    case "amplifier": {
      const { kind, id, gainDb, noiseFigureDb, compressionDbm, currentMa, minimumV, delayNs } = part;
      return { kind, id, gainDb, noiseFigureDb, compressionDbm, currentMa, minimumV, delayNs };
    }
    case "cable": {
      const { kind, id, dbPer100M, loopOhmPerKm, velocityFactor } = part;
      return { kind, id, dbPer100M, loopOhmPerKm, velocityFactor };
    }
    case "arrester": {
      const { kind, id, lossDb, passesDc, ohm, delayNs } = part;
      return { kind, id, lossDb, passesDc, ohm, delayNs };
    }
    case "splitter": {
      const { kind, id, lossDb, feed, ohm, delayNs } = part;
      return { kind, id, lossDb, feed, ohm, delayNs };
    }
  }
}

const choiceOf = ({ id, kind }: Part): Choice => ({
  value: id,
  label: kind === "cable" ? `${id} run of cable` : `${id} ${kind}`,
});

const BRIEF = [
  "Choose the parts of an antenna chain and their order, from the passive antenna to the receiver. The server computes what your own chain does; there is no single right one. There is one of each part.",
  "The run is one piece of cable. The arrester stands at the entry, right behind the run. Amplifiers stand at the antenna or in the building. Where two receivers are served, the splitter stands in the building; its loss is from its input to one port.",
  "Sheets state the loss of cables at 1\u00a0GHz; it grows with the root of the frequency. A passive part has the noise figure of its loss. The neighbour's signal lies so near the band that no filter takes it off.",
  "Every amplifier is fed through the line by one receiver. The resistance of a cable is of both conductors together. Keep 1\u00a0dB on every limit in dB; limits in V and mA hold as they stand.",
  "Then work out the figures of your chain. Noise figure: chain and receiver. Headroom: from the neighbour's level at the output of the amplifier nearest the antenna up to its 1\u00a0dB point. Delay: antenna to receiver.",
];

const FIGURE_FIELDS: readonly FieldSpec[] = [
  { id: "gain", label: "Net gain", input: "number", unit: "dB", quantity: "ownGain" },
  { id: "noise", label: "Noise figure", input: "number", unit: "dB", quantity: "ownNoise" },
  {
    id: "headroom",
    label: "Headroom of the first amplifier",
    input: "number",
    unit: "dB",
    signed: true,
    quantity: "ownHeadroom",
  },
  { id: "delay", label: "Delay", input: "number", unit: "ns", quantity: "ownDelay" },
  { id: "volts", label: "Volts at the first amplifier", input: "number", unit: "V", quantity: "ownVolts" },
];
