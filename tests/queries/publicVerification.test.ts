import { beforeEach, describe, expect, test } from "vitest";
import { getPublicVerification } from "@/lib/queries/getPublicVerification";
import type { ShownStanding } from "@/lib/policies/standing";
import { makeCertificate, makeDecision, makeStanding } from "../support/certified";
import { makeMarkingRecord, makeOpenCase, makeSitting } from "../support/chain";
import { minutesFrom, NOW } from "../support/clock";
import { makeFirm, type Firm } from "../support/factories";
import { insert, ownerRows } from "../support/owner";

let firm: Firm;
beforeEach(async () => {
  firm = await makeFirm();
});

test("says what a certificate says: holder, issuer, scope, limits, release, tolerances, fingerprints, days", async () => {
  const { number, fingerprint } = await makeCertificate(firm);
  const found = await getPublicVerification(number, NOW);
  expect(found).toMatchObject({
    ...{ number, fingerprint, holder: firm.technician.name, supervision: "open", identity: null },
    issuer: { name: firm.employer.name, standing: "Employer attestation", accreditation: null },
    scheme: { code: "TEST-1", title: "Prove a satellite", edition: "written to the firm's procedure 7" },
    ...{ scope: "Code-tracking receivers, GPS L1 C/A", limits: "Receive only" },
    decided: { outsideLine: true, at: NOW.toISOString() },
    quantities: [{ label: "Lag of the highest cell", tolerance: "0.2 chip", critical: false }],
    ...{ effectiveOn: "2026-12-01", standing: "Valid", ground: null, today: "2026-12-01", demonstration: false },
  });
});

test("tells nothing of who decided, what was read and computed, what was asked or why", async () => {
  const sitting = await makeSitting(firm);
  const words = "Words with the hand-in";
  const answers = { "peak.lag": "188.75 chip" };
  const handedIn = await makeOpenCase(firm, { sitting });
  await insert("hand_ins", { caseId: handedIn.id, answers, words, byClock: false, handedInAt: minutesFrom(NOW, -5) });
  const { id: markingRecordId } = await makeMarkingRecord(firm, { case: handedIn });
  const asked = { markingRecordId, quantity: "lag", words: "A question", askedBy: firm.technician.personId };
  await insert("questions", asked);
  const certificate = await makeCertificate(firm, { decision: await makeDecision(firm, { sitting }) });
  await makeStanding(firm, certificate, {
    standing: "suspended",
    ground: "Competence in doubt",
    reason: "A private reason",
  });
  const text = JSON.stringify(await getPublicVerification(certificate.number, NOW));
  expect(text).toContain("Competence in doubt");
  const [marked] = await ownerRows<{ rows: { computed: string; difference: string }[] }>(
    "SELECT rows FROM marking_records",
  );
  const { computed, difference } = marked!.rows[0]!;
  const [decision] = await ownerRows<{ reason: string; declaration: string }>(
    "SELECT reason, declaration FROM decisions",
  );
  const [people] = await ownerRows<{ emails: string[]; ids: string[] }>(
    "SELECT array_agg(email) AS emails, array_agg(id::text) AS ids FROM people",
  );
  const hidden = [
    ...[firm.decider, firm.lead, firm.assessor, firm.administrator].map(({ name }) => name),
    ...[
      computed,
      difference,
      "188.75",
      words,
      "A question",
      "A private reason",
      decision!.reason,
      decision!.declaration,
    ],
    ...[sitting.id, certificate.id, certificate.decisionId, handedIn.id, firm.employer.id],
    ...people!.emails,
    ...people!.ids,
  ];
  for (const one of hidden) expect(text, one).not.toContain(one);
});

test("an unknown number, a part of one and one in other letters find nothing: nothing is listed or searched", async () => {
  const { number } = await makeCertificate(firm);
  const wrong = [
    "LM-ZZZZZ-ZZZZZ-0",
    number.slice(0, -2),
    number.toLowerCase(),
    `${number}%`,
    "%",
    "",
    firm.technician.name,
  ];
  for (const one of wrong) expect(await getPublicVerification(one, NOW), one).toBeNull();
});

describe("standing", () => {
  // From 1 December 2026 to 30 November 2029, in London.
  test.each<[string, ShownStanding, string]>([
    ["2026-11-30T23:59:59Z", "Not yet valid", "2026-11-30"],
    ["2026-12-01T00:00:00Z", "Valid", "2026-12-01"],
    ["2029-11-30T23:59:59Z", "Valid", "2029-11-30"],
    ["2029-12-01T00:00:00Z", "Expired", "2029-12-01"],
  ])("at %s it is %s", async (at, standing, today) => {
    const { number } = await makeCertificate(firm, { effectiveOn: "2026-12-01", lastDay: "2029-11-30" });
    expect(await getPublicVerification(number, new Date(at))).toMatchObject({ standing, today });
  });

  test("days are those of the issuer's time zone", async () => {
    // On Kiritimati, UTC+14, the last day ends at 10:00 UTC.
    const east = await makeFirm({ timeZone: "Pacific/Kiritimati" });
    const { number } = await makeCertificate(east, { effectiveOn: "2026-12-02", lastDay: "2029-11-30" });
    const at = async (time: string) => (await getPublicVerification(number, new Date(`2029-11-30T${time}Z`)))?.standing;
    expect([await at("09:59:59"), await at("10:00:00")]).toEqual(["Valid", "Expired"]);
  });

  test("a later act shows at once, with its ground and since when, and without its reason", async () => {
    const certificate = await makeCertificate(firm);
    const setAt = minutesFrom(NOW, 3);
    await makeStanding(firm, certificate, {
      standing: "withdrawn",
      ground: "Issued in error",
      reason: "secret",
      setAt,
    });
    expect(await getPublicVerification(certificate.number, minutesFrom(NOW, 4))).toMatchObject({
      ...{ standing: "Withdrawn", ground: "Issued in error", standingSince: setAt.toISOString() },
    });
  });

  test("a ground of the past is not shown once the standing is valid again", async () => {
    const certificate = await makeCertificate(firm);
    await makeStanding(firm, certificate, { standing: "suspended", ground: "Competence in doubt" });
    await makeStanding(firm, certificate, { standing: "valid", ground: "Doubt removed" });
    expect(await getPublicVerification(certificate.number, NOW)).toMatchObject({ standing: "Valid", ground: null });
  });
});
