import "server-only";
import type { Transaction } from "sequelize";
import { type Order } from "@/models";

export async function closeOrder(order: Order, now: Date, transaction: Transaction): Promise<void> {
  if (!order.closedAt && !order.paidAt) await order.update({ closedAt: now }, { transaction });
}
