"use client";
import { useActionState } from "react";
import { messageOf, type FormAction } from "@/components/ui/actionResult";
import { SubmitKey } from "@/components/ui/SubmitKey";

type Held = { grantId: string; role: string; outsideLine: boolean };
type HeldRolesProps = { employer: string; person: string; roles: readonly Held[]; end: FormAction | null };

/** The roles of one person; with a key to end each for whoever may. */
export function HeldRoles({ employer, person, roles, end }: HeldRolesProps) {
  if (roles.length === 0) return <span className="text-ink-2">no role now</span>;
  return (
    <ul className="grid content-start gap-1">
      {roles.map((held) => (
        <li key={held.grantId} className="flex flex-wrap items-center gap-x-3 gap-y-1">
          <span>
            {held.role}
            {held.outsideLine && <span className="text-ink-2">, outside the candidates&rsquo; line</span>}
          </span>
          {end && <EndRole employer={employer} person={person} held={held} end={end} />}
        </li>
      ))}
    </ul>
  );
}

type EndRoleProps = { employer: string; person: string; held: Held; end: FormAction };

function EndRole({ employer, person, held, end }: EndRoleProps) {
  const [result, send] = useActionState(end, null);
  const message = messageOf(result);
  return (
    <form action={send} className="flex flex-wrap items-center gap-2">
      <input type="hidden" name="employer" value={employer} />
      <input type="hidden" name="grantId" value={held.grantId} />
      <SubmitKey variant="plain" size="tiny" aria-label={`End the role ${held.role} of ${person}`}>
        End
      </SubmitKey>
      {message && (
        <span role="alert" className="text-dense text-minus-deep">
          {message}
        </span>
      )}
    </form>
  );
}
