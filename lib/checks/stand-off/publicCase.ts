import { askedQuantities } from "../askedQuantities";
import { formatNumber, formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { CheckPlan, FieldSpec, FormSection, PublicCase } from "../kind";
import { publicTolerances } from "../publicTolerances";
import type { StandOffTruth } from "./drawCase";
import { INTERFERENCE_TEXT } from "./interference-types";
import type { StandOffParameters } from "./parameters";
import { standOffCautions, standOffQuantities } from "./quantities";
import { NEEDED, type StandOffSite } from "./standOffOf";

/** Field by field: the site as it is told, and nothing that follows from it. */
export function publicCase({ site, type }: StandOffTruth, plan: CheckPlan<StandOffParameters>): PublicCase {
  const asked = askedQuantities(standOffQuantities, plan);
  const threshold = formatUnderstood(site.thresholdDbHz, "dB-Hz");
  return {
    kind: "stand-off",
    version: 1,
    title: plan.title,
    brief: BRIEF,
    given: [
      { label: "Signal", value: "GPS L1 C/A, 1.023 million chips a second" },
      { label: "EIRP of the interferer", value: `${formatUnderstood(site.eirpMw, "1")}\u00a0mW` },
      { label: "Interference", value: INTERFERENCE_TEXT[type] },
      { label: "Its distance now", value: formatQuantity(site.distanceM, "m", 0) },
      { label: "Path exponent", value: formatNumber(site.exponent, 1) },
      { label: "Loss of what stands between", value: formatUnderstood(site.screenDb, "dB") },
      { label: "Antenna gain towards the interferer", value: formatUnderstood(site.antennaGainDb, "dB") },
      {
        label: "Noise density at the antenna's terminals",
        value: `${formatNumber(site.noiseDensityDbmHz, 1)}\u00a0dBm/Hz`,
      },
      { label: "The receiver needs", value: `${NEEDED} satellites of ${threshold} or more` },
    ],
    cautions: [...standOffCautions],
    sections: sectionsOf(site.satellites).flatMap(({ fields, ...section }) => {
      const own = fields.filter(({ quantity }) => asked.has(quantity));
      return own.length > 0 ? [{ ...section, fields: own }] : [];
    }),
    tolerances: publicTolerances(asked, {
      received: ({ tolerance }) => `±${formatUnderstood(tolerance, "dB")}`,
      effective: ({ tolerance }) => `±${formatUnderstood(tolerance, "dB")}`,
      recovery: ({ tolerance }) => `±${formatUnderstood(tolerance, "%")}`,
    }),
    data: {
      eirpMw: site.eirpMw,
      distanceM: site.distanceM,
      exponent: site.exponent,
      screenDb: site.screenDb,
      antennaGainDb: site.antennaGainDb,
      noiseDensityDbmHz: site.noiseDensityDbmHz,
      thresholdDbHz: site.thresholdDbHz,
      interference: type,
      satellites: site.satellites.map(({ prn, elevationDeg, cn0DbHz }) => ({ prn, elevationDeg, cn0DbHz })),
    },
  };
}

const BRIEF = [
  "An interferer stands at the distance given and at the height of the antenna. Work out how strong it is at the antenna's terminals, what it leaves of each satellite's C/N0, and from what distance the receiver works again.",
  "Path loss is that of free space at 1 m, then ten times the path exponent in dB for every tenfold distance, and the loss of what stands between. The frequency is 1 575.42 MHz.",
  "A satellite's power at the terminals is its C/N0 plus the noise density; its own antenna gain is in its C/N0 already.",
  "Effective C/N0 is −10 log (10^(−C/N0/10) + 10^((J/S)/10) / (Q × chip rate)). Q is 1 for a single carrier, 1.5 for a signal with the code's own spectrum, 2.22 for noise that is even over the main lobe.",
  "Recovery is the least distance of the interferer, all else equal, at which the receiver has the satellites it needs.",
];

const sectionsOf = (satellites: StandOffSite["satellites"]): FormSection[] => [
  { id: "interference", title: "At the distance given", fields: [RECEIVED] },
  { id: "effective", title: "Effective C/N0", fields: satellites.map(({ prn }) => effectiveField(prn)) },
  { id: "receiver", title: "The receiver", fields: [USABLE, RECOVERY] },
];

const RECEIVED: FieldSpec = {
  id: "received",
  label: "Interference at the antenna's terminals",
  input: "number",
  unit: "dBm",
  quantity: "received",
};
const effectiveField = (prn: number): FieldSpec => ({
  id: `prn${prn}`,
  label: `PRN ${prn}`,
  input: "number",
  unit: "dB-Hz",
  quantity: "effective",
});
const USABLE: FieldSpec = {
  id: "usable",
  label: "Satellites still usable",
  input: "number",
  unit: "1",
  help: "At or above what the receiver needs, at the distance given.",
  quantity: "usable",
};
const RECOVERY: FieldSpec = {
  id: "recovery",
  label: "Distance of recovery",
  input: "number",
  unit: "m",
  quantity: "recovery",
};
