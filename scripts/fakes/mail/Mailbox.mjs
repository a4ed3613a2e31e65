import { randomUUID } from "node:crypto";
import fs from "node:fs";
import path from "node:path";
import { simpleParser } from "mailparser";

/** Mails in a folder, one file each; what comes again with the same Message-ID is dropped. */
export class Mailbox {
  #folder;
  #mails;

  constructor(folder) {
    this.#folder = folder;
    fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
    const files = fs.readdirSync(folder).filter((name) => name.endsWith(".json"));
    const mails = files.map((name) => JSON.parse(fs.readFileSync(path.join(folder, name), "utf8")));
    this.#mails = mails.sort((a, b) => a.number - b.number);
  }

  /** @param source the mail as it came over the wire @param recipients of the envelope */
  async receive(source, recipients) {
    const parsed = await simpleParser(source, { skipTextLinks: true });
    const messageId = parsed.messageId ?? `<${randomUUID()}@unnamed>`;
    if (this.#mails.some((mail) => mail.messageId === messageId)) return "dropped, it came before";
    const mail = {
      id: randomUUID(),
      number: (this.#mails.at(-1)?.number ?? 0) + 1,
      messageId,
      received: new Date().toISOString(),
      from: parsed.from?.text ?? "",
      to: recipients,
      subject: parsed.subject ?? "",
      text: parsed.text ?? "",
      html: parsed.html || null,
      attachments: parsed.attachments.map(({ filename, contentType, content }) => ({
        filename: filename ?? "unnamed",
        contentType,
        size: content.length,
        base64: content.toString("base64"),
      })),
    };
    this.#mails.push(mail);
    fs.writeFileSync(path.join(this.#folder, `${mail.id}.json`), JSON.stringify(mail), { mode: 0o600 });
    return `kept as ${mail.id}`;
  }

  /** Newest first. @param to only those to this address */
  list(to) {
    const wanted = to?.toLowerCase();
    return this.#mails.filter((mail) => !wanted || mail.to.some((one) => one.toLowerCase() === wanted)).reverse();
  }

  find = (id) => this.#mails.find((mail) => mail.id === id);
}
