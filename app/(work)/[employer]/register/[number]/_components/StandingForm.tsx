"use client";
import { useRef, useState } from "react";
import type { ActionResult, FormAction } from "@/components/ui/actionResult";
import { fieldError } from "@/components/ui/actionResult";
import { Field } from "@/components/ui/Field";
import { Key } from "@/components/ui/Key";
import { RadioRows } from "@/components/ui/RadioRows";
import { SectionHead } from "@/components/ui/SectionHead";
import { Select } from "@/components/ui/Select";
import { SignAfresh } from "@/components/ui/SignAfresh";
import { TextArea } from "@/components/ui/TextArea";
import { GROUNDS, standingActs, type StandingAct, type StandingWord } from "@/lib/policies/standing";

type StandingFormProps = {
  employer: string;
  number: string;
  holder: string;
  title: string;
  stored: StandingWord;
  setStanding: FormAction;
  confirmPassword: FormAction;
};

const ACTS: { value: StandingAct; label: string; detail: string }[] = [
  { value: "suspend", label: "Suspend", detail: "Not to be relied on for now. Can be reinstated." },
  { value: "reinstate", label: "Reinstate", detail: "Valid again from now on." },
  { value: "withdraw", label: "Withdraw", detail: "Final. A new sitting would give a new certificate." },
];

/** Change the standing: act, ground, reason, one group of the number, and the password again. */
export function StandingForm({
  employer,
  number,
  holder,
  title,
  stored,
  setStanding,
  confirmPassword,
}: StandingFormProps) {
  const form = useRef<HTMLFormElement>(null);
  const [act, setAct] = useState<StandingAct | null>(null);
  const [filled, setFilled] = useState({ ground: "", reason: "", group: "" });
  const [signing, setSigning] = useState(false);
  const [result, setResult] = useState<ActionResult | null>(null);
  const possible = ACTS.filter(({ value }) => standingActs[value].from.includes(stored));
  if (possible.length === 0) return <p className="text-dense text-ink-2">This standing is final.</p>;

  const verb = ACTS.find(({ value }) => value === act)?.label;
  const group = number.split("-")[2]!;
  const missing = !act
    ? "Choose what to do."
    : !filled.ground
      ? "Choose a ground."
      : !filled.reason.trim()
        ? "Give your reason."
        : filled.group.trim().toUpperCase() !== group
          ? `Type the second group, ${group}.`
          : null;
  const sign = async () => {
    const answer = await setStanding(null, new FormData(form.current!));
    setResult(answer);
    if (answer.ok) {
      setSigning(false);
      setAct(null);
      setFilled({ ground: "", reason: "", group: "" });
    }
    return answer;
  };
  const fill = (field: keyof typeof filled) => (event: { target: { value: string } }) =>
    setFilled({ ...filled, [field]: event.target.value });
  return (
    <section aria-labelledby="change">
      <SectionHead title="Change the standing" id="change" />
      <form ref={form} className="mt-4 grid gap-5" onSubmit={(event) => event.preventDefault()}>
        <input type="hidden" name="employer" value={employer} />
        <input type="hidden" name="number" value={number} />
        <RadioRows
          name="act"
          legend="What to do"
          hideLegend
          rows={possible}
          value={act}
          onChange={(value) => setAct(value as StandingAct)}
        />
        <Select
          label="Ground"
          name="ground"
          empty="Choose a ground"
          choices={GROUNDS.map((ground) => ({ value: ground, label: ground }))}
          value={filled.ground}
          onChange={fill("ground")}
          help="The public page shows the ground."
          error={fieldError(result, "ground")}
        />
        <TextArea
          label="Reason"
          name="reason"
          note="the holder can read it"
          maxLength={4000}
          value={filled.reason}
          onChange={fill("reason")}
          error={fieldError(result, "reason")}
        />
        <Field
          label={`Type the second group of its number, ${group}`}
          name="group"
          look="code"
          autoComplete="off"
          value={filled.group}
          onChange={fill("group")}
          error={fieldError(result, "group")}
        />
        <Key variant={act === "reinstate" ? "filled" : "cut"} reason={missing} onClick={() => setSigning(true)}>
          {verb ? `${verb} ${number}…` : "Change the standing…"}
        </Key>
      </form>
      <SignAfresh
        open={signing}
        onClose={() => setSigning(false)}
        title={`${verb} ${number}?`}
        employer={employer}
        confirmPassword={confirmPassword}
        sign={sign}
        keyLabel={verb ?? "Sign"}
        cut={act !== "reinstate"}
      >
        <p>
          {holder}&rsquo;s certificate for {title} will read{" "}
          <strong>{act === "reinstate" ? "Valid" : act === "suspend" ? "Suspended" : "Withdrawn"}</strong> everywhere
          from now on.
          {act === "withdraw" && " This cannot be undone; a new sitting would give a new certificate."}
        </p>
      </SignAfresh>
    </section>
  );
}
