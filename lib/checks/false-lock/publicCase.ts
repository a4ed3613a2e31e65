import { askedQuantities, type AskedQuantities } from "../askedQuantities";
import { CAPTURE_FILE } from "../captureFiles";
import { formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { CheckPlan, FieldSpec, FormSection, PublicCase } from "../kind";
import { publicTolerances } from "../publicTolerances";
import type { FalseLockTruth, ListedSatellite } from "./drawScene";
import type { FalseLockParameters } from "./parameters";
import { falseLockCautions, falseLockQuantities, VERDICT_CHOICES } from "./quantities";
import { REFERENCE_SEARCH } from "./referenceSearch";
import { EQUAL_WITHIN_DB } from "./strongestFalsePeaks";

/** Field by field. Sky plot and report look the same whether the weak satellite is there or not. */
export function publicCase(
  { scene, listed, wall, weakestDbHz }: FalseLockTruth,
  plan: CheckPlan<FalseLockParameters>,
): PublicCase {
  const asked = askedQuantities(falseLockQuantities, plan);
  const { coherentMs, sums, dopplerHalfWidthHz, dopplerStepHz, falseAlarmPerSearch } = REFERENCE_SEARCH;
  return {
    kind: "false-lock",
    version: 1,
    title: plan.title,
    brief: [
      ...BRIEF,
      `A weak satellite in open sky may be in the capture although the receiver has not found it; it then has at least ${formatUnderstood(weakestDbHz, "dB-Hz")}.`,
    ],
    given: [
      { label: "Signal", value: "GPS L1 C/A" },
      { label: "Centre", value: "1\u2009575.42\u00a0MHz" },
      { label: "Sample rate", value: formatUnderstood(scene.rateHz / 1e6, "MHz") },
      { label: "Samples", value: "8-bit signed, I then Q" },
      { label: "Length", value: formatUnderstood(scene.durationMs, "ms") },
      {
        label: "Wall",
        value: `azimuth ${wall.fromAzimuthDeg}° to ${wall.toAzimuthDeg}°, up to ${wall.topElevationDeg}°`,
      },
      {
        label: "Search",
        value: `${coherentMs}\u00a0ms × ${sums}, ±${formatQuantity(dopplerHalfWidthHz, "Hz", 0)}, bins of ${dopplerStepHz}\u00a0Hz`,
      },
      { label: "False alarms per search", value: formatUnderstood(falseAlarmPerSearch, "1") },
    ],
    cautions: [...falseLockCautions],
    sections: sectionsOf(asked, listed),
    tolerances: publicTolerances(asked, {
      falseDoppler: ({ tolerance }) =>
        `±${formatUnderstood(tolerance, "Hz")} of any false peak within ${EQUAL_WITHIN_DB}\u00a0dB of the highest`,
      test: () => "one of the right ones",
      remedy: () => "one of the right ones",
    }),
    data: {
      captureFile: CAPTURE_FILE,
      rateHz: scene.rateHz,
      samples: (scene.rateHz / 1000) * scene.durationMs,
      sky: listed.map(({ prn, azimuthDeg, elevationDeg }) => ({ prn, azimuthDeg, elevationDeg })),
      wall: {
        fromAzimuthDeg: wall.fromAzimuthDeg,
        toAzimuthDeg: wall.toAzimuthDeg,
        topElevationDeg: wall.topElevationDeg,
      },
      report: listed.map(({ prn, reportedCn0DbHz }) => ({
        prn,
        tracked: reportedCn0DbHz !== null,
        cn0DbHz: reportedCn0DbHz,
      })),
      search: { coherentMs, sums, dopplerHalfWidthHz, dopplerStepHz, falseAlarmPerSearch },
      weakestDbHz,
    },
  };
}

const BRIEF = [
  "A receiver beside a wall reports a satellite that stands behind the wall. Find out from the capture whether it is there, and what every other satellite of the sky plot is.",
  "Genuine: the satellite's own signal is in the capture, reported or not. Cross-correlation: reported as tracked, but the lock is on another satellite's code. Absent: not reported as tracked, and its own signal is not in the capture, whatever peaks another satellite's code raises in its search.",
  "A false lock has several peaks of nearly the same height. Give the Doppler and the apparent C/N0 of one of the highest.",
];

const sectionsOf = (asked: AskedQuantities, listed: readonly ListedSatellite[]): FormSection[] =>
  [
    { id: "verdicts", title: "Verdict for each satellite", fields: listed.map(({ prn }) => verdictField(prn)) },
    { id: "falseLock", title: "The false lock", fields: FALSE_LOCK_FIELDS },
  ]
    .map((section) => ({ ...section, fields: section.fields.filter(({ quantity }) => asked.has(quantity)) }))
    .filter(({ fields }) => fields.length > 0);

const verdictField = (prn: number): FieldSpec => ({
  id: `prn${prn}`,
  label: `PRN ${prn}`,
  input: "choice",
  choices: VERDICT_CHOICES,
  quantity: "verdict",
});

const choicesOf = (id: string) => falseLockQuantities.find((quantity) => quantity.id === id)?.choices ?? [];

const FALSE_LOCK_FIELDS: readonly FieldSpec[] = [
  { id: "parent", label: "PRN of the satellite behind it", input: "number", unit: "1", quantity: "parent" },
  { id: "doppler", label: "Doppler of the false peak", input: "number", unit: "Hz", quantity: "falseDoppler" },
  { id: "cn0", label: "Apparent C/N0 of the false peak", input: "number", unit: "dB-Hz", quantity: "falseCn0" },
  { id: "test", label: "Test that shows it", input: "choice", choices: choicesOf("test"), quantity: "test" },
  { id: "remedy", label: "Remedy", input: "choice", choices: choicesOf("remedy"), quantity: "remedy" },
];
