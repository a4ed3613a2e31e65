"use client";
import { useEffect, useId, useRef, type ReactNode } from "react";

type DialogProps = {
  open: boolean;
  /** Called by Esc too: the safe way out. */
  onClose: () => void;
  title: string;
  children: ReactNode;
  /** The safe key, at the left. */
  safe: ReactNode;
  /** The key that acts, at the far right. */
  act: ReactNode;
};

/** For signing, withdrawing and handing in only. Focus stays inside and goes back to where it came from. */
export function Dialog({ open, onClose, title, children, safe, act }: DialogProps) {
  const titleId = useId();
  const sheet = useRef<HTMLDialogElement>(null);
  useEffect(() => {
    const dialog = sheet.current;
    if (!dialog) return;
    if (open && !dialog.open) dialog.showModal();
    if (!open && dialog.open) dialog.close();
  }, [open]);
  return (
    <dialog
      ref={sheet}
      className="dialog"
      aria-labelledby={titleId}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
    >
      <h2 id={titleId} className="text-h2">
        {title}
      </h2>
      <div className="mt-2 grid gap-4 text-body">{children}</div>
      <div className="mt-6 flex flex-wrap items-start justify-between gap-3">
        {safe}
        {act}
      </div>
    </dialog>
  );
}
