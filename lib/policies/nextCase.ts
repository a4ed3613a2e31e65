export type EarlierCase = {
  id: string;
  number: number;
  state: "building" | "open" | "handed in" | "marked";
  met: boolean | null;
  handedInAt: Date | null;
};
export type FreshCaseRule = { freshCases: number; waitHours: number };
export type NextCase =
  | { state: "open"; caseId: string }
  | { state: "available"; number: number }
  | { state: "closed"; reason: string; opensAt?: string };

/**
 * Which case of a check may be opened now, by the release's rule on fresh cases and waiting. The first one always: a
 * sitting that is paid for must be worth something.
 * @param exposed why no fresh case may be opened after so many of this kind; null when one may
 */
export function nextCaseOf(
  earlier: readonly EarlierCase[],
  rule: FreshCaseRule,
  now: Date,
  exposed: string | null,
): NextCase {
  const last = earlier.at(-1);
  if (!last) return { state: "available", number: 1 };
  if (last.state === "building" || last.state === "open") return { state: "open", caseId: last.id };
  if (last.state === "handed in") return { state: "closed", reason: "The case you handed in is being marked." };
  if (last.met) return { state: "closed", reason: "This check is met." };
  if (last.number > rule.freshCases)
    return { state: "closed", reason: "The release allows no further case of this check." };
  if (exposed) return { state: "closed", reason: exposed };
  const opensAt = new Date(last.handedInAt!.getTime() + rule.waitHours * 3_600_000);
  return now < opensAt
    ? {
        state: "closed",
        reason: "A fresh case opens after the wait that the release asks for.",
        opensAt: opensAt.toISOString(),
      }
    : { state: "available", number: last.number + 1 };
}
