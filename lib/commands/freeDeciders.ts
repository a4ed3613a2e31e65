import "server-only";
import type { Transaction } from "sequelize";
import { dayIn } from "@/lib/calendar";
import { select } from "@/lib/db";
import { barsToDeciding } from "@/lib/policies/separation";
import { separationFacts } from "@/lib/queries/separationFacts";
import type { FoundCase } from "./findCase";

type Decider = { personId: string; email: string };

/** Addresses of the employer's deciders whom nothing bars from deciding on a sitting. */
export async function freeDeciders(
  { sitting, employer }: Pick<FoundCase, "sitting" | "employer">,
  now: Date,
  transaction: Transaction,
): Promise<string[]> {
  const today = dayIn(employer.timeZone, now);
  const free: string[] = [];
  for (const { personId, email } of await select<Decider>(DECIDERS, { employerId: employer.id }, transaction)) {
    const bars = barsToDeciding(await separationFacts({ personId }, sitting, today, transaction));
    if (bars.length === 0) free.push(email);
  }
  return free;
}

const DECIDERS = `
  SELECT p.id AS "personId", p.email FROM people p JOIN role_grants g ON g.person_id = p.id
  WHERE g.employer_id = :employerId AND g.role = 'decider' AND g.ended_at IS NULL ORDER BY p.email`;
