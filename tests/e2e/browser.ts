import { readFileSync } from "node:fs";
import { chromium, type Browser, type BrowserContextOptions } from "playwright-core";

export const ORIGIN = process.env.PUBLIC_ORIGIN!;
const DESK = { width: 1440, height: 900 };

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

/** A page of a person who has just signed in, with what the browser complained of. */
export async function signedIn(browser: Browser, role: string, options: BrowserContextOptions = {}) {
  const context = await browser.newContext({ viewport: DESK, ...options });
  const page = await context.newPage();
  page.setDefaultTimeout(60_000);
  const faults: string[] = [];
  page.on("pageerror", (error) => faults.push(String(error)));
  page.on("console", (message) => {
    if (message.type() === "error" && message.text().includes("Content Security Policy")) faults.push(message.text());
  });
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
