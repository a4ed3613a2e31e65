import { randomUUID } from "node:crypto";
import { beforeEach, describe, expect, test } from "vitest";
import { actOnJob } from "@/lib/commands/actOnJob";
import { listStoppedJobs } from "@/lib/queries/listStoppedJobs";
import { NOW } from "../support/clock";
import { makeFirm, makePerson } from "../support/factories";
import { ownerRows } from "../support/owner";
import { everythingStored, expectNothingLeft, rowsOf, trailOf } from "../support/written";

const caseId = randomUUID();
let operator: { personId: string; isOperator: boolean };
let jobId: string;

/** A job as the queue leaves it after its last try, with the dead letter that goes with it. */
async function stopped(): Promise<string> {
  const data = JSON.stringify({ caseId });
  await ownerRows(`INSERT INTO jobs.job (name, data) VALUES ('dead-letters', $1)`, [data]);
  const sql = `INSERT INTO jobs.job (id, name, data, state, retry_limit, retry_count, started_on, completed_on, output)
    VALUES ($3, 'mark-case', $1, 'failed', 5, 5, $2, $2, '{"error": "EngineDiffersError", "reference": "X"}') RETURNING id`;
  return (await ownerRows<{ id: string }>(sql, [data, NOW, randomUUID()]))[0]!.id;
}

/** As the queue does with what is done or stopped for long. */
const archived = (id: string) =>
  ownerRows(
    `WITH moved AS (DELETE FROM jobs.job WHERE id = $1 RETURNING *) INSERT INTO jobs.archive SELECT *, now() FROM moved`,
    [id],
  );

beforeEach(async () => {
  await ownerRows("DELETE FROM jobs.archive");
  operator = { personId: (await makePerson({ isOperator: true })).id, isOperator: true };
  jobId = await stopped();
});
const act = (over: Partial<Parameters<typeof actOnJob>[1]> = {}, by = operator) =>
  actOnJob(by, { jobId, act: "try again", reason: "", ...over }, NOW);
const putBack = () =>
  ownerRows<{ data: object; retry_limit: number }>(
    "SELECT data, retry_limit FROM jobs.job WHERE name = 'mark-case' AND state = 'created'",
  );

test("the operator sees which job, about what, when, how often and the fault's name", async () => {
  expect(await listStoppedJobs(operator)).toEqual([
    {
      ...{ id: jobId, job: "mark-case", subject: [{ what: "case", id: caseId }], tries: 6 },
      ...{ fault: "EngineDiffersError", stoppedAt: NOW.toISOString() },
    },
  ]);
});

test("put back it is a job with all its tries, once however often it is pressed, and off the list", async () => {
  const [one, two] = await Promise.all([act(), act()]);
  expect(two).toEqual(one);
  expect(await act()).toEqual(one);
  expect(await putBack()).toEqual([{ data: { caseId }, retry_limit: 5 }]);
  expect(await listStoppedJobs(operator)).toEqual([]);
  expect(await trailOf(operator)).toEqual([{ act: "job_acts added", employer: null, key: one.id }]);
});

test("one that the queue has moved to its archive can be put back as well", async () => {
  await archived(jobId);
  await act();
  expect(await putBack()).toHaveLength(1);
});

test("left, it asks for a reason, is off the list and does not run", async () => {
  await expect(act({ act: "leave", reason: " " })).rejects.toMatchObject({ name: "InvalidError" });
  await act({ act: "leave", reason: "The firm has closed." });
  expect(await rowsOf("job_acts")).toMatchObject([{ job_id: jobId, job: "mark-case", reason: "The firm has closed." }]);
  expect(await listStoppedJobs(operator)).toEqual([]);
  expect(await putBack()).toEqual([]);
  expect((await trailOf(operator)).map(({ act: word }) => word)).toEqual(["job_acts added"]);
});

describe("refuses", () => {
  const refused = async (run: () => Promise<unknown>, name: string) => {
    const before = await everythingStored();
    await expect(run()).rejects.toMatchObject({ name });
    expect(await everythingStored()).toEqual(before);
  };

  test("everybody who is not the operator, whatever the roles", async () => {
    for (const actor of Object.values(await makeFirm()).filter((one) => "personId" in one)) {
      await refused(() => act({}, actor), "ForbiddenError");
      await refused(() => listStoppedJobs(actor), "ForbiddenError");
    }
  });

  test("the other act after the first, and what is no stopped job", async () => {
    await refused(() => act({ jobId: randomUUID() }), "NotFoundError");
    await refused(() => act({ jobId: "no id" }), "NotFoundError");
    await act();
    await refused(() => act({ act: "leave", reason: "Changed my mind." }), "ConflictError");
  });
});

test("a failure at the end leaves neither act nor job", () => expectNothingLeft("job_acts", () => act()));
