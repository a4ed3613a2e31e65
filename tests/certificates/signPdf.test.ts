import { fromBER } from "asn1js";
import { ContentInfo, SignedData } from "pkijs";
import { afterAll, beforeAll, describe, expect, test, vi } from "vitest";
import type { IssuerKeyFiles } from "@/lib/certificates/makeIssuerKey";
import { signPdf } from "@/lib/certificates/signPdf";
import { signatureGaps } from "@/lib/certificates/signatureGap";
import { drawn, issuerKey, issuerKeyFiles, SIGNED_AT } from "./issued";
import { PdfTools } from "./pdfTools";

vi.setConfig({ testTimeout: 60_000, hookTimeout: 60_000 });

const tools = new PdfTools();
let files: IssuerKeyFiles;
let signed: Uint8Array;
let file: string;
beforeAll(async () => {
  files = await issuerKeyFiles();
  const { pdf } = await drawn();
  signed = await signPdf(pdf, issuerKey(files), SIGNED_AT);
  file = tools.file("signed.pdf", signed);
});
afterAll(() => tools.remove());

describe("another reader", () => {
  test("finds signature, chain and extent in order", () => {
    const report = tools.signature(file, files.rootPem);
    for (const said of [
      "Signature Validation: Signature is Valid.",
      "Certificate Validation: Certificate is Trusted.",
      "Total document signed",
      "Signature Type: ETSI.CAdES.detached",
      "Signing Hash Algorithm: SHA-256",
      "Signer Certificate Common Name: Lagmark test issuer of certificates (Demonstration)",
      "Signing Time: Mar 14 2026 10:23:04",
    ]) {
      expect(report).toContain(said);
    }
    expect(report.match(/^Signature #/gm)).toHaveLength(1);
  });

  test("finds neither errors nor warnings in the file", () => {
    const { status, output } = tools.check(file);
    expect(status, output).toBe(0);
  });

  test("still finds the attached record and one page", () => {
    expect(JSON.parse(tools.attachment(file, "record.json").toString("utf8"))).toMatchObject({
      number: "LM-7K4Q0-2M9XB-0",
    });
    expect(tools.info(file)).toMatch(/^Pages: +1$/m);
  });
});

describe("the signature", () => {
  const cms = () => {
    const [gap] = signatureGaps(signed);
    if (!gap) throw new Error("no signature");
    return new SignedData({ schema: ContentInfo.fromBER(new Uint8Array(gap.cms)).content });
  };

  test("signs content type, message digest and signing certificate, and nothing else", () => {
    const [info] = cms().signerInfos;
    expect(info.signedAttrs?.attributes.map((attribute) => attribute.type)).toEqual([
      // RFC 5652, section 11; RFC 5035, section 3. No signing time (1.2.840.113549.1.9.5): the baseline profile keeps it in /M.
      "1.2.840.113549.1.9.3",
      "1.2.840.113549.1.9.4",
      "1.2.840.113549.1.9.16.2.47",
    ]);
    expect(info.unsignedAttrs).toBeUndefined();
  });

  test("is ECDSA with SHA-256 and brings its certificate and the root", () => {
    expect(cms().signerInfos[0].signatureAlgorithm.algorithmId).toBe("1.2.840.10045.4.3.2"); // RFC 5758, section 3.2
    expect(cms().certificates).toHaveLength(2);
  });

  test("keeps its attributes in the order DER asks of a set", () => {
    const encoded =
      cms().signerInfos[0].signedAttrs?.attributes.map((one) => Buffer.from(one.toSchema().toBER(false))) ?? [];
    expect([...encoded].sort(Buffer.compare)).toEqual(encoded);
  });

  test("is DER from end to end", () => {
    const [gap] = signatureGaps(signed);
    expect(fromBER(new Uint8Array(gap?.cms ?? [])).offset).toBe(gap?.cms.length);
  });
});

test("the dictionary claims the time, names the kind and forbids changes", () => {
  const text = Buffer.from(signed).toString("latin1");
  expect(text).toContain("/M (D:20260314102304Z)");
  expect(text).toContain("/SubFilter /ETSI.CAdES.detached");
  expect(text).toMatch(/\/TransformMethod \/DocMDP\s+\/TransformParams <<\s+\/Type \/TransformParams\s+\/P 1\s/);
  expect(text).toMatch(/\/Perms <<\s+\/DocMDP \d+ 0 R/);
});

test("two signatures of the same page differ only in the signature", async () => {
  const { pdf } = await drawn();
  const again = await signPdf(pdf, issuerKey(files), SIGNED_AT);
  const [first] = signatureGaps(signed);
  const [second] = signatureGaps(again);
  expect(again).toHaveLength(signed.length);
  expect(second?.signedParts.map((part) => Buffer.from(part))).toEqual(
    first?.signedParts.map((part) => Buffer.from(part)),
  );
});

test("a file that is signed already is not signed again", async () => {
  await expect(signPdf(signed, issuerKey(files), SIGNED_AT)).rejects.toThrow("signed already");
});
