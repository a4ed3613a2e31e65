import { randomBytes } from "node:crypto";
import { readFile } from "node:fs/promises";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { drawCertificateNumber } from "@/lib/certificates/number";
import { ownerRows } from "@/tests/support/owner";
import { demoPerson, launch, ORIGIN, phoneOf, signedIn, stranger } from "./browser";
import { brokenRules, phoneFindings } from "./pageFindings";
import { rightAnswers } from "./rightAnswers";
import { eachStepFits, losesTheSignal, readsASatellite, sendsAnswers } from "./technician";

type Opened = Awaited<ReturnType<typeof stranger>>;

// One certificate, from the lead's module to a stranger's verification, as people do it in a browser.
let browser: Browser;
let phone: Opened;
let decider: Awaited<ReturnType<typeof signedIn>>;
const kept: { number?: string; pdf?: Buffer } = {};

beforeAll(async () => {
  browser = await launch();
});
afterAll(() => browser.close());

describe("from a draft to a stranger's verification", () => {
  test("the lead is told of a mistake by line and column, mends it, releases and assigns", async () => {
    const { page, faults } = await signedIn(browser, "lead");
    expect.soft(await brokenRules(page)).toEqual([]);
    await page.getByRole("row").filter({ hasText: "SBW-R2" }).getByRole("link", { name: "Open", exact: true }).click();
    await page.waitForSelector(".cm-content");
    const end = async (text: string) => {
      await page.click(".cm-content");
      await page.keyboard.press("Control+End");
      await page.keyboard.type(text);
    };
    await end("\n<Wobble />\n");
    await page.getByText(/Wobble.* is not a tag of the module language/).waitFor();
    await page
      .getByText(/Line \d+, column 1/)
      .first()
      .waitFor();
    expect.soft(await brokenRules(page)).toEqual([]);
    for (let line = 0; line < 2; line++) await page.keyboard.press("Shift+ArrowUp");
    await page.keyboard.press("Delete");
    // The key waits for what is being saved; before the last save begins it would still take the click.
    const stored = page.waitForResponse(
      (response) => response.url().endsWith("/draft") && /before you leave/.test(response.request().postData() ?? ""),
    );
    await end("\nWrite the hash of the capture into the site record before you leave.\n");
    await stored;
    await page.getByText("No problem. The draft can be released.").waitFor();
    await runsTheReleaseCheck(page);
    await page.getByRole("button", { name: "Release…" }).click();
    await page.getByLabel("Why now").fill("First release after the boom case.");
    expect.soft(await brokenRules(page)).toEqual([]);
    await page.getByRole("button", { name: "Release 1.0" }).click();
    await page.waitForURL(/releases\/1\.0$/);
    await page.getByRole("img", { name: /^Chip strip [0-9a-f]{16}$/ }).waitFor();
    await page.getByLabel("Technician").selectOption({ label: demoPerson("technician").name });
    await page.getByLabel("Sit it by").fill("2099-01-15");
    await page.getByRole("button", { name: "Assign" }).click();
    await page.getByText("Fee open").waitFor();
    expect.soft(await brokenRules(page)).toEqual([]);
    await page.context().close();
    expect(faults).toEqual([]);
  }, 900_000);

  test("the administrator pays at the card page", async () => {
    const { page, faults } = await signedIn(browser, "administrator");
    await page.goto(`${ORIGIN}/saltmarsh/counter`);
    expect.soft(await brokenRules(page)).toEqual([]);
    await page.getByRole("button", { name: /^Pay .* by card$/ }).click();
    await page.waitForURL((url) => url.origin !== ORIGIN);
    await page.getByRole("button", { name: "Pay: the card is good" }).click();
    await page.waitForURL((url) => url.origin === ORIGIN);
    await page.getByRole("heading", { name: "Paid" }).waitFor();
    expect.soft(await brokenRules(page)).toEqual([]);
    await page.context().close();
    expect(faults).toEqual([]);
  });

  test("the technician sits six checks on own data, on the desk and on the phone, and loses nothing", async () => {
    const { page, faults } = await signedIn(browser, "technician");
    phone = await phoneOf(browser, page.context());
    expect.soft(await brokenRules(page)).toEqual([]);
    await phone.page.goto(page.url());
    expect.soft(await phoneFindings(phone.page)).toEqual([]);
    await page.getByRole("link", { name: "Read and start" }).click();
    await page.getByText("I accept these conditions").click();
    expect.soft(await brokenRules(page)).toEqual([]);
    await phone.page.goto(page.url());
    expect.soft(await phoneFindings(phone.page)).toEqual([]);
    await page.getByRole("button", { name: "Start the sitting" }).click();
    await page.waitForURL(/\/sittings\//);
    const sitting = page.url();
    expect.soft(await brokenRules(page)).toEqual([]);
    await phone.page.goto(sitting);
    expect.soft(await phoneFindings(phone.page)).toEqual([]);

    for (const check of ["reading", "plan", "satellites", "false-lock", "side-peak", "cn0"]) {
      // One check is sat with the phone alone.
      const own = check === "satellites" ? phone.page : page;
      await own.goto(sitting);
      await own.getByRole("button", { name: "Open the case" }).first().click();
      await own.waitForURL(/\/cases\//);
      await own.getByRole("button", { name: /^(Review and hand in|Hand in)$/ }).waitFor();
      const caseId = own.url().split("/").at(-1)!;
      const answers = await rightAnswers(own, caseId);
      if (check === "reading") {
        await losesTheSignal(own, answers);
        await phone.page.goto(own.url());
        await eachStepFits(phone.page);
      }
      if (check === "satellites") {
        await readsASatellite(own, answers["satellites.1.prn"]!);
        await eachStepFits(own);
      }
      await sendsAnswers(own, caseId, answers);
      if (own === page) expect.soft(await brokenRules(own)).toEqual([]);
      await own.getByRole("button", { name: /^(Review and hand in|Hand in)$/ }).click();
      if (own === phone.page) expect.soft(await phoneFindings(own)).toEqual([]);
      await own.getByRole("button", { name: /^Hand in \d+ answers$/ }).click();
      await own.waitForURL(/\/records\//, { timeout: 180_000 });
      await own.getByText("Met", { exact: true }).first().waitFor();
      expect.soft(await (own === page ? brokenRules(own) : phoneFindings(own))).toEqual([]);
    }
    await page.context().close();
    expect([...faults, ...phone.faults]).toEqual([]);
  }, 900_000);

  test("the outside decider signs afresh, and the certificate is issued", async () => {
    decider = await signedIn(browser, "outside decider");
    const { page, password, faults } = decider;
    await page.goto(`${ORIGIN}/saltmarsh/queue`);
    expect.soft(await brokenRules(page)).toEqual([]);
    await page.getByRole("link", { name: "Open the evidence" }).click();
    await page.getByText("Exhibit 1").waitFor();
    await page.getByText("Competent", { exact: true }).click();
    await page
      .getByRole("textbox", { name: "Reasons" })
      .fill("Every line is within, and the sitting log shows no gap.");
    await page.getByRole("checkbox").check();
    expect.soft(await brokenRules(page)).toEqual([]);
    await page.getByRole("button", { name: "Sign: competent" }).click();
    await page.getByLabel("Your password, again").fill(password);
    expect.soft(await brokenRules(page)).toEqual([]);
    await page.getByRole("dialog").getByRole("button", { name: "Sign: competent" }).click();
    await page.getByText("Decided: competent").waitFor();
    await expect.poll(issuedNumber, { timeout: 60_000, interval: 250 }).toMatch(/^LM-/);
    kept.number = (await issuedNumber())!;
    expect(faults).toEqual([]);
  });

  test("the holder opens the certificate on the phone and saves the signed file", async () => {
    const { page, faults } = phone;
    await page.goto(`${ORIGIN}/saltmarsh/certificates`);
    expect.soft(await phoneFindings(page)).toEqual([]);
    await page.getByRole("link", { name: "Open", exact: true }).click();
    await page.getByRole("link", { name: "Save the signed PDF" }).waitFor();
    expect.soft(await phoneFindings(page)).toEqual([]);
    const saved = page.waitForEvent("download");
    await page.getByRole("link", { name: "Save the signed PDF" }).click();
    kept.pdf = await readFile(await (await saved).path());
    expect(faults).toEqual([]);
  });

  test("anyone verifies by number and by file; each way of being wrong has its own answer", async () => {
    const { page, faults } = await stranger(browser);
    await page.goto(`${ORIGIN}/verify`);
    expect.soft(await brokenRules(page)).toEqual([]);
    const ask = async (typed: string) => {
      await page.getByLabel("Certificate number").fill(typed);
      await page.getByRole("button", { name: "Verify this number" }).click();
    };
    await ask(mistyped(kept.number!));
    await page.getByText("One character is mistyped").waitFor();
    expect.soft(await brokenRules(page)).toEqual([]);
    await ask("LM-7K4Q2");
    await page.getByText("A number has ten characters and a check character").waitFor();
    await ask(drawCertificateNumber((count) => randomBytes(count)));
    await page.getByRole("heading", { name: "No certificate has this number" }).waitFor();
    expect.soft(await brokenRules(page)).toEqual([]);
    await ask(kept.number!.toLowerCase().replaceAll("-", " "));
    await page.waitForURL(`${ORIGIN}/verify/${kept.number}`);
    await saysValid(page);
    expect.soft(await brokenRules(page)).toEqual([]);

    await page.goto(`${ORIGIN}/verify`);
    const changed = Buffer.from(kept.pdf!);
    changed[changed.length >> 1] ^= 1;
    for (const [file, answer] of [
      [kept.pdf!, "Signature genuine, file and register agree."],
      [changed, "This file was changed after it was signed."],
      [Buffer.concat([kept.pdf!, Buffer.from("\n% more")]), "Something was added to this file after it was signed."],
      [Buffer.from("not a pdf"), "This is not a certificate file."],
    ] as const) {
      await page
        .getByLabel("Certificate as a PDF file")
        .setInputFiles({ name: "c.pdf", mimeType: "application/pdf", buffer: file });
      await page.getByText(answer).waitFor();
      expect.soft(await brokenRules(page)).toEqual([]);
    }
    await page.context().close();
    expect(faults).toEqual([]);
  });

  test("the address in the code on the paper opens on a stranger's phone", async () => {
    const { page, faults } = await stranger(browser, "phone");
    await page.goto(`${ORIGIN}/verify/${kept.number}`);
    await saysValid(page);
    expect.soft(await phoneFindings(page)).toEqual([]);
    expect(faults).toEqual([]);
    await page.context().close();
  });

  test("withdrawn by the decider, the register says so at once", async () => {
    const { page, password, faults } = decider;
    await page.goto(`${ORIGIN}/saltmarsh/register/${kept.number}`);
    await page.getByText("Withdraw", { exact: true }).click();
    await page.getByLabel("Ground").selectOption("Competence in doubt");
    await page.getByRole("textbox", { name: "Reason" }).fill("Two sites report a wrong lock.");
    await page.getByLabel(/Type the second group/).fill(kept.number!.split("-")[2]!);
    expect.soft(await brokenRules(page)).toEqual([]);
    await page.getByRole("button", { name: /^Withdraw LM-/ }).click();
    await page.getByLabel("Your password, again").fill(password);
    await page.getByRole("dialog").getByRole("button", { name: "Withdraw" }).click();
    await page.getByText("This standing is final.").waitFor();
    expect.soft(await brokenRules(page)).toEqual([]);
    await page.goto(`${ORIGIN}/verify/${kept.number}`);
    await page.getByRole("heading", { name: "Withdrawn", exact: true }).waitFor();
    await page.getByText("Do not rely on this certificate.").waitFor();
    expect(await page.content()).not.toContain("Two sites report");
    expect.soft(await brokenRules(page)).toEqual([]);
    expect(faults).toEqual([]);
  });
});

/** The worker tries every check; those that take it minutes were computed before and come with the demonstration. */
async function runsTheReleaseCheck(page: Page) {
  await page.getByRole("link", { name: "Release check" }).click();
  await page.getByRole("heading", { name: "False lock on a blocked satellite" }).waitFor();
  expect.soft(await brokenRules(page)).toEqual([]);
  await page.getByRole("button", { name: "Run the release check" }).click();
  await page.getByRole("heading", { name: "The whole sitting" }).waitFor({ timeout: 600_000 });
  expect.soft(await brokenRules(page)).toEqual([]);
  expect.soft(await page.getByText("Outside", { exact: true }).count()).toBe(0);
  await page.getByRole("link", { name: "Back to the draft" }).click();
  await page.waitForSelector(".cm-content");
}

/** The number of the demo firm's newest certificate; null until the worker has issued it. */
async function issuedNumber(): Promise<string | null> {
  const [row] = await ownerRows<{ number: string }>(
    `SELECT c.number FROM certificates c JOIN employers e ON e.id = c.employer_id WHERE e.slug = 'saltmarsh'
     ORDER BY c.issued_at DESC LIMIT 1`,
  );
  return row?.number ?? null;
}

/** The register's public answer, and that it names nobody but the holder. */
async function saysValid(page: Page) {
  await page.getByRole("heading", { name: "Valid", exact: true }).waitFor();
  await page.getByText("is competent in").waitFor();
  const content = await page.content();
  expect(content).toContain(demoPerson("technician").name);
  expect(content).not.toContain(demoPerson("outside decider").name);
}

/** Two characters change places: the check character tells. */
function mistyped(number: string): string {
  const body = number.replaceAll("-", "").slice(2);
  const at = [...body].findIndex((character, index) => index < 9 && character !== body[index + 1]);
  return `LM${body.slice(0, at)}${body[at + 1]}${body[at]}${body.slice(at + 2)}`;
}
