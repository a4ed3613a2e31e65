import type { ReactNode } from "react";

export type WorkFact = { label: string; value: ReactNode };

type WorkBarProps = {
  /** What it belongs to, above the title ("Sitting S-20318, case 1 of 2"). */
  eyebrow?: ReactNode;
  title: ReactNode;
  /** Figures with their labels, each behind a rule. */
  facts?: readonly WorkFact[];
  /** Steps, saving state, time left: in the middle. */
  children?: ReactNode;
  /** One key or two. */
  keys?: ReactNode;
};

/** Second row of a working page: name of the thing, its steps or facts, its state, its keys. */
export function WorkBar({ eyebrow, title, facts, children, keys }: WorkBarProps) {
  return (
    <div className="border-b-hair border-rule-strong bg-sheet">
      <div className="page flex min-h-[76px] flex-wrap items-center gap-x-8 gap-y-3 py-2.5">
        <div className="min-w-0 flex-auto">
          {eyebrow && <p className="text-label font-normal text-ink-2">{eyebrow}</p>}
          <h1 className="text-[1.625rem] leading-8">{title}</h1>
        </div>
        {children}
        {facts && facts.length > 0 && (
          <dl className="flex flex-wrap gap-x-5 gap-y-2">
            {facts.map((fact) => (
              <div key={fact.label} className="border-rule tablet:border-l-hair tablet:pl-5">
                <dt className="text-label text-ink-2">{fact.label}</dt>
                <dd className="text-[1.375rem] leading-7 figures">{fact.value}</dd>
              </div>
            ))}
          </dl>
        )}
        {keys && <div className="flex flex-wrap items-center gap-3">{keys}</div>}
      </div>
    </div>
  );
}
