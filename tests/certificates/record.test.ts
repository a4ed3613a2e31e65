import { describe, expect, test } from "vitest";
import { InvalidError } from "@/lib/errors";
import { canonicalJson, fingerprintOf } from "@/lib/certificates/canonicalJson";
import { CERTIFICATE_CAUTIONS, certificateRecord, type CertificateFacts } from "@/lib/certificates/record";
import { certificateFacts } from "./certificateFacts";

const build = (changes: Partial<CertificateFacts>) => certificateRecord(certificateFacts(changes));
const { issuer, decided, release, scheme, quantities } = certificateFacts();

describe("the record", () => {
  test("names its schema and carries the cautions", () => {
    const record = build({});
    expect(record.schema).toEqual({ name: "lagmark.certificate", version: 1 });
    expect(record.cautions).toEqual([...CERTIFICATE_CAUTIONS]);
    expect(record.cautions.join(" ")).toMatch(/not a licence.*safety-of-life.*Local codes/);
  });

  test("holds what was listed and nothing that came along", () => {
    const facts = {
      ...certificateFacts(),
      holder: { name: "Daud Fenwick", email: "d@saltmarsh.example" },
      values: [1, 2],
    };
    expect(canonicalJson(certificateRecord(facts))).not.toMatch(/email|values/);
  });

  test("is text in NFC, trimmed, with single spaces", () => {
    expect(build({ holder: { name: "  Zo\u0308e \t Z\u0307o\u0301ral " } }).holder.name).toBe(
      "Z\u00f6e \u017b\u00f3ral",
    );
    expect(build({ scope: "Below 1\u2009500 MHz" }).scope).toBe("Below 1\u2009500 MHz");
  });

  test("has one fingerprint however its facts are ordered, and another when one is changed", () => {
    const facts = certificateFacts();
    const reordered = Object.fromEntries(Object.entries(facts).reverse()) as CertificateFacts;
    const fingerprint = fingerprintOf(certificateRecord(facts));
    expect(fingerprintOf(certificateRecord(reordered))).toBe(fingerprint);
    expect(fingerprintOf(build({ lastDay: "2029-03-14" }))).not.toBe(fingerprint);
    expect(fingerprintOf(build({ demonstration: true }))).not.toBe(fingerprint);
  });
});

describe("refused as a fault of the program", () => {
  test.each<[string, Partial<CertificateFacts>]>([
    ["number", { number: "LM-7K4Q0-2M9XB-1" }],
    ["number", { number: "lm-7k4q0-2m9xb-0" }],
    ["issuer.timeZone", { issuer: { ...issuer, timeZone: "Saltmarsh/Quay" } }],
    ["issuer.standing", { issuer: { ...issuer, standing: "Accredited certification body" } }],
    ["supervision", { supervision: "video" as CertificateFacts["supervision"] }],
    ["identity.at", { identity: { byRole: "assessor", at: "2026-03-03" } }],
    ["release.number", { release: { ...release, number: "3" } }],
    ["release.fingerprint", { release: { ...release, fingerprint: "9C41" } }],
    ["decided.at", { decided: { ...decided, at: "2026-03-14 10:22" } }],
    ["decided.signedAfreshAt", { decided: { ...decided, signedAfreshAt: "2026-03-14T10:22:52.000Z" } }],
    ["effectiveOn", { effectiveOn: "2026-02-30" }],
    ["effectiveOn", { effectiveOn: "2026-03-13" }],
    ["lastDay", { lastDay: "2026-03-13" }],
    ["quantities", { quantities: [] }],
  ])("%s: %j", (field, changes) => {
    expect(() => build(changes)).toThrow(RangeError);
    expect(() => build(changes)).toThrow(field);
  });
});

test("the day of the decision is the issuer's: late evening in UTC is the next day in Auckland", () => {
  const late = { ...decided, at: "2026-03-14T22:00:00.000Z", signedAfreshAt: "2026-03-14T21:59:00.000Z" };
  const auckland = { ...issuer, timeZone: "Pacific/Auckland" };
  expect(build({ decided: late, effectiveOn: "2026-03-14" }).effectiveOn).toBe("2026-03-14");
  expect(() => build({ decided: late, issuer: auckland, effectiveOn: "2026-03-14" })).toThrow(RangeError);
  expect(build({ decided: late, issuer: auckland, effectiveOn: "2026-03-15" }).effectiveOn).toBe("2026-03-15");
});

test("an issuer that gives its accreditation number may say accredited", () => {
  const accredited = { ...issuer, standing: "Accredited certification body", accreditation: "AB 0417" };
  expect(build({ issuer: accredited }).issuer.accreditation).toBe("AB 0417");
});

describe("refused with a sentence for the person who can correct it", () => {
  test.each<[string, Partial<CertificateFacts>]>([
    ["an empty name", { holder: { name: " \n " } }],
    ["a name that turns the reading direction", { holder: { name: "Daud \u202eFenwick" } }],
    ["a control character", { scope: "GPS\u0007 L1" }],
    ["half a character", { limits: "Receive only \ud83d" }],
    ["a scope longer than the page", { scope: "a".repeat(501) }],
    ["a quantity without tolerance", { quantities: [{ ...quantities[0], tolerance: "" }] }],
    ["an empty edition", { scheme: { ...scheme, edition: "" } }],
  ])("%s", (_what, changes) => expect(() => build(changes)).toThrow(InvalidError));
});
