import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, beforeAll, beforeEach, expect, test } from "vitest";
import { GET } from "@/app/api/verify/records/[id]/route";
import { POST } from "@/app/api/verify/records/route";
import { fingerprintOf } from "@/lib/certificates/canonicalJson";
import { drawCertificate } from "@/lib/certificates/drawCertificate";
import type { CertificateRecord } from "@/lib/certificates/record";
import { signPdf } from "@/lib/certificates/signPdf";
import { issuerKey, issuerKeyFiles } from "@/tests/certificates/issued";
import { makeCertificate } from "@/tests/support/certified";
import { NOW } from "@/tests/support/clock";
import { makeFirm } from "@/tests/support/factories";
import { owner, ownerRows } from "@/tests/support/owner";

const folder = mkdtempSync(path.join(tmpdir(), "issuer-"));
afterAll(() => rmSync(folder, { recursive: true }));

let keys: Awaited<ReturnType<typeof issuerKeyFiles>>;
beforeAll(async () => {
  keys = await issuerKeyFiles();
  for (const [name, pem] of Object.entries({ CERTIFICATE: keys.certificatePem, ROOT: keys.rootPem })) {
    process.env[`ISSUER_${name}_FILE`] = path.join(folder, `${name}.pem`);
    writeFileSync(path.join(folder, `${name}.pem`), pem);
  }
});

let number: string;
let pdf: Buffer;
beforeEach(async () => {
  number = (await makeCertificate(await makeFirm(), { pdf: signed })).number;
  [{ pdf }] = (await ownerRows<{ pdf: Buffer }>("SELECT pdf FROM certificates")) as [{ pdf: Buffer }];
});

async function signed(record: CertificateRecord): Promise<Uint8Array> {
  const verifyAddress = `https://lagmark.example/verify/${record.number}`;
  const options = { fingerprint: fingerprintOf(record), verifyAddress, demonstration: false };
  return signPdf(await drawCertificate(record, options), issuerKey(keys), NOW);
}

const address = "http://127.0.0.1/api/verify/records";
const from = { origin: process.env.PUBLIC_ORIGIN!, "x-forwarded-for": "192.0.2.8" };
const send = (body: BodyInit, headers: Record<string, string>) =>
  POST(new Request(address, { method: "POST", body, headers }));
const FORM = { ...from, "content-type": "application/x-www-form-urlencoded" };
const FILE = { ...from, "content-type": "application/pdf" };
const fetched = (id: string) =>
  GET(new Request(`${address}/${id}`, { headers: from }), { params: Promise.resolve({ id }) });

type Row = { id: string; file_sha256: string | null; pdf: Buffer | null };
const rows = () => ownerRows<Row>("SELECT * FROM verifications");

/** Stands for the worker: signs whatever is asked for as soon as it is there. */
async function signSoon(): Promise<void> {
  const sign = "UPDATE verifications SET pdf = '%PDF-1.7', signed_at = now() WHERE pdf IS NULL";
  while ((await owner.query(sign)).rowCount === 0) await new Promise((resolve) => setTimeout(resolve, 50));
}

test("a form with the number leads to the signed file, and nothing of who asked is kept", async () => {
  const [answer] = await Promise.all([send(`number=${number}`, FORM), signSoon()]);
  const [row] = (await rows()) as [Row];
  expect([answer.status, answer.headers.get("location")]).toEqual([303, `/api/verify/records/${row.id}`]);
  expect(Object.keys(row).sort()).toEqual(["asked_at", "certificate_id", "file_sha256", "id", "pdf", "signed_at"]);
  expect(row.file_sha256).toBeNull();
  const file = await fetched(row.id);
  expect([file.status, file.headers.get("content-type")]).toEqual([200, "application/pdf"]);
  expect(file.headers.get("content-disposition")).toContain(`verification-${number}-`);
  expect(await file.text()).toBe("%PDF-1.7");
});

test("while nobody signs it, the page of the number waits for it, and the job is there", async () => {
  const answer = await send(`number=${number}`, FORM);
  const [row] = (await rows()) as [Row];
  expect(answer.headers.get("location")).toBe(`/verify/${number}?record=${row.id}`);
  const jobs = await ownerRows<{ data: object }>("SELECT data FROM jobs.job WHERE name = 'sign-verification'");
  expect(jobs).toEqual([{ data: { verificationId: row.id } }]);
  expect((await fetched(row.id)).status).toBe(404);
});

test("a file is held against the register, and its hash kept for the record", async () => {
  const [answer] = await Promise.all([send(new Uint8Array(pdf), FILE), signSoon()]);
  const [row] = (await rows()) as [Row];
  expect(answer.status).toBe(201);
  expect(await answer.json()).toEqual({ address: `/api/verify/records/${row.id}` });
  const [register] = await ownerRows<{ pdf_sha256: string }>("SELECT pdf_sha256 FROM certificates");
  expect(row.file_sha256).toBe(register!.pdf_sha256);
});

test.each([
  ["a number that the register does not know", () => send("number=LM-00000-00000-0", FORM), 303],
  ["no number", () => send("", FORM), 303],
  ["a long form", () => send(`number=${"1".repeat(2000)}`, FORM), 303],
  ["a file that is no certificate", () => send("%PDF-1.7 nothing", FILE), 404],
  [
    "a request from another site",
    () => send(`number=${number}`, { ...FORM, origin: "https://elsewhere.example" }),
    403,
  ],
  ["a request from nowhere", () => send(`number=${number}`, { "content-type": FORM["content-type"] }), 403],
])("%s adds nothing", async (_what, ask, status) => {
  expect((await ask()).status).toBe(status);
  expect(await rows()).toEqual([]);
});

test("asked too often from one address, nothing more is added", async () => {
  for (let n = 0; n < 30; n += 1) await fetched("none");
  expect((await send(`number=${number}`, FORM)).headers.get("location")).toBe(`/verify/${number}`);
  expect((await send(new Uint8Array(pdf), FILE)).status).toBe(429);
  expect((await fetched("none")).status).toBe(429);
  expect(await rows()).toEqual([]);
});

test.each(["none", "00000000-0000-4000-8000-000000000000"])("the id %s leads to nothing", async (id) => {
  expect((await fetched(id)).status).toBe(404);
});

test("the web process cannot put a file of its own into the table", async () => {
  const { db } = await import("@/lib/db");
  await expect(db.query("INSERT INTO verifications (pdf, asked_at) VALUES ('', now())")).rejects.toThrow(/permission/);
});
