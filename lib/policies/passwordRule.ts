/** Length is what makes a password hard to guess; kinds of characters are not asked for (from memory of NIST SP 800-63B). */
export const SHORTEST_PASSWORD = 12;
export const LONGEST_PASSWORD = 200;

/** How long after following a mailed link a password may be set without the one before it. */
const LINK_STANDS_IN_MS = 15 * 60_000;

type Person = { hasPassword: boolean; passwordAt: Date | null; startedAt: Date };

/** Whether setting a password needs the present one: not the first time, and not just after a link proved the mailbox. */
export const needsPresentPassword = (person: Person, now: Date): boolean =>
  person.hasPassword &&
  !(person.passwordAt === null && now.getTime() - person.startedAt.getTime() <= LINK_STANDS_IN_MS);
