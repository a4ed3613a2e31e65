"use client";
import { Glyph } from "@/components/ui/Glyph";
import { Key } from "@/components/ui/Key";
import type { Problem } from "@/lib/mdx/problem";

type ProblemStripProps = {
  lines: number;
  line: number;
  problems: readonly Problem[];
  checking: boolean;
  onGo: (line: number, column: number) => void;
  onRepair: (problem: Problem) => void;
};

/** The file as a ruler, errors below the line and warnings astride it, then one row a problem with the key that helps. */
export function ProblemStrip({ lines, line, problems, checking, onGo, onRepair }: ProblemStripProps) {
  const place = (at: number) => `${(100 * (at - 0.5)) / Math.max(lines, 1)}%`;
  return (
    <section
      aria-label="Problems"
      aria-live="polite"
      className="relative max-h-[15rem] overflow-y-auto border-t-strong border-ink bg-sheet px-(--margin) pb-2"
    >
      <svg width="100%" height="40" className="block overflow-visible" aria-hidden>
        <rect x={place(line)} y="8" width="14" height="10" fill="var(--plus)" />
        <rect y="18" width="100%" height="2" fill="var(--ink)" />
        {problems.map((problem, index) => (
          <rect
            key={index}
            x={place(problem.line)}
            y={problem.severity === "error" ? 20 : 13}
            width="9"
            height="11"
            fill={problem.severity === "error" ? "var(--minus)" : "var(--caution)"}
            stroke={problem.severity === "error" ? "none" : "var(--ink)"}
          />
        ))}
        <text x="0" y="36" fontSize="12" fill="var(--ink-3)">
          1
        </text>
        <text x="100%" y="36" fontSize="12" textAnchor="end" fill="var(--ink-3)">
          {lines}
        </text>
      </svg>
      {problems.length === 0 ? (
        <p className="flex items-center gap-3 py-1.5 text-dense">
          <Glyph name="within" /> {checking ? "Reading…" : "No problem. The draft can be released."}
        </p>
      ) : (
        <ul>
          {problems.map((problem, index) => (
            <li
              key={index}
              className="grid items-center gap-x-5 gap-y-1 border-t-hair border-rule py-1.5 text-dense tablet:grid-cols-[auto_11rem_1fr_auto]"
            >
              <Glyph name={problem.severity === "error" ? "outside" : "suspended"} />
              <strong className="whitespace-nowrap font-semibold figures">
                Line {problem.line}, column {problem.column}
              </strong>
              <span>{problem.message}</span>
              {problem.repair ? (
                <Key size="small" onClick={() => onRepair(problem)}>
                  {problem.repair.label}
                </Key>
              ) : (
                <Key size="small" onClick={() => onGo(problem.line, problem.column)}>
                  Go to line {problem.line}
                </Key>
              )}
            </li>
          ))}
        </ul>
      )}
    </section>
  );
}
