/** Line and column as an editor shows them: both from 1, columns in UTF-16 units. */
export type Place = { line: number; column: number };

export type Range = { from: Place; to: Place };

/** Text that cures the problem when it replaces `from` to `to`. */
export type Repair = { label: string; text: string } & Range;

export type Problem = {
  line: number;
  column: number;
  endLine?: number;
  endColumn?: number;
  severity: "error" | "warning";
  /** Short name of the rule that was broken, for filters and tests; the message is for the lead. */
  rule: string;
  message: string;
  repair?: Repair;
};

export function problemAt(at: Place | Range, rule: string, message: string, repair?: Repair): Problem {
  const { from, to } = "from" in at ? at : { from: at, to: undefined };
  return {
    line: from.line,
    column: from.column,
    ...(to ? { endLine: to.line, endColumn: to.column } : {}),
    severity: "error",
    rule,
    message,
    ...(repair ? { repair } : {}),
  };
}

export const warningAt = (at: Place | Range, rule: string, message: string): Problem => ({
  ...problemAt(at, rule, message),
  severity: "warning",
});

export const inOrder = (problems: readonly Problem[]): Problem[] =>
  [...problems].sort((a, b) => a.line - b.line || a.column - b.column);

/** A hostile text must not become a list that no browser can show. */
export const LISTED_PROBLEMS = 200;
