"use client";
import { BlockMath } from "react-katex";
import "katex/dist/katex.min.css";

/** The formula a calculator uses, and where it is published. */
export function Formula({ tex, source }: { tex: string; source: string }) {
  return (
    <figure className="overflow-x-auto border-t-hair border-rule pt-3 text-dense" tabIndex={0} aria-label="Formula">
      <BlockMath math={tex} />
      <figcaption className="text-label font-normal text-ink-2">{source}</figcaption>
    </figure>
  );
}
