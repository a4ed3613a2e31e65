"use client";
import { useActionState, useState } from "react";
import { messageOf, type FormAction } from "@/components/ui/actionResult";
import { Notice } from "@/components/ui/Notice";
import { SubmitKey } from "@/components/ui/SubmitKey";
import { JudgedLine, type Judged, type Line } from "./JudgedLine";

type JudgingFormProps = {
  employer: string;
  caseId: string;
  technician: string;
  lines: readonly Line[];
  judge: FormAction;
};

/** Each line with its text, a verdict and its reason; one key for all of them. */
export function JudgingForm({ employer, caseId, technician, lines, judge }: JudgingFormProps) {
  const [result, send] = useActionState(judge, null);
  const [judged, setJudged] = useState<Readonly<Record<string, Judged>>>({});
  const of = (id: string): Judged => judged[id] ?? { within: null, reason: "" };
  const missing = lines.some(({ of: id }) => of(id).within === null)
    ? "Judge every line."
    : lines.some(({ of: id }) => of(id).within === false && of(id).reason.trim() === "")
      ? "Give a reason for every line that is outside."
      : null;
  const verdicts = lines.map(({ of: id }) => ({ of: id, within: of(id).within === true, reason: of(id).reason }));
  return (
    <form action={send} className="mt-8 grid gap-7">
      <input type="hidden" name="employer" value={employer} />
      <input type="hidden" name="case" value={caseId} />
      <input type="hidden" name="verdicts" value={JSON.stringify(verdicts)} />
      {lines.map((line) => (
        <JudgedLine
          key={line.of}
          line={line}
          technician={technician}
          judged={of(line.of)}
          onChange={(next) => setJudged({ ...judged, [line.of]: next })}
        />
      ))}
      {messageOf(result) && <Notice tone="minus" fact={messageOf(result)!} live />}
      <p className="text-dense text-ink-2">
        This makes the marking record, with your name. It is never edited. Whoever judges a line of a sitting does not
        decide on it.
      </p>
      <SubmitKey reason={missing}>Keep the marking record</SubmitKey>
    </form>
  );
}
