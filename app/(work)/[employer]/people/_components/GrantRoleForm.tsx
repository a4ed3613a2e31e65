"use client";
import { useActionState, useState } from "react";
import { messageOf, type FormAction } from "@/components/ui/actionResult";
import { CheckBox } from "@/components/ui/CheckBox";
import { Select } from "@/components/ui/Select";
import { SubmitKey } from "@/components/ui/SubmitKey";
import { ROLE_CHOICES } from "./roleChoices";

type GrantRoleFormProps = {
  employer: string;
  personId: string;
  person: string;
  held: readonly string[];
  action: FormAction;
};

/** One more role for a person of the firm. */
export function GrantRoleForm({ employer, personId, person, held, action }: GrantRoleFormProps) {
  const [result, send] = useActionState(action, null);
  const [role, setRole] = useState("");
  const open = ROLE_CHOICES.filter(({ value }) => !held.includes(value));
  const chosen = open.some(({ value }) => value === role) ? role : "";
  const message = messageOf(result);
  if (open.length === 0) return <span className="text-ink-2">holds every role</span>;
  return (
    <details>
      <summary className="key key-small">Grant a role</summary>
      <form action={send} className="mt-3 grid gap-3">
        <input type="hidden" name="employer" value={employer} />
        <input type="hidden" name="personId" value={personId} />
        <Select
          label={`Role for ${person}`}
          name="role"
          choices={open}
          empty="Choose a role"
          value={chosen}
          onChange={(event) => setRole(event.target.value)}
          error={message}
          required
        />
        {chosen === "decider" && <CheckBox name="outsideLine" label="Outside the candidates’ line" />}
        <div>
          <SubmitKey variant="plain" size="small">
            Grant
          </SubmitKey>
        </div>
      </form>
    </details>
  );
}
