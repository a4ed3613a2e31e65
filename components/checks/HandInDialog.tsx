"use client";
import { useState } from "react";
import { Dialog } from "@/components/ui/Dialog";
import { Key } from "@/components/ui/Key";
import { Notice } from "@/components/ui/Notice";
import { TextArea } from "@/components/ui/TextArea";
import { countGiven, type FormField } from "./formFields";

type HandInDialogProps = {
  open: boolean;
  onClose: () => void;
  address: string;
  fields: readonly FormField[];
  answers: Readonly<Record<string, string>>;
  onHandedIn: () => void;
};

/** The last look: what is missing, one's own words, and the key that cannot be taken back. */
export function HandInDialog({ open, onClose, address, fields, answers, onHandedIn }: HandInDialogProps) {
  const [words, setWords] = useState("");
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<string | null>(null);
  const given = countGiven(fields, answers);
  const empty = fields.filter(({ id }) => !(answers[id] ?? "").trim());
  const count = given === 1 ? "1 answer" : `${given} answers`;

  const handIn = async () => {
    setBusy(true);
    setFault(null);
    try {
      const response = await fetch(address, {
        method: "POST",
        headers: { "content-type": "application/json" },
        body: JSON.stringify({ answers, words }),
      });
      const body = (await response.json()) as { message?: string };
      if (response.ok) return onHandedIn();
      setFault(body.message ?? "The server did not take it.");
    } catch {
      setFault("There is no signal.");
    } finally {
      setBusy(false);
    }
  };
  return (
    <Dialog
      open={open}
      onClose={onClose}
      title={`Hand in ${count}?`}
      safe={<Key onClick={onClose}>Go on working</Key>}
      act={
        <Key variant="filled" busy={busy} onClick={() => void handIn()}>
          Hand in {count}
        </Key>
      }
    >
      <p>You cannot change them afterwards.</p>
      {empty.length > 0 && (
        <p>
          <strong>{empty.length === 1 ? "1 field is empty" : `${empty.length} fields are empty`}:</strong>{" "}
          {[...new Set(empty.map(({ spec }) => spec.label))].join(", ")}.
        </p>
      )}
      <TextArea
        label="In your own words"
        note="if you want the decider to read something"
        rows={3}
        maxLength={4000}
        value={words}
        onChange={(event) => setWords(event.target.value)}
      />
      {fault && (
        <Notice tone="minus" fact={fault} live>
          Your answers are kept. Hand in again.
        </Notice>
      )}
    </Dialog>
  );
}
