import "server-only";
import { Session } from "@/models";
import { transact } from "./transact";

/** A working day. The cookie that carries the session's id ends with it. */
export const SESSION_SECONDS = 12 * 3600;

/** @param passwordAt when the password was given; null for a session begun by a mailed link */
export const startSession = (
  { personId, passwordAt }: { personId: string; passwordAt: Date | null },
  now = new Date(),
): Promise<{ id: string }> =>
  transact(null, async (transaction) => {
    const expiresAt = new Date(now.getTime() + SESSION_SECONDS * 1000);
    const session = await Session.create({ personId, passwordAt, createdAt: now, expiresAt }, { transaction });
    return { id: session.id };
  });
