import Link from "next/link";
import type { FormAction } from "@/components/ui/actionResult";
import { formatInstant } from "@/components/ui/formatDay";
import { Glyph } from "@/components/ui/Glyph";
import { LinkKey } from "@/components/ui/LinkKey";
import type { CaseLine, CheckLine } from "@/lib/queries/getSitting";
import { OpenCase } from "./OpenCase";

type CheckRowProps = {
  employer: string;
  sittingId: string;
  check: CheckLine;
  freshCases: number;
  mayOpen: boolean;
  open: FormAction;
};

/** One check of the sitting: its cases so far, and the one thing that can be done next. */
export function CheckRow({ employer, sittingId, check, freshCases, mayOpen, open }: CheckRowProps) {
  const { plan, cases, next, met } = check;
  return (
    <li className="grid gap-x-6 gap-y-3 border-b-hair border-rule py-5 tablet:grid-cols-[1fr_auto]">
      <div>
        <h3 className="flex items-center gap-3 text-h3">
          <Glyph name={met ? "within" : cases.at(-1)?.state === "marked" ? "outside" : "todo"} />
          {plan.title}
        </h3>
        <p className="mt-1 text-dense text-ink-2">
          {plan.minutes} min{check.required ? ", required" : ""}
          {met ? ", met" : ""}
        </p>
        {cases.length > 0 && (
          <ul className="mt-2 grid gap-1 text-dense">
            {cases.map((one) => (
              <li key={one.id}>
                Case {one.number} of {freshCases + 1}: {caseWords(one, plan.kind)}
                {one.state === "marked" && (
                  <>
                    {" "}
                    <Link className="link" href={`/${employer}/records/${one.id}`}>
                      Marking record
                    </Link>
                  </>
                )}
              </li>
            ))}
          </ul>
        )}
        {next.state === "closed" && !met && cases.length > 0 && (
          <p className="mt-2 text-dense text-ink-2">
            {next.opensAt ? `A fresh case opens on ${formatInstant(next.opensAt)}.` : next.reason}
          </p>
        )}
      </div>
      {mayOpen && next.state === "open" && (
        <div>
          <LinkKey href={`/${employer}/cases/${next.caseId}`} variant="filled">
            Go to the case
          </LinkKey>
        </div>
      )}
      {mayOpen && next.state === "available" && (
        <OpenCase
          employer={employer}
          sittingId={sittingId}
          checkId={plan.id}
          minutes={plan.minutes}
          label={next.number === 1 ? "Open the case" : "Open a fresh case"}
          action={open}
        />
      )}
    </li>
  );
}

function caseWords(one: CaseLine, kind: string): string {
  if (one.state === "building") return "being drawn for you";
  if (one.state === "open") return `open until ${formatInstant(one.endsAt!)}`;
  const handed = `handed in ${formatInstant(one.handedInAt!)}${one.byClock ? " by the clock" : ""}`;
  const waits = kind === "written" ? "an assessor judges it" : "being marked";
  return one.state === "handed in" ? `${handed}, ${waits}` : `${one.met ? "met" : "not met"}, ${handed}.`;
}
