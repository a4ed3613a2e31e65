import { createHash } from "node:crypto";
import { beforeAll, beforeEach, expect, test } from "vitest";
import { fingerprintOf } from "@/lib/certificates/canonicalJson";
import type { CertificateRecord } from "@/lib/certificates/record";
import { verifyPdf } from "@/lib/certificates/verifyPdf";
import { issueCertificate, type IssueTools } from "@/lib/commands/issueCertificate";
import { makeDecision } from "../support/certified";
import {
  makeAssignment,
  makeMarkingRecord,
  makeRelease,
  makeSitting,
  makeHandIn,
  makeOpenCase,
  makeCase,
} from "../support/chain";
import { NOW } from "../support/clock";
import { makeFirm, type Firm } from "../support/factories";
import { ownerRows } from "../support/owner";
import { checkPlan, frontMatter, LAG, publicCase } from "../support/samples";
import { freshIssuer } from "./issuer-keys";
import { PUBLIC_ORIGIN, queued, rowsOf } from "./tools";

type CertificateRow = {
  id: string;
  number: string;
  record: CertificateRecord;
  record_text: string;
  fingerprint: string;
  effective_on: string;
  last_day: string;
  pdf: Buffer;
  pdf_sha256: string;
};
type Decided = Parameters<typeof makeDecision>[1];

let tools: IssueTools;
let firm: Firm;
beforeAll(async () => {
  const { keyPem, certificatePem, rootPem } = await freshIssuer();
  const issuerKey = { keyPem, certificatePem, chainPem: [rootPem] };
  tools = { issuerKey, rootPem, publicOrigin: PUBLIC_ORIGIN, demonstration: false };
});
beforeEach(async () => {
  firm = await makeFirm();
});

const issue = (decisionId: string, over: Partial<IssueTools> = {}) =>
  issueCertificate(decisionId, { ...tools, ...over }, () => NOW);
const certificate = async () => (await rowsOf<CertificateRow>("certificates"))[0]!;
async function issued(given?: Decided): Promise<CertificateRow> {
  expect(await issue((await makeDecision(firm, given)).id)).toBe("issued");
  return certificate();
}

test("the signed file verifies, and file, record and register agree", async () => {
  const { pdf, number, record, record_text, fingerprint, pdf_sha256 } = await issued();
  const trusted = { certificatePem: tools.issuerKey.certificatePem, rootPem: tools.rootPem };
  expect(await verifyPdf(pdf, trusted)).toMatchObject({ signature: "genuine", wholeFile: true, number, fingerprint });
  expect(fingerprint).toBe(createHash("sha256").update(record_text).digest("hex"));
  expect(fingerprintOf(record)).toBe(fingerprint);
  expect(pdf_sha256).toBe(createHash("sha256").update(pdf).digest("hex"));
});

test("says who decided, in which line, for which release, and that nobody confirmed the identity", async () => {
  const { record } = await issued();
  expect(record).toMatchObject({
    holder: { name: firm.technician.name },
    issuer: { name: firm.employer.name, standing: "Employer attestation", timeZone: "Europe/London" },
    identity: null,
    decided: { by: firm.decider.name, outsideLine: true, at: NOW.toISOString() },
    release: { code: "TEST-1", number: "1.0" },
    sittingId: "S-20001",
    quantities: [
      { check: "reading", title: "Read a correlator trace", label: LAG, tolerance: "0.2 chip", critical: false },
    ],
    demonstration: false,
  });
});

test("is valid in the register from the decision on, set by the decider", async () => {
  const { id } = await issued();
  expect(await rowsOf("standings")).toMatchObject([
    {
      certificate_id: id,
      sequence: 1,
      standing: "valid",
      ground: "decision",
      set_by: firm.decider.personId,
      set_at: NOW,
    },
  ]);
});

test("is mailed to the holder with the certificate attached", async () => {
  const { id, number } = await issued();
  const [mail] = await rowsOf<{ id: string; body: string }>("mails");
  expect(mail).toMatchObject({ certificate_id: id, subject: `Competent: your certificate ${number}` });
  expect(mail!.body).toContain(`${PUBLIC_ORIGIN}/verify/${number}`);
  expect(await queued("send-mail")).toMatchObject([{ data: { mailId: mail!.id } }]);
});

