import { StandingCalculator } from "@/components/calculators/StandingCalculator";
import { SectionHead } from "@/components/ui/SectionHead";
import { PartsTable, type ListedPart } from "./PartsTable";

export type ChainSiteData = {
  runM: number;
  neighbourDbm: number;
  gainFromDb: number;
  gainToDb: number;
  receiverNoiseDb: number;
  supplyV: number;
  limitMa: number;
  sourceOhm: number;
  parts: ListedPart[];
};

/** The parts at hand, and the bench's own calculators with what is given of the site: levels of a chain, loss of a run. */
export function ChainSite({ data }: { data: ChainSiteData }) {
  const { runM, neighbourDbm, gainFromDb, gainToDb, receiverNoiseDb, supplyV, limitMa, sourceOhm, parts } = data;
  const levels = {
    parts: "first part: 0",
    neighbour: neighbourDbm,
    receiver: receiverNoiseDb,
    gainFrom: gainFromDb,
    gainTo: gainToDb,
    volts: supplyV,
    limit: limitMa,
    source: sourceOhm,
  };
  return (
    <div className="grid gap-8">
      {(["amplifier", "cable", "arrester", "splitter"] as const).map((kind) => (
        <PartsTable key={kind} kind={kind} parts={parts} />
      ))}
      <section>
        <SectionHead title="Cable and echo" note="the bench's own, with the run of this site" level={3} />
        <div className="mt-4">
          <StandingCalculator tag="CableEcho" attributes={{ length: runM }} />
        </div>
      </section>
      <section>
        <SectionHead title="Chain levels" note="the bench's own, to try parts on; begins without any" level={3} />
        <div className="mt-4">
          <StandingCalculator tag="ChainLevels" attributes={levels} />
        </div>
      </section>
    </div>
  );
}
