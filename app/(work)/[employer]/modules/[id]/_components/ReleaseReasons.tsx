"use client";
import Link from "next/link";
import { Glyph } from "@/components/ui/Glyph";
import { TextArea } from "@/components/ui/TextArea";
import type { ReleaseCheckView } from "@/lib/queries/getReleaseCheck";

export type Reasons = { checks: Record<string, string>; sitting: string };
export const NO_REASONS: Reasons = { checks: {}, sitting: "" };

type ReleaseReasonsProps = {
  /** Address of the page of the release check. */
  href: string;
  /** Undefined until it is known. */
  view: ReleaseCheckView | undefined;
  reasons: Reasons;
  onChange: (reasons: Reasons) => void;
};

/** How the release check stands; for each thing outside its bounds, why it is released all the same. */
export function ReleaseReasons({ href, view, reasons, onChange }: ReleaseReasonsProps) {
  if (!view) return <p className="text-dense text-ink-2">Reading the release check…</p>;
  const missing = unfinishedChecks(view);
  const outside = outsideChecks(view);
  const sitting = sittingIsOutside(view);
  const link = (
    <Link className="link" href={href}>
      Release check
    </Link>
  );
  if (missing.length > 0) {
    return (
      <p className="flex flex-wrap items-center gap-2.5 text-dense">
        <Glyph name="suspended" /> {link} not finished: {missing.map(({ id }) => id).join(", ")}.
      </p>
    );
  }
  return (
    <>
      <p className="flex flex-wrap items-center gap-2.5 text-dense">
        <Glyph name={outside.length > 0 || sitting ? "outside" : "within"} /> {link}{" "}
        {outside.length > 0 || sitting ? "outside a bound. The decider reads your reason." : "within its bounds."}
      </p>
      {outside.map(({ id, result }) => (
        <TextArea
          key={id}
          label={`Why "${id}" is released outside its bounds`}
          help={result!.lines
            .filter(({ within }) => !within)
            .map(({ label, met, tried }) => `${label}: ${met} of ${tried}`)
            .join("; ")}
          rows={2}
          maxLength={2000}
          value={reasons.checks[id] ?? ""}
          onChange={(event) => onChange({ ...reasons, checks: { ...reasons.checks, [id]: event.target.value } })}
        />
      ))}
      {sitting && (
        <TextArea
          label="Why a sitting that guessing can meet is released"
          rows={2}
          maxLength={2000}
          value={reasons.sitting}
          onChange={(event) => onChange({ ...reasons, sitting: event.target.value })}
        />
      )}
    </>
  );
}

const unfinishedChecks = ({ checks }: ReleaseCheckView) => checks.filter(({ needed, result }) => needed && !result);
const outsideChecks = ({ checks }: ReleaseCheckView) => checks.filter(({ result, within }) => result && !within);
const sittingIsOutside = ({ sitting }: ReleaseCheckView) => sitting !== null && !sitting.guessedWithin;

/** Why the release cannot be made yet; null when nothing of the release check is in its way. */
export function releaseCheckReason(view: ReleaseCheckView | undefined, reasons: Reasons): string | null {
  if (!view) return "Reading the release check";
  if (unfinishedChecks(view).length > 0) return "Run the release check first";
  const open = outsideChecks(view).some(({ id }) => !reasons.checks[id]?.trim());
  return open || (sittingIsOutside(view) && !reasons.sitting.trim()) ? "Give a reason for what is outside" : null;
}
