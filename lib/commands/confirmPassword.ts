import "server-only";
import { InvalidError } from "@/lib/errors";
import { verifyPassword } from "@/lib/passwords";
import { Person, Session } from "@/models";
import { transact } from "./transact";

type Here = { personId: string; sessionId: string };

/** Give the password again in this session: what is signed within the next five minutes is signed afresh. */
export const confirmPassword = async (here: Here, password: string, now = new Date()): Promise<void> => {
  const person = await Person.findByPk(here.personId, { rejectOnEmpty: true });
  if (!person.passwordHash) {
    throw new InvalidError("You have no password yet. Set one in your account, then sign this.");
  }
  if (!(await verifyPassword(person.passwordHash, password))) {
    const sentence = "This is not your password.";
    throw new InvalidError(sentence, { password: [sentence] });
  }
  await transact(null, async (transaction) => {
    const where = { id: here.sessionId, personId: here.personId, endedAt: null };
    await Session.update({ passwordAt: now }, { where, transaction });
  });
};
