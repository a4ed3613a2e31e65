import { beforeEach, describe, expect, test } from "vitest";
import { orderFees } from "@/lib/commands/orderFees";
import { makeAssignment, settleFee } from "../support/chain";
import { NOW } from "../support/clock";
import { makeActor, makeFirm, type Firm } from "../support/factories";
import { owner, ownerRows } from "../support/owner";
import { everythingStored, expectNothingLeft, rowsOf, trailOf } from "../support/written";

let firm: Firm;
let other: Firm;
let feeIds: string[];
beforeEach(async () => {
  [firm, other] = [await makeFirm(), await makeFirm()];
  feeIds = [await makeFee(firm), await makeFee(firm)];
});

async function makeFee(of: Firm): Promise<string> {
  const assignment = await makeAssignment(of);
  return (await ownerRows<{ id: string }>("SELECT id FROM fees WHERE assignment_id = $1", [assignment.id]))[0]!.id;
}
const close = (id: string) => ownerRows("UPDATE orders SET closed_at = $1 WHERE id = $2", [NOW, id]);

test("one order carries the chosen fees and their sum", async () => {
  const { id } = await orderFees(firm.administrator, feeIds, NOW);
  expect(await rowsOf("orders")).toMatchObject([
    {
      ...{ id, employer_id: firm.employer.id, ordered_by: firm.administrator.personId, ordered_at: NOW },
      // Twice 192 pounds.
      ...{ amount_minor: 38_400, currency: "gbp", paid_at: null, closed_at: null },
    },
  ]);
  expect(await rowsOf("fees")).toMatchObject([
    { order_id: id, settled_at: null },
    { order_id: id, settled_at: null },
  ]);
});

test("a fee that is named twice is paid once", async () => {
  await orderFees(firm.administrator, [feeIds[0]!, feeIds[0]!], NOW);
  expect(await rowsOf("orders")).toMatchObject([{ amount_minor: 19_200 }]);
});

test("stands in the trail with who ordered, and for which firm", async () => {
  const { id } = await orderFees(firm.administrator, [feeIds[0]!], NOW);
  const employer = firm.employer.id;
  expect(await trailOf(firm.administrator)).toEqual([
    { act: "orders added", employer, key: id },
    { act: "fees changed", employer, key: feeIds[0] },
  ]);
});

test("run twice, the order that waits is found again, by whichever administrator", async () => {
  const first = await orderFees(firm.administrator, feeIds, NOW);
  const second = await makeActor(firm.employer, ["administrator"]);
  expect(await orderFees(second, [...feeIds].reverse(), NOW)).toEqual(first);
  expect(await rowsOf("orders")).toHaveLength(1);
});

test("two at once get the same order", async () => {
  const [one, two] = await Promise.all([
    orderFees(firm.administrator, feeIds, NOW),
    orderFees(firm.administrator, [...feeIds].reverse(), NOW),
  ]);
  expect(one).toEqual(two);
  expect(await rowsOf("orders")).toHaveLength(1);
});

test("does not wait for whoever holds an order and wants its fees", async () => {
  const { id } = await orderFees(firm.administrator, feeIds, NOW);
  const settling = await owner.connect();
  await settling.query("BEGIN");
  await settling.query("SELECT 1 FROM orders WHERE id = $1 FOR UPDATE", [id]);
  expect(await orderFees(firm.administrator, feeIds, NOW)).toEqual({ id });
  await settling.query("ROLLBACK");
  settling.release();
});

test("fees of a cancelled order are ordered again", async () => {
  const first = await orderFees(firm.administrator, feeIds, NOW);
  await close(first.id);
  const again = await orderFees(firm.administrator, [feeIds[0]!], NOW);
  expect(again.id).not.toBe(first.id);
  expect(await rowsOf("orders")).toHaveLength(2);
});

describe("refuses", () => {
  const refused = async (ids: string[], name: string) => {
    const before = await everythingStored();
    await expect(orderFees(firm.administrator, ids, NOW)).rejects.toMatchObject({ name });
    expect(await everythingStored()).toEqual(before);
  };

  test("no fee at all", () => refused([], "InvalidError"));

  test("a fee that waits in another order, alone or among others", async () => {
    await orderFees(firm.administrator, feeIds, NOW);
    await refused([feeIds[0]!], "ConflictError");
    await refused([...feeIds, await makeFee(firm)], "ConflictError");
  });

  test("a fee that is settled", async () => {
    const assignment = await makeAssignment(firm);
    await settleFee(firm, assignment);
    const [fee] = await ownerRows<{ id: string }>("SELECT id FROM fees WHERE assignment_id = $1", [assignment.id]);
    await refused([fee!.id, feeIds[0]!], "ConflictError");
  });

  test("fees in two currencies", async () => {
    await ownerRows("UPDATE fees SET currency = 'eur' WHERE id = $1", [feeIds[0]]);
    await refused(feeIds, "ConflictError");
  });

  test("another firm's fee among the own", async () => refused([...feeIds, await makeFee(other)], "NotFoundError"));
});

test("refuses everybody but an administrator", async () => {
  const before = await everythingStored();
  for (const role of ["technician", "lead", "assessor", "decider"] as const) {
    await expect(orderFees(firm[role], feeIds, NOW), role).rejects.toMatchObject({ name: "ForbiddenError" });
  }
  expect(await everythingStored()).toEqual(before);
});

test("to another firm's administrator the fee looks like none", async () => {
  const noSuch = orderFees(firm.administrator, ["00000000-0000-4000-8000-000000000000"], NOW);
  await expect(noSuch).rejects.toThrow("There is no such fee.");
  await expect(orderFees(other.administrator, feeIds, NOW)).rejects.toThrow("There is no such fee.");
  await expect(orderFees(firm.administrator, ["no id"], NOW)).rejects.toThrow("There is no such fee.");
});

test("a failure at the end leaves no order", () =>
  expectNothingLeft("orders", () => orderFees(firm.administrator, feeIds, NOW)));
