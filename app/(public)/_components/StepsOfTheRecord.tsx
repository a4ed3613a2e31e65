import { createHash } from "node:crypto";
import type { ReactNode } from "react";
import { PeakReading } from "@/components/calculators/PeakReading";
import { ChipStrip } from "@/components/ui/ChipStrip";
import { StatusWord } from "@/components/ui/StatusWord";
import { ExampleMarking } from "./ExampleMarking";
import { ExampleModule } from "./ExampleModule";

/** The chain from module to verification, each step with what it leaves behind. Examples are computed or marked as examples. */
export function StepsOfTheRecord({ prn, delayChips }: { prn: number; delayChips: number }) {
  return (
    <section className="page py-14 desk:py-18">
      <h2 className="max-w-[24em] text-h1 text-balance">
        From the module to the certificate, each step leaves a record that can be computed again
      </h2>
      <ol className="mt-10 border-b-line border-rule-strong">
        <StepRow number={1} title="An employer writes the module" exhibit={<ExampleModule />}>
          In plain text, for its own equipment and procedures. Calculators stand inside the text, practical checks at
          its end; a release is numbered, fingerprinted and never changed.
        </StepRow>
        <StepRow
          number={2}
          title="A technician sits the check"
          exhibit={<PeakReading prn={prn} delayChips={delayChips} />}
        >
          On data drawn for that one person: other satellites, delays and noise for each sitting. Every answer is saved
          as it is typed.
        </StepRow>
        <StepRow number={3} title="The server computes, a decider decides" exhibit={<ExampleMarking />}>
          Each quantity is set against its computed value and a tolerance that was public from the start. A person who
          did not train the candidate reads the record, gives reasons and signs.
        </StepRow>
        <StepRow number={4} title="Anyone verifies it" exhibit={<ExampleStrip />}>
          Paper and screen carry the same chip strip, drawn from the certificate&rsquo;s fingerprint. A strip can be
          copied, so the signature and the register decide.
        </StepRow>
      </ol>
    </section>
  );
}

function StepRow({
  number,
  title,
  exhibit,
  children,
}: {
  number: number;
  title: string;
  exhibit: ReactNode;
  children: ReactNode;
}) {
  return (
    <li className="grid gap-x-6 gap-y-4 border-t-line border-rule-strong py-7 desk:grid-cols-[112px_minmax(0,5fr)_minmax(0,12fr)]">
      <span className="value text-readout-l max-desk:hidden" aria-hidden>
        {number}
      </span>
      <div>
        <h3 className="text-h2">{title}</h3>
        <p className="mt-1.5 max-w-measure text-dense text-ink-2">{children}</p>
      </div>
      <div className="min-w-0 bg-sheet p-4 tablet:p-6">{exhibit}</div>
    </li>
  );
}

const EXAMPLE_RECORD = '{"example":"no certificate has this record"}';

function ExampleStrip() {
  const fingerprint = createHash("sha256").update(EXAMPLE_RECORD).digest("hex");
  return (
    <div className="flex flex-wrap items-center gap-x-12 gap-y-5">
      <ChipStrip fingerprint={fingerprint} width={520} />
      <div>
        <p className="text-readout-s">
          <StatusWord glyph="valid">Valid</StatusWord>
        </p>
        <p className="mt-1 max-w-[15em] text-label font-normal text-ink-2">
          Example: the strip of a record that no certificate has.
        </p>
      </div>
    </div>
  );
}
