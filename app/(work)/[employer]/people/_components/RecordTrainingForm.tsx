"use client";
import { useActionState, useState, type ChangeEvent } from "react";
import { fieldError, messageOf, type ActionResult, type FormAction } from "@/components/ui/actionResult";
import { Field } from "@/components/ui/Field";
import { Notice } from "@/components/ui/Notice";
import { SectionHead } from "@/components/ui/SectionHead";
import { Select } from "@/components/ui/Select";
import { SubmitKey } from "@/components/ui/SubmitKey";

type Trainable = { id: string; name: string; isTechnician: boolean };
type RecordTrainingFormProps = { employer: string; people: readonly Trainable[]; action: FormAction };

const NOTHING = { technicianId: "", trainerId: "", endedOn: "" };

/** Who trained whom; it bars the trainer from deciding. */
export function RecordTrainingForm({ employer, people, action }: RecordTrainingFormProps) {
  // Kept here: a form that was sent is emptied by itself, and a refused one must not be.
  const [kept, setKept] = useState(NOTHING);
  const [result, send] = useActionState<ActionResult | null, FormData>(async (previous, form) => {
    const answer = await action(previous, form);
    if (answer.ok) setKept(NOTHING);
    return answer;
  }, null);
  const keep = (event: ChangeEvent<HTMLInputElement | HTMLSelectElement>) =>
    setKept({ ...kept, [event.target.name]: event.target.value });
  const choices = people.map(({ id, name }) => ({ value: id, label: name }));
  const technicians = people
    .filter(({ isTechnician }) => isTechnician)
    .map(({ id, name }) => ({ value: id, label: name }));
  return (
    <section aria-labelledby="record-training">
      <SectionHead title="Record a training" id="record-training" />
      <form action={send} className="mt-4 grid gap-4">
        <input type="hidden" name="employer" value={employer} />
        <Select
          label="Technician"
          name="technicianId"
          choices={technicians}
          empty="Choose a technician"
          value={kept.technicianId}
          onChange={keep}
          error={fieldError(result, "technicianId")}
          required
        />
        <Select
          label="Trained by"
          name="trainerId"
          choices={choices}
          empty="Choose who trained"
          value={kept.trainerId}
          onChange={keep}
          error={fieldError(result, "trainerId")}
          required
        />
        <Field
          label="Last day of the training"
          name="endedOn"
          type="date"
          value={kept.endedOn}
          onChange={keep}
          error={fieldError(result, "endedOn")}
          required
        />
        <div>
          <SubmitKey variant="plain">Record the training</SubmitKey>
        </div>
        {messageOf(result) && (
          <Notice tone="minus" fact={messageOf(result)!} live>
            Nothing was recorded.
          </Notice>
        )}
        {result?.ok && <Notice tone="plus" fact="The training is recorded." live />}
      </form>
    </section>
  );
}