// Days are the issuer's own. 14 March 2027, 12:00 UTC is 15 March, 01:00, in Auckland (UTC+13 until April).
test.each([
  ["Europe/London", "2027-03-14T12:00:00Z", 36, "2027-03-14", "2030-03-13"],
  ["Pacific/Auckland", "2027-03-14T12:00:00Z", 36, "2027-03-15", "2030-03-14"],
  ["Europe/London", "2027-01-31T12:00:00Z", 1, "2027-01-31", "2027-02-27"],
  ["Europe/London", "2028-02-29T12:00:00Z", 12, "2028-02-29", "2029-02-27"],
])("in %s decided at %s for %i months: from %s to %s", async (timeZone, at, months, from, to) => {
  firm = await makeFirm({ timeZone });
  const release = await makeRelease(firm, {
    frontMatter: frontMatter({ valid: { months, reason: "as the firm decided" } }),
  });
  const sitting = await makeSitting(firm, { assignment: await makeAssignment(firm, { release }) });
  expect(await issued({ sitting, decidedAt: new Date(at) })).toMatchObject({ effective_on: from, last_day: to });
});

test("a check that stayed unmet, since the release asks for some only, is not certified", async () => {
  const release = await makeRelease(firm, {
    checks: [checkPlan(), checkPlan({ id: "delay", title: "Measure a delay" })],
    frontMatter: frontMatter({ require: { all: [], some: { of: ["reading", "delay"], count: 1 } } }),
  });
  const sitting = await makeSitting(firm, { assignment: await makeAssignment(firm, { release }) });
  await makeMarkingRecord(firm, { case: await makeHandIn(firm, { sitting }), met: false });
  const delay = await makeCase(firm, { sitting, checkId: "delay" });
  const tolerances = [{ quantity: "delay", label: "Cable delay", tolerance: "1 ns", critical: true, reason: "c" }];
  await makeOpenCase(firm, { case: delay, view: publicCase({ tolerances }) });
  await makeMarkingRecord(firm, { case: await makeHandIn(firm, { case: delay }) });
  const { record } = await issued({ sitting });
  expect(record.quantities).toEqual([
    { check: "delay", title: "Measure a delay", label: "Cable delay", tolerance: "1 ns", critical: true },
  ]);
});

test("run twice, the first certificate stays and no second mail is written", async () => {
  const decision = await makeDecision(firm);
  await issue(decision.id);
  const before = await certificate();
  expect(await issue(decision.id)).toBe("was issued");
  expect(await rowsOf("certificates")).toEqual([before]);
  expect(await rowsOf("standings")).toHaveLength(1);
  expect(await rowsOf("mails")).toHaveLength(1);
});

test("two runs at once issue one certificate", async () => {
  const { id } = await makeDecision(firm);
  expect((await Promise.all([issue(id), issue(id)])).sort()).toEqual(["issued", "was issued"]);
  expect(await rowsOf("certificates")).toHaveLength(1);
  expect(await rowsOf("standings")).toHaveLength(1);
  expect(await rowsOf("mails")).toHaveLength(1);
});

test("killed with the certificate written and the mail not, nothing is kept and the next run does it all", async () => {
  const { id } = await makeDecision(firm);
  await ownerRows("ALTER TABLE mails ADD CONSTRAINT stop_here CHECK (subject NOT LIKE 'Competent%')");
  try {
    await expect(issue(id)).rejects.toThrow();
  } finally {
    await ownerRows("ALTER TABLE mails DROP CONSTRAINT stop_here");
  }
  expect(await rowsOf("certificates")).toEqual([]);
  expect(await issue(id)).toBe("issued");
});

test("nothing is issued for a decision of not yet competent", async () => {
  const { id } = await makeDecision(firm, { outcome: "not yet competent" });
  await expect(issue(id)).rejects.toThrow(/not yet competent/);
  expect(await rowsOf("certificates")).toEqual([]);
});

test("nothing is issued while the fee is open", async () => {
  const { id } = await makeDecision(firm);
  await ownerRows("ALTER TABLE fees DISABLE TRIGGER USER");
  await ownerRows("UPDATE fees SET settled_at = NULL");
  await ownerRows("ALTER TABLE fees ENABLE TRIGGER USER");
  await expect(issue(id)).rejects.toThrow(/fee/);
  expect(await rowsOf("certificates")).toEqual([]);
});

test("nothing is issued that the issuer's own certificate does not verify", async () => {
  const { keyPem } = await freshIssuer();
  const { id } = await makeDecision(firm);
  await expect(issue(id, { issuerKey: { ...tools.issuerKey, keyPem } })).rejects.toThrow();
  expect(await rowsOf("certificates")).toEqual([]);
});

test("in a demonstration the certificate says so", async () => {
  const { id } = await makeDecision(firm);
  await issue(id, { demonstration: true });
  expect((await certificate()).record.demonstration).toBe(true);
});
