import type { Page } from "playwright-core";
import { expect } from "vitest";
import type { Answers } from "@/lib/checks/kind";
import { ORIGIN } from "./browser";
import { phoneFindings } from "./pageFindings";

// What a technician does with an open case.

/** The first number is typed without a signal; after a reload with one it is there, and at the server. */
export async function losesTheSignal(page: Page, answers: Answers) {
  const lag = page.getByLabel("Lag of the highest cell");
  await page.context().setOffline(true);
  await lag.fill(answers["reading.lag"]!);
  await page.getByText("Kept on this device").waitFor();
  await page.context().setOffline(false);
  await page.reload();
  await page.getByText(/^Saved \d\d:\d\d:\d\d/).waitFor();
  expect(await page.getByLabel("Lag of the highest cell").inputValue()).toBe(answers["reading.lag"]);
}

/** A satellite searched with a finger; what the crosshair reads goes into the answers, and from there to the server. */
export async function readsASatellite(page: Page, prn: string) {
  await page.getByLabel("Satellite", { exact: true }).selectOption(prn);
  await page.getByRole("button", { name: `Search PRN ${prn}`, exact: true }).tap();
  await page.getByRole("heading", { name: `Search grid, satellite ${prn}` }).waitFor();
  // Every plot has keys of its own; these are the grid's.
  await page.locator('.nudge-keys[data-cursor="both"]').getByRole("button", { name: "Next peak" }).tap();
  await page.getByRole("button", { name: /^Take .* for satellite/ }).tap();
  await page.getByText(/^Saved \d\d:\d\d:\d\d/).waitFor();
  await page.getByRole("button", { name: "Answers" }).tap();
  expect(await page.getByLabel("PRN, row 1").inputValue()).toBe(prn);
}

/** Each step of a case on a phone, which shows one at a time. */
export async function eachStepFits(page: Page) {
  for (const step of ["Brief", "Work", "Answers"]) {
    await page.getByRole("button", { name: step, exact: true }).tap();
    expect.soft(await phoneFindings(page)).toEqual([]);
  }
}

/** Long forms go in the way the form itself sends them; the page is then reloaded and shows them. */
export async function sendsAnswers(page: Page, caseId: string, answers: Answers) {
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
    .waitFor({ state: "attached" });
}
