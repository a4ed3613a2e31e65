import Link from "next/link";
import type { Failing } from "@/lib/checks/release-check/tally";
import type { TrialTable } from "@/lib/queries/checkTrialView";

/** The first cases of each line that are not as they should be, each to be looked at. */
export function FailingCases({ base, table }: { base: string; table: TrialTable }) {
  if (table.failing.length === 0) return null;
  const labels = new Map(table.lines.map(({ id, label }) => [id, label]));
  return (
    <details className="mt-3">
      <summary className="cursor-pointer py-1 text-dense font-semibold pointer-coarse:py-2.5">
        Cases to look at ({table.failing.length})
      </summary>
      <ul className="mt-1 grid gap-1 text-dense">
        {table.failing.map((failing) => (
          <li key={`${failing.line} ${failing.n} ${failing.hand}`}>
            <Link className="link inline-block py-1 pointer-coarse:py-2.5" href={address(base, failing)}>
              Case {failing.n + 1}
            </Link>
            , {labels.get(failing.line) ?? failing.line}: {failing.note}
          </li>
        ))}
      </ul>
    </details>
  );
}

const address = (base: string, { line, n, hand }: Failing) =>
  `${base}?line=${encodeURIComponent(line)}&n=${n}&hand=${hand}`;
