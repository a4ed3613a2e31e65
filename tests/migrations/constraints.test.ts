import { createHash } from "node:crypto";
import { beforeEach, describe, expect, test } from "vitest";
import { makeCertificate, makeDecision, makeStanding } from "../support/certified";
import {
  makeAssignment,
  makeCase,
  makeHandIn,
  makeMarkingRecord,
  makeModule,
  makeOpenCase,
  makeRelease,
  makeSitting,
  settleFee,
} from "../support/chain";
import { NOW } from "../support/clock";
import { grantTo, makeEmployer, makeFirm, makePerson, type Firm } from "../support/factories";
import { insert, owner, ownerRows } from "../support/owner";

let firm: Firm;
beforeEach(async () => {
  firm = await makeFirm();
});
const sha256 = (bytes: Buffer | string) => createHash("sha256").update(bytes).digest("hex");
const broken = (what: Promise<unknown>, constraint: string) => expect(what).rejects.toMatchObject({ constraint });

describe("a certificate", () => {
  const RECORD_TEXT = '{"number":"LM-00000-00000-0"}';
  const PDF = Buffer.from("%PDF-1.7");

  async function certificate(over: object = {}, given: Parameters<typeof makeDecision>[1] = {}) {
    const decision = await makeDecision(firm, given);
    return insert("certificates", {
      ...{ number: "LM-0A1B2-3C4D5-A", decisionId: decision.id, sittingId: decision.sittingId },
      ...{ employerId: firm.employer.id, holderId: firm.technician.personId, record: JSON.parse(RECORD_TEXT) },
      ...{ recordText: RECORD_TEXT, fingerprint: sha256(RECORD_TEXT), pdf: PDF, pdfSha256: sha256(PDF) },
      ...{ effectiveOn: "2026-12-01", lastDay: "2029-11-30", issuedAt: NOW },
      ...over,
    });
  }

  test("is stored when all of it fits", async () => {
    expect(await certificate()).toMatchObject({ number: "LM-0A1B2-3C4D5-A" });
  });

  // Ten characters of 0-9 A-Z without I L O U and a check character.
  test.each([
    "LM-0A1B2-3C4D5",
    "LM-0A1B2-3C4DI-A",
    "LM-0A1B2-3C4DL-A",
    "LM-0A1B2-3C4DO-A",
    "LM-0A1B2-3C4DU-A",
    "LM-0A1B2-3C4D5-U",
    "lm-0a1b2-3c4d5-a",
    "0A1B23C4D5A",
    "LM-0A1B2-3C4D5-AA",
  ])("cannot have the number %s", (number) => broken(certificate({ number }), "certificates_number_check"));

  test("has the fingerprint of the very text of its record", () =>
    broken(certificate({ recordText: `${RECORD_TEXT} ` }), "certificates_check"));

  test("has the hash of the very bytes of its file", () =>
    broken(certificate({ pdf: Buffer.from("%PDF-1.8") }), "certificates_check2"));

  test("does not end before it takes effect", async () => {
    await broken(certificate({ lastDay: "2026-11-30" }), "certificates_check1");
    expect(await certificate({ lastDay: "2026-12-01" })).toMatchObject({ lastDay: "2026-12-01" });
  });

  test("needs a decision of competent", () =>
    broken(certificate({}, { outcome: "not yet competent" }), "certificates_decided"));

  test("needs the decision of its own sitting", async () =>
    broken(certificate({ sittingId: (await makeSitting(firm)).id }), "certificates_decided"));

  test("needs a settled fee", async () => {
    const { id, releaseId, technicianId, employerId } = await makeAssignment(firm);
    const unpaid = await insert<{ id: string }>("sittings", {
      ...{ assignmentId: id, releaseId, technicianId, employerId, terms: "2026-12", lastDay: "2026-12-29" },
    });
    await broken(certificate({ sittingId: unpaid.id }), "certificates_fee_settled");
  });

  test("is one per decision, and its number is nobody else's", async () => {
    const { number, decisionId, sittingId } = await makeCertificate(firm);
    await broken(certificate({ decisionId, sittingId }), "certificates_decision_id_key");
    await broken(certificate({ number }), "certificates_number_key");
  });
});

