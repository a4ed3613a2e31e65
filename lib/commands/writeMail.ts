import "server-only";
import type { Transaction } from "sequelize";
import { enqueue } from "@/lib/jobs/enqueue";
import { Mail } from "@/models";

export type Letter = { to: string; subject: string; body: string; certificateId?: string };

/** Write a mail in the transaction that causes it; the worker sends it once that is stored. */
export async function writeMail({ to, subject, body, certificateId }: Letter, transaction: Transaction): Promise<void> {
  const mail = await Mail.create({ toEmail: to, subject, body, certificateId: certificateId ?? null }, { transaction });
  await enqueue("send-mail", { mailId: mail.id }, transaction);
}
