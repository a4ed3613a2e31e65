"use client";
import { useActionState, useState } from "react";
import { fieldError, messageOf, type ActionResult, type FormAction } from "@/components/ui/actionResult";
import { CheckBox } from "@/components/ui/CheckBox";
import { Field } from "@/components/ui/Field";
import { Notice } from "@/components/ui/Notice";
import { SectionHead } from "@/components/ui/SectionHead";
import { SubmitKey } from "@/components/ui/SubmitKey";
import { ROLE_CHOICES } from "./roleChoices";

/** Bring a person in: name, address, roles. The mail with the way in goes out with it. */
export function AddPersonForm({ employer, action }: { employer: string; action: FormAction }) {
  // Kept here: a form that was sent is emptied by itself, and a refused one must not be.
  const [name, setName] = useState("");
  const [email, setEmail] = useState("");
  const [roles, setRoles] = useState<readonly string[]>([]);
  const [result, send] = useActionState<ActionResult | null, FormData>(async (previous, form) => {
    const answer = await action(previous, form);
    if (answer.ok) {
      setName("");
      setEmail("");
      setRoles([]);
    }
    return answer;
  }, null);
  const tick = (role: string) =>
    setRoles(roles.includes(role) ? roles.filter((each) => each !== role) : [...roles, role]);
  const message = messageOf(result);
  return (
    <section aria-labelledby="add">
      <SectionHead title="Add a person" id="add" />
      <form action={send} className="mt-4 grid gap-4">
        <input type="hidden" name="employer" value={employer} />
        <Field
          label="Name"
          name="name"
          autoComplete="off"
          maxLength={120}
          help="As it is to stand on certificates."
          value={name}
          onChange={(event) => setName(event.target.value)}
          error={fieldError(result, "name")}
          required
        />
        <Field
          label="E-mail address"
          name="email"
          type="email"
          autoComplete="off"
          help="The way to sign in is mailed to it."
          value={email}
          onChange={(event) => setEmail(event.target.value)}
          error={fieldError(result, "email")}
          required
        />
        <fieldset>
          <legend className="field-label">Roles</legend>
          {ROLE_CHOICES.map(({ value, label, detail }) => (
            <CheckBox
              key={value}
              name="roles"
              value={value}
              label={
                <>
                  {label} <span className="text-dense text-ink-2">{detail}</span>
                </>
              }
              checked={roles.includes(value)}
              onChange={() => tick(value)}
            />
          ))}
          {fieldError(result, "roles") && <p className="field-error">{fieldError(result, "roles")}</p>}
        </fieldset>
        {roles.includes("decider") && (
          <CheckBox
            name="outsideLine"
            label="Outside the candidates’ line"
            help="Not in the line of the people decided on. The certificate says so."
          />
        )}
        <div>
          <SubmitKey>Add and mail the way in</SubmitKey>
        </div>
        {message && (
          <Notice tone="minus" fact={message} live>
            Nobody was added.
          </Notice>
        )}
        {result?.ok && (
          <Notice tone="plus" fact="The person is added." live>
            The mail is on its way.
          </Notice>
        )}
      </form>
    </section>
  );
}
