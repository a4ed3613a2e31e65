import "server-only";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { iso, isId, isoOrNull } from "./findOwn";

type FeeRow = {
  id: string;
  technician: string;
  code: string;
  title: string;
  release: string;
  dueAt: Date;
  amountMinor: number;
  currency: string;
  orderId: string | null;
  settledAt: Date | null;
  caseDrawn: boolean;
};
type OrderRow = {
  id: string;
  amountMinor: number;
  currency: string;
  orderedBy: string;
  orderedAt: Date;
  paidAt: Date | null;
  closedAt: Date | null;
  checkoutUrl: string | null;
  fees: number;
};
export type FeeLine = Omit<FeeRow, "dueAt" | "settledAt"> & { dueAt: string; settledAt: string | null };
export type OrderLine = Omit<OrderRow, "orderedAt" | "paidAt" | "closedAt"> & {
  orderedAt: string;
  paidAt: string | null;
  closedAt: string | null;
};
export type CounterView = { due: FeeLine[]; settled: FeeLine[]; orders: OrderLine[] };
export type OrderView = { order: OrderLine; fees: FeeLine[] };

/** Fees that are due, fees that are settled, and the employer's orders. */
export async function getCounter(actor: Actor): Promise<CounterView> {
  authorize(can.readFees(actor, actor), "read the fees");
  const { employerId } = actor;
  const fees = (
    await select<FeeRow>(`${FEES} WHERE f.employer_id = :employerId ORDER BY f.due_at DESC`, { employerId })
  ).map(feeLine);
  const orders = await select<OrderRow>(
    `${ORDERS} WHERE o.employer_id = :employerId ORDER BY o.ordered_at DESC LIMIT 200`,
    {
      employerId,
    },
  );
  return {
    due: fees.filter((fee) => !fee.settledAt),
    settled: fees.filter((fee) => fee.settledAt),
    orders: orders.map(orderLine),
  };
}

export async function getOrder(actor: Actor, id: string): Promise<OrderView | null> {
  authorize(can.readFees(actor, actor), "read the fees");
  if (!isId(id)) return null;
  const { employerId } = actor;
  const [order] = await select<OrderRow>(`${ORDERS} WHERE o.id = :id AND o.employer_id = :employerId`, {
    id,
    employerId,
  });
  if (!order) return null;
  const fees = await select<FeeRow>(`${FEES} WHERE f.order_id = :id AND f.employer_id = :employerId`, {
    id,
    employerId,
  });
  return { order: orderLine(order), fees: fees.map(feeLine) };
}

const feeLine = (row: FeeRow): FeeLine => ({ ...row, dueAt: iso(row.dueAt), settledAt: isoOrNull(row.settledAt) });
const orderLine = (row: OrderRow): OrderLine => ({
  ...row,
  orderedAt: iso(row.orderedAt),
  paidAt: isoOrNull(row.paidAt),
  closedAt: isoOrNull(row.closedAt),
});

// A fee whose order was cancelled is free to be ordered again.
const FEES = `
  SELECT f.id, p.name AS technician, m.code, r.title, r.number AS release, f.due_at AS "dueAt", f.amount_minor AS "amountMinor",
    f.currency, CASE WHEN o.closed_at IS NULL THEN f.order_id END AS "orderId", f.settled_at AS "settledAt",
    EXISTS (SELECT 1 FROM sittings s JOIN cases c ON c.sitting_id = s.id WHERE s.assignment_id = a.id) AS "caseDrawn"
  FROM fees f JOIN assignments a ON a.id = f.assignment_id JOIN releases r ON r.id = a.release_id
  JOIN modules m ON m.id = r.module_id JOIN people p ON p.id = a.technician_id LEFT JOIN orders o ON o.id = f.order_id`;
const ORDERS = `
  SELECT o.id, o.amount_minor AS "amountMinor", o.currency, p.name AS "orderedBy", o.ordered_at AS "orderedAt", o.paid_at AS "paidAt",
    o.closed_at AS "closedAt", o.checkout_url AS "checkoutUrl", (SELECT count(*)::int FROM fees f WHERE f.order_id = o.id) AS fees
  FROM orders o JOIN people p ON p.id = o.ordered_by`;
