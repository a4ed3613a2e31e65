import type { CertificateRecord } from "./record";

/** What the public register says of one certificate at one moment; neither values nor reasons are among it. */
export type RegisterEntry = Pick<
  CertificateRecord,
  | "number"
  | "scheme"
  | "scope"
  | "limits"
  | "supervision"
  | "identity"
  | "release"
  | "quantities"
  | "cautions"
  | "demonstration"
  | "effectiveOn"
  | "lastDay"
> & {
  holder: string;
  issuer: { name: string; standing: string; accreditation: string | null; timeZone: string };
  decided: { outsideLine: boolean; at: string };
  fingerprint: string;
  standing: "Valid" | "Suspended" | "Withdrawn" | "Superseded" | "Expired" | "Not yet valid";
  /** Class of ground of a suspension or withdrawal. */
  ground: string | null;
  standingSince: string;
  /** The day in the issuer's time zone, and the instant, at which the register was read. */
  today: string;
  readAt: string;
};

export type VerificationFacts = {
  entry: RegisterEntry;
  /** Where it was verified, and where to look again. */
  origin: string;
  /** The file that was held against the register's, by its SHA-256; null when none was. */
  file: { sha256: string; agrees: boolean } | null;
};
