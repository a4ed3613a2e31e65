"use client";
import type { Reading } from "@/components/calculators/reading";
import { StandingCalculator } from "@/components/calculators/StandingCalculator";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { SectionHead } from "@/components/ui/SectionHead";
import { formatNumber } from "@/components/ui/formatNumber";
import { EchoTraces } from "./EchoTraces";

type Paper =
  | { says: "delay"; ns: number }
  | { says: "cable"; installedM: number; reelM: number | null; velocityFactor: number }
  | { says: "nothing" };
type Part = {
  id: string;
  name: string;
  from: string;
  to: string;
  paper: Paper;
  uncertainty: { as: "standard" | "limits"; value: number; unit: "ns" | "%" };
};
export type DelayEntryData = { parts: Part[]; stepNs: number; leadTrace: number[]; endTrace: number[] };

/** The list of parts, the two traces of the run without papers, and the bench's own sums. */
export function DelayEntryWork({ data, onTake }: { data: DelayEntryData; onTake?: (reading: Reading) => void }) {
  return (
    <div className="grid gap-8">
      <section>
        <SectionHead title="List of parts" note="what each is connected to, and what its papers say" />
        <Table caption="List of parts" reflow>
          <thead>
            <tr>
              <Th>Part</Th>
              <Th>From</Th>
              <Th>To</Th>
              <Th>Papers</Th>
              <Th figure>Uncertainty</Th>
            </tr>
          </thead>
          <tbody>
            {data.parts.map((part) => (
              <Tr key={part.id}>
                <RowHead>{`${part.id.toUpperCase()} ${part.name}`}</RowHead>
                <Td label="From">{part.from}</Td>
                <Td label="To">{part.to}</Td>
                <Td label="Papers">{paperText(part.paper)}</Td>
                <Td label="Uncertainty" figure>
                  {uncertaintyText(part.uncertainty)}
                </Td>
              </Tr>
            ))}
          </tbody>
        </Table>
      </section>
      <section>
        <SectionHead title="Reflectometer" note="the run in the building, from its near end" />
        <EchoTraces data={data} onTake={onTake} />
      </section>
      <section>
        <SectionHead title="Cable and echo" note="the bench's own; your answers are typed at the right" />
        <div className="mt-4">
          <StandingCalculator tag="CableEcho" />
        </div>
      </section>
      <section>
        <SectionHead title="Delay budget" note="the bench's own; its parts are an example" />
        <div className="mt-4">
          <StandingCalculator tag="DelayBudget" />
        </div>
      </section>
    </div>
  );
}

function paperText(paper: Paper): string {
  if (paper.says === "delay") return `delay ${formatNumber(paper.ns, 1)}\u00a0ns`;
  if (paper.says === "nothing") return "none: measured by its echo";
  const drum = paper.reelM === null ? "" : `, drum label ${paper.reelM}\u00a0m`;
  return `installed ${formatNumber(paper.installedM, 1)}\u00a0m${drum}, velocity factor ${formatNumber(paper.velocityFactor, 2)}`;
}

const uncertaintyText = ({ as, value, unit }: Part["uncertainty"]): string =>
  `${as === "limits" ? "±" : "u\u00a0"}${formatNumber(value, 1)}\u00a0${unit}`;
