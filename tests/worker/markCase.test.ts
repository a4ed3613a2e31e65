import { beforeEach, expect, test } from "vitest";
import { fingerprintOf } from "@/lib/certificates/canonicalJson";
import { ENGINE_VERSION } from "@/lib/checks/engineVersion";
import { sealSecret } from "@/lib/commands/caseSecret";
import { EngineDiffersError } from "@/lib/commands/computeMarking";
import { markCase } from "@/lib/commands/markCase";
import { plainTruth } from "@/lib/commands/plainTruth";
import { reportProgress } from "@/lib/commands/reportProgress";
import {
  makeCase,
  makeHandIn,
  makeMarkingRecord,
  makeOpenCase,
  makeRelease,
  makeSitting,
  makeAssignment,
} from "../support/chain";
import { NOW } from "../support/clock";
import { grantTo, makeActor, makeFirm, type Firm } from "../support/factories";
import { insert } from "../support/owner";
import { checkPlan, frontMatter } from "../support/samples";
import { builtCase, FakeEngine } from "./fake-engine";
import { PUBLIC_ORIGIN, queued, rowsOf, SEED_KEY, stop } from "./tools";

const SEED = "5e".repeat(32);
let firm: Firm;
beforeEach(async () => {
  firm = await makeFirm();
});

const mark = (caseId: string, engine = new FakeEngine(), now = () => NOW) =>
  markCase(caseId, { engine, seedKey: SEED_KEY, publicOrigin: PUBLIC_ORIGIN }, now);

/** Handed in, with the secret that building leaves. */
async function handedIn(given: Parameters<typeof makeCase>[1] = {}): Promise<string> {
  const { id: caseId } = await makeHandIn(firm, {
    case: await makeOpenCase(firm, { case: await makeCase(firm, given) }),
  });
  const truth = plainTruth(builtCase(SEED).truth);
  const sealed = sealSecret({ seedHex: SEED, truth }, caseId, SEED_KEY);
  await insert("case_secrets", { caseId, sealed, truthSha256: fingerprintOf(truth), engineVersion: "1.0.0" });
  return caseId;
}

async function sittingWith(checks: string[], freshCases = 0) {
  const release = await makeRelease(firm, {
    checks: checks.map((id) => checkPlan({ id })),
    frontMatter: frontMatter({
      sitting: { days: 30, freshCases, waitHours: 24 },
      require: { all: checks, some: null },
    }),
  });
  return makeSitting(firm, { assignment: await makeAssignment(firm, { release }) });
}

type MailRow = { to_email: string; subject: string; body: string };
const mailsTo = async (subject: RegExp) =>
  (await rowsOf<MailRow>("mails")).filter((mail) => subject.test(mail.subject)).map(({ to_email }) => to_email);
const emailOf = async (personId: string) =>
  (await rowsOf<{ id: string; email: string }>("people")).find(({ id }) => id === personId)!.email;

test("marks the answers of the hand-in against the sealed seed and keeps the whole record", async () => {
  const caseId = await handedIn();
  const engine = new FakeEngine({ met: false });
  expect(await mark(caseId, engine)).toBe("marked");
  expect(engine.seeds).toEqual([SEED]);
  expect(engine.asked).toEqual([{ plan: checkPlan(), answers: { "peak.lag": "88.75 chip" } }]);
  expect(await rowsOf("marking_records")).toMatchObject([
    {
      case_id: caseId,
      sequence: 1,
      marking: "correlator-reading@1",
      engine_version: ENGINE_VERSION,
      met: false,
      within_count: 0,
      needs: 1,
      quantities: [{ of: "lag", within: false }],
      workings: [{ label: "PRN", value: "7" }],
      duration_ms: expect.any(Number),
      marked_at: NOW,
    },
  ]);
});

test("tells the technician where the record is, not how it went", async () => {
  const caseId = await handedIn();
  await mark(caseId);
  const [mail] = (await rowsOf<MailRow>("mails")).filter(({ subject }) => subject.startsWith("Marked"));
  expect(mail!.to_email).toBe(await emailOf(firm.technician.personId));
  expect(mail!.body).toContain(`${PUBLIC_ORIGIN}/${firm.employer.slug}/records/${caseId}`);
  expect(mail!.body).not.toMatch(/\bmet\b|within|outside/);
  expect(await queued("send-mail")).toHaveLength((await rowsOf("mails")).length);
});

