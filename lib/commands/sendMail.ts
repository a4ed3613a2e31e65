import "server-only";
import type { Transaction } from "sequelize";
import { Certificate, Mail } from "@/models";
import { transact } from "./transact";

export type Attachment = { filename: string; contentType: string; content: Buffer };
export type Outgoing = { id: string; to: string; subject: string; text: string; attachments: Attachment[] };

/**
 * Send a stored mail and mark it sent. Should the machine stop between the mail server's word and ours, it goes out a
 * second time with the same Message-ID.
 */
export const sendMail = (mailId: string, deliver: (mail: Outgoing) => Promise<void>, now = () => new Date()) =>
  transact(null, async (transaction): Promise<"sent" | "was sent"> => {
    const mail = await Mail.findByPk(mailId, { transaction, lock: transaction.LOCK.UPDATE, skipLocked: true });
    if (!mail) return refuseUnlessSent(mailId, transaction);
    if (mail.sentAt) return "was sent";
    const { toEmail: to, subject, body: text, certificateId } = mail;
    const attachments = certificateId ? [await certificateFile(certificateId, transaction)] : [];
    await deliver({ id: mailId, to, subject, text, attachments });
    await mail.update({ sentAt: now(), body: "" }, { transaction });
    return "sent";
  });

// Another run holds the row. Its outcome is unknown, so this job must not count as done: failing has it tried again.
async function refuseUnlessSent(mailId: string, transaction: Transaction): Promise<"was sent"> {
  const mail = await Mail.findByPk(mailId, { attributes: ["sentAt"], transaction, rejectOnEmpty: true });
  if (mail.sentAt) return "was sent";
  throw new Error(`sendMail: another run is sending mail ${mailId}`);
}

async function certificateFile(id: string, transaction: Transaction): Promise<Attachment> {
  const attributes = ["number", "pdf"];
  const { number, pdf } = await Certificate.findByPk(id, { attributes, transaction, rejectOnEmpty: true });
  return { filename: `${number}.pdf`, contentType: "application/pdf", content: pdf };
}
