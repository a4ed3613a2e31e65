"use client";
import { SmallCurve } from "@/components/calculators/SmallCurve";
import { CALCULATORS } from "@/lib/calculators/calculators";
import { BenchLink } from "./BenchLink";

/** Calculators by number and question, each drawn by its own small curve. */
export function BenchList({ open, heading: Heading }: { open: string; heading: "h1" | "h2" }) {
  return (
    <nav className="bench-list" aria-label="Calculators">
      <div className="bench-head">
        <Heading id="bench" tabIndex={-1} className="text-h2">
          Bench
        </Heading>
        <span className="text-label font-normal text-ink-2">{CALCULATORS.length} calculators</span>
      </div>
      <ul className="bench-entries">
        {CALCULATORS.map(({ id, tag, number, name, question }) => (
          <li key={id}>
            <BenchLink id={id} className="bench-entry" aria-current={id === open ? "page" : undefined}>
              <SmallCurve tag={tag} />
              <span className="min-w-0">
                <span className="block font-semibold">
                  <span className="mr-1.5 font-normal text-ink-2 figures">K{number}</span>
                  {name}
                </span>
                <span className="block text-label font-normal text-ink-2">{question}</span>
              </span>
            </BenchLink>
          </li>
        ))}
      </ul>
      <p className="px-4 py-4 pl-(--margin) text-label font-normal text-ink-2">
        The engine here is the engine that marks. Nothing you type leaves this device.
      </p>
    </nav>
  );
}
