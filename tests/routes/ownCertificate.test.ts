import { encode } from "next-auth/jwt";
import { beforeEach, expect, test, vi } from "vitest";
import { GET } from "@/app/api/account/certificates/[number]/pdf/route";
import { homeAddress } from "@/lib/auth/homeAddress";
import { makeCertificate } from "@/tests/support/certified";
import { makeActor, makeFirm, type Firm } from "@/tests/support/factories";
import { cookies, newBrowser } from "@/tests/support/nextHeaders";
import { ownerRows } from "@/tests/support/owner";

vi.mock("next/headers", () => import("@/tests/support/nextHeaders"));

let firm: Firm;
let number: string;
beforeEach(async () => {
  newBrowser();
  firm = await makeFirm();
  number = (await makeCertificate(firm)).number;
});

async function signInAs({ sessionId }: { sessionId: string }): Promise<void> {
  await ownerRows("UPDATE sessions SET expires_at = now() + interval '1 hour' WHERE id = $1", [sessionId]);
  const value = await encode({ token: { sid: sessionId }, secret: process.env.NEXTAUTH_SECRET! });
  (await cookies()).set({ name: "lagmark-session", value });
}
const fetched = (wanted = number) =>
  GET(new Request(`http://127.0.0.1/api/account/certificates/${wanted}/pdf`), {
    params: Promise.resolve({ number: wanted }),
  });

test("a holder whose last role has ended still signs in and has the file exactly as it was issued", async () => {
  await ownerRows("UPDATE role_grants SET ended_at = now() WHERE person_id = $1", [firm.technician.personId]);
  await signInAs(firm.technician);
  expect(await homeAddress()).toBe("/account");
  const answer = await fetched();
  expect([answer.status, answer.headers.get("content-type")]).toEqual([200, "application/pdf"]);
  expect(answer.headers.get("content-disposition")).toBe(`attachment; filename="${number}.pdf"`);
  const [row] = await ownerRows<{ pdf: Buffer }>("SELECT pdf FROM certificates");
  expect(Buffer.from(await answer.arrayBuffer())).toEqual(row!.pdf);
});

test("nobody else has it from here, be it the issuer's own administrator", async () => {
  for (const somebody of [firm.administrator, firm.decider, await makeActor(firm.employer, ["technician"])]) {
    await signInAs(somebody);
    expect((await fetched()).status).toBe(404);
  }
});

test("whoever is signed out is told so, and an unknown number is none", async () => {
  expect((await fetched()).status).toBe(401);
  await signInAs(firm.technician);
  expect((await fetched("LM-00000-00000-0")).status).toBe(404);
});
