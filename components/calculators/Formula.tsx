"use client";
import { BlockMath } from "react-katex";
import "katex/dist/katex.min.css";

type FormulaProps = {
  /** One formula a line: long ones do not fit a phone side by side. */
  tex: string | readonly string[];
  /** Where it is published. */
  source: string;
  /** The same with the numbers put in, a line each. */
  worked?: readonly string[];
};

/** The formula a calculator uses, where it is published, and the formula with the numbers put in. */
export function Formula({ tex, source, worked = [] }: FormulaProps) {
  return (
    <figure className="working-out text-dense" tabIndex={0} aria-label="Formula">
      {[tex, worked].flat().map((line, at) => (
        <BlockMath key={at} math={line} />
      ))}
      <figcaption className="text-label font-normal text-ink-2">{source}</figcaption>
    </figure>
  );
}
