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
    "/bench",
    "/bench?open=search-plan",
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

  test("the browser complained of nothing", () => expect(visitor.faults).toEqual([]));
});
