import type { ReactNode } from "react";

type ExhibitProps = { number: number; title: string; note?: string; children: ReactNode };

/** One piece of evidence, in the order a decider asks for it. */
export function Exhibit({ number, title, note, children }: ExhibitProps) {
  return (
    <section className="mt-5 border-t-hair border-rule-strong pt-4" aria-labelledby={`exhibit-${number}`}>
      <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1">
        <span className="plate text-h3">Exhibit {number}</span>
        <h2 id={`exhibit-${number}`} className="text-h3">
          {title}
        </h2>
        {note && <span className="text-dense text-ink-2">{note}</span>}
      </div>
      <div className="mt-3">{children}</div>
    </section>
  );
}