describe("standings", () => {
  test("follow one another without a gap", async () => {
    const issued = await makeCertificate(firm);
    const next = { certificateId: issued.id, standing: "suspended", ground: "doubt", setBy: firm.decider.personId };
    for (const sequence of [1, 3])
      await broken(insert("standings", { ...next, sequence, setAt: NOW }), "standings_in_order");
    await insert("standings", { ...next, sequence: 2, setAt: NOW });
  });

  test.each(["withdrawn", "superseded"] as const)("end with %s", async (standing) => {
    const issued = await makeCertificate(firm);
    await makeStanding(firm, issued, { standing });
    await broken(makeStanding(firm, issued, { standing: "valid" }), "standings_final");
  });

  test("have four words and no other", async () => {
    const issued = await makeCertificate(firm);
    await broken(makeStanding(firm, issued, { standing: "expired" as "valid" }), "standings_standing_check");
  });
});

describe("fees and orders", () => {
  test("paid is paid: neither goes back to open, nor to another time", async () => {
    const assignment = await makeAssignment(firm);
    const { orderId } = await settleFee(firm, assignment);
    for (const change of ["paid_at = NULL", "paid_at = now()"]) {
      await expect(ownerRows(`UPDATE orders SET ${change} WHERE id = $1`, [orderId])).rejects.toThrow(/is paid$/);
    }
    for (const change of ["settled_at = NULL", "order_id = NULL", "amount_minor = 1"]) {
      const sql = `UPDATE fees SET ${change} WHERE assignment_id = $1`;
      await expect(ownerRows(sql, [assignment.id])).rejects.toThrow(/is settled$/);
    }
  });

  test("a fee is settled by an order only, and an order is not paid and closed at once", async () => {
    const assignment = await makeAssignment(firm);
    const sql = "UPDATE fees SET settled_at = now() WHERE assignment_id = $1";
    await broken(ownerRows(sql, [assignment.id]), "fees_check");
    const money = { amountMinor: 19_200, currency: "gbp", orderedBy: firm.administrator.personId };
    const both = { employerId: firm.employer.id, ...money, paidAt: NOW, closedAt: NOW };
    await broken(insert("orders", both), "orders_check");
  });

  test("an assignment has one fee", async () => {
    const { id: assignmentId, employerId } = await makeAssignment(firm);
    const second = insert("fees", { assignmentId, employerId, amountMinor: 1, currency: "gbp" });
    await broken(second, "fees_assignment_id_key");
  });
});

describe("a sitting and its cases", () => {
  test("one assignment is sat once", async () => {
    const assignment = await makeAssignment(firm);
    await makeSitting(firm, { assignment });
    await broken(makeSitting(firm, { assignment }), "sittings_assignment_id_key");
  });

  test("a number of a check is drawn once", async () => {
    const sitting = await makeSitting(firm);
    await makeCase(firm, { sitting });
    await broken(makeCase(firm, { sitting }), "cases_sitting_id_check_id_number_key");
  });

  test("a case ends after it opens", () =>
    broken(makeOpenCase(firm, { openedAt: NOW, endsAt: NOW }), "case_views_check"));

  test("a case is handed in once, and marked only then", async () => {
    const handedIn = await makeHandIn(firm);
    const again = insert("hand_ins", { caseId: handedIn.id, answers: {}, byClock: true, handedInAt: NOW });
    await broken(again, "hand_ins_pkey");
    await broken(makeMarkingRecord(firm, { case: await makeOpenCase(firm) }), "marking_records_case_id_fkey");
  });

  test("a second marking record of a case says why", async () => {
    const handedIn = await makeHandIn(firm);
    await makeMarkingRecord(firm, { case: handedIn });
    await broken(makeMarkingRecord(firm, { case: handedIn, sequence: 2 }), "marking_records_check");
    await makeMarkingRecord(firm, { case: handedIn, sequence: 2, reason: "The marking was wrong." });
    await broken(makeMarkingRecord(firm, { case: handedIn }), "marking_records_case_id_sequence_key");
  });

  test("a sitting is decided once, with reasons", async () => {
    const sitting = await makeSitting(firm);
    const { sittingId } = await makeDecision(firm, { sitting });
    await broken(makeDecision(firm, { sitting: { id: sittingId } }), "decisions_sitting_id_key");
  });

  test("saved answers are at most 64 KiB", async () => {
    const { id: caseId } = await makeOpenCase(firm);
    const answers = { "peak.lag": "8".repeat(65_536) };
    await broken(insert("case_answers", { caseId, answers, revision: 1, savedAt: NOW }), "case_answers_answers_check");
  });
});

