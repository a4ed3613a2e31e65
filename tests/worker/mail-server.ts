import type { AddressInfo } from "node:net";
import { simpleParser, type ParsedMail } from "mailparser";
import { SMTPServer } from "smtp-server";

export type ReceivedMail = ParsedMail & { envelope: string[] };

/** A real mail server on this machine that keeps what it is given; `refuse` makes it answer that it cannot take a mail. */
export class MailServer {
  readonly received: ReceivedMail[] = [];
  refuse = false;
  #server = new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS", "AUTH"],
    onData: (stream, session, done) => {
      void simpleParser(stream).then((mail) => {
        if (this.refuse) return done(Object.assign(new Error("try again later"), { responseCode: 451 }));
        this.received.push({ ...mail, envelope: session.envelope.rcptTo.map(({ address }) => address) });
        done();
      });
    },
  });

  async start(): Promise<string> {
    const server = this.#server.listen(0, "127.0.0.1");
    await new Promise((resolve) => server.once("listening", resolve));
    return `smtp://127.0.0.1:${(server.address() as AddressInfo).port}`;
  }

  stop(): Promise<void> {
    return new Promise((resolve) => this.#server.close(() => resolve()));
  }
}
