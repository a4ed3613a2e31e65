"use client";
import { RadioRows } from "@/components/ui/RadioRows";
import { SectionHead } from "@/components/ui/SectionHead";
import { TextArea } from "@/components/ui/TextArea";

export type Line = { of: string; label: string; critical: boolean; text: string };
export type Judged = { within: boolean | null; reason: string };

type JudgedLineProps = { line: Line; technician: string; judged: Judged; onChange: (judged: Judged) => void };

/** One line of the account: what was written, within or outside, and why. */
export function JudgedLine({ line, technician, judged, onChange }: JudgedLineProps) {
  const word = judged.within === null ? null : judged.within ? "within" : "outside";
  return (
    <section aria-label={line.label}>
      <SectionHead title={line.label} note={line.critical ? "critical" : undefined} />
      <blockquote className="mt-3 bg-sheet px-4 py-3 whitespace-pre-line">
        {line.text.trim() || <span className="text-ink-2">Nothing was handed in.</span>}
      </blockquote>
      <RadioRows
        name={`within-${line.of}`}
        legend={`Verdict on ${line.label}`}
        hideLegend
        className="mt-4"
        value={word}
        onChange={(value) => onChange({ ...judged, within: value === "within" })}
        rows={[
          { value: "within", label: "Within" },
          { value: "outside", label: "Outside", detail: line.critical ? "The check is then not met." : undefined },
        ]}
      />
      <TextArea
        label="Reason"
        note={judged.within === false ? `needed; ${technician} reads it` : `if you want ${technician} to read one`}
        className="mt-4"
        rows={3}
        maxLength={1000}
        value={judged.reason}
        onChange={(event) => onChange({ ...judged, reason: event.target.value })}
      />
    </section>
  );
}
