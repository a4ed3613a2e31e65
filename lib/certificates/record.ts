import { dayIn } from "@/lib/calendar";
import { InvalidError } from "@/lib/errors";
import { isCertificateNumber } from "./isCertificateNumber";
import { isDay, isInstant, isTimeZone } from "./dates";

export const RECORD_SCHEMA = { name: "lagmark.certificate", version: 1 } as const;

/** Printed on every certificate and part of its record. */
export const CERTIFICATE_CAUTIONS = [
  "This certificate is its issuer's statement of competence; it is not a licence.",
  "Nothing in it is approved for safety-of-life use.",
  "Local codes and licensed practice come first.",
] as const;

export const SUPERVISIONS = ["open", "remote", "on-site"] as const;

/** What was measured; neither values nor results stand in the record. */
export type CertifiedQuantity = { check: string; title: string; label: string; tolerance: string; critical: boolean };

/** The canonical record of one certificate: its fingerprint stands on every face, so a field is never renamed. */
export type CertificateRecord = {
  schema: { name: "lagmark.certificate"; version: 1 };
  number: string;
  holder: { name: string };
  /** `standing` is what the issuer says of itself; `accreditation` the number without which it may not say accredited. */
  issuer: { name: string; standing: string; accreditation: string | null; timeZone: string };
  scheme: { code: string; title: string; edition: string };
  scope: string;
  limits: string;
  supervision: (typeof SUPERVISIONS)[number];
  /** Who confirmed the holder's identity at the sitting; null when no person did. */
  identity: { byRole: string; at: string } | null;
  release: { code: string; number: string; fingerprint: string };
  sittingId: string;
  decided: { by: string; outsideLine: boolean; at: string; signedAfreshAt: string };
  /** Days in the issuer's time zone, the last day included. */
  effectiveOn: string;
  lastDay: string;
  quantities: CertifiedQuantity[];
  cautions: string[];
  demonstration: boolean;
};

export type CertificateFacts = Omit<CertificateRecord, "schema" | "cautions">;

/**
 * Builds the record from facts already decided elsewhere: text is trimmed and brought to NFC, everything is listed field by
 * field so that nothing else can enter.
 * @throws InvalidError for text a person can correct, RangeError for a fact that cannot be on a certificate
 */
export function certificateRecord(facts: CertificateFacts): CertificateRecord {
  const { holder, issuer, scheme, identity, release, decided } = facts;
  const record: CertificateRecord = {
    schema: { ...RECORD_SCHEMA },
    number: facts.number,
    holder: { name: line(holder.name, "holder.name", 120) },
    issuer: {
      name: line(issuer.name, "issuer.name", 120),
      standing: line(issuer.standing, "issuer.standing", 80),
      accreditation: issuer.accreditation === null ? null : line(issuer.accreditation, "issuer.accreditation", 40),
      timeZone: issuer.timeZone,
    },
    scheme: {
      code: line(scheme.code, "scheme.code", 40),
      title: line(scheme.title, "scheme.title", 120),
      edition: line(scheme.edition, "scheme.edition", 120),
    },
    scope: line(facts.scope, "scope", 500),
    limits: line(facts.limits, "limits", 300),
    supervision: facts.supervision,
    identity: identity && { byRole: line(identity.byRole, "identity.byRole", 80), at: identity.at },
    release: { code: line(release.code, "release.code", 40), number: release.number, fingerprint: release.fingerprint },
    sittingId: line(facts.sittingId, "sittingId", 64),
    decided: {
      by: line(decided.by, "decided.by", 120),
      outsideLine: decided.outsideLine,
      at: decided.at,
      signedAfreshAt: decided.signedAfreshAt,
    },
    effectiveOn: facts.effectiveOn,
    lastDay: facts.lastDay,
    quantities: facts.quantities.map(certifiedQuantity),
    cautions: [...CERTIFICATE_CAUTIONS],
    demonstration: facts.demonstration,
  };
  refuse(record);
  return record;
}

const certifiedQuantity = (quantity: CertifiedQuantity, index: number): CertifiedQuantity => ({
  check: line(quantity.check, `quantities[${index}].check`, 80),
  title: line(quantity.title, `quantities[${index}].title`, 120),
  label: line(quantity.label, `quantities[${index}].label`, 120),
  tolerance: line(quantity.tolerance, `quantities[${index}].tolerance`, 60),
  critical: quantity.critical,
});

// Controls and direction overrides could make paper say something other than the record.
const HIDDEN = /[\p{Cc}\p{Cf}\p{Surrogate}]/u;

function line(text: string, field: string, longest: number): string {
  // Thin and no-break spaces inside numbers stay.
  const tidy = text
    .normalize("NFC")
    .replace(/[^\S\u2009\u202f\u00a0]+/gu, " ")
    .trim();
  if (tidy.length === 0) throw new InvalidError(`A certificate needs ${field}, and it is empty.`);
  if (tidy.length > longest) throw new InvalidError(`On a certificate ${field} has at most ${longest} characters.`);
  if (HIDDEN.test(tidy))
    throw new InvalidError(`On a certificate ${field} may hold no hidden character. Type it again.`);
  return tidy;
}

function refuse(record: CertificateRecord): void {
  const { issuer, release, decided } = record;
  for (const [field, holds] of [
    ["number", isCertificateNumber(record.number)],
    ["issuer.timeZone", isTimeZone(issuer.timeZone)],
    [
      "issuer.standing (accredited without a number)",
      !/accredit/i.test(issuer.standing) || issuer.accreditation !== null,
    ],
    ["supervision", SUPERVISIONS.includes(record.supervision)],
    ["identity.at", record.identity === null || isInstant(record.identity.at)],
    ["release.number", /^[1-9]\d*\.\d+$/.test(release.number)],
    ["release.fingerprint", /^[0-9a-f]{64}$/.test(release.fingerprint)],
    ["decided.at", isInstant(decided.at)],
    ["decided.signedAfreshAt", isInstant(decided.signedAfreshAt) && decided.signedAfreshAt <= decided.at],
    ["effectiveOn", isDay(record.effectiveOn)],
    ["lastDay", isDay(record.lastDay) && record.lastDay >= record.effectiveOn],
    ["quantities", record.quantities.length > 0],
  ] as const) {
    if (!holds) throw new RangeError(`certificateRecord: ${field} cannot be on a certificate`);
  }
  // ISO/IEC 17024:2012, 9.4 (from memory): a certificate is not effective before the decision was made.
  if (record.effectiveOn < dayIn(issuer.timeZone, new Date(decided.at))) {
    throw new RangeError("certificateRecord: effectiveOn lies before the day of the decision");
  }
}
