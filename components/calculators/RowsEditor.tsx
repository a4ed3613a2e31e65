"use client";
import { useState } from "react";
import { Field } from "@/components/ui/Field";
import { Key } from "@/components/ui/Key";
import { SectionHead } from "@/components/ui/SectionHead";
import type { Row, RowsInput } from "@/lib/calculators/calculator";
import { readRowName } from "@/lib/calculators/readRows";
import { unitText } from "@/lib/calculators/unitText";
import type { Unit } from "@/lib/gnss/units";
import { FigureField } from "./FigureField";

type RowsEditorProps = { input: RowsInput; rows: readonly Row[]; onChange: (rows: readonly Row[]) => void };

/** A list of things with the same figures each, in an order that counts. */
export function RowsEditor({ input, rows, onChange }: RowsEditorProps) {
  const { row: what, columns, most } = input;
  const replace = (at: number, row: Row) => onChange(rows.map((old, index) => (index === at ? row : old)));
  const swap = (at: number) => {
    const moved = [...rows];
    [moved[at - 1], moved[at]] = [moved[at], moved[at - 1]];
    onChange(moved);
  };
  const add = () => {
    const figures = columns.map(({ start }) => start);
    onChange([...rows, { name: freshName(what, rows), figures }]);
  };
  return (
    <>
      <SectionHead title={input.label} note={`${rows.length} of at most ${most}`} />
      <ol className="rows-editor" style={{ "--columns": columns.length } as React.CSSProperties}>
        {rows.map((row, at) => (
          // Places count and names may repeat: a row is its place.
          <li key={at} className="rows-row">
            <RowName what={what} number={at + 1} name={row.name} onChange={(name) => replace(at, { ...row, name })} />
            {columns.map((column, index) => (
              <div key={`${column.key} ${row.name}`} style={headUnit(column.unit)}>
                <FigureField
                  label={column.label}
                  bounds={column}
                  unit={column.unit}
                  value={row.figures[index]}
                  onChange={(figure) => replace(at, { ...row, figures: row.figures.with(index, figure) })}
                />
              </div>
            ))}
            <div className="rows-keys no-print">
              {at > 0 && (
                <Key size="tiny" aria-label={`Move ${row.name} up`} onClick={() => swap(at)}>
                  Up
                </Key>
              )}
              {rows.length > 1 && (
                <Key
                  size="tiny"
                  aria-label={`Take ${row.name} out`}
                  onClick={() => onChange(rows.filter((_, index) => index !== at))}
                >
                  Out
                </Key>
              )}
            </div>
          </li>
        ))}
      </ol>
      <div className="mt-3 no-print">
        <Key size="small" reason={rows.length < most ? null : `at most ${most} ${what}s`} onClick={add}>
          {`Add a ${what}`}
        </Key>
      </div>
    </>
  );
}

/** The unit as the common head shows it: there is no room for one in every field of a row. */
function headUnit(unit?: Unit): React.CSSProperties | undefined {
  const text = unit && unitText(unit);
  return text ? ({ "--head-unit": JSON.stringify(`, ${text}`) } as React.CSSProperties) : undefined;
}

function freshName(what: string, rows: readonly Row[]): string {
  let number = rows.length + 1;
  while (rows.some(({ name }) => name === `${what} ${number}`)) number++;
  return `${what} ${number}`;
}

type RowNameProps = { what: string; number: number; name: string; onChange: (name: string) => void };

function RowName({ what, number, name, onChange }: RowNameProps) {
  const [typed, setTyped] = useState<string | null>(null);
  const [error, setError] = useState<string | null>(null);
  const leave = (text: string) => {
    const read = readRowName(text);
    if (read === null) return setError("1 to 28 letters without : ; , or quotes.");
    setTyped(null);
    if (read !== name) onChange(read);
  };
  return (
    <Field
      label={`${what[0].toUpperCase()}${what.slice(1)} ${number}`}
      className="rows-name"
      error={error}
      value={typed ?? name}
      onChange={(event) => {
        setTyped(event.target.value);
        setError(null);
      }}
      onBlur={(event) => leave(event.target.value)}
    />
  );
}