describe("modules and releases", () => {
  test.each(["1", "0.1", "01.0", "1.0.0", "v1.0"])("a release cannot have the number %s", (number) =>
    broken(makeRelease(firm, { number }), "releases_number_check"),
  );

  test("a number is given once in a module, a fingerprint once in the world", async () => {
    const made = await makeModule(firm);
    const { fingerprint } = await makeRelease(firm, { module: made });
    await broken(
      makeRelease(firm, { module: made, fingerprint: sha256("another text") }),
      "releases_module_id_number_key",
    );
    await broken(makeRelease(await makeFirm(), { fingerprint }), "releases_fingerprint_key");
  });

  test("a text is at most 64 KiB, in bytes", async () => {
    await makeModule(firm, { source: "é".repeat(32_768) });
    await broken(makeModule(firm, { source: "é".repeat(32_769) }), "drafts_source_check");
  });
});

describe("people", () => {
  test("an address is stored in small letters, once", async () => {
    await broken(makePerson({ email: "Ines@firm.example" }), "people_email_check");
    await broken(makePerson({ email: "no address" }), "people_email_check");
    await makePerson({ email: "ines@firm.example" });
    await broken(makePerson({ email: "ines@firm.example" }), "people_email_key");
  });

  test("a role is held once at a time", () =>
    broken(grantTo(firm.lead.personId, firm.employer.id, "lead"), "role_grants_held_once"));

  test("there are five roles at an employer and no other", () =>
    broken(grantTo(firm.lead.personId, firm.employer.id, "operator" as "lead"), "role_grants_role_check"));

  test.each(["Firm", "firm_1", "-firm", "fi rm", ""])("an employer cannot stand in an address as %j", (slug) =>
    broken(makeEmployer({ slug }), "employers_slug_check"),
  );

  test("nobody trains oneself", () => {
    const { personId } = firm.lead;
    const training = { employerId: firm.employer.id, trainerId: personId, technicianId: personId };
    return broken(insert("trainings", { ...training, endedOn: "2026-06-01", recordedBy: personId }), "trainings_check");
  });
});

test("the trail's hash of a row does not depend on the time zone of whoever wrote it", async () => {
  const { id } = await makeOpenCase(firm);
  const client = await owner.connect();
  await client.query("SET timezone = 'Asia/Tokyo'");
  const sql = "INSERT INTO hand_ins (case_id, answers, by_clock, handed_in_at) VALUES ($1, '{}', false, $2)";
  await client.query(sql, [id, NOW]);
  await client.query("SET timezone = 'UTC'");
  const { rows } = await client.query(`
    SELECT e.row_sha256 = row_sha256(to_jsonb(h)) AS same FROM hand_ins h
    JOIN trail_entries e ON e.subject_table = 'hand_ins' AND e.subject_key = h.case_id::text`);
  client.release();
  expect(rows).toEqual([{ same: true }]);
});
