import { Gauge } from "@/components/ui/Gauge";
import { Glyph } from "@/components/ui/Glyph";
import { ReasonRow, RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { wholeNumbers } from "@/components/ui/wholeNumbers";
import type { MarkedRow } from "@/lib/checks/kind";
import { Fragment } from "react";

const COLUMNS = 7;

/** A row a line of the hand-in: as it was typed and understood, what was computed, how far apart, within or outside, why. */
export function RecordTable({ rows }: { rows: readonly MarkedRow[] }) {
  return (
    <>
      <div className="hidden bg-sheet tablet:block">
        <Table caption="Quantities of this marking record">
          <thead>
            <tr>
              <Th>Quantity</Th>
              <Th figure>Handed in</Th>
              <Th figure>Computed</Th>
              <Th figure>Difference</Th>
              <Th figure>Tolerance</Th>
              <Th>Against tolerance</Th>
              <Th>Result</Th>
            </tr>
          </thead>
          <tbody>
            {rows.map((row, index) => {
              const wash = row.within ? null : "minus";
              return (
                <Fragment key={index}>
                  <Tr wash={wash} joined={row.reason !== null || isAccount(row)}>
                    <RowHead>
                      {row.subject && <span className="plate mr-3">{row.subject}</span>}
                      <span className="font-normal">{row.label}</span>
                      {row.critical && <span className="ml-2 text-label font-normal text-ink-2">critical</span>}
                    </RowHead>
                    <Td figure>
                      <HandedIn row={row} />
                    </Td>
                    <Td figure className={wrapped(row.computed)}>
                      {row.computed}
                    </Td>
                    <Td figure>{row.difference ?? "–"}</Td>
                    <Td figure className={wrapped(row.tolerance)}>
                      {row.tolerance}
                    </Td>
                    <Td>
                      {row.offByTolerances !== null && (
                        <Gauge offByTolerances={row.offByTolerances} within={row.within} />
                      )}
                    </Td>
                    <Td>
                      <Result row={row} />
                    </Td>
                  </Tr>
                  {isAccount(row) && (
                    <ReasonRow columns={COLUMNS} label="Handed in" wash={wash ?? undefined}>
                      <span className="whitespace-pre-line">{row.handedIn}</span>
                    </ReasonRow>
                  )}
                  {row.reason && (
                    <ReasonRow columns={COLUMNS} wash={wash ?? undefined}>
                      {wholeNumbers(row.reason)}
                    </ReasonRow>
                  )}
                </Fragment>
              );
            })}
          </tbody>
        </Table>
      </div>
      <ul className="tablet:hidden">
        {rows.map((row, index) => (
          <PhoneRow key={index} row={row} />
        ))}
      </ul>
    </>
  );
}

function PhoneRow({ row }: { row: MarkedRow }) {
  return (
    <li className={`border-b-hair border-rule px-4 py-3 ${row.within ? "bg-sheet" : "bg-minus-wash"}`}>
      <div className="flex items-baseline justify-between gap-4">
        <h2 className="text-body font-semibold">
          {row.subject && `${row.subject}, `}
          {row.label}
          {row.critical && <span className="ml-2 text-label font-normal text-ink-2">critical</span>}
        </h2>
        <Result row={row} />
      </div>
      <dl className="mt-1 grid grid-cols-2 gap-x-4 text-dense figures">
        <Pair term="Handed in">
          <HandedIn row={row} />
        </Pair>
        <Pair term="Computed">{row.computed}</Pair>
        <Pair term="Difference">{row.difference ?? "–"}</Pair>
        <Pair term="Tolerance">{row.tolerance}</Pair>
      </dl>
      {isAccount(row) && <p className="mt-2 text-dense whitespace-pre-line">{row.handedIn}</p>}
      {row.offByTolerances !== null && (
        <div className="mt-2">
          <Gauge offByTolerances={row.offByTolerances} within={row.within} />
        </div>
      )}
      {row.reason && (
        <p className={`mt-2 text-dense ${row.within ? "text-ink-2" : "text-minus-deep"}`}>
          <strong className="font-semibold">Reason</strong> {wholeNumbers(row.reason)}
        </p>
      )}
    </li>
  );
}

function Pair({ term, children }: { term: string; children: React.ReactNode }) {
  return (
    <div className="flex justify-between gap-2 border-b-hair border-rule py-1">
      <dt className="text-ink-2">{term}</dt>
      <dd className="text-right font-semibold">{children}</dd>
    </div>
  );
}

/** A figure keeps to its line; words take as many as they need, so that the columns behind them stay on the page. */
const wrapped = (text: string) => (text.length > LONGEST_FIGURE ? "whitespace-normal min-w-36" : undefined);
const LONGEST_FIGURE = 20;

/** More than a word or a number: it stands in a line of its own. */
const isAccount = (row: MarkedRow) => row.understood === null && row.handedIn.trim().length > LONGEST_WORD;
const LONGEST_WORD = 60;

/** What was understood; the text as typed stands under it where it reads differently. */
function HandedIn({ row }: { row: MarkedRow }) {
  const typed = row.handedIn.trim();
  if (isAccount(row)) return "text";
  if (row.understood === null) return typed || "–";
  const plain = (text: string) => text.replace(/[\s\u00a0\u2009\u202f]/g, "");
  return (
    <>
      {row.understood}
      {plain(row.understood).startsWith(plain(typed)) || (
        <span className="block text-label font-normal text-ink-2">typed {typed}</span>
      )}
    </>
  );
}

function Result({ row }: { row: MarkedRow }) {
  return (
    <span className="flex items-center gap-2.5 whitespace-nowrap">
      <Glyph name={row.within ? "within" : "outside"} />
      {row.within ? "Within" : <strong className="font-bold">Outside</strong>}
    </span>
  );
}
