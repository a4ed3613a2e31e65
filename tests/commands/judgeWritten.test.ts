import { beforeEach, describe, expect, test } from "vitest";
import { judgeWritten } from "@/lib/commands/judgeWritten";
import { decide } from "@/lib/commands/decide";
import { makeHandIn, makeWrittenCase, makeWrittenHandIn } from "../support/chain";
import { minutesFrom, NOW } from "../support/clock";
import { grantTo, makeActor, makeFirm, type Firm } from "../support/factories";
import { insert } from "../support/owner";
import { expectNothingLeft, rowsOf, trailOf } from "../support/written";
import { refusals } from "./refusals";

let firm: Firm;
let other: Firm;
let caseId: string;
beforeEach(async () => {
  [firm, other] = [await makeFirm(), await makeFirm()];
  caseId = (await makeWrittenHandIn(firm)).id;
});
const BOTH = [
  { of: "seen", within: true, reason: "" },
  { of: "done", within: false, reason: "Nothing was handed in." },
];
const judge = (verdicts = BOTH, actor = firm.assessor, id = caseId) =>
  judgeWritten(actor, { caseId: id, verdicts }, NOW);
const subjects = async () => (await rowsOf<{ subject: string }>("mails")).map(({ subject }) => subject);

test("makes the marking record, with each line's text, verdict and reason, and who judged", async () => {
  const { id } = await judge();
  expect(await rowsOf("marking_records")).toMatchObject([
    {
      ...{ id, case_id: caseId, sequence: 1, marking: "written@1", judged_by: firm.assessor.personId, marked_at: NOW },
      ...{ met: false, within_count: 1, needs: 2 },
      rows: [
        {
          quantity: "seen",
          handedIn: "Two receivers shadowed by the crane.",
          within: true,
          critical: true,
          reason: null,
        },
        { quantity: "done", handedIn: "", within: false, reason: "Nothing was handed in." },
      ],
      quantities: [
        { of: "seen", within: true },
        { of: "done", within: false },
      ],
    },
  ]);
  const employer = firm.employer.id;
  expect(await trailOf(firm.assessor)).toContainEqual({ act: "marking_records added", employer, key: id });
});

test("completes the sitting: the technician is told of the record, the deciders that it is theirs", async () => {
  await judge();
  expect((await subjects()).sort()).toEqual([expect.stringMatching("^For decision"), "Marked: What you saw"]);
});

test("judged twice, also at once, the first record stays and nobody is told twice", async () => {
  const [one, two] = await Promise.all([judge(), judge()]);
  expect(two).toEqual(one);
  expect(await judge(BOTH.map((verdict) => ({ ...verdict, within: true })))).toEqual(one);
  expect(await rowsOf("marking_records")).toHaveLength(1);
  expect(await subjects()).toHaveLength(2);
});

test("whoever judged does not decide on the sitting", async () => {
  await grantTo(firm.assessor.personId, firm.employer.id, "decider");
  await judge();
  const [record] = await rowsOf<{ case_id: string }>("marking_records");
  const [found] = (await rowsOf<{ id: string; sitting_id: string }>("cases")).filter(
    ({ id }) => id === record!.case_id,
  );
  const signed = { sittingId: found!.sitting_id, outcome: "not yet competent" as const, reason: "r", declaration: "d" };
  const decider = {
    ...firm.assessor,
    roles: ["assessor" as const, "decider" as const],
    passwordAt: minutesFrom(NOW, -1),
  };
  await expect(decide(decider, signed, NOW)).rejects.toThrow(/You judged a line of this sitting/);
});

describe("refuses", () => {
  test.each([
    ["a line without a verdict", BOTH.slice(0, 1)],
    ["two verdicts on one line", [BOTH[0]!, BOTH[0]!]],
    ["a line that there is not", [BOTH[0]!, { of: "else", within: true, reason: "" }]],
    ["outside without a reason", [BOTH[0]!, { of: "done", within: false, reason: "  " }]],
  ])("%s", async (_what, verdicts) => {
    await expect(judge(verdicts)).rejects.toMatchObject({ name: "InvalidError" });
    expect(await rowsOf("marking_records")).toEqual([]);
  });

  test("who sat the case, with whatever role", async () => {
    await grantTo(firm.technician.personId, firm.employer.id, "assessor");
    const both = { ...firm.technician, roles: ["technician" as const, "assessor" as const] };
    await expect(judge(BOTH, both)).rejects.toMatchObject({ name: "ForbiddenError" });
  });

  test("a second assessor after the first", async () => {
    await judge();
    await expect(judge(BOTH, await makeActor(firm.employer, ["assessor"]))).rejects.toThrow(/judged this case already/);
  });

  test("a case that is open, and one that the server marks", async () => {
    const { id } = await makeWrittenCase(firm);
    await expect(judge(BOTH, firm.assessor, id)).rejects.toThrow(/not handed in yet/);
    const { id: computed } = await makeHandIn(firm);
    await expect(judge(BOTH, firm.assessor, computed)).rejects.toThrow(/The server marks this case/);
  });

  refusals({
    allowed: "assessor",
    setting: () => ({ firm, other, id: caseId }),
    act: (actor, id) => judge(BOTH, actor, id),
  });
});

test("a failure at the end leaves nothing", () => expectNothingLeft("marking_records", () => judge()));

// Whatever command asks: the database knows who may add a record by hand.
describe("the table refuses", () => {
  const record = (over: object) =>
    insert("marking_records", {
      ...{
        caseId,
        sequence: 1,
        marking: "written@1",
        engineVersion: "1.0.0",
        rows: [],
        quantities: [],
        withinCount: 0,
      },
      ...{ needs: 1, met: true, workings: [], durationMs: 0, markedAt: NOW, judgedBy: firm.assessor.personId },
      ...over,
    });
  const broken = (what: Promise<unknown>, constraint: string) => expect(what).rejects.toMatchObject({ constraint });

  test("a written case that nobody judged", () => broken(record({ judgedBy: null }), "marking_records_hand"));
  test("a person's verdict on a case that the server marks", async () => {
    const { id } = await makeHandIn(firm);
    await broken(record({ caseId: id }), "marking_records_hand");
  });
  test("the technician and who is no assessor there", async () => {
    await broken(record({ judgedBy: firm.technician.personId }), "marking_records_judge");
    await broken(record({ judgedBy: firm.lead.personId }), "marking_records_judge");
    await broken(record({ judgedBy: other.assessor.personId }), "marking_records_judge");
  });
});
