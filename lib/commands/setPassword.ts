import "server-only";
import { Op } from "sequelize";
import { InvalidError } from "@/lib/errors";
import { hashPassword, verifyPassword } from "@/lib/passwords";
import { needsPresentPassword } from "@/lib/policies/passwordRule";
import { Person, Session } from "@/models";
import { transact } from "./transact";

type Here = { personId: string; sessionId: string; hasPassword: boolean; passwordAt: Date | null; startedAt: Date };
type Passwords = { current?: string; password: string };

/** Set or change the own password. Every other session of the person ends: one of them may be why it is changed. */
export const setPassword = async (here: Here, { current, password }: Passwords, now = new Date()): Promise<void> => {
  const passwordHash = await hashPassword(password);
  await transact(null, async (transaction) => {
    const { personId } = here;
    const lock = transaction.LOCK.UPDATE;
    const person = await Person.findByPk(personId, { transaction, lock, rejectOnEmpty: true });
    const facts = { ...here, hasPassword: person.passwordHash !== null };
    if (needsPresentPassword(facts, now) && !(await verifyPassword(person.passwordHash, current ?? ""))) {
      const sentence = "This is not your present password.";
      throw new InvalidError(sentence, { current: [sentence] });
    }
    if (password.toLowerCase().includes(person.email)) {
      const sentence = "Your e-mail address is the first thing anyone would try.";
      throw new InvalidError(sentence, { password: [sentence] });
    }
    await person.update({ passwordHash }, { transaction });
    const others = { personId, id: { [Op.ne]: here.sessionId }, endedAt: null };
    await Session.update({ endedAt: now }, { where: others, transaction });
  });
};
