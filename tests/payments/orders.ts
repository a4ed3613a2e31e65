import { orderFees } from "@/lib/commands/orderFees";
import { makeAssignment } from "../support/chain";
import { NOW } from "../support/clock";
import type { Firm } from "../support/factories";
import { ownerRows } from "../support/owner";

export type Order = { id: string; amountMinor: number; currency: string; paidAt: Date | null; closedAt: Date | null };

/** Fees of so many assignments, due and open. */
export async function makeFees(firm: Firm, count: number): Promise<string[]> {
  const ids: string[] = [];
  for (let n = 0; n < count; n += 1) {
    const { id } = await makeAssignment(firm);
    const [fee] = await ownerRows<{ id: string }>("SELECT id FROM fees WHERE assignment_id = $1", [id]);
    ids.push(fee!.id);
  }
  return ids;
}

export const orderOf = async (id: string): Promise<Order> =>
  (
    await ownerRows<Order>(
      `SELECT id, amount_minor AS "amountMinor", currency, paid_at AS "paidAt", closed_at AS "closedAt"
       FROM orders WHERE id = $1`,
      [id],
    )
  )[0]!;

/** An order that waits to be paid, for so many fees. */
export async function makeOrder(firm: Firm, fees: readonly string[]): Promise<Order> {
  return orderOf((await orderFees(firm.administrator, fees, NOW)).id);
}

export const settledFees = async (orderId: string) =>
  (
    await ownerRows<{ at: Date | null }>("SELECT settled_at AS at FROM fees WHERE order_id = $1 ORDER BY id", [orderId])
  ).map(({ at }) => at);
