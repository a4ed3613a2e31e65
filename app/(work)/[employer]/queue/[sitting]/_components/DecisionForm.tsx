"use client";
import { useRef, useState } from "react";
import type { ActionResult, FormAction } from "@/components/ui/actionResult";
import { CheckBox } from "@/components/ui/CheckBox";
import { Key } from "@/components/ui/Key";
import { RadioRows } from "@/components/ui/RadioRows";
import { SectionHead } from "@/components/ui/SectionHead";
import { SignAfresh } from "@/components/ui/SignAfresh";
import { TextArea } from "@/components/ui/TextArea";

type DecisionFormProps = {
  employer: string;
  sittingId: string;
  technician: string;
  title: string;
  months: number;
  requirementMet: boolean;
  outsideLine: boolean;
  decide: FormAction;
  confirmPassword: FormAction;
};

/** Outcome, reasons, declaration; the key names the outcome and the signature asks for the password again. */
export function DecisionForm(props: DecisionFormProps) {
  const { employer, technician, title, months, requirementMet, outsideLine } = props;
  const form = useRef<HTMLFormElement>(null);
  const [outcome, setOutcome] = useState<string | null>(null);
  const [reason, setReason] = useState("");
  const [declared, setDeclared] = useState(false);
  const [signing, setSigning] = useState(false);
  const line = outsideLine ? "I am not in the line of" : "I decide within the line of";
  const declaration = `${line} ${technician}, did not train or assign this person, and had no part in this release.`;

  const missing = !outcome
    ? "Choose an outcome."
    : !reason.trim()
      ? "Give your reasons."
      : !declared
        ? "Make the declaration."
        : null;
  const sign = async (): Promise<ActionResult> => {
    const result = await props.decide(null, new FormData(form.current!));
    if (result.ok) setSigning(false);
    return result;
  };
  return (
    <>
      <form ref={form} className="mt-4 grid gap-6" onSubmit={(event) => event.preventDefault()}>
        <input type="hidden" name="employer" value={employer} />
        <input type="hidden" name="sitting" value={props.sittingId} />
        <input type="hidden" name="declaration" value={declaration} />
        <RadioRows
          name="outcome"
          legend="Outcome"
          hideLegend
          value={outcome}
          onChange={setOutcome}
          rows={[
            {
              value: "competent",
              label: "Competent",
              detail: requirementMet
                ? `A certificate for ${title} is issued to ${technician}, for ${months} months from today.`
                : "The release’s requirement is not met, so this cannot be chosen.",
              disabled: !requirementMet,
            },
            {
              value: "not yet competent",
              label: "Not yet competent",
              detail: `A new sitting can be assigned. Your reasons go to ${technician}.`,
            },
          ]}
        />
        <TextArea
          label="Reasons"
          name="reason"
          note={`${technician} can read them`}
          rows={5}
          maxLength={4000}
          value={reason}
          onChange={(event) => setReason(event.target.value)}
        />
        <CheckBox label={declaration} checked={declared} onChange={(event) => setDeclared(event.target.checked)} />
        <Key variant="filled" wide reason={missing} onClick={() => setSigning(true)}>
          {outcome ? `Sign: ${outcome}` : "Sign"}
        </Key>
      </form>
      <p className="mt-3 text-dense text-ink-2">
        You sign in again to sign. A signed decision is never edited. A certificate can be suspended or withdrawn, with
        a date and a reason.
      </p>
      <SectionHead title="Before you sign" level={3} className="mt-7" />
      <p className="mt-2 text-dense">
        {requirementMet ? "The release’s requirement is met." : "The release’s requirement is not met."} The marking is
        the server’s; the decision is yours. If the evidence leaves you in doubt, say so in the reasons.
      </p>
      <SignAfresh
        open={signing}
        onClose={() => setSigning(false)}
        title={`Sign: ${outcome ?? ""}`}
        employer={employer}
        confirmPassword={props.confirmPassword}
        sign={sign}
        keyLabel={`Sign: ${outcome ?? ""}`}
      >
        <p>
          {outcome === "competent"
            ? `${technician} gets a certificate for ${title}, and the register shows it to anyone with its number.`
            : `${technician} is told that the sitting is decided not yet competent, with your reasons.`}
        </p>
      </SignAfresh>
    </>
  );
}
