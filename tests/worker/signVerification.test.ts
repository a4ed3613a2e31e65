import { createHash } from "node:crypto";
import { afterAll, beforeAll, beforeEach, expect, test } from "vitest";
import { signVerification } from "@/lib/commands/signVerification";
import type { IssuerKey } from "@/lib/certificates/signPdf";
import { PdfTools } from "../certificates/pdfTools";
import { makeCertificate, makeStanding } from "../support/certified";
import { daysFrom, NOW } from "../support/clock";
import { makeFirm, type Firm } from "../support/factories";
import { insert, ownerRows } from "../support/owner";
import { freshIssuer } from "./issuer-keys";
import { PUBLIC_ORIGIN } from "./tools";

const pdfTools = new PdfTools();
afterAll(() => pdfTools.remove());

let issuerKey: IssuerKey;
let rootPem: string;
beforeAll(async () => {
  const keys = await freshIssuer();
  rootPem = keys.rootPem;
  issuerKey = { keyPem: keys.keyPem, certificatePem: keys.certificatePem, chainPem: [rootPem] };
});

let firm: Firm;
let certificate: Awaited<ReturnType<typeof makeCertificate>>;
beforeEach(async () => {
  firm = await makeFirm();
  certificate = await makeCertificate(firm);
});

type Asked = { id: string; pdf: Buffer | null; signed_at: Date | null };
const ask = async (askedAt = NOW, fileSha256: string | null = null) =>
  (await insert<Asked>("verifications", { certificateId: certificate.id, askedAt, fileSha256 })).id;
const sign = (id: string, at = NOW) => signVerification(id, { issuerKey, publicOrigin: PUBLIC_ORIGIN }, () => at);
const rows = () => ownerRows<Asked>("SELECT * FROM verifications ORDER BY asked_at");
const textOf = (pdf: Buffer) => pdfTools.text(pdfTools.file("record.pdf", pdf)).replace(/\s+/g, " ");

test("signs what the register says at that moment, with the key that signs certificates", async () => {
  await makeStanding(firm, certificate, {
    standing: "suspended",
    ground: "Competence in doubt",
    reason: "secret words",
  });
  expect(await sign(await ask())).toBe("signed");
  const [{ pdf, signed_at }] = (await rows()) as [Asked];
  expect(signed_at).toEqual(NOW);
  const text = textOf(pdf!);
  expect(text).toContain("Standing in the register on 1 December 2026 Suspended");
  expect(text).toContain(`look again at ${PUBLIC_ORIGIN}/verify/${certificate.number}`);
  expect(text).not.toContain("secret words");
  expect(text).not.toContain(firm.decider.name);
  expect(pdfTools.check(pdfTools.file("record.pdf", pdf!))).toMatchObject({ status: 0 });
  const signature = pdfTools.signature(pdfTools.file("record.pdf", pdf!), rootPem);
  expect(signature).toMatch(/Signature is Valid[\s\S]*Certificate is Trusted/);
  expect(signature).toContain("Total document signed");
});

test("whether the file was the one that was issued is found here, from the register's own hash", async () => {
  const [{ pdf }] = (await ownerRows<{ pdf: Buffer }>("SELECT pdf FROM certificates")) as [{ pdf: Buffer }];
  await sign(await ask(NOW, createHash("sha256").update(pdf).digest("hex")));
  await sign(await ask(daysFrom(NOW, 0.1), "0".repeat(64)));
  const [same, other] = await rows();
  expect(textOf(same!.pdf!)).toContain("byte for byte the one issued");
  expect(textOf(other!.pdf!)).toContain("NOT the one issued");
});

test("run twice, the first record stays", async () => {
  const id = await ask();
  await sign(id);
  const [before] = await rows();
  expect(await sign(id, daysFrom(NOW, 0.5))).toBe("was signed");
  expect(await rows()).toEqual([before]);
});

test("is kept for a day and then forgotten, and a job that comes too late says so", async () => {
  const old = await ask();
  expect(await sign(await ask(daysFrom(NOW, 1.1)), daysFrom(NOW, 1.1))).toBe("signed");
  expect((await rows()).map(({ id }) => id)).not.toContain(old);
  expect(await sign(old, daysFrom(NOW, 1.1))).toBe("is gone");
});
