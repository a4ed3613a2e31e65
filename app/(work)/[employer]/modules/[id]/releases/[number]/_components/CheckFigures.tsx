import { formatDay } from "@/components/ui/formatDay";
import { formatNumber } from "@/components/ui/formatNumber";
import { SectionHead } from "@/components/ui/SectionHead";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import type { ReleaseStatisticsView } from "@/lib/queries/getReleaseStatistics";
import { OutsideFigures } from "./OutsideFigures";

type Figures = ReleaseStatisticsView["checks"][number];

/** What the sittings came to, check by check. */
export function CheckFigures({ figures }: { figures: ReleaseStatisticsView }) {
  const { sittings, leastSittings, review, checks } = figures;
  return (
    <section aria-labelledby="figures">
      <SectionHead title="What the sittings say" id="figures" note={`${sittings} with a marking record`} />
      {sittings === 0 ? (
        <p className="mt-3 text-dense text-ink-2">No case of this release has been marked yet.</p>
      ) : (
        <>
          <FigureTable checks={checks} />
          <div className="mt-3 grid max-w-measure gap-1 text-label font-normal text-ink-2">
            <p>
              First cases only; fresh cases are counted apart. Bounds are for 95&nbsp;%. Time is from opening to
              hand-in: median, and quartiles.
            </p>
            <p>
              Discrimination is the correlation between meeting this check and the share of the sitting’s other checks
              that were met. Near 0 the check does not tell people apart as the others do; below 0, look at the check.
              It is shown from {leastSittings} sittings on.
            </p>
          </div>
          <OutsideFigures checks={checks} />
        </>
      )}
      <p className="mt-3 text-label font-normal text-ink-2">
        Review these figures after {review.sittings} sittings or on {formatDay(review.day)}, whichever comes first.
      </p>
    </section>
  );
}

function FigureTable({ checks }: { checks: readonly Figures[] }) {
  return (
    <Table reflow caption="Checks of this release">
      <thead>
        <tr>
          <Th>Check</Th>
          <Th>Met</Th>
          <Th>Time</Th>
          <Th>Discrimination</Th>
        </tr>
      </thead>
      <tbody>
        {checks.map((check) => (
          <Tr key={check.checkId}>
            <RowHead>{check.title}</RowHead>
            <Td label="Met">
              <Lines lines={metLines(check)} />
            </Td>
            <Td label="Time">
              <Lines lines={timeLines(check)} />
            </Td>
            <Td label="Discrimination">{discriminationText(check)}</Td>
          </Tr>
        ))}
      </tbody>
    </Table>
  );
}

const Lines = ({ lines }: { lines: readonly string[] }) => (
  <span>
    {lines.map((line, n) => (
      <span key={line} className={n === 0 ? "block" : "block text-ink-2"}>
        {line}
      </span>
    ))}
  </span>
);

const percent = (rate: number) => `${formatNumber(100 * rate)}\u00a0%`;

function metLines({ cases, met, bounds, fresh }: Figures): string[] {
  if (!bounds) return ["no case yet"];
  return [
    `${met} of ${cases}`,
    `${percent(met / cases)}, ${percent(bounds.lower)} to ${percent(bounds.upper)}`,
    ...(fresh.cases > 0 ? [`fresh cases: ${fresh.met} of ${fresh.cases}`] : []),
  ];
}

function timeLines({ minutes, byClock }: Figures): string[] {
  if (!minutes) return ["–"];
  const [lower, middle, upper] = [minutes.lower, minutes.middle, minutes.upper].map((value) => formatNumber(value, 1));
  return [
    `${middle}\u00a0min`,
    `${lower} to ${upper}\u00a0min`,
    ...(byClock > 0 ? [`handed in by the clock: ${byClock}`] : []),
  ];
}

const WITHOUT = { "too few": "too few to say", alike: "all alike, cannot be told", "only check": "no other check" };

const discriminationText = ({ discrimination }: Figures) =>
  typeof discrimination === "number" ? formatNumber(discrimination, 2, true) : WITHOUT[discrimination];
