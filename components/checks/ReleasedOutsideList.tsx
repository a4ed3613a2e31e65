import { Glyph } from "@/components/ui/Glyph";
import { formatNumber } from "@/components/ui/formatNumber";
import type { ReleasedOutside } from "@/lib/queries/releasedOutside";

/** What a release check found outside its bounds, and why the lead released it all the same. */
export function ReleasedOutsideList({ outside }: { outside: readonly ReleasedOutside[] }) {
  return (
    <ul className="grid gap-4">
      {outside.map(({ checkId, lines, reason }) => (
        <li key={checkId ?? ""} className="max-w-measure">
          <p className="flex items-center gap-2.5 text-dense font-semibold">
            <Glyph name="outside" /> {checkId ?? "The sitting as a whole: guessing can meet it"}
          </p>
          {lines.map(({ id, label, met, tried, asked }) => (
            <p key={id} className="text-dense figures">
              {label}: {formatNumber(met)} of {formatNumber(tried)}, asked {asked}
            </p>
          ))}
          <p className="mt-1 whitespace-pre-line">{reason}</p>
        </li>
      ))}
    </ul>
  );
}
