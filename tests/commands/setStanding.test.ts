import { beforeEach, describe, expect, test } from "vitest";
import { setStanding } from "@/lib/commands/setStanding";
import type { StandingAct } from "@/lib/policies/standing";
import { makeCertificate, makeDecision, makeStanding } from "../support/certified";
import { makeAssignment, makeSitting } from "../support/chain";
import { NOW } from "../support/clock";
import { makeActor, makeFirm, type Firm } from "../support/factories";
import { ownerRows } from "../support/owner";
import { everythingStored, expectNothingLeft, jobsOf, rowsOf, trailOf } from "../support/written";
import { refusals } from "./refusals";

const NUMBER = "LM-0A1B2-3C4D5-A";
const NO_SUCH = "LM-ZZZZZ-ZZZZZ-0";

let firm: Firm;
let other: Firm;
let certificate: Awaited<ReturnType<typeof makeCertificate>>;
beforeEach(async () => {
  [firm, other] = [await makeFirm(), await makeFirm()];
  certificate = await makeCertificate(firm, { number: NUMBER });
});
const act = (what: StandingAct, over: object = {}) => ({
  ...{ number: NUMBER, act: what, ground: "Competence in doubt", reason: "A capture was mixed up.", group: "3C4D5" },
  ...over,
});
const set = (what: StandingAct, over: object = {}) => setStanding(firm.decider, act(what, over), NOW);
const refused = async (doing: () => Promise<unknown>, name: string, message: RegExp) => {
  const before = await everythingStored();
  await expect(doing()).rejects.toMatchObject({ name, message: expect.stringMatching(message) });
  expect(await everythingStored()).toEqual(before);
};
const history = async () =>
  (await ownerRows<{ standing: string }>("SELECT standing FROM standings ORDER BY sequence")).map((s) => s.standing);

test("suspends, reinstates and withdraws, each as a later row with who and why", async () => {
  expect(await set("suspend")).toEqual({ standing: "suspended" });
  await set("reinstate", { ground: "Doubt removed", reason: "The capture was found." });
  await set("withdraw");
  expect(await history()).toEqual(["valid", "suspended", "valid", "withdrawn"]);
  const rows = await ownerRows("SELECT * FROM standings WHERE sequence = 3");
  expect(rows).toMatchObject([
    {
      ...{ certificate_id: certificate.id, standing: "valid", ground: "Doubt removed", set_at: NOW },
      ...{ reason: "The capture was found.", set_by: firm.decider.personId },
    },
  ]);
});

test("tells the holder, with the ground and what may be done about it", async () => {
  await set("suspend");
  const [mail] = await rowsOf<{ id: string; subject: string; body: string }>("mails");
  expect(mail!.subject).toBe(`Certificate ${NUMBER} is suspended`);
  expect(mail!.body).toMatch(/Competence in doubt\n[^]*Do not present it as valid[^]*appeal/);
  await set("reinstate", { ground: "Doubt removed" });
  const [, second] = await ownerRows<{ id: string; body: string }>("SELECT * FROM mails ORDER BY written_at");
  expect(second!.body).not.toContain("Do not present it");
  expect(await jobsOf("send-mail")).toEqual([{ mailId: mail!.id }, { mailId: second!.id }]);
});

test("stands in the trail with who did it, and for which firm", async () => {
  await set("withdraw");
  const [row] = await ownerRows<{ id: string }>("SELECT id FROM standings WHERE sequence = 2");
  const employer = firm.employer.id;
  expect(await trailOf(firm.decider)).toEqual([{ act: "standings added", employer, key: row!.id }]);
});

test.each<[StandingAct[], StandingAct]>([
  [[], "reinstate"],
  [["suspend"], "suspend"],
  [["withdraw"], "suspend"],
  [["withdraw"], "reinstate"],
  [["withdraw"], "withdraw"],
])("after %j, %s is refused", async (earlier, what) => {
  for (const one of earlier) await set(one);
  await refused(() => set(what), "ConflictError", /^This certificate is \w+; it cannot be/);
});

test("a superseded certificate stays superseded", async () => {
  await makeStanding(firm, certificate, { standing: "superseded", ground: "Name corrected" });
  for (const what of ["suspend", "reinstate", "withdraw"] as const) {
    await refused(() => set(what), "ConflictError", /is superseded/);
  }
});

test("two deciders at once set it once", async () => {
  const second = await makeActor(firm.employer, ["decider"], { passwordAt: NOW });
  const both = await Promise.allSettled(
    [firm.decider, second].map((actor) => setStanding(actor, act("withdraw"), NOW)),
  );
  expect(both.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
  expect(await history()).toEqual(["valid", "withdrawn"]);
  expect(await rowsOf("mails")).toHaveLength(1);
});

describe("refuses", () => {
  test("any other group of the number than its second", async () => {
    for (const group of ["", "0A1B2", "3C4D6", NUMBER]) {
      await refused(() => set("withdraw", { group }), "InvalidError", /second group of the number, 3C4D5/);
    }
    await set("withdraw", { group: " 3c4d5 " });
  });

  test("without signing in afresh", async () => {
    const signed = (passwordAt: Date | null) => setStanding({ ...firm.decider, passwordAt }, act("withdraw"), NOW);
    const tooLongAgo = new Date(NOW.getTime() - 5 * 60_000 - 1);
    for (const at of [null, tooLongAgo]) await refused(() => signed(at), "SignInAfreshError", /password again/);
  });

  test("the holder, decider or not", async () => {
    const both = await makeActor(firm.employer, ["technician", "decider"], { passwordAt: NOW });
    const assignment = await makeAssignment(firm, { technicianId: both.personId });
    const decision = await makeDecision(firm, { sitting: await makeSitting(firm, { assignment }) });
    const own = await makeCertificate(firm, { decision, number: "LM-0A1B2-9C4D5-F" });
    const doing = () => setStanding(both, act("suspend", { number: own.number, group: "9C4D5" }), NOW);
    await refused(doing, "ForbiddenError", /You may not change the standing/);
  });

  refusals({
    allowed: "decider",
    setting: () => ({ firm, other, id: NUMBER }),
    noSuchId: NO_SUCH,
    act: (actor, number) => setStanding(actor, act("withdraw", { number }), NOW),
  });
});

test("a failure at the end leaves neither standing nor mail", () =>
  expectNothingLeft("standings", () => set("withdraw")));
