"use client";
import { useActionState, useState } from "react";
import { fieldError, messageOf, type FormAction } from "@/components/ui/actionResult";
import { Field } from "@/components/ui/Field";
import { Notice } from "@/components/ui/Notice";
import { SectionHead } from "@/components/ui/SectionHead";
import { Select } from "@/components/ui/Select";
import { SubmitKey } from "@/components/ui/SubmitKey";
import { TextArea } from "@/components/ui/TextArea";

type AssignReleaseProps = {
  employer: string;
  releaseId: string;
  technicians: readonly { id: string; name: string }[];
  action: FormAction;
};

/** Give a technician a sitting of this release, with a day to have it done by. */
export function AssignRelease({ employer, releaseId, technicians, action }: AssignReleaseProps) {
  const [result, send] = useActionState(action, null);
  // Held here: a form forgets what was chosen once it is sent, and a refused one is sent again.
  const [technician, setTechnician] = useState("");
  const [dueOn, setDueOn] = useState("");
  const exposed = fieldError(result, "exposureNote");
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
          value={technician}
          onChange={(event) => setTechnician(event.target.value)}
          choices={technicians.map(({ id, name }) => ({ value: id, label: name }))}
          error={fieldError(result, "technicianId") ?? fieldError(result, "technician")}
          required
        />
        <Field
          label="Sit it by"
          name="dueOn"
          type="date"
          value={dueOn}
          onChange={(event) => setDueOn(event.target.value)}
          error={fieldError(result, "dueOn")}
          required
        />
        <SubmitKey>{exposed ? "Assign all the same" : "Assign"}</SubmitKey>
        {exposed && (
          <TextArea
            className="tablet:col-span-3"
            label="Why all the same"
            name="exposureNote"
            help="The decider reads it. The limit on cases of one kind does not hold in this sitting."
            error={exposed}
            rows={3}
            maxLength={1000}
          />
        )}
      </form>
      {result?.ok && <Notice tone="plus" fact="Assigned." live className="mt-4" />}
      {messageOf(result) && <Notice tone="minus" fact={messageOf(result)!} live className="mt-4" />}
      {technicians.length === 0 && <p className="mt-3 text-dense text-ink-2">Your firm has no technician yet.</p>}
    </section>
  );
}
