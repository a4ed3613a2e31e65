"use client";
import { useMemo } from "react";
import { CalculatorBody } from "@/components/calculators/CalculatorBody";
import { Key } from "@/components/ui/Key";
import { Notice } from "@/components/ui/Notice";
import { startValues, type Calculator } from "@/lib/calculators/calculator";
import type { CalculatorTag } from "@/lib/calculators/calculators";
import { queryOf, readQuery } from "@/lib/calculators/link";
import { moduleText } from "@/lib/calculators/moduleText";
import { changeInputs, forgetInputs, useRemembered } from "./benchAddress";
import { BenchLink } from "./BenchLink";
import { CopyKey } from "./CopyKey";

type OpenCalculatorProps = { calculator: Calculator & { tag: CalculatorTag }; query: string; heading: "h1" | "h2" };

/** One calculator with its keys. A link's inputs win over what this device remembers, which wins over the start values. */
export function OpenCalculator({ calculator, query, heading: Heading }: OpenCalculatorProps) {
  const remembered = useRemembered(calculator.id);
  const { values, problems } = useMemo(() => {
    const given = readQuery(calculator, new URLSearchParams(query));
    if (given.carries) return given;
    if (remembered === null) return { values: startValues(calculator), problems: [] };
    return { values: readQuery(calculator, new URLSearchParams(remembered)).values, problems: [] };
  }, [calculator, query, remembered]);
  return (
    <>
      <p className="bench-back no-print">
        <BenchLink id={null} className="link inline-flex min-h-11 items-center">
          All calculators
        </BenchLink>
      </p>
      <div className="mb-5 flex flex-wrap items-start justify-between gap-x-6 gap-y-3">
        <div className="min-w-0">
          <Heading id="open-calculator" tabIndex={-1} className="text-h1">
            {calculator.name}
          </Heading>
          <p className="mt-1 text-ink-2">{calculator.question}</p>
        </div>
        <div className="flex flex-wrap items-start gap-3 no-print">
          <CopyKey
            label="Copy the link"
            done="Link copied"
            text={() => `${location.origin}/bench?${queryOf(calculator, values)}`}
          />
          <CopyKey label="Copy as module text" done="Module text copied" text={() => moduleText(calculator, values)} />
          <Key size="small" onClick={() => forgetInputs(calculator.id)}>
            Start values
          </Key>
        </div>
      </div>
      {problems.length > 0 && (
        <Notice tone="caution" fact="Not all of the link could be taken." className="mb-5">
          {problems.join(" ")} The start values stand in their place.
        </Notice>
      )}
      <CalculatorBody
        tag={calculator.tag}
        values={values}
        onChange={(changed) => changeInputs(calculator.id, queryOf(calculator, changed))}
      />
    </>
  );
}
