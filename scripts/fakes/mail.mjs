// Local stand-in for the mail server: takes every mail over SMTP, sends none on, shows them on a page.
import { createServer } from "node:http";
import { SMTPServer } from "smtp-server";
import { Mailbox } from "./mail/Mailbox.mjs";
import { answerMailPages } from "./mail/mailPages.mjs";
import { requiredSetting } from "./requiredSetting.mjs";

const mailbox = new Mailbox(requiredSetting("FAKE_FOLDER"));

const smtp = new SMTPServer({
  authOptional: true,
  disabledCommands: ["STARTTLS", "AUTH"],
  onData(stream, session, done) {
    const recipients = session.envelope.rcptTo.map(({ address }) => address);
    receive(stream, recipients).then(
      (what) => done(null, what),
      (error) => done(error),
    );
  },
});
const pages = createServer((request, response) => answerMailPages(request, response, mailbox));

await listen(smtp, process.env.FAKE_SMTP_PORT);
await listen(pages, process.env.FAKE_PORT);
console.log(`smtp on smtp://127.0.0.1:${smtp.server.address().port}`);
console.log(`listening on http://127.0.0.1:${pages.address().port}`);
process.on("SIGTERM", () => process.exit(0));

async function receive(stream, recipients) {
  const what = await mailbox.receive(await sourceOf(stream), recipients);
  console.log(`${recipients.join(", ")}: ${what}`);
  return what;
}

async function sourceOf(stream) {
  const chunks = [];
  for await (const chunk of stream) chunks.push(chunk);
  return Buffer.concat(chunks);
}

function listen(server, port = "0") {
  return new Promise((resolve, reject) => {
    (server.server ?? server).once("error", reject);
    server.listen(Number(port), "127.0.0.1", resolve);
  });
}
