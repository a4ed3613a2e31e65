import type { CertificateFacts } from "@/lib/certificates/record";
import { certificateFacts } from "./certificateFacts";

type Row = [label: string, tolerance: string, critical?: true];
const check = (id: string, title: string, rows: Row[]) =>
  rows.map(([label, tolerance, critical = false]) => ({ check: id, title, label, tolerance, critical }));

/** Fourteen quantities of four checks. */
const QUANTITIES = [
  ...check("reading", "Read the correlator", [
    ["Code offset", "±0.20 chip"],
    ["Code offset as time", "±1 %"],
    ["Code offset as length", "±1 %"],
    ["Peak to second peak", "±1.0 dB"],
  ]),
  ...check("false-lock", "Prove the blocked satellite", [
    ["Verdict on each satellite", "exact", true],
    ["Parent of the false peak", "exact"],
    ["Doppler of the false peak", "±125 Hz"],
    ["Apparent C/N0", "±1.5 dB-Hz"],
  ]),
  ...check("satellites", "Which satellites are in the capture", [
    ["Satellites of 36 dB-Hz or more", "none left out", true],
    ["Satellites listed", "none invented", true],
    ["Code phase at the first sample", "±0.50 chip"],
  ]),
  ...check("plan", "Plan a search", [
    ["Detection the plan attains", "0.95 less one point, or more", true],
    ["False alarms per search", "0.001 or fewer", true],
    ["Search time", "12.0 s or less"],
  ]),
];

export const SCOPE_OF_400_CHARACTERS =
  "Code-tracking receivers on machines, stations and vehicles, GPS L1 C/A and one BOC signal, within the three depots of the issuer and at its customers' sites on the estuary, with captures of at least ten milliseconds at 2.046 to 4.092 megasamples a second from the holder's own receive-only set-up, indoors or on a roof that needs no tower climbing, and the acceptance sheet of the issuer, form R2/14.";

/** Everything as long as a real certificate may make it. */
export const longFacts = (): Partial<CertificateFacts> => ({
  holder: { name: "Łukasz Maximilian Żółć-Δimitrov van der Hoogstraten-Öğünç" },
  issuer: { ...certificateFacts().issuer, name: "Saltmarsh Beacon Works and Tidewater Masts Installation Partnership" },
  scheme: {
    code: "SBW-R2",
    title: "Prove which satellites you really have, and which are only borrowed from another code",
    edition: "written to ISO/IEC 17024:2012, second issue of the scheme, March 2026",
  },
  scope: SCOPE_OF_400_CHARACTERS,
  limits:
    "Receive only. Not for safety-of-life use. No enforcement powers. No work at height without the employer's plan, and none on towers at all.",
  supervision: "on-site",
  identity: { byRole: "assessor", at: "2026-03-03T09:00:00.000Z" },
  quantities: QUANTITIES,
  demonstration: true,
});
