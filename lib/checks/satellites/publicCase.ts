import { askedQuantities } from "../askedQuantities";
import { CAPTURE_FILE } from "../captureFiles";
import { formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { CheckPlan, FieldSpec, PublicCase } from "../kind";
import { publicTolerances } from "../publicTolerances";
import type { SatellitesTruth } from "./drawScene";
import type { SatellitesParameters } from "./parameters";
import { satellitesCautions, satellitesQuantities } from "./quantities";

/** Lines that a hand-in may hold; more satellites are never above the horizon of one place. */
export const MOST_LINES = 16;

/** Field by field; nothing of the scene but the sample rate, the length and the window to search. */
export function publicCase(
  { scene, windowHz, foundFromDbHz }: SatellitesTruth,
  plan: CheckPlan<SatellitesParameters>,
): PublicCase {
  const asked = askedQuantities(satellitesQuantities, plan);
  const foundFrom = formatUnderstood(foundFromDbHz, "dB-Hz");
  return {
    kind: "satellites",
    version: 1,
    title: plan.title,
    brief: [
      `Search the capture for GPS L1 C/A satellites, PRN 1 to 32. Satellite motion and the receiver's own clock shift all Dopplers: search at least ±${formatQuantity(windowHz, "Hz", 0)}.`,
      `List every satellite of ${foundFrom} or more that is in the capture. Weaker ones may be listed and change nothing. A satellite that is not there must not be listed.`,
      "Code phase is the place in the satellite's code, 0 to 1 023 chip, at the first sample of the capture: 0 means that the code starts there. It is not the delay of the replica.",
      "Doppler is the received frequency minus 1 575.42 MHz.",
    ],
    given: [
      { label: "Signal", value: "GPS L1 C/A" },
      { label: "Centre", value: "1\u2009575.42\u00a0MHz" },
      { label: "Sample rate", value: formatUnderstood(scene.rateHz / 1e6, "MHz") },
      { label: "Samples", value: "8-bit signed, I then Q" },
      { label: "Length", value: formatUnderstood(scene.durationMs, "ms") },
      { label: "Search at least", value: `±${formatQuantity(windowHz, "Hz", 0)}` },
      { label: "Must be found from", value: foundFrom },
    ],
    cautions: [...satellitesCautions],
    sections: [
      {
        id: "search",
        title: "Your search",
        fields: SEARCH_FIELDS.filter(({ quantity }) => asked.has(quantity)),
      },
      {
        id: "satellites",
        title: "Satellites in the capture",
        repeat: { max: MOST_LINES, add: "Add a satellite" },
        // The PRN names the line, whichever quantities are asked.
        fields: LINE_FIELDS.filter(({ id, quantity }) => id === "prn" || asked.has(quantity)),
      },
    ].filter(({ fields }) => fields.length > 0),
    tolerances: publicTolerances(asked, {
      doppler: ({ tolerance }) => `± half of your Doppler bin, at most ±${formatUnderstood(tolerance, "Hz")}`,
      found: () => `all from ${foundFrom}`,
      invented: () => "none",
    }),
    data: {
      captureFile: CAPTURE_FILE,
      rateHz: scene.rateHz,
      samples: (scene.rateHz / 1000) * scene.durationMs,
      windowHz,
      foundFromDbHz,
      sky: [],
    },
  };
}

const SEARCH_FIELDS: readonly FieldSpec[] = [
  {
    id: "bin",
    label: "Your Doppler bin",
    input: "number",
    unit: "Hz",
    help: "The step between the Dopplers you searched. Half of it is the tolerance of every Doppler.",
    quantity: "doppler",
  },
];

const LINE_FIELDS: readonly FieldSpec[] = [
  { id: "prn", label: "PRN", input: "number", unit: "1", quantity: "found" },
  { id: "codePhase", label: "Code phase", input: "number", unit: "chip", quantity: "codePhase" },
  { id: "doppler", label: "Doppler", input: "number", unit: "Hz", quantity: "doppler" },
  { id: "cn0", label: "C/N0", input: "number", unit: "dB-Hz", quantity: "cn0" },
];
