/** Stored standing; expired and not yet valid follow from the certificate's days. */
export type StandingWord = "valid" | "suspended" | "withdrawn" | "superseded";
export type StandingAct = "suspend" | "reinstate" | "withdraw";

/** Withdrawn and superseded are final; only a suspension can be taken back. */
export const standingActs: Record<StandingAct, { from: readonly StandingWord[]; to: StandingWord; done: string }> = {
  suspend: { from: ["valid"], to: "suspended", done: "suspended" },
  reinstate: { from: ["suspended"], to: "valid", done: "reinstated" },
  withdraw: { from: ["valid", "suspended"], to: "withdrawn", done: "withdrawn" },
};

/** What the public page says. */
export type ShownStanding = "Valid" | "Suspended" | "Withdrawn" | "Superseded" | "Expired" | "Not yet valid";

/** Stored standing first; an untouched certificate is not yet valid, valid or expired by its days, the last day included. */
export function shownStanding(
  stored: StandingWord,
  effectiveOn: string,
  lastDay: string,
  today: string,
): ShownStanding {
  if (stored === "withdrawn") return "Withdrawn";
  if (stored === "superseded") return "Superseded";
  if (today > lastDay) return "Expired";
  if (stored === "suspended") return "Suspended";
  return today < effectiveOn ? "Not yet valid" : "Valid";
}

/** Grounds a decider may name; the public page shows the ground and never the reason. */
export const GROUNDS = [
  "Evidence not the holder's own",
  "A check of the release was found wrong",
  "Work outside the scope",
  "Misleading use of the certificate",
  "Competence in doubt",
  "At the holder's request",
  "Issued in error",
  "Doubt removed",
] as const;
