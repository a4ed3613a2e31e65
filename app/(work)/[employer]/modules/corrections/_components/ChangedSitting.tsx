import Link from "next/link";
import type { FormAction } from "@/components/ui/actionResult";
import { formatInstant } from "@/components/ui/formatDay";
import type { ReviewedSitting } from "@/lib/queries/reviewedSittings";
import { ActOnReview } from "./ActOnReview";

type ChangedSittingProps = { employer: string; reviewId: string; sitting: ReviewedSitting; action: FormAction };

/** A sitting with the checks that would come out different, what that does to its outcome, and what the lead does about it. */
export function ChangedSitting({ employer, reviewId, sitting, action }: ChangedSittingProps) {
  const changed = sitting.cases.filter(({ met, metBefore }) => met !== metBefore);
  return (
    <li className="border-b-hair border-rule py-5">
      <h3 className="text-h3">
        <Link className="link" href={`/${employer}/sittings/${sitting.sittingId}`}>
          S-{sitting.number}
        </Link>{" "}
        {sitting.technician}, {sitting.code} {sitting.title}
      </h3>
      <ul className="mt-2 grid gap-1 text-dense">
        {changed.map((one) => (
          <li key={one.caseId}>
            <Link className="link" href={`/${employer}/records/${one.caseId}`}>
              {one.checkTitle}, case {one.number}
            </Link>
            : {one.metBefore ? "met" : "not met"} before, {one.met ? "met" : "not met"} by the corrected marking
            <ul>
              {one.changedRows.map((row) => (
                <li key={row.label} className="text-ink-2">
                  {row.label}: {row.before ?? "no row"}; now {row.now ?? "no row"}
                </li>
              ))}
            </ul>
          </li>
        ))}
      </ul>
      <p className="mt-2 text-dense font-semibold">{consequence(sitting)}</p>
      {sitting.act ? (
        <p className="mt-2 text-dense text-ink-2">
          {actWords(sitting)} {sitting.actedBy}, {formatInstant(sitting.actedAt!)}
        </p>
      ) : (
        <ActOnReview employer={employer} reviewId={reviewId} sittingId={sitting.sittingId} action={action} />
      )}
    </li>
  );
}

function consequence({ requirement, outcome, certificate, standing }: ReviewedSitting): string {
  const { before, now } = requirement;
  if (before === now) return `The release’s requirement stays ${now ? "met" : "not met"}.`;
  const change = `The release’s requirement would be ${now ? "met" : "no longer met"}.`;
  if (!outcome) return `${change} The sitting is not decided yet.`;
  if (now) return `${change} Decided ${outcome}; the deciders are told.`;
  return certificate
    ? `${change} Certificate ${certificate} is ${standing}; whether it stands is for a decider to say.`
    : `${change} Decided ${outcome}; the deciders are told.`;
}

function actWords({ act, actReason, isMarkedAgain }: ReviewedSitting): string {
  if (act === "leave") return `Left as it is: ${actReason}`;
  return isMarkedAgain ? "Marked again." : "Waits to be marked again by the worker.";
}
