import "server-only";
import type { Transaction } from "sequelize";
import { NotFoundError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { Order } from "@/models";
import { requireId } from "./lockOwn";

export async function lockOwnOrder(actor: Actor, id: string, transaction: Transaction): Promise<Order> {
  requireId(id, "order");
  const where = { id, employerId: actor.employerId };
  const order = await Order.findOne({ where, transaction, lock: transaction.LOCK.UPDATE });
  if (!order) throw new NotFoundError("order");
  authorize(can.payFees(actor, order), "pay this order");
  return order;
}
