"use client";
import { useActionState } from "react";
import { fieldError, messageOf, type FormAction } from "@/components/ui/actionResult";
import { Field } from "@/components/ui/Field";
import { Notice } from "@/components/ui/Notice";
import { SectionHead } from "@/components/ui/SectionHead";
import { Select } from "@/components/ui/Select";
import { SubmitKey } from "@/components/ui/SubmitKey";

type AssignReleaseProps = {
  employer: string;
  releaseId: string;
  technicians: readonly { id: string; name: string }[];
  action: FormAction;
};

/** Give a technician a sitting of this release, with a day to have it done by. */
export function AssignRelease({ employer, releaseId, technicians, action }: AssignReleaseProps) {
  const [result, send] = useActionState(action, null);
  return (
    <section aria-labelledby="assign">
      <SectionHead title="Assign" id="assign" note="the technician is mailed; the fee falls due" />
      <form action={send} className="mt-4 grid items-end gap-4 tablet:grid-cols-[1fr_12rem_auto]">
        <input type="hidden" name="employer" value={employer} />
        <input type="hidden" name="release" value={releaseId} />
        <Select
          label="Technician"
          name="technician"
          empty="Choose a technician"
          choices={technicians.map(({ id, name }) => ({ value: id, label: name }))}
          error={fieldError(result, "technicianId") ?? fieldError(result, "technician")}
          required
        />
        <Field label="Sit it by" name="dueOn" type="date" error={fieldError(result, "dueOn")} required />
        <SubmitKey>Assign</SubmitKey>
      </form>
      {result?.ok && <Notice tone="plus" fact="Assigned." live className="mt-4" />}
      {messageOf(result) && <Notice tone="minus" fact={messageOf(result)!} live className="mt-4" />}
      {technicians.length === 0 && <p className="mt-3 text-dense text-ink-2">Your firm has no technician yet.</p>}
    </section>
  );
}
