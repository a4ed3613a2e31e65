"use client";
import { useDeferredValue, useSyncExternalStore } from "react";
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

/**
 * The formula a calculator uses, where it is published, and the formula with the numbers put in. Setting a line takes some
 * milliseconds: the figures come first and the lines after them, one at a time.
 */
export function Formula({ tex, source, worked = [] }: FormulaProps) {
  const lines = [tex, worked].flat().join(BREAK);
  const set = useDeferredValue(lines, useIsFirstOfPage() ? lines : "");
  return (
    <figure className="working-out text-dense" tabIndex={0} aria-label="Formula">
      {set !== "" && set.split(BREAK).map((line, at) => <BlockMath key={at} math={line} />)}
      <figcaption className="text-label font-normal text-ink-2">{source}</figcaption>
    </figure>
  );
}

const BREAK = "\n"; // no line of TeX here holds one

const never = () => () => {};
/** True on the server and while its page comes to life: what it shows must be what stands there. */
const useIsFirstOfPage = (): boolean =>
  useSyncExternalStore(
    never,
    () => false,
    () => true,
  );
