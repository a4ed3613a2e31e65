"use client";
import { useRef, useState, type DragEvent, type ReactNode } from "react";
import { Key } from "@/components/ui/Key";
import { Notice } from "@/components/ui/Notice";
import { SectionHead } from "@/components/ui/SectionHead";

export type ChosenFiles = { data: File; meta: File | null };

type CaptureChooserProps = {
  name: string | null;
  onChoose: (files: ChosenFiles) => void;
  /** What is typed in for a recording without metadata. */
  children: ReactNode;
};

/** A recording by drop or choice. Its metadata are chosen together with it. */
export function CaptureChooser({ name, onChoose, children }: CaptureChooserProps) {
  const [problem, setProblem] = useState<string | null>(null);
  const [over, setOver] = useState(false);
  const chooser = useRef<HTMLInputElement>(null);

  const take = (list: FileList | null) => {
    if (!list || list.length === 0) return;
    const chosen = pairOf([...list]);
    if (typeof chosen === "string") return setProblem(chosen);
    setProblem(null);
    onChoose(chosen);
  };
  const drop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    take(event.dataTransfer.files);
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
      <SectionHead title={name ?? "No file yet"} note="stays on this device: nothing is uploaded" />
      <p className="mt-3 max-w-measure text-dense text-ink-2">
        Drop a recording here, up to 20 MB: the .sigmf-meta and .sigmf-data files together, or a raw file alone, which
        is read as typed in below.
      </p>
      <p className="mt-3 no-print">
        <Key variant={name ? undefined : "filled"} onClick={() => chooser.current?.click()}>
          {name ? "Choose another file" : "Choose a file"}
        </Key>
      </p>
      <input
        ref={chooser}
        type="file"
        multiple
        className="sr-only"
        tabIndex={-1}
        aria-label="Recording"
        onChange={(event) => {
          take(event.target.files);
          event.target.value = "";
        }}
      />
      {problem && (
        <Notice tone="caution" fact="Not read." live className="mt-3">
          {problem}
        </Notice>
      )}
      <div className="mt-4 grid grid-cols-1 gap-3 tablet:grid-cols-3">{children}</div>
    </div>
  );
}

/** The recording and its metadata among the files, or what is wrong with them. */
export function pairOf(files: readonly File[]): ChosenFiles | string {
  const metas = files.filter(({ name }) => name.endsWith(".sigmf-meta"));
  const others = files.filter(({ name }) => !name.endsWith(".sigmf-meta"));
  if (others.length === 0) return "Choose the .sigmf-data file together with its .sigmf-meta file.";
  if (others.length > 1 || metas.length > 1)
    return "Choose one recording: two files at most, the samples and their metadata.";
  if (metas.length === 0 && others[0].name.endsWith(".sigmf-data"))
    return "Choose the .sigmf-meta file together with it: it says what the samples are.";
  return { data: others[0], meta: metas[0] ?? null };
}
