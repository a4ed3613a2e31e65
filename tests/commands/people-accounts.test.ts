import { beforeEach, expect, test } from "vitest";
import { confirmPassword } from "@/lib/commands/confirmPassword";
import { endSession } from "@/lib/commands/endSession";
import { renamePerson } from "@/lib/commands/renamePerson";
import { setPassword } from "@/lib/commands/setPassword";
import { startSession } from "@/lib/commands/startSession";
import { InvalidError, NotFoundError, SignInAfreshError } from "@/lib/errors";
import { verifyPassword } from "@/lib/passwords";
import { requireAfresh } from "@/lib/policies/requireAfresh";
import { getSignedIn, type SignedIn } from "@/lib/queries/getSignedIn";
import { minutesFrom, NOW } from "@/tests/support/clock";
import { makePerson, makeSession } from "@/tests/support/factories";
import { ownerRows } from "@/tests/support/owner";

const PASSWORD = "three blue buoys";
const NEXT = "four grey masts";
let personId: string;
beforeEach(async () => {
  personId = (await makePerson({ email: "orla@example.test", password: PASSWORD })).id;
});

const inSession = async (sessionId: string, at = NOW): Promise<SignedIn> => (await getSignedIn(sessionId, at))!;
const storedHash = async () =>
  (await ownerRows<{ hash: string }>("SELECT password_hash AS hash FROM people WHERE id = $1", [personId]))[0]!.hash;

test("a session holds for twelve hours and not longer", async () => {
  const { id } = await startSession({ personId, passwordAt: NOW }, NOW);
  expect(await getSignedIn(id, minutesFrom(NOW, 719))).not.toBeNull();
  expect(await getSignedIn(id, minutesFrom(NOW, 720))).toBeNull();
});

test("a session that is ended is refused at once, and no other session with it", async () => {
  const [here, there] = [await makeSession(personId), await makeSession(personId)];
  await endSession({ personId }, here.id, NOW);
  expect(await getSignedIn(here.id, NOW)).toBeNull();
  expect(await getSignedIn(there.id, NOW)).not.toBeNull();
});

test("another person's session cannot be ended, and an ended one not again", async () => {
  const strange = await makeSession((await makePerson()).id);
  await expect(endSession({ personId }, strange.id, NOW)).rejects.toBeInstanceOf(NotFoundError);
  expect(await getSignedIn(strange.id, NOW)).not.toBeNull();
  const own = await makeSession(personId);
  await endSession({ personId }, own.id, NOW);
  await expect(endSession({ personId }, own.id, NOW)).rejects.toBeInstanceOf(NotFoundError);
});

test("the password given again counts for five minutes, in the session it was given in", async () => {
  const [here, there] = [await makeSession(personId), await makeSession(personId)];
  expect(() => requireAfresh({ passwordAt: minutesFrom(NOW, -60) }, NOW)).toThrow(SignInAfreshError);
  await confirmPassword(await inSession(here.id), PASSWORD, NOW);
  const confirmed = await inSession(here.id);
  expect(requireAfresh(confirmed, minutesFrom(NOW, 5))).toEqual(NOW);
  expect(() => requireAfresh(confirmed, new Date(minutesFrom(NOW, 5).getTime() + 1))).toThrow(SignInAfreshError);
  expect((await inSession(there.id)).passwordAt).toEqual(minutesFrom(NOW, -60));
});

test("a wrong password confirms nothing", async () => {
  const { id } = await makeSession(personId, { passwordAt: null });
  const wrong = confirmPassword(await inSession(id), NEXT, NOW);
  await expect(wrong).rejects.toMatchObject({ fields: { password: [expect.any(String)] } });
  expect((await inSession(id)).passwordAt).toBeNull();
});

test("without a password nothing can be confirmed, and the sentence says where to set one", async () => {
  const other = await makePerson();
  const { id } = await makeSession(other.id, { passwordAt: null });
  await expect(confirmPassword(await inSession(id), "", NOW)).rejects.toThrow(/Set one in your account/);
});

test("a changed password is stored as an Argon2id hash, and every other session ends", async () => {
  const [here, there] = [await makeSession(personId), await makeSession(personId)];
  await setPassword(await inSession(here.id), { current: PASSWORD, password: NEXT }, NOW);
  const hash = await storedHash();
  // OWASP Password Storage Cheat Sheet, Argon2id: 19 MiB, two passes, one lane.
  expect(hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  expect(await verifyPassword(hash, NEXT)).toBe(true);
  expect(await verifyPassword(hash, PASSWORD)).toBe(false);
  expect(await getSignedIn(here.id, NOW)).not.toBeNull();
  expect(await getSignedIn(there.id, NOW)).toBeNull();
});

test.each([[undefined], [""], [NEXT]])("with %j for the present password nothing changes", async (current) => {
  const { id } = await makeSession(personId);
  const before = await storedHash();
  const wrong = setPassword(await inSession(id), { current, password: NEXT }, NOW);
  await expect(wrong).rejects.toMatchObject({ fields: { current: [expect.any(String)] } });
  expect(await storedHash()).toBe(before);
});

test("just after a mailed link a lost password is replaced without it, a quarter of an hour later not", async () => {
  const { id } = await startSession({ personId, passwordAt: null }, NOW);
  const late = minutesFrom(NOW, 16);
  const tooLate = setPassword(await inSession(id, late), { password: NEXT }, late);
  await expect(tooLate).rejects.toBeInstanceOf(InvalidError);
  await setPassword(await inSession(id), { password: NEXT }, minutesFrom(NOW, 1));
  expect(await verifyPassword(await storedHash(), NEXT)).toBe(true);
});

test("setting a password is not signing in afresh", async () => {
  const { id } = await startSession({ personId, passwordAt: null }, NOW);
  await setPassword(await inSession(id), { password: NEXT }, NOW);
  expect((await inSession(id)).passwordAt).toBeNull();
});

test("the own address is no password", async () => {
  const { id } = await makeSession(personId);
  const address = setPassword(await inSession(id), { current: PASSWORD, password: "Orla@Example.test1" }, NOW);
  await expect(address).rejects.toMatchObject({ fields: { password: [expect.any(String)] } });
});

test("a password is the same however its letters are composed", async () => {
  const { id } = await makeSession(personId);
  await setPassword(await inSession(id), { current: PASSWORD, password: "blåbærsyltetøy" }, NOW);
  expect(await verifyPassword(await storedHash(), "bla\u030Abærsyltetøy")).toBe(true);
});

test("a new name is there at the next request", async () => {
  const { id } = await makeSession(personId);
  await renamePerson({ personId }, "Orla Quist-Vane");
  expect((await inSession(id)).name).toBe("Orla Quist-Vane");
});

test.each([["no id"], ["' OR true --"], ["00000000-0000-4000-8000-000000000000"]])("%s is no session", async (id) => {
  expect(await getSignedIn(id, NOW)).toBeNull();
});
