"use client";
import Link from "next/link";
import { useActionState, useState } from "react";
import { messageOf, type FormAction } from "@/components/ui/actionResult";
import { formatDay } from "@/components/ui/formatDay";
import { formatMoney } from "@/components/ui/formatMoney";
import { Notice } from "@/components/ui/Notice";
import { SectionHead } from "@/components/ui/SectionHead";
import { SubmitKey } from "@/components/ui/SubmitKey";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import type { FeeLine } from "@/lib/queries/getCounter";

/** Fees that are due; one card payment may cover several. */
export function DueFees({ employer, fees, action }: { employer: string; fees: FeeLine[]; action: FormAction }) {
  const [result, send] = useActionState(action, null);
  const free = fees.filter((fee) => !fee.orderId);
  const [chosen, setChosen] = useState<ReadonlySet<string>>(new Set(free.map(({ id }) => id)));
  const total = free.filter(({ id }) => chosen.has(id)).reduce((sum, { amountMinor }) => sum + amountMinor, 0);
  const currency = fees[0]!.currency;
  const toggle = (id: string) => {
    const next = new Set(chosen);
    if (!next.delete(id)) next.add(id);
    setChosen(next);
  };
  return (
    <form action={send} className="grid gap-x-14 gap-y-8 desk:grid-cols-[2fr_1fr]">
      <input type="hidden" name="employer" value={employer} />
      <section aria-labelledby="due">
        <SectionHead title="Due now" id="due" />
        <Table reflow caption="Fees that are due">
          <thead>
            <tr>
              <Th>Pay</Th>
              <Th>Technician</Th>
              <Th>Sitting of</Th>
              <Th>Assigned</Th>
              <Th figure>Fee</Th>
            </tr>
          </thead>
          <tbody>
            {fees.map((fee) => (
              <Tr key={fee.id}>
                <Td label="Pay">
                  {fee.orderId ? (
                    <Link className="link" href={`/${employer}/counter/orders/${fee.orderId}`}>
                      in an order
                    </Link>
                  ) : (
                    <input
                      type="checkbox"
                      name="fee"
                      value={fee.id}
                      className="check-box"
                      aria-label={`Pay the fee of ${fee.technician}, ${fee.code}`}
                      checked={chosen.has(fee.id)}
                      onChange={() => toggle(fee.id)}
                    />
                  )}
                </Td>
                <RowHead>{fee.technician}</RowHead>
                <Td label="Sitting of">
                  {fee.code} {fee.title}, release {fee.release}
                </Td>
                <Td label="Assigned">{formatDay(fee.dueAt)}</Td>
                <Td label="Fee" figure>
                  {formatMoney(fee.amountMinor, fee.currency)}
                </Td>
              </Tr>
            ))}
          </tbody>
        </Table>
        <p className="mt-4 flex items-baseline justify-end gap-8">
          <span className="font-semibold">To pay</span>
          <span className="text-readout-l value">{formatMoney(total, currency)}</span>
        </p>
      </section>
      <section aria-labelledby="how">
        <SectionHead title="How to pay" id="how" />
        <p className="mt-3 text-dense text-ink-2">
          By card. You go to the card processor&rsquo;s page and come back here. The card number is never seen or kept
          by Lagmark. If you close that page nothing is charged, and the order waits here.
        </p>
        {messageOf(result) && (
          <Notice tone="minus" fact={messageOf(result)!} live className="mt-4">
            Nothing was charged.
          </Notice>
        )}
        <div className="mt-5">
          <SubmitKey wide reason={total === 0 ? "Choose at least one fee." : null}>
            {total === 0 ? "Pay by card" : `Pay ${formatMoney(total, currency)} by card`}
          </SubmitKey>
        </div>
        <p className="mt-4 text-label font-normal text-ink-2">
          A fee can be refunded only while no case of its sitting has been drawn.
        </p>
      </section>
    </form>
  );
}
