import { afterAll, beforeAll, describe, expect, test, vi } from "vitest";
import { drawVerification } from "@/lib/certificates/drawVerification";
import { signPdf } from "@/lib/certificates/signPdf";
import type { RegisterEntry } from "@/lib/certificates/verificationFacts";
import { verifyPdf } from "@/lib/certificates/verifyPdf";
import { issuerKey, issuerKeyFiles, SIGNED_AT } from "./issued";
import { longFacts } from "./longFacts";
import { PdfTools } from "./pdfTools";
import { ORIGIN, verificationFacts } from "./verificationFacts";

vi.setConfig({ testTimeout: 60_000, hookTimeout: 60_000 });

const tools = new PdfTools();
afterAll(() => tools.remove());

type Asked = Parameters<typeof verificationFacts>;
/** Text with its line breaks made spaces: where a line breaks is the layout's business. */
async function said(...asked: Asked): Promise<string> {
  const file = tools.file("record.pdf", await drawVerification(verificationFacts(...asked)));
  return tools.text(file).replace(/\s+/g, " ");
}

let plain: string;
beforeAll(async () => {
  plain = await said();
});

describe("what the page says", () => {
  test("everything that the public page says of a certificate, when and where it was read", () => {
    const { entry } = verificationFacts();
    for (const part of [
      "Record of a verification",
      "LM-7K4Q0-2M9XB-0",
      "Standing in the register on 2 July 2026 Valid",
      "Daud Fenwick",
      "in Prove which satellites you really have, scheme SBW-R2, written to ISO/IEC 17024:2012",
      // Four cells are read line by line.
      "Effective Last day Valid since Issuer 14 March 2026 13 March 2029 14 March 2026 Saltmarsh Beacon Works",
      "Days in Europe/London That day included 10:22:51 UTC Employer attestation",
      "Code-tracking receivers on machines and stations, GPS L1 C/A",
      "Receive only. Not for safety-of-life use.",
      "Open book, not supervised",
      "Not confirmed by a person",
      "SBW-R2, 3.1",
      "A decider, outside the candidate's line, 14 March 2026",
      // The time zone database: London keeps summer time, UTC+1, in July.
      "2 July 2026, 00:30:05",
      "Europe/London, UTC+01:00",
      "lagmark.example",
      "none was compared",
      "Standing can change on any later day",
      `look again at ${ORIGIN}/verify/LM-7K4Q0-2M9XB-0`,
      entry.fingerprint.slice(0, 8).toUpperCase(),
      ...entry.cautions,
    ]) {
      expect(plain).toContain(part);
    }
    for (const { label, tolerance } of entry.quantities) {
      expect(plain).toContain(label.replace("C/N0", "C/N\u2080"));
      expect(plain).toContain(tolerance);
    }
  });

  test("neither the name of the decider nor anything of results", () => {
    expect(plain).not.toMatch(/Orla Quist|\b(within|outside) tolerance/);
    expect(plain.replace("Page 1 of 1", "")).not.toMatch(/\d+ of \d+/);
  });

  const since = { standingSince: "2026-06-01T08:00:00.000Z" };
  test.each<[RegisterEntry["standing"], Partial<RegisterEntry>, string]>([
    [
      "Suspended",
      { ...since, ground: "Competence in doubt" },
      "suspended since 1 June 2026; ground: Competence in doubt",
    ],
    ["Withdrawn", { ...since, ground: "Issued in error" }, "withdrawn on 1 June 2026; ground: Issued in error"],
    ["Superseded", since, "A later certificate took its place on 1 June 2026."],
    ["Expired", { lastDay: "2026-07-01" }, "Its last day was 1 July 2026."],
  ])("%s begins with what not to do", async (standing, changes, sentence) => {
    const text = await said({ standing, ...changes });
    expect(text).toContain(`Standing in the register on 2 July 2026 ${standing} Do not rely on this certificate.`);
    expect(text).toContain(sentence);
    expect(text).not.toContain("Valid since");
  });

  test("from when one holds that does not hold yet", async () => {
    const text = await said({ standing: "Not yet valid", effectiveOn: "2026-08-01" });
    expect(text).toContain("Not yet valid It holds from 1 August 2026 on, and not before.");
  });

  test("whether a file was the one that was issued", async () => {
    const sha256 = "5a".repeat(32);
    const same = await said({}, { file: { sha256, agrees: true } });
    expect(same).toContain("compared, and byte for byte the one issued; SHA-256 5A5A5A5A5A5A5A5A");
    const other = await said({}, { file: { sha256, agrees: false } });
    expect(other).toContain("compared, and NOT the one issued; SHA-256 5A5A5A5A5A5A5A5A");
  });

  test("Demonstration, where it is one", async () => {
    expect(plain).not.toContain("Demonstration");
    expect(await said({}, { certificate: { demonstration: true } })).toMatch(
      /^Record of a verification Lagmark Demonstration /,
    );
  });
});

test("one page, also with the longest texts, in fonts that are all in the file", async () => {
  const long = verificationFacts(
    { standing: "Withdrawn", ground: "A check of the release was found wrong" },
    { certificate: { ...longFacts(), demonstration: true }, file: { sha256: "0".repeat(64), agrees: false } },
  );
  const file = tools.file("long.pdf", await drawVerification(long));
  expect(tools.info(file)).toMatch(/Pages:\s+1\n/);
  expect(tools.info(file)).toMatch(/Page size:\s+595.2\d x 841.8\d pts \(A4\)/);
  const fonts = tools.fonts(file).split("\n").slice(2).filter(Boolean);
  expect(fonts.length).toBeGreaterThan(3);
  for (const font of fonts) expect(font).toMatch(/\byes\s+yes\s+yes\b/);
});

test("signed, an independent reader finds it valid and whole, and nobody takes it for a certificate", async () => {
  const keys = await issuerKeyFiles();
  const signed = await signPdf(await drawVerification(verificationFacts()), issuerKey(keys), SIGNED_AT, "A record");
  const file = tools.file("signed.pdf", signed);
  expect(tools.check(file)).toMatchObject({ status: 0 });
  const signature = tools.signature(file, keys.rootPem);
  expect(signature).toContain("Signature is Valid");
  expect(signature).toContain("Certificate is Trusted");
  expect(signature).toContain("Total document signed");
  const verdict = await verifyPdf(signed, keys);
  expect(verdict).toMatchObject({ signature: "genuine", wholeFile: true, number: null, fingerprint: null });
});
