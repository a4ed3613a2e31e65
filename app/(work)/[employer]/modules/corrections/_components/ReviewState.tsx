import { LinkKey } from "@/components/ui/LinkKey";
import { Notice } from "@/components/ui/Notice";
import { formatInstant } from "@/components/ui/formatDay";
import type { ReviewView } from "@/lib/queries/listCorrections";
import { actOnReviewAction } from "../actions";
import { ChangedSitting } from "./ChangedSitting";

/** How far the comparison is, and each sitting that the corrected marking would change. */
export function ReviewState({ employer, review }: { employer: string; review: ReviewView }) {
  const { cases, computed, stopped, changed, unchanged } = review;
  return (
    <>
      <p className="mt-3 text-dense text-ink-2">
        Asked for by {review.askedBy}, {formatInstant(review.askedAt)}. {computed} of {cases} cases computed.
      </p>
      {computed < cases && (
        <Notice
          tone={stopped > 0 ? "minus" : "caution"}
          fact={stopped > 0 ? "Some cases could not be computed." : "The worker is at it."}
          className="mt-4"
          action={<LinkKey href={`/${employer}/modules/corrections`}>Look again</LinkKey>}
        >
          {stopped > 0
            ? `${stopped} stopped. Tell whoever runs this installation.`
            : "What it has found so far is below. You need not wait here."}
        </Notice>
      )}
      <p className="mt-4">
        {changed.length === 0
          ? "No sitting would come out different so far."
          : `${changed.length === 1 ? "One sitting" : `${changed.length} sittings`} would come out different.`}{" "}
        {unchanged} would not.
      </p>
      {changed.length > 0 && (
        <ul>
          {changed.map((sitting) => (
            <ChangedSitting
              key={sitting.sittingId}
              employer={employer}
              reviewId={review.id}
              sitting={sitting}
              action={actOnReviewAction}
            />
          ))}
        </ul>
      )}
    </>
  );
}
