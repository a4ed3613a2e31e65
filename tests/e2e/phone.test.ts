import type { Browser } from "playwright-core";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { launch, ORIGIN, stranger } from "./browser";
import { phoneFindings } from "./pageFindings";

let browser: Browser;
let visitor: Awaited<ReturnType<typeof stranger>>;

beforeAll(async () => {
  browser = await launch();
  visitor = await stranger(browser, "phone");
});
afterAll(() => browser.close());

describe("without an account, on a phone 390 px wide", () => {
  test.each([
    "/",
    "/verify",
    "/verify?number=LM-1",
    "/employers",
    "/technicians",
    "/prices",
    "/trust",
    "/privacy",
    "/impartiality",
    "/cautions",
    "/sign-in",
    "/nowhere",
  ])("%s fits the window, its targets a finger, and no rule is broken", async (address) => {
    await visitor.page.goto(ORIGIN + address);
    expect(await phoneFindings(visitor.page)).toEqual([]);
  });

  test("so does every calculator of the bench", async () => {
    const { page } = visitor;
    await page.goto(`${ORIGIN}/bench`);
    const links = page.getByRole("navigation", { name: "Calculators" }).getByRole("link");
    const addresses = await links.evaluateAll((all) => all.map((link) => (link as HTMLAnchorElement).href));
    expect(addresses).not.toEqual([]);
    for (const address of addresses) {
      await page.goto(address);
      expect.soft(await phoneFindings(page), address).toEqual([]);
    }
  });

  test("the browser complained of nothing", () => expect(visitor.faults).toEqual([]));
});
