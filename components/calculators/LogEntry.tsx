"use client";
import { useRef, useState, type DragEvent } from "react";
import { Key } from "@/components/ui/Key";
import { Notice } from "@/components/ui/Notice";
import { SectionHead } from "@/components/ui/SectionHead";
import { TextArea } from "@/components/ui/TextArea";

/** `name` of the file it came from; null for what was typed or pasted. */
export type PastedLog = { name: string | null; text: string };

type LogEntryProps = { log: PastedLog; onChange: (log: PastedLog) => void; problem: string | null };

const MOST_BYTES = 40_000_000;

/** A log of lines, pasted or dropped as a file. A file is not put into the field: a day of lines would make it slow. */
export function LogEntry({ log, onChange, problem }: LogEntryProps) {
  const [typed, setTyped] = useState(log.name === null ? log.text : "");
  const [tooLarge, setTooLarge] = useState<string | null>(null);
  const [over, setOver] = useState(false);
  const chooser = useRef<HTMLInputElement>(null);

  const take = async (file: File | undefined) => {
    setTooLarge(null);
    if (!file) return;
    if (file.size > MOST_BYTES) return setTooLarge(file.name);
    onChange({ name: file.name, text: await file.text() });
  };
  const drop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    void take(event.dataTransfer.files[0]);
  };
  return (
    <div
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={drop}
      className={over ? "bg-plus-wash" : undefined}
    >
      <SectionHead title="The log" note="kept while this page is open; the link cannot carry it" />
      {log.name !== null ? (
        <p className="mt-3 flex flex-wrap items-center gap-4">
          <span className="font-semibold">{log.name}</span>
          <Key size="small" onClick={() => onChange({ name: null, text: "" })}>
            Take the log out
          </Key>
        </p>
      ) : (
        <TextArea
          className="mt-3"
          label="Time and time error"
          unit="ns"
          help="A reading a line: seconds or a time stamp, then ns. Empty lines and lines that begin with # are passed over."
          rows={6}
          value={typed}
          spellCheck={false}
          onChange={(event) => {
            setTyped(event.target.value);
            // What is pasted is whole; what is typed is read when the field is left.
            if ((event.nativeEvent as InputEvent).inputType === "insertFromPaste")
              onChange({ name: null, text: event.target.value });
          }}
          onBlur={(event) => {
            if (event.target.value !== log.text) onChange({ name: null, text: event.target.value });
          }}
        />
      )}
      <p className="mt-3 flex flex-wrap items-center gap-4 no-print">
        <Key size="small" onClick={() => chooser.current?.click()}>
          Choose a file
        </Key>
        <span className="text-label font-normal text-ink-2">or drop it here, up to 40 MB</span>
      </p>
      <input
        ref={chooser}
        type="file"
        accept=".txt,.csv,.log,.dat,text/plain,text/csv"
        className="sr-only"
        tabIndex={-1}
        aria-label="Log as a file"
        onChange={(event) => {
          void take(event.target.files?.[0]);
          event.target.value = "";
        }}
      />
      {tooLarge && (
        <Notice tone="caution" fact="Not read." live className="mt-3">
          {`${tooLarge} is larger than 40 MB. The log before it is kept.`}
        </Notice>
      )}
      {problem && (
        <Notice tone="minus" fact="The log cannot be read." live className="mt-3">
          {problem}
        </Notice>
      )}
    </div>
  );
}
