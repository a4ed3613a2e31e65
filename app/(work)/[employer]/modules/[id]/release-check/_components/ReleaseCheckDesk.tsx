"use client";
import { useState, useTransition } from "react";
import { messageOf, type FormAction } from "@/components/ui/actionResult";
import { Empty } from "@/components/ui/Empty";
import { Key } from "@/components/ui/Key";
import { LinkKey } from "@/components/ui/LinkKey";
import { Notice } from "@/components/ui/Notice";
import { WorkBar } from "@/components/ui/WorkBar";
import type { ReleaseCheckView } from "@/lib/queries/getReleaseCheck";
import { isRunning, useReleaseCheck } from "../../_components/useReleaseCheck";
import { CheckTrial } from "./CheckTrial";
import { SittingRate } from "./SittingRate";

type ReleaseCheckDeskProps = { employer: string; first: ReleaseCheckView; ask: FormAction; stop: FormAction };

/** Every check of the draft tried by people who never existed, and what it comes to over a sitting. */
export function ReleaseCheckDesk({ employer, first, ask, stop }: ReleaseCheckDeskProps) {
  const { data: view = first, mutate } = useReleaseCheck(employer, first.moduleId, { first });
  const [message, setMessage] = useState<string | null>(null);
  const [pending, start] = useTransition();
  const send = (action: FormAction, fields: Record<string, string>) =>
    start(async () => {
      const form = new FormData();
      for (const [name, value] of Object.entries({ employer, module: first.moduleId, ...fields }))
        form.set(name, value);
      setMessage(messageOf(await action(null, form)));
      await mutate();
    });
  const needed = view.checks.filter((check) => check.needed);
  const finished = needed.filter(({ result }) => result).length;
  const within = needed.filter((check) => check.within).length;
  const running = isRunning(view);
  return (
    <>
      <WorkBar
        eyebrow={`Release check of the draft, ${view.code}`}
        title={view.title}
        facts={
          view.errors > 0
            ? []
            : [
                { label: "Finished", value: `${finished} of ${needed.length}` },
                { label: "Within bounds", value: `${within} of ${needed.length}` },
              ]
        }
        keys={
          <>
            <LinkKey href={`/${employer}/modules/${view.moduleId}`}>Back to the draft</LinkKey>
            {running ? (
              <Key busy={pending} onClick={() => send(stop, {})}>
                Stop
              </Key>
            ) : (
              <Key
                busy={pending}
                reason={needed.length === 0 ? "No check to try" : null}
                onClick={() => send(ask, { preview: "yes" })}
              >
                Try 200
              </Key>
            )}
            <Key
              variant="filled"
              busy={pending}
              reason={keyReason(view, finished === needed.length, running)}
              onClick={() => send(ask, { preview: "no" })}
            >
              Run the release check
            </Key>
          </>
        }
      />
      <div className="page grid gap-10 py-7">
        {message && (
          <Notice tone="minus" fact={message} live>
            Nothing was begun.
          </Notice>
        )}
        <p className="max-w-measure">
          Each check is tried on 1{"\u2009"}000 cases that nobody sits: by the right method read with care, by each
          known wrong method, and by ten blind guesses a case. A check that a guess can meet, or that careful people
          fail, is seen here before it harms anybody. Trying 200 is a look; it permits no release.
        </p>
        {view.errors > 0 ? (
          <Empty title="The draft has a problem">
            {view.errors === 1 ? "1 error has" : `${view.errors} errors have`} to be mended before its checks can be
            tried.
          </Empty>
        ) : (
          <>
            <SittingRate view={view} />
            {view.checks.map((check) => (
              <CheckTrial key={check.id} base={`/${employer}/modules/${view.moduleId}/release-check`} check={check} />
            ))}
          </>
        )}
      </div>
    </>
  );
}

function keyReason({ errors, checks }: ReleaseCheckView, finished: boolean, running: boolean): string | null {
  if (errors > 0 || checks.length === 0) return "No check to try";
  if (finished) return "Every check has finished";
  return running ? "Running" : null;
}
