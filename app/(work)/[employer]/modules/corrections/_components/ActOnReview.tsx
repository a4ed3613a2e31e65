"use client";
import { useActionState, useState } from "react";
import { fieldError, messageOf, type FormAction } from "@/components/ui/actionResult";
import { Notice } from "@/components/ui/Notice";
import { SubmitKey } from "@/components/ui/SubmitKey";
import { TextArea } from "@/components/ui/TextArea";

type ActOnReviewProps = { employer: string; reviewId: string; sittingId: string; action: FormAction };

/** Mark the sitting's cases again, or leave them with a written reason. Once for each sitting. */
export function ActOnReview({ employer, reviewId, sittingId, action }: ActOnReviewProps) {
  const [result, send] = useActionState(action, null);
  const [reason, setReason] = useState("");
  return (
    <form action={send} className="mt-3 grid max-w-measure gap-3">
      <input type="hidden" name="employer" value={employer} />
      <input type="hidden" name="review" value={reviewId} />
      <input type="hidden" name="sitting" value={sittingId} />
      <TextArea
        label="Reason"
        name="reason"
        note="needed where it is left"
        rows={2}
        maxLength={2000}
        value={reason}
        onChange={(event) => setReason(event.target.value)}
        error={fieldError(result, "reason")}
      />
      <div className="flex flex-wrap gap-3">
        <SubmitKey name="act" value="mark again">
          Mark again
        </SubmitKey>
        <SubmitKey name="act" value="leave" variant="plain">
          Leave as it is
        </SubmitKey>
      </div>
      {messageOf(result) && <Notice tone="minus" fact={messageOf(result)!} live />}
    </form>
  );
}
