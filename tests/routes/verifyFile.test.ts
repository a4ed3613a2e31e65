import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, afterEach, beforeAll, beforeEach, expect, test, vi } from "vitest";
import { POST } from "@/app/api/verify/file/route";
import { fingerprintOf } from "@/lib/certificates/canonicalJson";
import { drawCertificate } from "@/lib/certificates/drawCertificate";
import type { CertificateRecord } from "@/lib/certificates/record";
import { signPdf } from "@/lib/certificates/signPdf";
import { LARGEST_PDF_BYTES } from "@/lib/certificates/verifyPdf";
import type { PublicFileVerdict } from "@/lib/queries/verifyPublicFile";
import { issuerKey, issuerKeyFiles } from "@/tests/certificates/issued";
import { makeCertificate, makeStanding } from "@/tests/support/certified";
import { NOW } from "@/tests/support/clock";
import { makeFirm, type Firm } from "@/tests/support/factories";
import { ownerRows } from "@/tests/support/owner";

const folder = mkdtempSync(path.join(tmpdir(), "issuer-"));
afterAll(() => rmSync(folder, { recursive: true }));

let keys: Awaited<ReturnType<typeof issuerKeyFiles>>;
beforeAll(async () => {
  keys = await issuerKeyFiles();
  for (const [name, pem] of [
    ["CERTIFICATE", keys.certificatePem],
    ["ROOT", keys.rootPem],
  ] as const) {
    const file = path.join(folder, `${name}.pem`);
    writeFileSync(file, pem);
    process.env[`ISSUER_${name}_FILE`] = file;
  }
});

let firm: Firm;
let certificate: Awaited<ReturnType<typeof makeCertificate>>;
let pdf: Buffer;
afterEach(() => void vi.useRealTimers());
beforeEach(async () => {
  // The register's answer is that of today, and throttles count by the clock.
  vi.useFakeTimers({ toFake: ["Date"], now: NOW });
  firm = await makeFirm();
  certificate = await makeCertificate(firm, { pdf: signed });
  const [row] = await ownerRows<{ pdf: Buffer }>("SELECT pdf FROM certificates");
  pdf = row!.pdf;
});

async function signed(record: CertificateRecord, key = issuerKey(keys)): Promise<Uint8Array> {
  const verifyAddress = `https://lagmark.example/verify/${record.number}`;
  const options = { fingerprint: fingerprintOf(record), verifyAddress, demonstration: false };
  return signPdf(await drawCertificate(record, options), key, NOW);
}

const send = (body: BodyInit, more: Record<string, string> = {}) =>
  POST(
    new Request("http://127.0.0.1/api/verify/file", {
      method: "POST",
      body,
      headers: { "x-forwarded-for": "192.0.2.7", ...more },
      // A stream as body needs it said; the type of the platform does not know the field.
      ...({ duplex: "half" } as object),
    }),
  );
const verdictOn = async (file: Uint8Array): Promise<PublicFileVerdict> =>
  (await (await send(new Uint8Array(file))).json()) as PublicFileVerdict;

test("the issued file is genuine, agrees with the register and shows its standing of this moment", async () => {
  const before = await verdictOn(pdf);
  expect(before).toMatchObject({ agrees: true, file: { signature: "genuine", number: certificate.number } });
  expect(before.register?.standing).toBe("Valid");
  await makeStanding(firm, certificate, { standing: "withdrawn", ground: "evidence", reason: "not the holder's own" });
  const after = await verdictOn(pdf);
  expect([after.agrees, after.file.signature, after.register?.standing]).toEqual([true, "genuine", "Withdrawn"]);
});

test("one byte changed inside the signed part", async () => {
  const altered = Buffer.from(pdf);
  altered[200] ^= 1;
  expect(await verdictOn(altered)).toMatchObject({ agrees: false, file: { signature: "altered" } });
});

test("bytes added after the signed part", async () => {
  const longer = Buffer.concat([pdf, Buffer.from("\n% one more line\n")]);
  expect(await verdictOn(longer)).toMatchObject({ agrees: false, file: { signature: "altered", wholeFile: false } });
});

test("a file that another key signed under the same number", async () => {
  const [row] = await ownerRows<{ record: CertificateRecord }>("SELECT record FROM certificates");
  const forged = await signed(row!.record, issuerKey(await issuerKeyFiles()));
  expect(await verdictOn(forged)).toMatchObject({ agrees: false, file: { signature: "other-signer" } });
});

test.each([
  ["a picture", Buffer.from([0x89, 0x50, 0x4e, 0x47])],
  ["nothing", Buffer.alloc(0)],
])("%s is no certificate and not found in the register", async (_what, file) => {
  expect(await verdictOn(file)).toMatchObject({ agrees: false, register: null, file: { signature: "unreadable" } });
});

test("a file larger than any certificate is refused by what it says and by what it is", async () => {
  expect((await send("x", { "content-length": String(LARGEST_PDF_BYTES + 1) })).status).toBe(413);
  let left = LARGEST_PDF_BYTES / 2 ** 20 + 2;
  const endless = new ReadableStream({
    pull: (out) => (left-- > 0 ? out.enqueue(new Uint8Array(2 ** 20)) : out.close()),
  });
  expect((await send(endless)).status).toBe(413);
  expect(left).toBeGreaterThanOrEqual(0);
});

test("the thirty-first look-up of a minute from one address is refused", async () => {
  const answers: number[] = [];
  for (let n = 0; n < 31; n += 1) answers.push((await send("x")).status);
  expect(answers).toEqual([...Array.from({ length: 30 }, () => 200), 429]);
});

test("nothing of the file is kept", async () => {
  await verdictOn(pdf);
  expect(await ownerRows("SELECT * FROM captures")).toEqual([]);
  expect(await ownerRows("SELECT 1 FROM certificates")).toHaveLength(1);
});
