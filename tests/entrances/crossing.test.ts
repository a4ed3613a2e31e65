import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { owner } from "@/tests/support/owner";
import { PAGES, READING_ROUTES, WRITING_ROUTES, type Addressed } from "./rows";
import { VISITORS, type Visitor } from "./visitors";
import { makeWorld, type World } from "./world";

// The running product's own address. (BASE_URL is no help: the test runner sets it to "/" for itself.)
const origin = process.env.PUBLIC_ORIGIN;
if (!origin) throw new Error("PUBLIC_ORIGIN is not set: run the browser tests through npm test");

let world: World;
beforeAll(async () => {
  world = await makeWorld();
});
afterAll(() => owner.end());

const ask = (address: string, visitor: Visitor, more: RequestInit = {}) =>
  fetch(origin + address, {
    redirect: "manual",
    ...more,
    headers: { cookie: world.cookies[visitor], ...(more.headers as Record<string, string>) },
  });

const SIGN_IN = (address: string) => `/sign-in?back=${encodeURIComponent(address)}`;

async function answerOf(row: Addressed, visitor: Visitor): Promise<number | "sign in"> {
  const address = row.address(world.ids);
  const response = await ask(address, visitor);
  await response.body?.cancel();
  const goesTo = new URL(response.headers.get("location") ?? "", origin);
  return response.status === 307 && goesTo.pathname + goesTo.search === SIGN_IN(address) ? "sign in" : response.status;
}

const rows = { ...PAGES, ...READING_ROUTES };
describe.each(Object.entries(rows))("%s", (_name, row) => {
  test.each(VISITORS)("answers %s as its row says", async (visitor) => {
    expect(await answerOf(row, visitor)).toBe(row.answers[visitor]);
  });
});

const writing = Object.entries(WRITING_ROUTES).flatMap(([name, { address }]) => (address ? [{ name, address }] : []));
describe.each(writing)("$name", ({ name, address }) => {
  const method = name.split(" ")[0]!;
  const send = (visitor: Visitor, from: Record<string, string>) =>
    ask(address(world.ids), visitor, { method, body: "{}", headers: { "content-type": "application/json", ...from } });

  test.each([
    ["signed out", 401],
    ["every role elsewhere", 404],
    ["operator", 404],
  ] as const)("answers %s with %i", async (visitor, status) => {
    expect((await send(visitor, { origin })).status).toBe(status);
  });

  test.each([
    ["from another site", { origin: "https://elsewhere.example" }],
    ["from a page without an origin", { origin: "null" }],
    ["from nowhere", {}],
  ])("is refused %s, whoever is signed in", async (_where, from) => {
    for (const visitor of VISITORS) expect((await send(visitor, from)).status, visitor).toBe(403);
  });
});

test("an ended session is signed out at its next request", async () => {
  const { ids, firm } = world;
  const page = `/${ids.employer}/trail`;
  expect((await ask(page, "administrator")).status).toBe(200);
  await owner.query("UPDATE sessions SET ended_at = now() WHERE id = $1", [firm.administrator.sessionId]);
  const after = await ask(page, "administrator");
  expect([after.status, after.headers.get("location")]).toEqual([307, SIGN_IN(page)]);
});

test("an ended role closes the page at its next request", async () => {
  const { ids, firm } = world;
  const page = `/${ids.employer}/modules`;
  expect((await ask(page, "lead")).status).toBe(200);
  await owner.query("UPDATE role_grants SET ended_at = now() WHERE person_id = $1", [firm.lead.personId]);
  expect((await ask(page, "lead")).status).toBe(404);
});
