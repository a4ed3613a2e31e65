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

/** Which case of a check may be opened now, by the release's rule on fresh cases and waiting. */
export function nextCaseOf(earlier: readonly EarlierCase[], rule: FreshCaseRule, now: Date): NextCase {
  const last = earlier.at(-1);
  if (!last) return { state: "available", number: 1 };
  if (last.state === "building" || last.state === "open") return { state: "open", caseId: last.id };
  if (last.state === "handed in") return { state: "closed", reason: "The case you handed in is being marked." };
  if (last.met) return { state: "closed", reason: "This check is met." };
  if (last.number > rule.freshCases)
    return { state: "closed", reason: "The release allows no further case of this check." };
  const opensAt = new Date(last.handedInAt!.getTime() + rule.waitHours * 3_600_000);
  return now < opensAt
    ? {
        state: "closed",
        reason: "A fresh case opens after the wait that the release asks for.",
        opensAt: opensAt.toISOString(),
      }
    : { state: "available", number: last.number + 1 };
}
