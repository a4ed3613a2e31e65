import type { Metadata } from "next";
import Link from "next/link";
import { SearchPlan } from "@/components/calculators/SearchPlan";
import { TwoCodes } from "@/components/calculators/TwoCodes";
import { SectionHead } from "@/components/ui/SectionHead";

export const metadata: Metadata = {
  title: "Bench",
  description: "Calculators for receiver work, on the same engine the checks are marked with.",
};

const CALCULATORS = [
  { id: "two-codes", name: "Two codes", question: "How alike are these two?" },
  { id: "search-plan", name: "Search planner", question: "Will it find it, and when?" },
] as const;

export default async function BenchPage({ searchParams }: { searchParams: Promise<{ open?: string }> }) {
  const asked = (await searchParams).open;
  const open = CALCULATORS.find(({ id }) => id === asked) ?? CALCULATORS[0];
  return (
    <div className="page grid gap-x-10 gap-y-6 py-7 desk:grid-cols-[15rem_1fr]">
      <div>
        <h1 className="text-h1">Bench</h1>
        <p className="mt-2 text-dense text-ink-2">
          The engine here is the engine that marks. Nothing you type leaves this device.
        </p>
        <nav aria-label="Calculators" className="mt-5 border-t-hair border-rule-strong">
          {CALCULATORS.map(({ id, name, question }) => (
            <Link
              key={id}
              href={`/bench?open=${id}`}
              aria-current={id === open.id ? "page" : undefined}
              className="menu-item flex-col items-start border-b-hair border-rule"
            >
              <span className="font-semibold">{name}</span>
              <span className="text-label font-normal text-ink-2">{question}</span>
            </Link>
          ))}
        </nav>
      </div>
      <section aria-labelledby="open" className="min-w-0 bg-sheet p-4 tablet:p-7">
        <SectionHead title={open.name} note={open.question} id="open" size="h2" />
        <div className="mt-5">{open.id === "two-codes" ? <TwoCodes a={7} b={19} /> : <SearchPlan />}</div>
      </section>
    </div>
  );
}
