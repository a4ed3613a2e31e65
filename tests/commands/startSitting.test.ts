import { beforeEach, describe, expect, test } from "vitest";
import { startSitting } from "@/lib/commands/startSitting";
import { makeAssignment, makeRelease, settleFee } from "../support/chain";
import { NOW } from "../support/clock";
import { makeActor, makeFirm, type Firm } from "../support/factories";
import { frontMatter } from "../support/samples";
import { everythingStored, expectNothingLeft, rowsOf, trailOf } from "../support/written";
import { refusals } from "./refusals";

let firm: Firm;
let other: Firm;
let assignment: Awaited<ReturnType<typeof makeAssignment>>;
beforeEach(async () => {
  [firm, other] = [await makeFirm(), await makeFirm()];
  assignment = await makeAssignment(firm);
});
const settled = () => settleFee(firm, assignment);

test("starts the sitting of the assigned release, with the conditions accepted", async () => {
  await settled();
  const { id } = await startSitting(firm.technician, assignment.id, NOW);
  expect(await rowsOf("sittings")).toEqual([
    {
      ...{ id, number: "20001", assignment_id: assignment.id, release_id: assignment.releaseId, terms: "2026-12" },
      ...{ technician_id: firm.technician.personId, employer_id: firm.employer.id, started_at: NOW },
      // Thirty days, 1 December counted.
      last_day: "2026-12-30",
    },
  ]);
});

test("counts the days where the firm is", async () => {
  // At 10:00 UTC on 1 December it is 2 December on Kiritimati, UTC+14.
  const east = await makeFirm({ timeZone: "Pacific/Kiritimati" });
  const sitting = { days: 1, freshCases: 0, waitHours: 0 };
  const release = await makeRelease(east, { frontMatter: frontMatter({ sitting }) });
  const there = await makeAssignment(east, { release });
  await settleFee(east, there);
  await startSitting(east.technician, there.id, NOW);
  expect(await rowsOf("sittings")).toMatchObject([{ last_day: "2026-12-02" }]);
});

test("stands in the trail with who started, and for which firm", async () => {
  await settled();
  const { id } = await startSitting(firm.technician, assignment.id, NOW);
  expect(await trailOf(firm.technician)).toEqual([{ act: "sittings added", employer: firm.employer.id, key: id }]);
});

test("run twice, also at once, it is one sitting", async () => {
  await settled();
  const start = () => startSitting(firm.technician, assignment.id, NOW);
  const [one, two] = await Promise.all([start(), start()]);
  expect(two).toEqual(one);
  expect(await start()).toEqual(one);
  expect(await rowsOf("sittings")).toHaveLength(1);
});

describe("refuses", () => {
  test("as long as the fee is open", async () => {
    const before = await everythingStored();
    const started = startSitting(firm.technician, assignment.id, NOW);
    await expect(started).rejects.toMatchObject({
      name: "ConflictError",
      publicMessage: expect.stringMatching(/^The fee .* is open/),
    });
    expect(await everythingStored()).toEqual(before);
  });

  test("another technician of the firm", async () => {
    await settled();
    const second = await makeActor(firm.employer, ["technician"]);
    const started = startSitting(second, assignment.id, NOW);
    await expect(started).rejects.toMatchObject({ name: "ForbiddenError" });
    expect(await rowsOf("sittings")).toEqual([]);
  });

  refusals({
    allowed: "technician",
    setting: () => ({ firm, other, id: assignment.id }),
    act: (actor, id) => startSitting(actor, id, NOW),
  });
});

test("a failure at the end leaves no sitting", async () => {
  await settled();
  await expectNothingLeft("sittings", () => startSitting(firm.technician, assignment.id, NOW));
});
