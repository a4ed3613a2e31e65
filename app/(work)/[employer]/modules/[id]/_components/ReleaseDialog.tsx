"use client";
import { useState, useTransition } from "react";
import { messageOf, type FormAction } from "@/components/ui/actionResult";
import { Dialog } from "@/components/ui/Dialog";
import { Key } from "@/components/ui/Key";
import { Notice } from "@/components/ui/Notice";
import { RadioRows } from "@/components/ui/RadioRows";
import { TextArea } from "@/components/ui/TextArea";
import { NO_REASONS, releaseCheckReason, ReleaseReasons, type Reasons } from "./ReleaseReasons";
import { useReleaseCheck } from "./useReleaseCheck";

type ReleaseDialogProps = {
  open: boolean;
  onClose: () => void;
  employer: string;
  moduleId: string;
  /** Number of the last release; null before the first. */
  last: string | null;
  /** Gives the revision that holds the text of the editor, or null when it could not be stored. */
  save: () => Promise<number | null>;
  action: FormAction;
};

/** Freezing the draft: which number it gets, and why. */
export function ReleaseDialog({ open, onClose, employer, moduleId, last, save, action }: ReleaseDialogProps) {
  const [kind, setKind] = useState<string>("minor");
  const [reason, setReason] = useState("");
  const [message, setMessage] = useState<string | null>(null);
  const [pending, start] = useTransition();
  const [reasons, setReasons] = useState<Reasons>(NO_REASONS);
  const { data: view } = useReleaseCheck(employer, moduleId, { ask: open });
  const number = last ? numberAfter(last, kind) : "1.0";

  const release = () =>
    start(async () => {
      const revision = await save();
      if (revision === null) return setMessage("The text could not be saved.");
      const form = new FormData();
      for (const [name, value] of Object.entries({
        employer,
        module: moduleId,
        revision: String(revision),
        kind,
        reason,
        outside: JSON.stringify(reasons),
      })) {
        form.set(name, value);
      }
      const result = await action(null, form);
      setMessage(result ? messageOf(result) : null);
    });
  return (
    <Dialog
      open={open}
      onClose={onClose}
      title={`Release ${number}?`}
      safe={<Key onClick={onClose}>Go on writing</Key>}
      act={
        <Key
          variant="filled"
          busy={pending}
          reason={reason.trim() ? releaseCheckReason(view, reasons) : "Say what changed and why."}
          onClick={release}
        >
          Release {number}
        </Key>
      }
    >
      <p>A release is never edited. Sittings stay on the release they were assigned; the next release is a new one.</p>
      {last && (
        <RadioRows
          name="kind"
          legend="Kind of release"
          value={kind}
          onChange={setKind}
          rows={[
            {
              value: "editorial",
              label: `Editorial, ${numberAfter(last, "editorial")}`,
              detail: "Wording only; no check changes.",
            },
            {
              value: "minor",
              label: `Minor, ${numberAfter(last, "minor")}`,
              detail: "Checks change, the competence does not.",
            },
            { value: "major", label: `Major, ${numberAfter(last, "major")}`, detail: "Scope or requirement changes." },
          ]}
        />
      )}
      <TextArea
        label={last ? "What changed, and why" : "Why now"}
        rows={3}
        maxLength={2000}
        value={reason}
        onChange={(event) => setReason(event.target.value)}
      />
      <ReleaseReasons
        href={`/${employer}/modules/${moduleId}/release-check`}
        view={view}
        reasons={reasons}
        onChange={setReasons}
      />
      {message && (
        <Notice tone="minus" fact={message} live>
          Nothing was released.
        </Notice>
      )}
    </Dialog>
  );
}

function numberAfter(last: string, kind: string): string {
  const [major, minor] = last.split(".").map(Number) as [number, number];
  return kind === "major" ? `${major + 1}.0` : `${major}.${minor + 1}`;
}
