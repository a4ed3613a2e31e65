import { randomUUID } from "node:crypto";
import PgBoss from "pg-boss";
import { afterAll, afterEach, beforeAll, expect, test, vi } from "vitest";
import { transact } from "@/lib/commands/transact";
import { enqueue } from "@/lib/jobs/enqueue";
import { DEAD_LETTERS, JOBS_SCHEMA, type JobName } from "@/lib/jobs/jobs";
import { log } from "@/lib/log";
import { Lane, type Tasks } from "@/lib/worker/Lane";
import { ownerRows } from "../support/owner";

let queue: PgBoss;
beforeAll(async () => {
  log.level = "silent";
  const connectionString = process.env.WORKER_DATABASE_URL;
  queue = new PgBoss({
    connectionString,
    schema: JOBS_SCHEMA,
    migrate: false,
    schedule: false,
    supervise: false,
    max: 3,
  });
  await queue.start();
});
afterAll(() => queue.stop({ graceful: false }));

const started: Lane[] = [];
afterEach(async () => {
  await Promise.all(started.splice(0).map((lane) => lane.stop(0)));
});
function lane(names: JobName[], slots: number, tasks: Partial<Tasks>): Lane {
  const made = new Lane(queue, tasks as Tasks, names, slots);
  made.start();
  started.push(made);
  return made;
}

const add = async (name: JobName, count = 1): Promise<string[]> => {
  const ids = Array.from({ length: count }, () => randomUUID());
  const payload = (id: string) => (name === "send-mail" ? { mailId: id } : { caseId: id });
  await transact(null, async (transaction) => {
    for (const id of ids) await enqueue(name, payload(id) as never, transaction);
  });
  return ids;
};

type JobRow = { state: string; retry_count: number; output: object | null; subject: string; id: string };
const jobs = (name: string) =>
  ownerRows<JobRow>(
    `SELECT id, state::text, retry_count, output, coalesce(data->>'mailId', data->>'caseId') AS subject FROM jobs.job WHERE name = $1`,
    [name],
  );
const stateOf = async (name: string, subject: string) =>
  (await jobs(name)).find((job) => job.subject === subject)?.state;
const eventually = (assertion: () => Promise<void>) => vi.waitFor(assertion, { timeout: 20_000, interval: 50 });
const never = () => new Promise<never>(() => undefined);

test("runs each job with its payload and counts it done", async () => {
  const [id] = await add("send-mail");
  const seen: unknown[] = [];
  lane(["send-mail"], 2, { "send-mail": async (payload) => seen.push(payload) });
  await eventually(async () => expect(await stateOf("send-mail", id!)).toBe("completed"));
  expect(seen).toEqual([{ mailId: id }]);
});

test("a job that fails is tried again and does not fail its neighbours", async () => {
  const [bad, ...good] = await add("send-mail", 3);
  lane(["send-mail"], 3, {
    "send-mail": async ({ mailId }) => {
      if (mailId === bad) throw new Error("the seed is 88.8");
    },
  });
  await eventually(async () => {
    for (const id of good) expect(await stateOf("send-mail", id)).toBe("completed");
    expect(await stateOf("send-mail", bad!)).toBe("retry");
  });
});

test("what the web process may read of a failure holds none of the error's own words", async () => {
  const [id] = await add("send-mail");
  lane(["send-mail"], 1, { "send-mail": () => Promise.reject(new RangeError("the seed is 88.8")) });
  await eventually(async () => expect(await stateOf("send-mail", id!)).toBe("retry"));
  const [job] = await jobs("send-mail");
  expect(job!.output).toEqual({ error: "RangeError", reference: job!.id.slice(0, 8).toUpperCase() });
});

test("a job that takes long holds up nobody while a slot is free", async () => {
  const [slow, ...quick] = await add("send-mail", 4);
  lane(["send-mail"], 2, { "send-mail": ({ mailId }) => (mailId === slow ? never() : Promise.resolve()) });
  await eventually(async () => {
    for (const id of quick) expect(await stateOf("send-mail", id)).toBe("completed");
    expect(await stateOf("send-mail", slow!)).toBe("active");
  });
});

