import { createHash } from "node:crypto";
import { afterAll, expect, test } from "vitest";
import { grantTo, makeEmployer, makePerson } from "@/tests/support/factories";
import { owner, ownerRows } from "@/tests/support/owner";

const origin = process.env.PUBLIC_ORIGIN!;
const PASSWORD = "three blue buoys";
afterAll(() => owner.end());

/** Fill in and send the form that holds a field of this name, as a browser does whose scripts never ran. */
async function send(page: string, holding: string, fields: Record<string, string>, from = origin): Promise<Response> {
  const html = await (await fetch(origin + page)).text();
  const form = html.match(/<form[\s\S]*?<\/form>/g)?.find((each) => each.includes(`name="${holding}"`));
  expect(form, `a form on ${page} that holds ${holding}`).toBeDefined();
  expect(form).toContain('method="POST"');
  const body = new FormData();
  for (const [, tag] of form!.matchAll(/<input([^>]*)>/g)) {
    const [name, value] = ["name", "value"].map((attribute) => new RegExp(`\\b${attribute}="([^"]*)"`).exec(tag!)?.[1]);
    if (name) body.set(name, fields[name] ?? (value ?? "").replaceAll("&quot;", '"'));
  }
  return fetch(origin + page, { method: "POST", body, redirect: "manual", headers: { origin: from } });
}

const cookieOf = (response: Response) =>
  response.headers.getSetCookie().find((line) => line.startsWith("lagmark-session="));

async function technician() {
  const employer = await makeEmployer();
  const person = await makePerson({ password: PASSWORD });
  await grantTo(person.id, employer.id, "technician");
  return { email: person.email, home: `/${employer.slug}/desk` };
}

test("address and password lead to the first station, with a cookie closed to scripts", async () => {
  const { email, home } = await technician();
  const answer = await send("/sign-in", "password", { email, password: PASSWORD });
  expect([answer.status, answer.headers.get("location")]).toEqual([303, home]);
  const cookie = cookieOf(answer)!;
  expect(cookie).toMatch(/; HttpOnly/i);
  expect(cookie).toMatch(/; SameSite=lax/i);
  const page = await fetch(origin + home, { headers: { cookie: cookie.split(";")[0]! }, redirect: "manual" });
  expect(page.status).toBe(200);
});

test("after signing in the page that was asked for comes back, and no other site's", async () => {
  const { email, home } = await technician();
  const fields = { email, password: PASSWORD };
  const asked = await send(`/sign-in?back=${encodeURIComponent("/account")}`, "password", fields);
  expect(asked.headers.get("location")).toBe("/account");
  const foreign = await send("/sign-in", "password", { ...fields, back: "//elsewhere.example" });
  expect(foreign.headers.get("location")).toBe(home);
});

test("a wrong password shows the sentence, keeps the address and sets no cookie", async () => {
  const { email } = await technician();
  const answer = await send("/sign-in", "password", { email, password: "wrong" });
  expect(cookieOf(answer)).toBeUndefined();
  const html = await answer.text();
  expect(html).toContain("do not belong together");
  expect(html).toContain(`value="${email}"`);
  expect(html).not.toContain('value="wrong"');
});

test("a post from another site signs nobody in", async () => {
  const { email } = await technician();
  const answer = await send("/sign-in", "password", { email, password: PASSWORD }, "https://elsewhere.example");
  expect(cookieOf(answer)).toBeUndefined();
  expect(answer.status).toBeGreaterThanOrEqual(400);
});

test("the page of a mailed link uses nothing up when it is opened, and signs in when its key is pressed", async () => {
  const { email, home } = await technician();
  const token = "a token of this test";
  const hash = createHash("sha256").update(`${token}${process.env.NEXTAUTH_SECRET}`).digest("hex");
  await ownerRows("INSERT INTO sign_in_links VALUES ($1, $2, now() + interval '5 minutes')", [hash, email]);
  const page = `/sign-in/link?${new URLSearchParams({ email, token })}`;
  for (let scan = 0; scan < 2; scan += 1) expect((await fetch(origin + page)).status).toBe(200);
  const answer = await send(page, "token", {});
  expect([answer.status, answer.headers.get("location")]).toEqual([303, home]);
  expect(cookieOf(answer)).toBeDefined();
  const again = await send(page, "token", {});
  expect(cookieOf(again)).toBeUndefined();
  expect(await again.text()).toContain("used already");
});
