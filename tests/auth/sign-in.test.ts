import { decode } from "next-auth/jwt";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { askForLink, signInByLink, signInByPassword, signOut } from "@/lib/auth/sign-in";
import { signedIn } from "@/lib/auth/signedIn";
import { ThrottledError } from "@/lib/errors";
import { makePerson } from "@/tests/support/factories";
import { minutesFrom, NOW } from "@/tests/support/clock";
import { cookieNamed, newBrowser } from "@/tests/support/nextHeaders";
import { ownerRows } from "@/tests/support/owner";

vi.mock("next/headers", () => import("@/tests/support/nextHeaders"));

const PASSWORD = "three blue buoys";
const EMAIL = "daud@example.test";
const person = () => makePerson({ email: EMAIL, password: PASSWORD });

// The libraries of sign-in look at the process's clock; the timers of the database connections go on.
const at = (minutes: number) => vi.useFakeTimers({ toFake: ["Date"], now: minutesFrom(NOW, minutes) });
beforeEach(() => {
  newBrowser();
  at(0);
});
afterEach(() => void vi.useRealTimers());

test("address and password that belong together begin a session, whatever the case of the address", async () => {
  const { id } = await person();
  expect(await signInByPassword(" Daud@Example.TEST ", PASSWORD)).toBe(true);
  expect(await signedIn()).toMatchObject({ personId: id, email: EMAIL, passwordAt: NOW });
});

test.each([
  ["a wrong password", EMAIL, "three blue boys"],
  ["a password in another case", EMAIL, PASSWORD.toUpperCase()],
  ["an unknown address", "nobody@example.test", PASSWORD],
  ["no address", "", PASSWORD],
  ["no password", EMAIL, ""],
  ["a password longer than any can be", EMAIL, "b".repeat(100_000)],
])("%s begins none", async (_what, email, password) => {
  await person();
  expect(await signInByPassword(email, password)).toBe(false);
  expect(await signedIn()).toBeNull();
  expect(await ownerRows("SELECT id FROM sessions")).toEqual([]);
});

test("a person without a password is not let in by any", async () => {
  await makePerson({ email: EMAIL });
  expect(await signInByPassword(EMAIL, "no password has this hash")).toBe(false);
});

test("the cookie is closed to scripts and carries a session id and nothing else of ours", async () => {
  await person();
  await signInByPassword(EMAIL, PASSWORD);
  const cookie = cookieNamed("lagmark-session");
  expect(cookie).toMatchObject({ httpOnly: true, sameSite: "lax", secure: false, maxAge: 43_200 });
  const token = await decode({ token: cookie!.value, secret: process.env.NEXTAUTH_SECRET! });
  const [session] = await ownerRows<{ id: string }>("SELECT id FROM sessions");
  expect(token).toEqual({
    sid: session!.id,
    iat: expect.any(Number),
    exp: expect.any(Number),
    jti: expect.any(String),
  });
});

test("a cookie that another key sealed is no session", async () => {
  await person();
  await signInByPassword(EMAIL, PASSWORD);
  const held = cookieNamed("lagmark-session")!;
  held.value = `${held.value.slice(0, -2)}AA`;
  expect(await signedIn()).toBeNull();
});

test("the ninth try within a quarter of an hour is refused with the wait, even with the right password", async () => {
  await person();
  for (let n = 0; n < 8; n += 1) expect(await signInByPassword(EMAIL, "wrong")).toBe(false);
  at(5);
  await expect(signInByPassword(EMAIL, PASSWORD)).rejects.toThrow(new ThrottledError(600));
  at(16);
  expect(await signInByPassword(EMAIL, PASSWORD)).toBe(true);
});

test("guesses made all at once are counted before any is looked at", async () => {
  await person();
  const guesses = Array.from({ length: 20 }, () => signInByPassword(EMAIL, "wrong"));
  const refused = (await Promise.allSettled(guesses)).filter((guess) => guess.status === "rejected");
  expect(refused).toHaveLength(12);
});

