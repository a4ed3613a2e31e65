"use client";
import { useActionState, useState } from "react";
import { messageOf, type FormAction } from "@/components/ui/actionResult";
import { CheckBox } from "@/components/ui/CheckBox";
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
    <form action={send} className="grid gap-2">
      <input type="hidden" name="employer" value={employer} />
      <input type="hidden" name="personId" value={personId} />
      <div className="flex flex-wrap items-center gap-2">
        <div className="field-box">
          <select
            name="role"
            aria-label={`Role to grant to ${person}`}
            value={chosen}
            onChange={(event) => setRole(event.target.value)}
            required
          >
            <option value="">Choose a role</option>
            {open.map(({ value, label }) => (
              <option key={value} value={value}>
                {label}
              </option>
            ))}
          </select>
        </div>
        <SubmitKey variant="plain" size="small" aria-label={`Grant the role to ${person}`}>
          Grant
        </SubmitKey>
      </div>
      {chosen === "decider" && <CheckBox name="outsideLine" label="Outside the candidates’ line" />}
      {message && (
        <span role="alert" className="text-dense text-minus-deep">
          {message}
        </span>
      )}
    </form>
  );
}
