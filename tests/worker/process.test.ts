import { afterAll, afterEach, beforeAll, beforeEach, expect, test, vi } from "vitest";
import { kindOf } from "@/lib/checks/registry";
import { openSecret } from "@/lib/commands/caseSecret";
import { transact } from "@/lib/commands/transact";
import { enqueue } from "@/lib/jobs/enqueue";
import { makeAssignment, makeCase, makeRelease, makeSitting } from "../support/chain";
import { makeFirm } from "../support/factories";
import { insert, ownerRows } from "../support/owner";
import { checkPlan } from "../support/samples";
import { MailServer } from "./mail-server";
import { queued, rowsOf, SEED_KEY } from "./tools";
import { WorkerProcess, workerSettings } from "./worker-process";

// The check whose marking computes longest: the worker acquires the capture itself.
const KIND = kindOf("satellites");
const PLAN = checkPlan({
  id: "satellites",
  kind: KIND.id,
  version: KIND.version,
  parameters: Object.fromEntries(KIND.parameters.map(({ name, default: value }) => [name, value])),
});

const mails = new MailServer();
let settings: Record<string, string>;
beforeAll(async () => {
  settings = await workerSettings(await mails.start());
});
afterAll(() => mails.stop());

const running: WorkerProcess[] = [];
const start = async () => {
  const worker = await WorkerProcess.start(settings);
  running.push(worker);
  return worker;
};
afterEach(() => Promise.all(running.splice(0).map((worker) => worker.kill("SIGKILL"))));

let caseId: string;
beforeEach(async () => {
  const firm = await makeFirm();
  const assignment = await makeAssignment(firm, { release: await makeRelease(firm, { checks: [PLAN] }) });
  const sitting = await makeSitting(firm, { assignment });
  caseId = (await makeCase(firm, { sitting, checkId: PLAN.id, kind: PLAN.kind })).id;
  await transact(null, (transaction) => enqueue("build-case", { caseId }, transaction));
});

const eventually = (assertion: () => Promise<void>) => vi.waitFor(assertion, { timeout: 110_000, interval: 100 });
const jobs = (name: string) =>
  ownerRows<{ state: string; retryCount: number }>(
    `SELECT state::text, retry_count AS "retryCount" FROM jobs.job WHERE name = $1`,
    [name],
  );

async function handIn(): Promise<void> {
  await eventually(async () => expect(await rowsOf("case_views")).toHaveLength(1));
  await insert("hand_ins", { caseId, answers: {}, byClock: false, handedInAt: new Date(0) });
  await transact(null, (transaction) => enqueue("mark-case", { caseId }, transaction));
}

/** Until the technician who waits sees that the marking is on its way. */
const untilMarking = () =>
  eventually(async () => {
    const [progress] = await rowsOf("progress");
    expect(progress).toMatchObject({ job: "mark-case", step: expect.stringMatching(/Searching/) });
  });

/** As if the time that one run may take had gone by. */
const timeGoesBy = () => ownerRows("UPDATE jobs.job SET started_on = started_on - expire_in WHERE state = 'active'");

test(
  "killed while marking, then told to stop while marking: the third worker does the whole job, once",
  {
    timeout: 240_000,
  },
  async () => {
    const killed = await start();
    await handIn();
    await untilMarking();
    expect(await killed.kill("SIGKILL")).toMatchObject({ signal: "SIGKILL" });
    expect(await rowsOf("marking_records")).toEqual([]);
    expect(await jobs("mark-case")).toEqual([{ state: "active", retryCount: 0 }]);
    await Promise.all([timeGoesBy(), ownerRows("DELETE FROM progress")]);

    const stopped = await start();
    await untilMarking();
    expect(await stopped.kill("SIGTERM")).toEqual({ code: 0, signal: null });
    // On a fast machine the marking ends within the time that a stop leaves it.
    const done = (await rowsOf("marking_records")).length === 1;
    expect(await jobs("mark-case")).toEqual([{ state: done ? "completed" : "retry", retryCount: 1 }]);

    const last = await start();
    await eventually(async () => expect(await jobs("mark-case")).toEqual([{ state: "completed", retryCount: 1 }]));
    expect(await rowsOf("marking_records")).toMatchObject([{ case_id: caseId, sequence: 1, met: false }]);
    await eventually(async () => {
      expect(mails.received.map(({ subject }) => subject)).toEqual([`Marked: ${PLAN.title}`]);
      expect(await rowsOf("trail_unsealed")).toEqual([]);
    });
    expect(await rowsOf("progress")).toEqual([]);
    expect(await queued("close-case")).toHaveLength(1);

    const [secret] = await rowsOf<{ sealed: Buffer }>("case_secrets");
    const { seedHex } = openSecret(secret!.sealed, caseId, SEED_KEY);
    for (const { output } of [killed, stopped, last]) expect(output).not.toContain(seedHex);
  },
);
