"use client";
import { useActionState } from "react";
import { messageOf, type FormAction } from "@/components/ui/actionResult";
import { Notice } from "@/components/ui/Notice";
import { SubmitKey } from "@/components/ui/SubmitKey";

type OpenCaseProps = {
  employer: string;
  sittingId: string;
  checkId: string;
  minutes: number;
  label: string;
  action: FormAction;
};

export function OpenCase({ employer, sittingId, checkId, minutes, label, action }: OpenCaseProps) {
  const [result, send] = useActionState(action, null);
  return (
    <form action={send} className="max-w-[280px]">
      <input type="hidden" name="employer" value={employer} />
      <input type="hidden" name="sitting" value={sittingId} />
      <input type="hidden" name="check" value={checkId} />
      <SubmitKey variant="plain">{label}</SubmitKey>
      <p className="mt-2 text-label font-normal text-ink-2">{minutes} minutes run from when your data is there.</p>
      {messageOf(result) && <Notice tone="minus" fact={messageOf(result)!} live className="mt-2" />}
    </form>
  );
}
