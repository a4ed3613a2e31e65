"use client";
import { formatQuantity } from "@/lib/checks/formatQuantity";
import type { FieldSpec, FormSection } from "@/lib/checks/kind";
import { parseQuantity } from "@/lib/checks/parseQuantity";
import { Field } from "@/components/ui/Field";
import { NumberField } from "@/components/ui/NumberField";
import { SectionHead } from "@/components/ui/SectionHead";
import { Select } from "@/components/ui/Select";
import { TextArea } from "@/components/ui/TextArea";
import { TwoWay } from "@/components/ui/TwoWay";
import { useState } from "react";
import { fieldsOfRow, rowsShown } from "./formFields";

type AnswerFormProps = {
  sections: readonly FormSection[];
  answers: Readonly<Record<string, string>>;
  onChange: (fields: Readonly<Record<string, string>>) => void;
  /** A field was entered: it stays the open one until another is. */
  onEnter?: (id: string) => void;
};

/** The fields of a case, section by section; a repeating section grows by one row as the last is filled. */
export function AnswerForm({ sections, answers, onChange, onEnter }: AnswerFormProps) {
  return sections.map((section) => (
    <section key={section.id} className="bg-sheet px-3 py-4" aria-labelledby={`section-${section.id}`}>
      <SectionHead title={section.title} id={`section-${section.id}`} level={3} />
      {Array.from({ length: rowsShown(section, answers) }, (_, index) => (
        <div
          key={index}
          className={
            section.repeat
              ? `grid gap-x-3 gap-y-3 border-b-hair border-rule py-3 ${section.fields.length > 1 ? "grid-cols-2" : ""}`
              : "grid gap-4 pt-3"
          }
        >
          {fieldsOfRow(section, index + 1).map(({ id, spec }) => (
            <div key={id} className="contents" onFocus={() => onEnter?.(id)}>
              <AnswerField
                spec={spec}
                row={section.repeat ? index + 1 : null}
                value={answers[id] ?? ""}
                onChange={(value) => onChange({ [id]: value })}
              />
            </div>
          ))}
        </div>
      ))}
      {section.repeat && rowsShown(section, answers) === section.repeat.max && (
        <p className="mt-2 text-label font-normal text-ink-2">All {section.repeat.max} rows are in use.</p>
      )}
    </section>
  ));
}

type AnswerFieldProps = { spec: FieldSpec; row: number | null; value: string; onChange: (value: string) => void };

/** Few words are a switch, many a list, figures are checked when the field is left. */
function AnswerField({ spec, row, value, onChange }: AnswerFieldProps) {
  const [error, setError] = useState<string | null>(null);
  const label = row === null ? spec.label : `${spec.label}, row ${row}`;
  const shown = row === null ? label : spec.label;
  if (spec.input === "choice" && spec.choices!.length <= 3) {
    return (
      <TwoWay
        name={`${spec.id}-${row ?? 0}`}
        label={label}
        showLabel
        choices={spec.choices!}
        value={value || null}
        onChange={onChange}
        help={spec.help}
      />
    );
  }
  if (spec.input === "choice") {
    return (
      <Select
        label={row === null ? shown : `${shown} ${row}`}
        empty="Not answered"
        choices={spec.choices!}
        value={value}
        onChange={(event) => onChange(event.target.value)}
        help={spec.help}
      />
    );
  }
  if (spec.input === "text" && spec.longest) {
    return (
      <TextArea
        label={shown}
        note={`${value.length} of ${spec.longest} characters`}
        value={value}
        onChange={(event) => onChange(event.target.value)}
        help={spec.help}
        rows={8}
        maxLength={spec.longest}
      />
    );
  }
  if (spec.input === "text") {
    return (
      <Field
        label={shown}
        value={value}
        onChange={(event) => onChange(event.target.value)}
        help={spec.help}
        maxLength={200}
      />
    );
  }
  const unit = spec.unit ?? "1";
  const understand = (typed: string) => {
    if (!typed.trim()) return setError(null);
    const read = parseQuantity(typed, unit);
    setError("problem" in read ? read.problem : null);
  };
  return (
    <NumberField
      label={shown}
      aria-label={label}
      unit={unit === "1" ? undefined : formatQuantity(0, unit, 0).replace(/^0\s?/, "")}
      signed={isSigned(spec)}
      value={value}
      error={error}
      help={spec.help}
      onChange={(typed) => {
        setError(null);
        onChange(typed);
      }}
      onLeave={understand}
    />
  );
}

/** A level in dBm has a sign as a rule; of frequencies a Doppler has one, a step or a bin has none. */
const isSigned = ({ id, unit, signed }: FieldSpec) => signed || SIGNED.has(id) || unit === "dBm";
const SIGNED: ReadonlySet<string> = new Set(["doppler", "east", "north"]);
