"use client";
import { useEffect, useState } from "react";
import { Key } from "@/components/ui/Key";

type CopyKeyProps = { label: string; done: string; text: () => string };

const SHOWN_MS = 4000;

/** Copies a text; where the browser forbids that, shows it to be copied by hand. */
export function CopyKey({ label, done, text }: CopyKeyProps) {
  const [state, setState] = useState<{ copied: boolean; text: string } | null>(null);
  useEffect(() => {
    if (!state?.copied) return;
    const timer = setTimeout(() => setState(null), SHOWN_MS);
    return () => clearTimeout(timer);
  }, [state]);
  const copy = async () => {
    const copying = text();
    try {
      await navigator.clipboard.writeText(copying);
      setState({ copied: true, text: copying });
    } catch {
      setState({ copied: false, text: copying });
    }
  };
  return (
    <span className="grid max-w-full gap-1">
      <Key size="small" onClick={copy}>
        {state?.copied ? done : label}
      </Key>
      <span className="sr-only" role="status">
        {state?.copied && done}
      </span>
      {state && !state.copied && (
        <textarea
          readOnly
          rows={2}
          className="w-64 max-w-full text-code"
          aria-label={`${label}: select and copy`}
          value={state.text}
          onFocus={(event) => event.currentTarget.select()}
        />
      )}
    </span>
  );
}
