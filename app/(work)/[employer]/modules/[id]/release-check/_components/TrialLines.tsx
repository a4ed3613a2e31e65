import { formatNumber } from "@/components/ui/formatNumber";
import { Glyph } from "@/components/ui/Glyph";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import type { LineVerdict } from "@/lib/checks/release-check/judgeTally";
import type { TrialTable } from "@/lib/queries/checkTrialView";
import { percentText } from "./percentText";

/** Each kind of candidate with its count, its rate with bounds, and what is asked of it. */
export function TrialLines({ caption, table }: { caption: string; table: TrialTable }) {
  return (
    <>
      <Table caption={caption} reflow className="mt-3">
        <thead>
          <tr>
            <Th>Tried</Th>
            <Th figure>Met</Th>
            <Th figure>Rate</Th>
            <Th figure>95 % bounds</Th>
            <Th>Asked</Th>
            <Th>Result</Th>
          </tr>
        </thead>
        <tbody>
          {table.lines.map((line) => (
            <Tr key={line.id} wash={line.within ? null : "minus"}>
              <RowHead className="font-normal">{nameOf(line)}</RowHead>
              <Td label="Met" figure>
                {line.tried === 0 ? "–" : `${formatNumber(line.met)} of ${formatNumber(line.tried)}`}
              </Td>
              <Td label="Rate" figure>
                {line.tried === 0 ? "–" : percentText(line.rate)}
              </Td>
              <Td label="95 % bounds" figure>
                {line.tried === 0 ? "–" : `${percentText(line.lower)} to ${percentText(line.upper)}`}
              </Td>
              <Td label="Asked">{line.asked}</Td>
              <Td label="Result">
                <span className="flex items-center gap-2.5 whitespace-nowrap">
                  <Glyph name={line.within ? "within" : "outside"} />
                  {line.within ? "Within" : <strong className="font-bold">Outside</strong>}
                </span>
              </Td>
            </Tr>
          ))}
        </tbody>
      </Table>
      <p className="mt-2 text-label font-normal text-ink-2 figures">
        {formatNumber(table.built)} cases drawn in {formatNumber(table.draws)} draws, at most{" "}
        {formatNumber(table.mostDraws)} for one. Bounds after Clopper and Pearson.
      </p>
    </>
  );
}

const nameOf = ({ id, label, tried }: LineVerdict) => {
  if (!id.startsWith("wrong/")) return label;
  return tried > 0 ? `Wrong method: ${label}` : `Wrong method: ${label} (gives the right answer to all that is asked)`;
};
