import { randomUUID } from "node:crypto";
import { expect, test } from "vitest";
import { referenceOf, reportFaults } from "@/lib/commands/reportFaults";
import { reportProgress } from "@/lib/commands/reportProgress";
import { NOW } from "../support/clock";
import { makePerson } from "../support/factories";
import { insert, ownerRows } from "../support/owner";
import { rowsOf } from "./tools";

const caseId = randomUUID();

/** A job in the queue as the library leaves it after its last try. */
const failed = async (name = "mark-case", at = "now()", data: object = { caseId }) => {
  const sql = `INSERT INTO jobs.job (name, data, state, started_on, completed_on)
    VALUES ($1, $2, 'failed', now() - interval '1 hour', ${at}) RETURNING id`;
  return (await ownerRows<{ id: string }>(sql, [name, JSON.stringify(data)]))[0]!.id;
};

test("whoever waits for a job that was tried to the end is told, with a reference", async () => {
  await reportProgress(caseId, "mark-case", { step: "acquiring", done: 3, total: 32 });
  const id = await failed("mark-case", "now() + interval '1 second'");
  await reportFaults();
  expect(await rowsOf("progress")).toMatchObject([{ subject_id: caseId, job: "mark-case", fault: referenceOf(id) }]);
  expect(referenceOf(id)).toMatch(/^[0-9A-F]{8}$/);
});

test("also when the job never said how far it was", async () => {
  const id = await failed("build-case");
  await reportFaults();
  expect(await rowsOf("progress")).toMatchObject([{ job: "build-case", fault: referenceOf(id) }]);
});

test("a certificate's job is told under its decision", async () => {
  const decisionId = randomUUID();
  await failed("issue-certificate", "now()", { decisionId });
  await reportFaults();
  expect(await rowsOf("progress")).toMatchObject([{ subject_id: decisionId, job: "issue-certificate" }]);
});

test("the page that waits for the record of a verification is told under the record's id", async () => {
  const verificationId = randomUUID();
  await failed("sign-verification", "now()", { verificationId });
  await reportFaults();
  expect(await rowsOf("progress")).toMatchObject([{ subject_id: verificationId, job: "sign-verification" }]);
});

test("a mail that cannot be sent has nobody waiting", async () => {
  await failed("send-mail", "now()", { mailId: randomUUID() });
  await reportFaults();
  expect(await rowsOf("progress")).toEqual([]);
});

test("a job that is being tried again is no fault, nor is its dead letter", async () => {
  await ownerRows(
    `INSERT INTO jobs.job (name, data, state) VALUES ('mark-case', $1, 'retry'), ('dead-letters', $1, 'created')`,
    [JSON.stringify({ caseId })],
  );
  await reportFaults();
  expect(await rowsOf("progress")).toEqual([]);
});

test("a case that runs again after somebody looked at it is no longer at fault", async () => {
  await failed("mark-case", "now() - interval '1 minute'");
  await reportFaults();
  await reportProgress(caseId, "mark-case", { step: "acquiring", done: 1, total: 32 });
  await reportFaults();
  expect(await rowsOf("progress")).toMatchObject([{ step: "acquiring", fault: null }]);
});

test("a job that the operator has put back is no longer at fault, also once its progress is cleared", async () => {
  const jobId = await failed();
  const { id: actedBy } = await makePerson({ isOperator: true });
  await insert("job_acts", { jobId, job: "mark-case", act: "try again", actedBy, actedAt: NOW });
  await reportFaults();
  expect(await rowsOf("progress")).toEqual([]);
});
