import { afterAll, beforeAll, beforeEach, expect, test } from "vitest";
import { sendMail } from "@/lib/commands/sendMail";
import { mailDelivery } from "@/lib/worker/deliverMail";
import { makeCertificate } from "../support/certified";
import { NOW } from "../support/clock";
import { makeFirm } from "../support/factories";
import { insert } from "../support/owner";
import { MailServer } from "./mail-server";
import { rowsOf, stop } from "./tools";

const server = new MailServer();
let delivery: ReturnType<typeof mailDelivery>;
beforeAll(async () => {
  delivery = mailDelivery({ SMTP_URL: await server.start(), MAIL_FROM: "Register <register@lagmark.example>" });
});
afterAll(async () => {
  delivery.close();
  await server.stop();
});
beforeEach(() => {
  server.received.length = 0;
  server.refuse = false;
});

const write = async (over: object = {}) =>
  (
    await insert<{ id: string }>("mails", {
      toEmail: "holder@example.test",
      subject: "Marked: τ ≤ 1 chip",
      body: "The record:\n\nhttps://register.example/records/1\n",
      writtenAt: NOW,
      ...over,
    })
  ).id;
const send = (id: string, now = () => NOW) => sendMail(id, delivery.deliver, now);

test("sends the mail as it was written, with a Message-ID of its own id", async () => {
  const id = await write();
  expect(await send(id)).toBe("sent");
  expect(server.received).toHaveLength(1);
  expect(server.received[0]).toMatchObject({
    envelope: ["holder@example.test"],
    subject: "Marked: τ ≤ 1 chip",
    text: "The record:\n\nhttps://register.example/records/1\n",
    messageId: `<${id}@lagmark.example>`,
    from: { value: [{ address: "register@lagmark.example", name: "Register" }] },
    attachments: [],
  });
});

test("a sent mail is marked and its text is gone", async () => {
  await send(await write());
  expect(await rowsOf("mails")).toMatchObject([{ sent_at: NOW, body: "", to_email: "holder@example.test" }]);
});

test("attaches the certificate byte for byte", async () => {
  const pdf = Buffer.from("%PDF-1.7 \u0000\u0001 not a page");
  const certificate = await makeCertificate(await makeFirm(), { pdf });
  await send(await write({ certificateId: certificate.id }));
  const [attachment] = server.received[0]!.attachments;
  expect(attachment).toMatchObject({ filename: `${certificate.number}.pdf`, contentType: "application/pdf" });
  expect(attachment!.content.equals(pdf)).toBe(true);
});

test("run twice, one mail goes out", async () => {
  const id = await write();
  await send(id);
  expect(await send(id)).toBe("was sent");
  expect(server.received).toHaveLength(1);
});

test("of two runs at once one sends; the other does not call itself done", async () => {
  const id = await write();
  const outcomes = await Promise.allSettled([send(id), send(id)]);
  expect(server.received).toHaveLength(1);
  expect(outcomes.filter((one) => one.status === "fulfilled" && one.value === "sent")).toHaveLength(1);
  const other = outcomes.find((one) => !(one.status === "fulfilled" && one.value === "sent"))!;
  if (other.status === "rejected") expect(String(other.reason)).toMatch(/another run is sending/);
  else expect(other.value).toBe("was sent");
});

test("a mail server that cannot take it leaves the mail as it was, to be tried again", async () => {
  const id = await write();
  server.refuse = true;
  await expect(send(id)).rejects.toThrow(/try again later/);
  expect(await rowsOf("mails")).toMatchObject([{ sent_at: null, body: expect.stringContaining("The record") }]);
  server.refuse = false;
  expect(await send(id)).toBe("sent");
});

test("killed after the mail server took it, it goes out again under the same Message-ID", async () => {
  const id = await write();
  await expect(send(id, () => stop())).rejects.toThrow("killed");
  expect(await rowsOf("mails")).toMatchObject([{ sent_at: null }]);
  await send(id);
  expect(server.received.map(({ messageId }) => messageId)).toEqual(Array(2).fill(`<${id}@lagmark.example>`));
});

test("a line break in an address or subject adds no header and no recipient", async () => {
  await send(await write({ subject: "Marked\r\nBcc: stranger@example.test", toEmail: "a@example.test" }));
  expect(server.received[0]!.envelope).toEqual(["a@example.test"]);
  expect(server.received[0]!.headers.has("bcc")).toBe(false);
});

test("there is no such mail", async () => {
  await expect(send("00000000-0000-4000-8000-000000000000")).rejects.toThrow();
});
