import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { createTransport } from "nodemailer";
import { afterAll, beforeAll, expect, test, vi } from "vitest";
import { runScript, type RunningScript } from "../support/run-script";

// A process of its own is started, on a machine that may be busy.
vi.setConfig({ testTimeout: 60_000, hookTimeout: 60_000 });
type Shown = {
  id: string;
  subject: string;
  to: string[];
  text: string;
  attachments: { filename: string; url: string }[];
};
const folder = mkdtempSync(path.join(tmpdir(), "mail-"));
let fake: RunningScript;

beforeAll(async () => {
  fake = await runScript("scripts/fakes/mail.mjs", { FAKE_FOLDER: folder });
});
afterAll(async () => {
  await fake.stop();
  rmSync(folder, { recursive: true });
});

const send = (mail: object) =>
  createTransport(String(fake.output().match(/smtp:\S+/)?.[0])).sendMail({
    from: "Register <register@lagmark.example>",
    to: "tech@firm.example",
    subject: "Assigned",
    text: "Due soon",
    ...mail,
  });
const shown = async (to: string): Promise<Shown[]> => (await fetch(`${fake.origin}/mails.json?to=${to}`)).json();
const pageOf = async (address: string) => (await fetch(fake.origin + address)).text();

test("mails are listed newest first, for one address alone", async () => {
  await send({ to: "a@firm.example", subject: "first" });
  await send({ to: "b@firm.example", subject: "to somebody else" });
  await send({ to: "a@firm.example", subject: "second" });
  expect((await shown("A@firm.example")).map(({ subject }) => subject)).toEqual(["second", "first"]);
  expect(await pageOf("/")).toMatch(/second.*to somebody else.*first/);
});

test("a mail that is sent again with the same Message-ID is dropped", async () => {
  await send({ to: "c@firm.example", messageId: "<mail-7@lagmark.example>" });
  await send({ to: "c@firm.example", messageId: "<mail-7@lagmark.example>" });
  expect(await shown("c@firm.example")).toHaveLength(1);
});

test("links can be followed, and nothing in a mail becomes markup of the page", async () => {
  await send({ to: "d@firm.example", text: "Sign in: http://127.0.0.1:3000/sign-in?token=a&b=1. <script>x</script>" });
  const [{ id }] = await shown("d@firm.example");
  const page = await pageOf(`/mails/${id}`);
  expect(page).toContain('<a href="http://127.0.0.1:3000/sign-in?token=a&#38;b=1">');
  expect(page).not.toContain("<script>");
});

test("an attachment comes out with the very bytes", async () => {
  const content = Buffer.from(Uint8Array.from({ length: 5000 }, (_, index) => (index * 7) % 256));
  await send({ to: "e@firm.example", attachments: [{ filename: "LM-1 Żółć.pdf", content }] });
  const [{ attachments }] = await shown("e@firm.example");
  const answer = await fetch(fake.origin + attachments[0].url);
  expect(attachments[0].filename).toBe("LM-1 Żółć.pdf");
  expect(answer.headers.get("content-disposition")).toContain(encodeURIComponent("LM-1 Żółć.pdf"));
  expect(Buffer.from(await answer.arrayBuffer()).equals(content)).toBe(true);
});

test("a restart keeps the mails and still knows which came before", async () => {
  await send({ to: "f@firm.example", messageId: "<mail-8@lagmark.example>" });
  await fake.stop();
  fake = await runScript("scripts/fakes/mail.mjs", { FAKE_FOLDER: folder });
  await send({ to: "f@firm.example", messageId: "<mail-8@lagmark.example>" });
  expect(await shown("f@firm.example")).toHaveLength(1);
});

test("what is not there is not found", async () => {
  expect((await fetch(`${fake.origin}/mails/00000000-0000-0000-0000-000000000000`)).status).toBe(404);
});
