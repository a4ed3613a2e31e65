import "server-only";
import { Person } from "@/models";
import { transact } from "./transact";
import { writeMail } from "./writeMail";
import { writeSignInLink } from "./writeSignInLink";

const MINUTES = 30;

/** Mail a link to whoever has an account with this address. Nobody is told whether there is one. */
export const mailSignInLink = (email: string, back: string | null, now = new Date()) =>
  transact(null, async (transaction) => {
    if (!(await Person.count({ where: { email }, transaction }))) return;
    const expiresAt = new Date(now.getTime() + MINUTES * 60_000);
    const link = await writeSignInLink({ email, back, expiresAt }, now, transaction);
    const body = `Sign in to Lagmark with this link. It works once, within ${MINUTES} minutes.\n\n${link}\n\nIf you did not ask for it, do nothing: without this link nobody is signed in.\n`;
    await writeMail({ to: email, subject: "Your link to sign in", body }, transaction);
  });
