"use client";
import { useActionState } from "react";
import { fieldError, type FormAction } from "@/components/ui/actionResult";
import { Field } from "@/components/ui/Field";
import { Notice } from "@/components/ui/Notice";
import { SubmitKey } from "@/components/ui/SubmitKey";

export function NameForm({ name, action }: { name: string; action: FormAction }) {
  const [result, send] = useActionState(action, null);
  return (
    <form action={send} className="mt-4 grid gap-4">
      {/* A new default only counts for a new field. */}
      <Field
        key={name}
        label="Your name"
        name="name"
        autoComplete="name"
        maxLength={120}
        defaultValue={name}
        help="Certificates already issued keep the name they carry."
        error={fieldError(result, "name")}
        required
      />
      <div>
        <SubmitKey variant="plain">Store the name</SubmitKey>
      </div>
      {result?.ok && <Notice tone="plus" fact="The name is stored." live />}
    </form>
  );
}