test("takes no more than its slots, so that another worker can take the rest", async () => {
  await add("mark-case", 5);
  const begun: string[] = [];
  const task = ({ caseId }: { caseId: string }) => (begun.push(caseId), never());
  lane(["mark-case"], 2, { "mark-case": task });
  await eventually(async () => expect(begun).toHaveLength(2));
  expect((await jobs("mark-case")).filter(({ state }) => state === "created")).toHaveLength(3);
  lane(["mark-case"], 3, { "mark-case": task });
  await eventually(async () => expect(new Set(begun).size).toBe(5));
});

test("two sorts of jobs share the slots in turn", async () => {
  await Promise.all([add("mark-case", 4), add("build-case", 4)]);
  const order: string[] = [];
  const task = (name: string) => async () => void order.push(name);
  lane(["mark-case", "build-case"], 1, { "mark-case": task("mark"), "build-case": task("build") });
  await eventually(async () => expect(order).toHaveLength(8));
  expect(new Set(order.slice(0, 4))).toEqual(new Set(["mark", "build"]));
});

test("a stop lets what runs finish", async () => {
  const [id] = await add("send-mail");
  let finish = () => undefined as void;
  const running = new Promise<void>((resolve) => (finish = resolve));
  let begun = false;
  const made = lane(["send-mail"], 1, { "send-mail": () => ((begun = true), running) });
  await eventually(async () => expect(begun).toBe(true));
  const stopped = made.stop(10_000);
  finish();
  await stopped;
  expect(await stateOf("send-mail", id!)).toBe("completed");
});

test("a stop gives back what does not finish, at once and without counting a try", async () => {
  const [id] = await add("mark-case");
  let signal: AbortSignal | undefined;
  const made = lane(["mark-case"], 1, { "mark-case": (_payload, given) => ((signal = given), never()) });
  await eventually(async () => expect(signal).toBeDefined());
  await made.stop(0);
  expect(signal!.aborted).toBe(true);
  expect((await jobs("mark-case")).find(({ subject }) => subject === id)).toMatchObject({
    state: "retry",
    retry_count: 0,
  });
  const again: string[] = [];
  lane(["mark-case"], 1, { "mark-case": async ({ caseId }) => again.push(caseId) });
  await eventually(async () => expect(again).toEqual([id]));
  expect(await jobs("mark-case")).toMatchObject([{ retry_count: 0 }]);
});

test("a run that takes longer than it may is broken off, fails and frees its slot", async () => {
  const [slow] = await add("mark-case");
  await ownerRows("UPDATE jobs.job SET expire_in = interval '1 second'");
  const [next] = await add("mark-case");
  let signal: AbortSignal | undefined;
  lane(["mark-case"], 1, {
    "mark-case": ({ caseId }, given) => (caseId === slow ? ((signal = given), never()) : Promise.resolve()),
  });
  await eventually(async () => {
    expect(await stateOf("mark-case", slow!)).toBe("retry");
    expect(await stateOf("mark-case", next!)).toBe("completed");
  });
  expect(String(signal!.reason)).toMatch(/took longer than it may/);
});

test("a payload that is none fails and reaches no task", async () => {
  await ownerRows(
    `INSERT INTO jobs.job (name, data, retry_limit, dead_letter) VALUES ('send-mail', '{"mailId": "1; DROP"}', 0, $1)`,
    [DEAD_LETTERS],
  );
  const seen: unknown[] = [];
  lane(["send-mail"], 1, { "send-mail": async (payload) => seen.push(payload) });
  await eventually(async () => expect(await jobs(DEAD_LETTERS)).toHaveLength(1));
  expect(await jobs("send-mail")).toMatchObject([{ state: "failed", output: { error: "ZodError" } }]);
  expect(seen).toEqual([]);
});
