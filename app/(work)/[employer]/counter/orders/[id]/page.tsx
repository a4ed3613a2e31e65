import type { Metadata } from "next";
import { formatInstant } from "@/components/ui/formatDay";
import { formatMoney } from "@/components/ui/formatMoney";
import { Ledger } from "@/components/ui/Ledger";
import { LinkKey } from "@/components/ui/LinkKey";
import { SectionHead } from "@/components/ui/SectionHead";
import { StatusHead } from "@/components/ui/StatusHead";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { getOrder } from "@/lib/queries/getCounter";
import { WaitingOrder } from "../../_components/WaitingOrder";
import { cancelOrderAction, payOrderAction } from "../../actions";

export const metadata: Metadata = { title: "Order" };

type Props = { params: Promise<{ employer: string; id: string }>; searchParams: Promise<{ left?: string }> };

export default async function OrderPage({ params, searchParams }: Props) {
  const { employer, id } = await params;
  const { order, fees } = await orNotFound(getOrder(await requireActor(employer), id));
  const amount = formatMoney(order.amountMinor, order.currency);
  const left = (await searchParams).left !== undefined;
  return (
    <div className="page grid gap-x-14 gap-y-10 py-8 desk:grid-cols-[2fr_1fr] desk:py-10">
      <div>
        {order.paidAt ? (
          <>
            <StatusHead standing="valid" word="Paid" aside={amount} size="small" />
            <p className="mt-5 max-w-measure text-lead">
              {fees.length === 1 ? "The sitting is open." : `${fees.length} sittings are open.`} Each technician has
              been written to. Nothing else is charged later, whatever the outcome.
            </p>
          </>
        ) : order.closedAt ? (
          <>
            <h1 className="text-h1">Order cancelled</h1>
            <p className="mt-3 max-w-measure text-lead">Nothing was charged. Its fees are due at the counter again.</p>
          </>
        ) : (
          <WaitingOrder
            employer={employer}
            orderId={order.id}
            amount={amount}
            left={left}
            pay={payOrderAction}
            cancel={cancelOrderAction}
          />
        )}
        {fees.length > 0 && (
          <section className="mt-8" aria-labelledby="fees">
            <SectionHead title="Sittings in this order" id="fees" />
            <Table reflow caption="Sittings in this order">
              <thead>
                <tr>
                  <Th>Technician</Th>
                  <Th>Sitting of</Th>
                  <Th figure>Fee</Th>
                </tr>
              </thead>
              <tbody>
                {fees.map((fee) => (
                  <Tr key={fee.id}>
                    <RowHead>{fee.technician}</RowHead>
                    <Td label="Sitting of">
                      {fee.code} {fee.title}, release {fee.release}
                    </Td>
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
      <aside>
        <SectionHead title={order.paidAt ? "Receipt" : "Order"} />
        <Ledger
          narrow
          rows={[
            { label: "Order", value: <span className="font-code">{order.id.slice(0, 8).toUpperCase()}</span> },
            { label: "Ordered", value: formatInstant(order.orderedAt) },
            { label: "By", value: order.orderedBy },
            { label: "Paid", value: order.paidAt ? formatInstant(order.paidAt, { seconds: true }) : "–" },
            { label: "Total", value: amount },
          ]}
        />
        <div className="mt-6">
          <LinkKey href={`/${employer}/counter`}>Back to the counter</LinkKey>
        </div>
      </aside>
    </div>
  );
}
