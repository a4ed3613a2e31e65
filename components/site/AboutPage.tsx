import type { ReactNode } from "react";
import { Ledger, type LedgerRow } from "@/components/ui/Ledger";

export type AboutStep = { title: string; text: string };

type AboutPageProps = {
  title: string;
  lead: string;
  steps: readonly AboutStep[];
  facts: readonly LedgerRow[];
  keys: ReactNode;
};

/** A page about the product for one sort of reader: what they get, in the order they meet it, and the facts beside it. */
export function AboutPage({ title, lead, steps, facts, keys }: AboutPageProps) {
  return (
    <>
      <div className="border-b-hair border-rule bg-sheet">
        <div className="page py-10 desk:py-14">
          <h1 className="max-w-[20em] text-h1 desk:text-[3rem] desk:leading-[3.25rem]">{title}</h1>
          <p className="mt-4 max-w-[44em] text-lead text-ink-2">{lead}</p>
          <div className="mt-7 flex flex-wrap gap-3">{keys}</div>
        </div>
      </div>
      <div className="page grid gap-x-14 gap-y-12 py-12 desk:grid-cols-[minmax(0,7fr)_minmax(0,5fr)]">
        <ol className="border-b-line border-rule-strong">
          {steps.map((step, at) => (
            <li
              key={step.title}
              className="grid grid-cols-[40px_minmax(0,1fr)] border-t-line border-rule-strong py-6 tablet:grid-cols-[72px_minmax(0,1fr)]"
            >
              <span className="value text-readout" aria-hidden>
                {at + 1}
              </span>
              <div>
                <h2 className="text-h3 tablet:text-h2">{step.title}</h2>
                <p className="mt-1.5 max-w-measure text-body text-ink-2">{step.text}</p>
              </div>
            </li>
          ))}
        </ol>
        <aside aria-label="In short">
          <Ledger rows={facts} stacked />
        </aside>
      </div>
    </>
  );
}
