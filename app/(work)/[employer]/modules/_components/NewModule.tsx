"use client";
import { useActionState } from "react";
import { fieldError, messageOf, type FormAction } from "@/components/ui/actionResult";
import { Field } from "@/components/ui/Field";
import { Notice } from "@/components/ui/Notice";
import { SectionHead } from "@/components/ui/SectionHead";
import { SubmitKey } from "@/components/ui/SubmitKey";

export function NewModule({ employer, action }: { employer: string; action: FormAction }) {
  const [result, send] = useActionState(action, null);
  return (
    <section aria-labelledby="new">
      <SectionHead title="Begin a module" id="new" />
      <form action={send} className="mt-4 grid gap-4">
        <input type="hidden" name="employer" value={employer} />
        <Field
          label="Code"
          name="code"
          look="code"
          help="Capitals, figures and dashes, as SBW-R2. It stays."
          error={fieldError(result, "code")}
          maxLength={24}
          required
        />
        <Field label="Title" name="title" error={fieldError(result, "title")} maxLength={120} required />
        {messageOf(result) && <Notice tone="minus" fact={messageOf(result)!} live />}
        <div>
          <SubmitKey variant="plain">Begin the module</SubmitKey>
        </div>
      </form>
    </section>
  );
}
