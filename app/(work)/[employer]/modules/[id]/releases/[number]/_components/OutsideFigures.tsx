import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import type { ReleaseStatisticsView } from "@/lib/queries/getReleaseStatistics";

const MOST_ROWS = 5; // of a check: the rest is told by its number

/** Which quantities were outside, and with which class of error. */
export function OutsideFigures({ checks }: { checks: ReleaseStatisticsView["checks"] }) {
  if (checks.every(({ errors }) => errors.length === 0)) return null;
  return (
    <div className="mt-6">
      <Table reflow showCaption caption="Outside, by class of error">
        <thead>
          <tr>
            <Th>Quantity</Th>
            <Th>Check</Th>
            <Th>Class of error</Th>
            <Th>Cases</Th>
          </tr>
        </thead>
        <tbody>
          {checks.flatMap((check) => {
            const left = check.errors.length - MOST_ROWS;
            return [
              ...check.errors.slice(0, MOST_ROWS).map(({ quantity, errorClass, cases }) => (
                <Tr key={`${check.checkId} ${quantity} ${errorClass}`}>
                  <RowHead>{quantity}</RowHead>
                  <Td label="Check">{check.title}</Td>
                  <Td label="Class of error">{errorClass ?? "none known"}</Td>
                  <Td label="Cases">
                    {cases} of {check.cases}
                  </Td>
                </Tr>
              )),
              left > 0 && (
                <Tr key={`${check.checkId} rest`}>
                  <RowHead>{left === 1 ? "One less frequent" : `${left} less frequent`}</RowHead>
                  <Td label="Check">{check.title}</Td>
                  <Td>not shown</Td>
                  <Td />
                </Tr>
              ),
            ];
          })}
        </tbody>
      </Table>
    </div>
  );
}
