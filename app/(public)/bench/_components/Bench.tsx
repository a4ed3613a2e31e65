"use client";
import { CALCULATORS } from "@/lib/calculators/calculators";
import { useBenchQuery } from "./benchAddress";
import { BenchList } from "./BenchList";
import { OffLine } from "./OffLine";
import { OpenCalculator } from "./OpenCalculator";
import { useKeptBench } from "./useKeptBench";

/** The list of calculators and the one that is open. On a phone one of the two is shown. */
export function Bench({ asked }: { asked: string }) {
  useKeptBench();
  const query = useBenchQuery(asked);
  const id = new URLSearchParams(query).get("open");
  const chosen = CALCULATORS.find((one) => one.id === id);
  const open = chosen ?? CALCULATORS[0];
  return (
    <div className="bench" data-chosen={chosen !== undefined}>
      <BenchList open={open.id} heading={chosen ? "h2" : "h1"} />
      <section className="bench-open" aria-labelledby="open-calculator">
        <OffLine />
        <OpenCalculator key={open.id} calculator={open} query={query} heading={chosen ? "h1" : "h2"} />
      </section>
    </div>
  );
}
