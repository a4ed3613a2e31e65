import { formatDay } from "@/components/ui/formatDay";

type ValidityLineProps = {
  effectiveOn: string;
  lastDay: string;
  today: string;
  /** Since when it does not hold, for a withdrawn or suspended certificate. */
  brokenOn?: string | null;
  brokenWord?: string;
};

const DAY_MS = 86_400_000;
const at = (day: string) => Date.parse(`${day.slice(0, 10)}T00:00:00Z`);

/** Time on a line: what holds stands above it, what does not hangs below it. */
export function ValidityLine({ effectiveOn, lastDay, today, brokenOn, brokenWord }: ValidityLineProps) {
  const end = at(lastDay) + DAY_MS;
  const from = Math.min(at(effectiveOn), at(today)) - 30 * DAY_MS;
  const span = Math.max(end, at(today)) + 60 * DAY_MS - from;
  const place = (time: number) => ((time - from) / span) * 100;
  const start = place(at(effectiveOn));
  const stop = place(brokenOn ? at(brokenOn) : end);
  const now = place(at(today) + DAY_MS / 2);
  return (
    <div>
      <p className="relative h-6 text-label font-semibold" aria-hidden>
        <span
          className="absolute -translate-x-1/2 whitespace-nowrap"
          style={{ left: `${Math.min(Math.max(now, 14), 86)}%` }}
        >
          Today, {formatDay(today)}
        </span>
      </p>
      <svg width="100%" height="46" className="block overflow-visible" aria-hidden>
        <rect x={`${start}%`} y="8" width={`${Math.max(stop - start, 0.4)}%`} height="18" fill="var(--plus)" />
        {brokenOn && <rect x={`${stop}%`} y="27" width={`${100 - stop}%`} height="18" fill="var(--minus)" />}
        <rect y="25" width="100%" height="2" fill="var(--ink)" />
        {years(from, from + span).map((year) => (
          <rect key={year} x={`${place(year)}%`} y="27" width="1" height="8" fill="var(--ink)" />
        ))}
        <svg x={`${now}%`} overflow="visible">
          <path d="M-7 0h14l-7 9z" fill="var(--ink)" />
          <rect x="-1" y="0" width="2" height="44" fill="var(--ink)" />
        </svg>
      </svg>
      <dl className="mt-1 flex justify-between gap-4 text-dense">
        <Mark term="Issued" day={effectiveOn} />
        {brokenOn && <Mark term={brokenWord ?? "Broken"} day={brokenOn} />}
        <Mark term={brokenOn ? "Would have lapsed" : "Last day"} day={lastDay} right />
      </dl>
    </div>
  );
}

function Mark({ term, day, right }: { term: string; day: string; right?: boolean }) {
  return (
    <div className={right ? "text-right" : undefined}>
      <dt className="text-label text-ink-2">{term}</dt>
      <dd className="font-semibold figures">{formatDay(day)}</dd>
    </div>
  );
}

function years(from: number, to: number): number[] {
  const first = new Date(from).getUTCFullYear() + 1;
  const last = new Date(to).getUTCFullYear();
  return Array.from({ length: Math.max(last - first + 1, 0) }, (_, index) => Date.UTC(first + index, 0, 1));
}