test("one machine that tries many addresses is refused", async () => {
  for (let n = 0; n < 60; n += 1) await signInByPassword(`guess-${n}@example.test`, "wrong");
  await person();
  await expect(signInByPassword(EMAIL, PASSWORD)).rejects.toBeInstanceOf(ThrottledError);
  newBrowser({ "x-forwarded-for": "198.51.100.4" });
  expect(await signInByPassword(EMAIL, PASSWORD)).toBe(true);
});

test("right passwords are not counted", async () => {
  await person();
  for (let n = 0; n < 12; n += 1) expect(await signInByPassword(EMAIL, PASSWORD)).toBe(true);
});

/** The last mail's link, as the page it leads to would hand it on. */
async function mailedLink(): Promise<{ email: string; token: string; back: string | null }> {
  const [mail] = await ownerRows<{ body: string }>("SELECT body FROM mails ORDER BY written_at DESC LIMIT 1");
  const link = new URL(/http\S+/.exec(mail!.body)![0]);
  expect(link.pathname).toBe("/sign-in/link");
  return {
    email: link.searchParams.get("email")!,
    token: link.searchParams.get("token")!,
    back: link.searchParams.get("back"),
  };
}

test("a mailed link signs in once, without a password", async () => {
  const { id } = await person();
  await askForLink(EMAIL, "/firm/desk?page=2");
  const { email, token, back } = await mailedLink();
  expect(back).toBe("/firm/desk?page=2");
  expect(await signInByLink(email, token)).toBe(true);
  expect(await signedIn()).toMatchObject({ personId: id, passwordAt: null });
  newBrowser();
  expect(await signInByLink(email, token)).toBe(false);
  expect(await signedIn()).toBeNull();
});

test("a link followed twice at once lets one in", async () => {
  await person();
  await askForLink(EMAIL, null);
  const { email, token } = await mailedLink();
  const both = await Promise.all([signInByLink(email, token), signInByLink(email, token)]);
  expect(both.filter(Boolean)).toHaveLength(1);
});

test("a link holds for half an hour", async () => {
  await person();
  await askForLink(EMAIL, null);
  const { email, token } = await mailedLink();
  at(31);
  expect(await signInByLink(email, token)).toBe(false);
});

test("a link is for its own address only, and survives a try with another", async () => {
  await person();
  await makePerson({ email: "ines@example.test" });
  await askForLink(EMAIL, null);
  const { email, token } = await mailedLink();
  expect(await signInByLink("ines@example.test", token)).toBe(false);
  expect(await signInByLink(email, token)).toBe(true);
});

test("neither the token nor what it hashes from stands in the table", async () => {
  await person();
  await askForLink(EMAIL, null);
  const { token } = await mailedLink();
  const [row] = await ownerRows<{ token_hash: string }>("SELECT token_hash FROM sign_in_links");
  expect(row!.token_hash).toMatch(/^[0-9a-f]{64}$/);
  expect(row!.token_hash).not.toContain(token);
});

test("an address without an account gets no link, no mail, no account, and the same answer", async () => {
  await expect(askForLink("nobody@example.test", null)).resolves.toBeUndefined();
  for (const table of ["sign_in_links", "mails", "people"])
    expect(await ownerRows(`SELECT * FROM ${table}`)).toEqual([]);
  await person();
  await expect(askForLink(EMAIL, null)).resolves.toBeUndefined();
});

test.each([[EMAIL], ["nobody@example.test"]])("the sixth link to %s within an hour is refused", async (email) => {
  await person();
  for (let n = 0; n < 5; n += 1) await askForLink(email, null);
  await expect(askForLink(email, null)).rejects.toBeInstanceOf(ThrottledError);
});

test("a mail never leads to another site", async () => {
  await person();
  await askForLink(EMAIL, "//elsewhere.example/desk");
  expect((await mailedLink()).back).toBeNull();
});

test("signing out ends the session in the table, so that a copy of the cookie is worth nothing", async () => {
  await person();
  await signInByPassword(EMAIL, PASSWORD);
  const copy = { ...cookieNamed("lagmark-session")! };
  await signOut();
  expect(cookieNamed("lagmark-session")).toBeUndefined();
  newBrowser();
  const { cookies } = await import("@/tests/support/nextHeaders");
  (await cookies()).set(copy);
  expect(await signedIn()).toBeNull();
});
