import { readFileSync } from "node:fs";
import { chromium, type Browser, type BrowserContext, type BrowserContextOptions } from "playwright-core";

export const ORIGIN = process.env.PUBLIC_ORIGIN!;
const DESK: BrowserContextOptions = { viewport: { width: 1440, height: 900 } };
/** A phone as a finger finds it: narrow, touched, without a fine pointer. */
const PHONE: BrowserContextOptions = { viewport: { width: 390, height: 844 }, isMobile: true, hasTouch: true };

type SignIn = { role: string; name: string; email: string; password: string };

export const launch = (): Promise<Browser> =>
  chromium.launch({
    executablePath: process.env.CHROMIUM_PATH || "/usr/bin/chromium",
    args: [
      "--no-sandbox",
      "--disable-gpu",
      "--disable-quic",
      "--disable-background-networking",
      "--disable-component-update",
    ],
  });

/** One of the demo firm's people, as the start command prints them. */
export function demoPerson(role: string): SignIn {
  const people = JSON.parse(readFileSync(process.env.DEMO_SIGN_INS_FILE!, "utf8")) as SignIn[];
  return people.find((person) => person.role === role)!;
}

/** A page of somebody without an account, with what the browser complained of. */
export const stranger = (browser: Browser, device: "desk" | "phone" = "desk") => opened(browser, device);

/** A page of a person who has just signed in. */
export async function signedIn(browser: Browser, role: string) {
  const { page, faults } = await opened(browser, "desk");
  const { email, password } = demoPerson(role);
  await page.goto(`${ORIGIN}/sign-in`);
  await page
    .getByLabel(/e-mail/i)
    .first()
    .fill(email);
  await page.locator("input[type=password]").first().fill(password);
  await page
    .getByRole("button", { name: /sign in/i })
    .first()
    .click();
  await page.waitForURL((url) => !url.pathname.startsWith("/sign-in"));
  return { page, faults, password };
}

/** The same person's phone: signed in already, and with nothing of what the other device keeps. */
export async function phoneOf(browser: Browser, context: BrowserContext) {
  const { cookies } = await context.storageState();
  return opened(browser, "phone", { storageState: { cookies, origins: [] } });
}

async function opened(browser: Browser, device: "desk" | "phone", options: BrowserContextOptions = {}) {
  const context = await browser.newContext({ ...(device === "desk" ? DESK : PHONE), ...options });
  const page = await context.newPage();
  page.setDefaultTimeout(60_000);
  const faults: string[] = [];
  page.on("pageerror", (error) => faults.push(String(error)));
  page.on("console", (message) => {
    if (message.type() === "error" && message.text().includes("Content Security Policy")) faults.push(message.text());
  });
  return { page, faults };
}
