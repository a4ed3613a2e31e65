import type { Metadata } from "next";
import { Empty } from "@/components/ui/Empty";
import { formatDay, formatInstant } from "@/components/ui/formatDay";
import { formatMoney } from "@/components/ui/formatMoney";
import { Glyph } from "@/components/ui/Glyph";
import { LinkKey } from "@/components/ui/LinkKey";
import { SectionHead } from "@/components/ui/SectionHead";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { getCounter, type OrderLine } from "@/lib/queries/getCounter";
import { DueFees } from "./_components/DueFees";
import { orderFeesAction } from "./actions";

export const metadata: Metadata = { title: "Counter" };

export default async function CounterPage({ params }: { params: Promise<{ employer: string }> }) {
  const { employer } = await params;
  const { due, settled, orders } = await orNotFound(getCounter(await requireActor(employer)));
  return (
    <div className="page py-8 desk:py-10">
      <h1 className="text-h1">Counter</h1>
      <p className="mt-2 max-w-measure text-lead text-ink-2">
        One fee for each sitting and its decision, certificate included. The line is the same whatever the outcome.
      </p>
      <div className="mt-8">
        {due.length > 0 ? (
          <DueFees employer={employer} fees={due} action={orderFeesAction} />
        ) : (
          <Empty title="No fee is due">
            A fee falls due when a sitting is assigned, before its first case is drawn.
          </Empty>
        )}
      </div>
      {orders.length > 0 && <Orders employer={employer} orders={orders} />}
      {settled.length > 0 && (
        <section className="mt-10" aria-labelledby="settled">
          <SectionHead title="Settled" id="settled" note="Refundable only while no case has been drawn" />
          <Table reflow caption="Settled fees">
            <thead>
              <tr>
                <Th>Technician</Th>
                <Th>Sitting of</Th>
                <Th>Settled</Th>
                <Th>Case</Th>
                <Th figure>Fee</Th>
              </tr>
            </thead>
            <tbody>
              {settled.map((fee) => (
                <Tr key={fee.id}>
                  <RowHead>{fee.technician}</RowHead>
                  <Td label="Sitting of">
                    {fee.code} {fee.title}, release {fee.release}
                  </Td>
                  <Td label="Settled">{formatDay(fee.settledAt!)}</Td>
                  <Td label="Case">{fee.caseDrawn ? "drawn" : "none drawn yet"}</Td>
                  <Td label="Fee" figure>
                    {formatMoney(fee.amountMinor, fee.currency)}
                  </Td>
                </Tr>
              ))}
            </tbody>
          </Table>
        </section>
      )}
    </div>
  );
}

function Orders({ employer, orders }: { employer: string; orders: OrderLine[] }) {
  return (
    <section className="mt-10" aria-labelledby="orders">
      <SectionHead title="Orders" id="orders" />
      <Table reflow caption="Orders">
        <thead>
          <tr>
            <Th>Ordered</Th>
            <Th>By</Th>
            <Th>State</Th>
            <Th figure>Sittings</Th>
            <Th figure>Amount</Th>
            <Th />
          </tr>
        </thead>
        <tbody>
          {orders.map((order) => (
            <Tr key={order.id}>
              <RowHead>{formatInstant(order.orderedAt)}</RowHead>
              <Td label="By">{order.orderedBy}</Td>
              <Td label="State">
                <span className="flex items-center gap-2">
                  <Glyph name={order.paidAt ? "within" : order.closedAt ? "none" : "awaiting"} />
                  {order.paidAt
                    ? `Paid ${formatDay(order.paidAt)}`
                    : order.closedAt
                      ? "Cancelled"
                      : "Waits for payment"}
                </span>
              </Td>
              <Td label="Sittings" figure>
                {order.fees}
              </Td>
              <Td label="Amount" figure>
                {formatMoney(order.amountMinor, order.currency)}
              </Td>
              <Td>
                <LinkKey href={`/${employer}/counter/orders/${order.id}`} size="small">
                  Open the order
                </LinkKey>
              </Td>
            </Tr>
          ))}
        </tbody>
      </Table>
    </section>
  );
}
