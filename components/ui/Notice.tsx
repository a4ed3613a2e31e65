import type { ReactNode } from "react";
import { Glyph } from "./Glyph";

const looks = {
  plus: { glyph: "valid", colour: "var(--plus)" },
  caution: { glyph: "suspended", colour: "var(--caution-deep)" },
  minus: { glyph: "outside", colour: "var(--minus-deep)" },
} as const;

type NoticeProps = {
  tone: keyof typeof looks;
  /** What happened, in bold: a sentence with its full stop. */
  fact: string;
  /** What is kept, what to do. */
  children?: ReactNode;
  /** One key. */
  action?: ReactNode;
  /** For faults: what the person can quote. */
  reference?: string;
  /** Announced when it appears after an act of the person; off for what stands on the page from the start. */
  live?: boolean;
  className?: string;
};

/** Stands in the page until read; nothing pops up and goes away. */
export function Notice({ tone, fact, children, action, reference, live, className }: NoticeProps) {
  const { glyph, colour } = looks[tone];
  return (
    <div
      className={`notice ${className ?? ""}`}
      style={{ "--notice": colour } as React.CSSProperties}
      role={live ? (tone === "minus" ? "alert" : "status") : undefined}
    >
      <Glyph name={glyph} />
      <p className="min-w-0 flex-1 basis-60">
        <strong className="font-bold">{fact}</strong> {children}
        {reference && <> Reference {reference}.</>}
      </p>
      {action}
    </div>
  );
}
