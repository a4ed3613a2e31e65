import "server-only";
import { NotFoundError } from "@/lib/errors";
import { Session } from "@/models";
import { transact } from "./transact";

/** End one of the person's own sessions, this one or one on another machine. The next request made in it is refused. */
export const endSession = (person: { personId: string }, sessionId: string, now = new Date()) =>
  transact(null, async (transaction) => {
    const where = { id: sessionId, personId: person.personId, endedAt: null };
    const [ended] = await Session.update({ endedAt: now }, { where, transaction });
    if (!ended) throw new NotFoundError("session");
  });
