import { fingerprintOf } from "@/lib/certificates/canonicalJson";
import { certificateRecord, type CertificateFacts } from "@/lib/certificates/record";
import type { RegisterEntry, VerificationFacts } from "@/lib/certificates/verificationFacts";
import { certificateFacts } from "./certificateFacts";

export const ORIGIN = "https://lagmark.example";
export const READ_AT = "2026-07-01T23:30:05.000Z";

/** What a register says of the invented certificate; a test changes what it is about. */
export function verificationFacts(
  changes: Partial<RegisterEntry> = {},
  { certificate = {}, file = null }: { certificate?: Partial<CertificateFacts>; file?: VerificationFacts["file"] } = {},
): VerificationFacts {
  const record = certificateRecord(certificateFacts(certificate));
  const { holder, decided, schema: _schema, sittingId: _sitting, ...same } = record;
  const entry: RegisterEntry = {
    ...same,
    holder: holder.name,
    decided: { outsideLine: decided.outsideLine, at: decided.at },
    fingerprint: fingerprintOf(record),
    standing: "Valid",
    ground: null,
    standingSince: "2026-03-14T10:22:51.000Z",
    // In London it is half past midnight, summer time.
    today: "2026-07-02",
    readAt: READ_AT,
    ...changes,
  };
  return { entry, origin: ORIGIN, file };
}
