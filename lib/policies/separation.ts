import { addMonths } from "@/lib/calendar";

/** Two years after training ended, from memory of ISO/IEC 17024:2012, 5.2 practice. */
const LOOK_BACK_MONTHS = 24;

export type SeparationFacts = {
  deciderId: string;
  technicianId: string;
  assignedById: string;
  /** Whoever wrote, approved or released the release. */
  releaseHands: readonly { personId: string; part: "wrote" | "released" }[];
  /** Trainings of the technician, by day on which they ended. */
  trainings: readonly { trainerId: string; endedOn: string }[];
  /** Whoever judged a written line of the sitting. */
  judgedByIds: readonly string[];
  today: string;
};

/** Why this person may not decide on this sitting; empty when nothing stands in the way. */
export function barsToDeciding(facts: SeparationFacts): string[] {
  const { deciderId } = facts;
  const bars: string[] = [];
  if (deciderId === facts.technicianId) bars.push("You are the candidate.");
  if (deciderId === facts.assignedById) bars.push("You assigned this sitting.");
  const parts = new Set(facts.releaseHands.filter((hand) => hand.personId === deciderId).map((hand) => hand.part));
  if (parts.has("wrote")) bars.push("You wrote part of this release.");
  if (parts.has("released")) bars.push("You released this release.");
  if (facts.judgedByIds.includes(deciderId)) bars.push("You judged a line of this sitting.");
  const trained = facts.trainings.some(
    (training) => training.trainerId === deciderId && addMonths(training.endedOn, LOOK_BACK_MONTHS) >= facts.today,
  );
  if (trained) bars.push("You trained this candidate within the last two years.");
  return bars;
}
