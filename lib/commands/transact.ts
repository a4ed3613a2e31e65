import "server-only";
import type { Transaction } from "sequelize";
import { db } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";

/**
 * One command, one transaction: all of it is stored or none of it.
 * @param actor whose act it is, for the trail's trigger; null when nobody signed in acts (a job, a webhook, a sign-in)
 */
export const transact = <R>(
  actor: Pick<Actor, "personId" | "employerId"> | null,
  run: (transaction: Transaction) => Promise<R>,
): Promise<R> =>
  db.transaction(async (transaction) => {
    const replacements = { personId: actor?.personId ?? "", employerId: actor?.employerId ?? "" };
    await db.query(SAY_WHO_ACTS, { replacements, transaction });
    return run(transaction);
  });

// Forgotten at the end of the transaction, so that the next user of the connection does not inherit it.
const SAY_WHO_ACTS = `SELECT set_config('lagmark.actor', :personId, true), set_config('lagmark.employer', :employerId, true)`;
