import { execFileSync } from "node:child_process";
import { createPrivateKey, X509Certificate } from "node:crypto";
import { beforeAll, describe, expect, test } from "vitest";
import { makeIssuerKey, type IssuerKeyFiles } from "@/lib/certificates/makeIssuerKey";
import { PdfTools } from "./pdfTools";

const from = new Date("2026-01-01T00:00:00.000Z");
let files: IssuerKeyFiles;
let root: X509Certificate;
let issuer: X509Certificate;
beforeAll(async () => {
  files = await makeIssuerKey({ organisation: "Saltmarsh Register", country: "GB", demonstration: false, from });
  root = new X509Certificate(files.rootPem);
  issuer = new X509Certificate(files.certificatePem);
});

describe("the certificates", () => {
  test("lead from the issuer to a root that signs itself", () => {
    expect(root.verify(root.publicKey)).toBe(true);
    expect(issuer.checkIssued(root)).toBe(true);
    expect(issuer.verify(root.publicKey)).toBe(true);
    expect([root.ca, issuer.ca]).toEqual([true, false]);
  });

  test("belong to their keys, on P-256", () => {
    expect(root.checkPrivateKey(createPrivateKey(files.rootKeyPem))).toBe(true);
    expect(issuer.checkPrivateKey(createPrivateKey(files.keyPem))).toBe(true);
    expect(issuer.publicKey.asymmetricKeyDetails).toEqual({ namedCurve: "prime256v1" });
  });

  test("are dated as wished, a year after 2049 with its four figures", () => {
    expect([issuer.validFrom, issuer.validTo]).toEqual(["Jan  1 00:00:00 2026 GMT", "Jan  1 00:00:00 2038 GMT"]);
    // A two-figure 51 would read as 1951 and every signature as expired: it happened.
    expect(root.validTo).toBe("Jan  1 00:00:00 2051 GMT");
  });

  test("name their owner, one attribute at a time", () => {
    expect(issuer.subject).toBe("C=GB\nO=Saltmarsh Register\nCN=Saltmarsh Register issuer of certificates");
    expect(issuer.issuer).toBe("C=GB\nO=Saltmarsh Register\nCN=Saltmarsh Register root");
  });

  test("carry no extended key usage, which common readers would refuse for a PDF", () => {
    expect(issuer.keyUsage).toBeUndefined();
  });

  test("have long serial numbers of their own", () => {
    expect(issuer.serialNumber).toMatch(/^[4-7][0-9A-F]{31}$/);
    expect(issuer.serialNumber).not.toBe(root.serialNumber);
  });
});

test("a demonstration says so in every name", async () => {
  const made = await makeIssuerKey({ organisation: "Lagmark", demonstration: true, from });
  for (const pem of [made.rootPem, made.certificatePem]) {
    const { subject } = new X509Certificate(pem);
    expect(subject.split("\n").every((part) => part.endsWith("(Demonstration)"))).toBe(true);
  }
  expect(new X509Certificate(files.certificatePem).subject).not.toContain("Demonstration");
});

test("no two are alike", async () => {
  const again = await makeIssuerKey({ organisation: "Saltmarsh Register", country: "GB", demonstration: false, from });
  expect(again.keyPem).not.toBe(files.keyPem);
  expect(new X509Certificate(again.certificatePem).verify(root.publicKey)).toBe(false);
});

// RFC 5280, 4.1.2.5.2: a time from 2050 on has no fraction of a second; such a root is no root to a reader that obeys it.
test("made in the middle of a second, the certificates are good to independent readers all the same", async () => {
  const at = new Date("2026-12-01T16:06:25.194Z");
  const made = await makeIssuerKey({ organisation: "Lagmark", demonstration: true, from: at });
  const tools = new PdfTools();
  try {
    const [root, issuer] = [tools.file("r.pem", made.rootPem), tools.file("i.pem", made.certificatePem)];
    const attime = String(Date.parse("2027-01-01T00:00:00Z") / 1000);
    const said = execFileSync("openssl", ["verify", "-attime", attime, "-CAfile", root, issuer], { encoding: "utf8" });
    expect(said).toContain(": OK");
    expect(new X509Certificate(made.rootPem).validTo).toBe("Dec  1 16:06:25 2051 GMT");
  } finally {
    tools.remove();
  }
});
