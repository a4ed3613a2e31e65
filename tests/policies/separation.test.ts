import { expect, test } from "vitest";
import { barsToDeciding, type SeparationFacts } from "@/lib/policies/separation";

const facts = (over: Partial<SeparationFacts> = {}): SeparationFacts => ({
  ...{ deciderId: "d", technicianId: "t", assignedById: "lead", today: "2026-12-01" },
  releaseHands: [
    { personId: "lead", part: "wrote" },
    { personId: "lead", part: "released" },
  ],
  trainings: [{ trainerId: "lead", endedOn: "2026-11-30" }],
  judgedByIds: ["assessor"],
  ...over,
});
const trained = (endedOn: string, trainerId = "d") => facts({ trainings: [{ trainerId, endedOn }] });
const hand = (part: "wrote" | "released") => facts({ releaseHands: [{ personId: "d", part }] });
const TRAINED = ["You trained this candidate within the last two years."];

test.each<[string, SeparationFacts, string[]]>([
  ["nobody's hand but the lead's", facts(), []],
  ["the candidate", facts({ technicianId: "d" }), ["You are the candidate."]],
  ["who assigned", facts({ assignedById: "d" }), ["You assigned this sitting."]],
  ["who wrote", hand("wrote"), ["You wrote part of this release."]],
  ["who released", hand("released"), ["You released this release."]],
  ["who judged a written line", facts({ judgedByIds: ["assessor", "d"] }), ["You judged a line of this sitting."]],
  ["a training that ended today", trained("2026-12-01"), TRAINED],
  ["a training that ended two years ago to the day", trained("2024-12-01"), TRAINED],
  ["a training that ended a day longer ago", trained("2024-11-30"), []],
  ["somebody else's training", trained("2026-11-30", "lead"), []],
  [
    "one training long ago and one lately",
    facts({
      trainings: [
        { trainerId: "d", endedOn: "2019-01-01" },
        { trainerId: "d", endedOn: "2026-01-01" },
      ],
    }),
    TRAINED,
  ],
  // Two years after 29 February 2024 is 28 February 2026.
  ["the 29th of February, two years on", { ...trained("2024-02-29"), today: "2026-02-28" }, TRAINED],
  ["the day after that", { ...trained("2024-02-29"), today: "2026-03-01" }, []],
])("%s", (_who, given, bars) => {
  expect(barsToDeciding(given)).toEqual(bars);
});

test("every bar is told, each once", () => {
  const hands = (["wrote", "released", "wrote"] as const).map((part) => ({ personId: "d", part }));
  const all = facts({ assignedById: "d", releaseHands: hands, trainings: [{ trainerId: "d", endedOn: "2026-11-30" }] });
  expect(barsToDeciding(all)).toEqual([
    "You assigned this sitting.",
    "You wrote part of this release.",
    "You released this release.",
    ...TRAINED,
  ]);
});
