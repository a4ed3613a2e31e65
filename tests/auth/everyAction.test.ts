import path from "node:path";
import { encode } from "next-auth/jwt";
import { beforeEach, expect, test, vi } from "vitest";
import { ROLES } from "@/lib/policies/actor";
import { actions } from "@/tests/support/entrances";
import { makeActor, makeFirm } from "@/tests/support/factories";
import { cookies, newBrowser } from "@/tests/support/nextHeaders";
import { ownerRows } from "@/tests/support/owner";

vi.mock("next/headers", () => import("@/tests/support/nextHeaders"));
vi.mock("next/cache", () => ({ revalidatePath: () => undefined }));

// The ways in and out: what they refuse is in sign-in.test.ts.
const OPEN = ["signInAction", "mailLinkAction", "followLinkAction", "signOutAction"];
const closed = actions().filter(({ name }) => !OPEN.includes(name));
const ofEmployers = closed.filter(({ file }) => file.includes("[employer]"));

type Action = (previous: unknown, form: FormData) => Promise<unknown>;
const load = async ({ name, file }: { name: string; file: string }): Promise<Action> => {
  const exported = (await import(path.resolve(import.meta.dirname, "../..", file))) as Record<string, Action>;
  return exported[name]!;
};
const form = (fields: Record<string, string>) => {
  const data = new FormData();
  for (const [name, value] of Object.entries(fields)) data.set(name, value);
  return data;
};
async function signInAs(sessionId: string): Promise<void> {
  await ownerRows("UPDATE sessions SET expires_at = now() + interval '1 hour' WHERE id = $1", [sessionId]);
  const value = await encode({ token: { sid: sessionId }, secret: process.env.NEXTAUTH_SECRET! });
  (await cookies()).set({ name: "lagmark-session", value });
}

beforeEach(() => newBrowser({ "x-page": "/firm/desk" }));

test.each(closed.map((each) => [each.name, each] as const))(
  "%s sends whoever is signed out to sign in",
  async (_name, each) => {
    const asked = (await load(each))(null, form({ employer: "firm" }));
    await expect(asked).rejects.toMatchObject({
      digest: expect.stringContaining(";/sign-in?back=%2Ffirm%2Fdesk;"),
    });
  },
);

test.each(ofEmployers.map((each) => [each.name, each] as const))(
  "%s knows no employer at which the person holds no role, and does nothing with an empty form at the own",
  async (_name, each) => {
    const other = await makeFirm();
    const { employer } = await makeFirm();
    await signInAs((await makeActor(employer, [...ROLES])).sessionId);
    const run = await load(each);
    const refusal = { ok: false, message: "There is no such employer." };
    expect(await run(null, form({ employer: other.employer.slug }))).toEqual(refusal);
    expect(await run(null, form({}))).toEqual(refusal);
    expect(await run(null, form({ employer: employer.slug }))).toMatchObject({ ok: false, fields: expect.any(Object) });
  },
);

test("an action in a session that has ended is sent to sign in", async () => {
  const { employer, lead } = await makeFirm();
  await signInAs(lead.sessionId);
  await ownerRows("UPDATE sessions SET ended_at = now() WHERE id = $1", [lead.sessionId]);
  const asked = (await load(ofEmployers[0]!))(null, form({ employer: employer.slug }));
  await expect(asked).rejects.toMatchObject({ digest: expect.stringContaining(";/sign-in?") });
});
