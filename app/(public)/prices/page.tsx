import type { Metadata } from "next";
import { formatMoney } from "@/components/ui/formatMoney";
import { Ledger } from "@/components/ui/Ledger";
import { LinkKey } from "@/components/ui/LinkKey";
import { SectionHead } from "@/components/ui/SectionHead";
import { SITTING_FEE } from "@/lib/price";

export const metadata: Metadata = {
  title: "Prices",
  description: "One fee a sitting, whatever the outcome; the certificate is in it.",
};

const INCLUDED = [
  { label: "Cases", value: "One for each check of the module", detail: "and the fresh cases that the release allows" },
  { label: "Marking", value: "Every quantity computed again", detail: "with the workings" },
  { label: "Decision", value: "Competent or not yet competent", detail: "with reasons, signed" },
  { label: "Certificate", value: "Signed PDF and register entry", detail: "when the decision is competent" },
  { label: "Correction", value: "A wrong name is put right", detail: "the old certificate is superseded" },
];

const FREE = [
  { label: "Verifying", value: "One certificate or its PDF", detail: "by anyone, without an account" },
  { label: "Bench", value: "All calculators", detail: "without an account" },
  { label: "Modules", value: "Writing, trying, releasing", detail: "as many as you need" },
  { label: "People", value: "No charge by seat", detail: "technicians keep their certificates" },
];

export default function PricesPage() {
  return (
    <div className="half-sheet">
      <div className="mx-auto grid max-w-content desk:grid-cols-[minmax(0,2fr)_minmax(0,1fr)]">
        <div className="bg-sheet">
          <div className="page py-10 desk:py-14 desk:pr-14">
            <h1 className="text-h1">One fee a sitting, whatever the outcome</h1>
            <p className="mt-4 text-[4rem] leading-[4.5rem] value">
              {formatMoney(SITTING_FEE.amountMinor, SITTING_FEE.currency)}
            </p>
            <p className="text-lead text-ink-2">for one sitting and its decision, certificate included</p>
            <SectionHead title="What the fee includes" className="mt-12" />
            <Ledger rows={INCLUDED} />
            <SectionHead title="What costs nothing" className="mt-12" />
            <Ledger rows={FREE} />
          </div>
        </div>
        <aside className="px-(--margin) py-10 desk:px-10 desk:py-14">
          <SectionHead title="Why it never depends on the outcome" />
          <p className="text-dense">
            Whoever is paid for certificates has a reason to issue them. The fee pays for the sitting and for a decision
            that may go either way; the invoice line reads the same for both.
          </p>
          <SectionHead title="When it is due" className="mt-10" />
          <p className="text-dense">
            Before the first case is drawn: by card, or on the employer&rsquo;s account. One payment may cover several
            sittings. Card details are typed on the payment provider&rsquo;s page and are never seen here.
          </p>
          <SectionHead title="When it is given back" className="mt-10" />
          <p className="text-dense">
            While no case has been drawn, in full. From then on data have been made for one person, and the fee stays.
          </p>
          <SectionHead title="After not yet competent" className="mt-10" />
          <p className="text-dense">
            A new sitting can be assigned, with new data and a new fee. Nobody is charged without being asked.
          </p>
          <p className="mt-10">
            <LinkKey href="/employers">What an employer gets</LinkKey>
          </p>
        </aside>
      </div>
    </div>
  );
}
