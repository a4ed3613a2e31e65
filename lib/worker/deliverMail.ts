import "server-only";
import nodemailer from "nodemailer";
import type { Outgoing } from "@/lib/commands/sendMail";

/** Well under the time a mail job may take, so that a silent mail server fails the job and does not lose it. */
const TIMEOUT_MS = 20_000;

/** Hands mails to the mail server. The Message-ID follows from the mail's own id: a mail that goes out twice is seen to be one. */
export function mailDelivery({ SMTP_URL, MAIL_FROM }: { SMTP_URL: string; MAIL_FROM: string }) {
  const transport = nodemailer.createTransport({
    url: SMTP_URL,
    pool: true,
    maxConnections: 5,
    connectionTimeout: TIMEOUT_MS,
    greetingTimeout: TIMEOUT_MS,
    socketTimeout: TIMEOUT_MS,
    // Nothing in a mail names a file or an address to be fetched.
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  const host = /@([\w.-]+)/.exec(MAIL_FROM)?.[1] ?? "localhost";
  return {
    async deliver({ id, to, subject, text, attachments }: Outgoing): Promise<void> {
      await transport.sendMail({
        ...{ messageId: `<${id}@${host}>`, from: MAIL_FROM, to: { name: "", address: to }, subject, text, attachments },
        headers: { "Auto-Submitted": "auto-generated" },
      });
    },
    close: () => transport.close(),
  };
}
