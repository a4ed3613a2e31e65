import "server-only";
import { Op, type Transaction } from "sequelize";
import { ConflictError, InvalidError, NotFoundError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { Fee, Order } from "@/models";
import { requireId } from "./lockOwn";
import { transact } from "./transact";

/** Put open fees of the employer into one order, to be paid by one card payment. */
export const orderFees = (actor: Actor, feeIds: readonly string[], now = new Date()) =>
  transact(actor, async (transaction) => {
    authorize(can.payFees(actor, actor), "pay fees");
    if (feeIds.length === 0) throw new InvalidError("Choose at least one fee.");
    feeIds.forEach((id) => requireId(id, "fee"));
    const where = { id: { [Op.in]: [...feeIds] }, employerId: actor.employerId };
    const fees = await Fee.findAll({ where, order: ["id"], transaction, lock: transaction.LOCK.UPDATE });
    if (fees.length !== new Set(feeIds).size) throw new NotFoundError("fee");
    if (fees.some((fee) => fee.settledAt)) throw new ConflictError("One of these fees is settled already.");
    const waiting = await openOrderOf(fees, transaction);
    if (waiting) return { id: waiting.id };
    const { currency } = fees[0]!;
    if (fees.some((fee) => fee.currency !== currency))
      throw new ConflictError("These fees are in different currencies.");
    const order = await Order.create(
      {
        employerId: actor.employerId,
        amountMinor: fees.reduce((sum, fee) => sum + fee.amountMinor, 0),
        currency,
        orderedBy: actor.personId,
        orderedAt: now,
      },
      { transaction },
    );
    for (const fee of fees) await fee.update({ orderId: order.id }, { transaction });
    return { id: order.id };
  });

/** Pressing the key twice finds the order of the first press; a fee that waits in another order is not paid twice. */
async function openOrderOf(fees: Fee[], transaction: Transaction): Promise<Order | null> {
  const orderIds = [...new Set(fees.map((fee) => fee.orderId).filter((id): id is string => id !== null))];
  if (orderIds.length === 0) return null;
  const where = { id: { [Op.in]: orderIds }, closedAt: null };
  // Not locked: an event settles its order first and the fees afterwards, so the two would wait for each other.
  const open = await Order.findAll({ where, transaction });
  if (open.length === 0) return null;
  const sameFees =
    open.length === 1 && (await Fee.count({ where: { orderId: open[0]!.id }, transaction })) === fees.length;
  if (sameFees && fees.every((fee) => fee.orderId === open[0]!.id)) return open[0]!;
  throw new ConflictError(
    "One of these fees waits in an order that is not finished. Finish or cancel that order first.",
  );
}
