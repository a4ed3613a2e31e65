"use client";
import { useRef, useState, type DragEvent } from "react";
import { Key } from "@/components/ui/Key";
import { LinkKey } from "@/components/ui/LinkKey";
import { Notice } from "@/components/ui/Notice";
import { Working } from "@/components/ui/Working";
import { fileAnswer, type FileAnswer } from "@/components/certificates/fileAnswer";
import type { PublicFileVerdict } from "@/lib/queries/verifyPublicFile";

const TOO_MANY: FileAnswer = {
  tone: "caution",
  fact: "Too many look-ups from this address.",
  detail: "Nothing was verified. Wait a minute and choose the file again.",
  number: null,
};

type State =
  { at: "idle" } | { at: "reading" } | { at: "answered"; answer: FileAnswer; file: File } | { at: "not-sent" };

/** Drop the PDF itself: its signature is verified and the register is read for the number it carries. */
export function FileDrop() {
  const [state, setState] = useState<State>({ at: "idle" });
  const [over, setOver] = useState(false);
  const input = useRef<HTMLInputElement>(null);

  const verify = async (file: File | undefined) => {
    if (!file) return;
    setState({ at: "reading" });
    try {
      const response = await send("/api/verify/file", file);
      if (response.status === 429) return setState({ at: "answered", answer: TOO_MANY, file });
      if (!response.ok) throw new Error(response.statusText);
      setState({ at: "answered", answer: fileAnswer((await response.json()) as PublicFileVerdict), file });
    } catch {
      setState({ at: "not-sent" });
    }
  };
  const drop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    void verify(event.dataTransfer.files[0]);
  };

  return (
    <div className="grid gap-4">
      <div
        onDragOver={(event) => {
          event.preventDefault();
          setOver(true);
        }}
        onDragLeave={() => setOver(false)}
        onDrop={drop}
        className={`grid justify-items-start gap-3 border-line border-dashed border-control px-6 py-7 ${over ? "bg-plus-wash" : "bg-sheet"}`}
      >
        <p className="text-dense text-ink-2">Drop the PDF here, or choose it. Up to 10 MB; it is read and not kept.</p>
        <Key onClick={() => input.current?.click()} busy={state.at === "reading"}>
          Choose a PDF file
        </Key>
        <input
          ref={input}
          type="file"
          accept="application/pdf,.pdf"
          className="sr-only"
          tabIndex={-1}
          aria-label="Certificate as a PDF file"
          onChange={(event) => {
            void verify(event.target.files?.[0]);
            event.target.value = "";
          }}
        />
      </div>
      {state.at === "reading" && <Working label="Verifying the file" />}
      {state.at === "not-sent" && (
        <Notice tone="caution" fact="Cannot be told." live>
          The file could not be sent or the register not be reached, so nothing was verified. Try again in a minute.
        </Notice>
      )}
      {state.at === "answered" && <Answer answer={state.answer} file={state.file} />}
    </div>
  );
}

const send = (address: string, file: File) =>
  fetch(address, { method: "POST", body: file, headers: { "content-type": "application/pdf" } });

function Answer({ answer, file }: { answer: FileAnswer; file: File }) {
  return (
    <Notice
      tone={answer.tone}
      fact={answer.fact}
      live
      action={
        answer.number && (
          <span className="flex flex-wrap gap-3">
            <LinkKey href={`/verify/${answer.number}`} size="small">
              Open the register&rsquo;s entry
            </LinkKey>
            <SaveFileRecord file={file} />
          </span>
        )
      }
    >
      {answer.detail}
    </Notice>
  );
}

/** The file is sent once more, so that the record says what the server itself found. */
function SaveFileRecord({ file }: { file: File }) {
  const [state, setState] = useState<"idle" | "signing" | "failed">("idle");
  const save = async () => {
    setState("signing");
    try {
      const response = await send("/api/verify/records", file);
      if (!response.ok) throw new Error(response.statusText);
      window.location.assign(((await response.json()) as { address: string }).address);
      setState("idle");
    } catch {
      setState("failed");
    }
  };
  return (
    <>
      <Key size="small" onClick={() => void save()} busy={state === "signing"}>
        Save a record of this verification
      </Key>
      {state === "failed" && <span role="status">Not saved. Try again in a minute.</span>}
    </>
  );
}
