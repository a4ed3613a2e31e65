import { createHash } from "node:crypto";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import type { Answers, CheckPlan, PublicCase } from "@/lib/checks/kind";
import { kindOf } from "@/lib/checks/registry";
import { ownerRows } from "@/tests/support/owner";
import { demoPerson, launch, ORIGIN, signedIn } from "./browser";

// One certificate, from the lead's module to a stranger's verification, as people do it in a browser.
let browser: Browser;
const kept: { number?: string; pdf?: Buffer } = {};

beforeAll(async () => {
  browser = await launch();
});
afterAll(() => browser.close());

describe("from a draft to a stranger's verification", () => {
  test("the lead is told of a mistake by line and column, mends it, releases and assigns", async () => {
    const { page, faults } = await signedIn(browser, "lead");
    await page.getByRole("link", { name: "Open", exact: true }).first().click();
    await page.waitForSelector(".cm-content");
    const end = async (text: string) => {
      await page.click(".cm-content");
      await page.keyboard.press("Control+End");
      await page.keyboard.type(text);
    };
    await end("\n<Wobble />\n");
    await page.getByText(/Wobble.* is not a tag of the module language/).waitFor();
    await expect(
      page
        .getByText(/Line \d+, column 1/)
        .first()
        .isVisible(),
    ).resolves.toBe(true);
    for (let line = 0; line < 2; line++) await page.keyboard.press("Shift+ArrowUp");
    await page.keyboard.press("Delete");
    await end("\nWrite the hash of the capture into the site record before you leave.\n");
    await page.getByText("No problem. The draft can be released.").waitFor();
    await page.getByRole("button", { name: "Release…" }).click();
    await page.getByLabel("Why now").fill("First release after the boom case.");
    await page.getByRole("button", { name: "Release 1.0" }).click();
    await page.waitForURL(/releases\/1\.0$/);
    await page.getByRole("img", { name: /^Chip strip [0-9a-f]{16}$/ }).waitFor();
    await page.getByLabel("Technician").selectOption({ label: demoPerson("technician").name });
    await page.getByLabel("Sit it by").fill("2099-01-15");
    await page.getByRole("button", { name: "Assign" }).click();
    await page.getByText("Fee open").waitFor();
    expect(faults).toEqual([]);
    await page.context().close();
  });

  test("the administrator pays at the card page", async () => {
    const { page } = await signedIn(browser, "administrator");
    await page.goto(`${ORIGIN}/saltmarsh/counter`);
    await page.getByRole("button", { name: /^Pay .* by card$/ }).click();
    await page.waitForURL((url) => url.origin !== ORIGIN);
    await page.getByRole("button", { name: "Pay: the card is good" }).click();
    await page.waitForURL((url) => url.origin === ORIGIN);
    await page.getByRole("heading", { name: "Paid" }).waitFor();
    await page.context().close();
  });

  test("the technician sits four checks on own data, loses the signal and nothing else", async () => {
    const { page, faults } = await signedIn(browser, "technician");
    await page.getByRole("link", { name: "Read and start" }).click();
    await page.getByText("I accept these conditions").click();
    await page.getByRole("button", { name: "Start the sitting" }).click();
    await page.waitForURL(/\/sittings\//);
    const sitting = page.url();
    const checks = await page.getByRole("button", { name: "Open the case" }).count();
    expect(checks).toBe(4);
    for (let check = 0; check < checks; check++) {
      await page.goto(sitting);
      await page.getByRole("button", { name: "Open the case" }).first().click();
      await page.getByRole("heading", { name: "Answers" }).waitFor();
      const caseId = page.url().split("/").at(-1)!;
      const answers = await rightAnswers(page, caseId);
      if (check === 0) await losesTheSignal(page, answers);
      await type(page, caseId, answers);
      await page.getByRole("button", { name: "Review and hand in" }).click();
      await page.getByRole("button", { name: /^Hand in \d+ answers$/ }).click();
      await page.waitForURL(/\/records\//, { timeout: 180_000 });
      await page.getByText("Met", { exact: true }).first().waitFor();
    }
    expect(faults).toEqual([]);
    await page.context().close();
  }, 900_000);

  test("the outside decider signs afresh, and the certificate is issued", async () => {
    const { page, password } = await signedIn(browser, "outside decider");
    await page.goto(`${ORIGIN}/saltmarsh/queue`);
    await page.getByRole("link", { name: "Open the evidence" }).click();
    await page.getByText("Exhibit 1").waitFor();
    await page.getByText("Competent", { exact: true }).click();
    await page
      .getByRole("textbox", { name: "Reasons" })
      .fill("Every line is within, and the sitting log shows no gap.");
    await page.getByRole("checkbox").check();
    await page.getByRole("button", { name: "Sign: competent" }).click();
    await page.getByLabel("Your password, again").fill(password);
    await page.getByRole("dialog").getByRole("button", { name: "Sign: competent" }).click();
    await page.getByText("Decided: competent").waitFor();
    for (let tries = 0; tries < 60 && !kept.number; tries++) {
      await page.waitForTimeout(1000);
      await readIssued();
    }
    expect(kept.number).toMatch(/^LM-/);
    await page.context().close();
  });

  test("withdrawn by the decider, the register says so at once", async () => {
    const { page, password } = await signedIn(browser, "outside decider");
    await page.goto(`${ORIGIN}/saltmarsh/register/${kept.number}`);
    await page.getByText("Withdraw", { exact: true }).click();
    await page.getByLabel("Ground").selectOption("Competence in doubt");
    await page.getByRole("textbox", { name: "Reason" }).fill("Two sites report a wrong lock.");
    await page.getByLabel(/Type the second group/).fill(kept.number!.split("-")[2]!);
    await page.getByRole("button", { name: /^Withdraw LM-/ }).click();
    await page.getByLabel("Your password, again").fill(password);
    await page.getByRole("dialog").getByRole("button", { name: "Withdraw" }).click();
    await page.getByText("This standing is final.").waitFor();
    await page.goto(`${ORIGIN}/verify/${kept.number}`);
    await page.getByRole("heading", { name: "Withdrawn", exact: true }).waitFor();
    await page.getByText("Do not rely on this certificate.").waitFor();
    expect(await page.content()).not.toContain("Two sites report");
    await page.context().close();
  });
});

/** The newest certificate of the register. */
async function readIssued() {
  const [row] = await ownerRows<{ number: string; pdf: Buffer }>(
    "SELECT number, pdf FROM certificates ORDER BY issued_at DESC LIMIT 1",
  );
  if (row) Object.assign(kept, row);
}

/** What the right method reads from the case as the technician has it: the public view and its files, nothing else. */
async function rightAnswers(page: Page, caseId: string): Promise<Answers> {
  const [row] = await ownerRows<{
    view: PublicCase;
    files: { name: string; mediaType: string; sha256: string }[];
    checks: CheckPlan[];
    checkId: string;
  }>(
    `SELECT v.view, v.files, r.checks, c.check_id AS "checkId" FROM case_views v JOIN cases c ON c.id = v.case_id
     JOIN sittings s ON s.id = c.sitting_id JOIN releases r ON r.id = s.release_id WHERE c.id = '${caseId}'`,
  );
  const { view, files, checks, checkId } = row!;
  const loaded = [];
  for (const { name, mediaType, sha256 } of files) {
    const response = await page.request.get(`${ORIGIN}/api/employers/saltmarsh/cases/${caseId}/files/${name}`);
    const bytes = await response.body();
    expect(createHash("sha256").update(bytes).digest("hex")).toBe(sha256);
    loaded.push({ name, mediaType, bytes: new Uint8Array(bytes) });
  }
  const plan = checks.find(({ id }) => id === checkId)!;
  return kindOf(plan.kind, plan.version).solve({ truth: null, publicCase: view, files: loaded, draws: 1 }, plan);
}

/** The first number is typed without a signal; after a reload with one it is there, and at the server. */
async function losesTheSignal(page: Page, answers: Answers) {
  const lag = page.getByLabel("Lag of the highest cell");
  await page.context().setOffline(true);
  await lag.fill(answers["reading.lag"]!);
  await page.getByText("Kept on this device").waitFor();
  await page.context().setOffline(false);
  await page.reload();
  await page.getByText(/^Saved \d\d:\d\d:\d\d/).waitFor();
  expect(await page.getByLabel("Lag of the highest cell").inputValue()).toBe(answers["reading.lag"]);
}

/** Long forms go in the way the form itself sends them; the page is then reloaded and shows them. */
async function type(page: Page, caseId: string, answers: Answers) {
  const response = await page.request.put(`${ORIGIN}/api/employers/saltmarsh/cases/${caseId}/answers`, {
    data: { answers, revision: 1000 },
    headers: { origin: ORIGIN },
  });
  expect(response.ok()).toBe(true);
  await page.evaluate(() => localStorage.clear());
  await page.reload();
  await page
    .getByText(/given$/)
    .first()
    .waitFor();
}