test("clears the progress that was told", async () => {
  const caseId = await handedIn();
  await reportProgress(caseId, "mark-case", { step: "acquiring", done: 3, total: 32 });
  await mark(caseId);
  expect(await rowsOf("progress")).toEqual([]);
});

test("run twice, the first record stays and no second mail goes out", async () => {
  const caseId = await handedIn();
  await mark(caseId);
  const engine = new FakeEngine({ met: false });
  expect(await mark(caseId, engine)).toBe("was marked");
  expect(engine.seeds).toEqual([]);
  expect(await rowsOf("marking_records")).toMatchObject([{ met: true }]);
  expect(await mailsTo(/^Marked/)).toHaveLength(1);
});

test("two runs at once leave one record and one mail", async () => {
  const caseId = await handedIn();
  expect((await Promise.all([mark(caseId), mark(caseId)])).sort()).toEqual(["marked", "was marked"]);
  expect(await rowsOf("marking_records")).toHaveLength(1);
  expect(await mailsTo(/^Marked/)).toHaveLength(1);
  expect(await mailsTo(/^For decision/)).toHaveLength(1);
});

test("killed with the record written and the mails not, nothing is kept and the next run does it all", async () => {
  const caseId = await handedIn();
  let asked = 0;
  const killedAtTheDecidersMail = () => ((asked += 1) === 1 ? NOW : stop());
  await expect(mark(caseId, new FakeEngine(), killedAtTheDecidersMail)).rejects.toThrow("killed");
  expect(await rowsOf("marking_records")).toEqual([]);
  expect(await rowsOf("mails")).toEqual([]);
  expect(await mark(caseId)).toBe("marked");
});

test("an engine that does not re-create the case marks nothing", async () => {
  const caseId = await handedIn();
  await expect(mark(caseId, new FakeEngine({ truth: { lagChips: 88.9 } }))).rejects.toThrow(EngineDiffersError);
  expect(await rowsOf("marking_records")).toEqual([]);
});

test("a secret sealed with another key marks nothing", async () => {
  const caseId = await handedIn();
  const seedKey = Buffer.alloc(32, 9).toString("base64url");
  await expect(markCase(caseId, { engine: new FakeEngine(), seedKey, publicOrigin: PUBLIC_ORIGIN })).rejects.toThrow();
});

test("the deciders hear of a sitting once its last check is met", async () => {
  const sitting = await sittingWith(["reading", "delay"]);
  const [first, second] = [await handedIn({ sitting }), await handedIn({ sitting, checkId: "delay" })];
  await mark(first);
  expect(await mailsTo(/^For decision/)).toEqual([]);
  await mark(second);
  expect(await mailsTo(/^For decision/)).toEqual([await emailOf(firm.decider.personId)]);
  const [mail] = (await rowsOf<MailRow>("mails")).filter(({ subject }) => subject.startsWith("For decision"));
  expect(mail!.body).toContain(`${PUBLIC_ORIGIN}/${firm.employer.slug}/queue/${sitting.id}`);
});

test("two checks marked at the same time are told to the deciders once", async () => {
  const sitting = await sittingWith(["reading", "delay"]);
  const ids = [await handedIn({ sitting }), await handedIn({ sitting, checkId: "delay" })];
  await Promise.all(ids.map((id) => mark(id)));
  expect(await mailsTo(/^For decision/)).toHaveLength(1);
});

test("a check that is not met waits for its fresh case before the deciders hear of it", async () => {
  const sitting = await sittingWith(["reading"], 1);
  await makeMarkingRecord(firm, { case: await makeHandIn(firm, { sitting }), met: false });
  const fresh = await handedIn({ sitting, number: 2 });
  await mark(fresh, new FakeEngine({ met: false }));
  expect(await mailsTo(/^For decision/)).toHaveLength(1);
});

test("the first case of two that is not met tells nobody", async () => {
  const sitting = await sittingWith(["reading"], 1);
  await mark(await handedIn({ sitting }), new FakeEngine({ met: false }));
  expect(await mailsTo(/^For decision/)).toEqual([]);
});

test("a decider who is barred from this sitting gets no mail, nor does another firm's", async () => {
  await grantTo(firm.lead.personId, firm.employer.id, "decider");
  const other = await makeFirm();
  await makeActor(other.employer, ["decider"]);
  await mark(await handedIn());
  expect(await mailsTo(/^For decision/)).toEqual([await emailOf(firm.decider.personId)]);
});
