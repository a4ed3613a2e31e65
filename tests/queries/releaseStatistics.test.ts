import { beforeEach, expect, test } from "vitest";
import { getReleaseStatistics } from "@/lib/queries/getReleaseStatistics";
import {
  makeAssignment,
  makeHandIn,
  makeMarkingRecord,
  makeOpenCase,
  makeRelease,
  makeSitting,
  makeCase,
} from "../support/chain";
import { minutesFrom, NOW } from "../support/clock";
import { makeFirm, type Firm } from "../support/factories";
import { checkPlan, LAG, markedRow } from "../support/samples";

let firm: Firm;
let release: Awaited<ReturnType<typeof makeRelease>>;
beforeEach(async () => {
  firm = await makeFirm();
  const checks = [checkPlan(), checkPlan({ id: "second", title: "Read another" })];
  release = await makeRelease(firm, { checks });
});

const sitting = async () => makeSitting(firm, { assignment: await makeAssignment(firm, { release }) });

/** A case opened ten minutes before NOW, handed in after so many minutes. */
async function handedIn(given: { sitting: { id: string }; checkId?: string; number?: number }, minutes: number) {
  const open = await makeOpenCase(firm, { case: await makeCase(firm, given) });
  return makeHandIn(firm, { case: open, handedInAt: minutesFrom(NOW, minutes - 10) });
}

test("a release without a marked case has its checks and nothing of them", async () => {
  await handedIn({ sitting: await sitting() }, 3);
  const figures = await getReleaseStatistics(firm.lead, release.id);
  expect(figures).toMatchObject({ sittings: 0, review: { sittings: 100, day: "2027-11-11" } });
  expect(figures!.checks.map(({ title, cases, bounds }) => [title, cases, bounds])).toEqual([
    ["Read a correlator trace", 0, null],
    ["Read another", 0, null],
  ]);
});

test("the newest record of a case counts, fresh cases stand apart, other releases do not come in", async () => {
  const [one, two] = [await sitting(), await sitting()];
  const first = await handedIn({ sitting: one }, 4);
  await makeMarkingRecord(firm, { case: first, met: true });
  const rows = [
    { ...markedRow(false), errorClass: "sign" },
    { ...markedRow(false), errorClass: "sign" },
    markedRow(true),
  ];
  await makeMarkingRecord(firm, { case: first, met: false, sequence: 2, reason: "marked again", rows });
  await makeMarkingRecord(firm, { case: await handedIn({ sitting: one, number: 2 }, 1), met: true });
  await makeMarkingRecord(firm, { case: await handedIn({ sitting: two }, 8), met: true });
  await makeMarkingRecord(firm, { case: await handedIn({ sitting: two, checkId: "second" }, 5), met: false });
  await makeMarkingRecord(firm, { met: false });
  const figures = await getReleaseStatistics(firm.lead, release.id);
  expect(figures).toMatchObject({ sittings: 2 });
  expect(figures!.checks).toMatchObject([
    {
      ...{ checkId: "reading", cases: 2, met: 1, fresh: { cases: 1, met: 1 }, byClock: 0 },
      ...{ minutes: { lower: 4, middle: 6, upper: 8 }, discrimination: "too few" },
      errors: [{ quantity: LAG, errorClass: "sign", cases: 1 }],
    },
    { checkId: "second", cases: 1, met: 0, errors: [{ quantity: LAG, errorClass: null, cases: 1 }] },
  ]);
});
