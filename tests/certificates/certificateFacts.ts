import type { CertificateFacts } from "@/lib/certificates/record";

const FALSE_LOCK = { check: "false-lock", title: "Prove the blocked satellite" };
const SEARCH_PLAN = { check: "search-plan", title: "Plan a search" };

/** Facts of an invented certificate; a test changes what it is about. */
export const certificateFacts = (changes: Partial<CertificateFacts> = {}): CertificateFacts => ({
  number: "LM-7K4Q0-2M9XB-0",
  holder: { name: "Daud Fenwick" },
  issuer: {
    name: "Saltmarsh Beacon Works",
    standing: "Employer attestation",
    accreditation: null,
    timeZone: "Europe/London",
  },
  scheme: { code: "SBW-R2", title: "Prove which satellites you really have", edition: "written to ISO/IEC 17024:2012" },
  scope: "Code-tracking receivers on machines and stations, GPS L1 C/A",
  limits: "Receive only. Not for safety-of-life use.",
  supervision: "open",
  identity: null,
  release: { code: "SBW-R2", number: "3.1", fingerprint: "9c417e02b8d530af".repeat(4) },
  sittingId: "5f0c7a52-6f0e-4a35-9a0f-0d2f5d2f7a11",
  decided: {
    by: "Orla Quist",
    outsideLine: true,
    at: "2026-03-14T10:22:51.000Z",
    signedAfreshAt: "2026-03-14T10:22:04.000Z",
  },
  effectiveOn: "2026-03-14",
  lastDay: "2029-03-13",
  quantities: [
    { ...FALSE_LOCK, label: "Verdict on each satellite", tolerance: "exact", critical: true },
    { ...FALSE_LOCK, label: "Parent of the false peak", tolerance: "exact", critical: false },
    { ...FALSE_LOCK, label: "Doppler of the false peak", tolerance: "±125 Hz", critical: false },
    { ...FALSE_LOCK, label: "Apparent C/N0", tolerance: "±1.5 dB-Hz", critical: false },
    { ...SEARCH_PLAN, label: "Detection your plan attains", tolerance: "0.95 or more", critical: true },
    { ...SEARCH_PLAN, label: "False alarms per search", tolerance: "0.001 or fewer", critical: true },
    { ...SEARCH_PLAN, label: "Search time", tolerance: "12.0 s or less", critical: false },
  ],
  demonstration: false,
  ...changes,
});
