import { beforeEach, expect, test } from "vitest";
import { addPerson } from "@/lib/commands/addPerson";
import { endRole } from "@/lib/commands/endRole";
import { grantRole } from "@/lib/commands/grantRole";
import { ConflictError, ForbiddenError, NotFoundError } from "@/lib/errors";
import type { Actor, Role } from "@/lib/policies/actor";
import { getSignedIn } from "@/lib/queries/getSignedIn";
import { minutesFrom, NOW } from "@/tests/support/clock";
import { grantTo, makeActor, makeFirm, makePerson, type Firm } from "@/tests/support/factories";
import { ownerRows } from "@/tests/support/owner";

let firm: Firm;
let other: Firm;
beforeEach(async () => {
  firm = await makeFirm();
  other = await makeFirm();
});

const rolesOf = async (actor: Actor) =>
  (await getSignedIn(actor.sessionId, NOW))?.employers.find(({ id }) => id === firm.employer.id)?.roles ?? [];
const grantOf = async (actor: Actor, role: Role) =>
  (
    await ownerRows<{ id: string }>(
      "SELECT id FROM role_grants WHERE person_id = $1 AND employer_id = $2 AND role = $3",
      [actor.personId, actor.employerId, role],
    )
  )[0]!.id;
const technicianAs = (role: Role) => ({ personId: firm.technician.personId, role, outsideLine: false });

test("a role that is granted counts at the next request", async () => {
  await grantRole(firm.administrator, technicianAs("assessor"), NOW);
  expect(await rolesOf(firm.technician)).toEqual(["assessor", "technician"]);
});

test("a role that is ended is gone at the next request, in a session that goes on", async () => {
  await endRole(firm.administrator, await grantOf(firm.technician, "technician"), NOW);
  expect(await rolesOf(firm.technician)).toEqual([]);
  expect(await getSignedIn(firm.technician.sessionId, NOW)).not.toBeNull();
});

test("a role that ended can be granted again", async () => {
  await endRole(firm.administrator, await grantOf(firm.technician, "technician"), NOW);
  await grantRole(firm.administrator, technicianAs("technician"), minutesFrom(NOW, 1));
  expect(await rolesOf(firm.technician)).toEqual(["technician"]);
});

test("both acts stand in the trail with who did them", async () => {
  await grantRole(firm.administrator, technicianAs("lead"), NOW);
  await endRole(firm.administrator, await grantOf(firm.technician, "lead"), NOW);
  const sql = `SELECT act, employer_id FROM trail_entries WHERE actor_id = $1 ORDER BY id`;
  expect(await ownerRows(sql, [firm.administrator.personId])).toEqual([
    { act: "role_grants added", employer_id: firm.employer.id },
    { act: "role_grants changed", employer_id: firm.employer.id },
  ]);
});

test("a role is held once", async () => {
  const twice = grantRole(firm.administrator, technicianAs("technician"), NOW);
  await expect(twice).rejects.toBeInstanceOf(ConflictError);
});

test("two administrators who grant the same role at once make one grant", async () => {
  const second = await makeActor(firm.employer, ["administrator"]);
  const both = await Promise.allSettled(
    [firm.administrator, second].map((actor) => grantRole(actor, technicianAs("lead"), NOW)),
  );
  expect(both.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
  expect(await rolesOf(firm.technician)).toEqual(["lead", "technician"]);
});

test("only a decider is outside the line", async () => {
  await grantRole(firm.administrator, { ...technicianAs("lead"), outsideLine: true }, NOW);
  await grantRole(firm.administrator, { ...technicianAs("decider"), outsideLine: true }, NOW);
  const sql = "SELECT role FROM role_grants WHERE person_id = $1 AND outside_line";
  expect(await ownerRows(sql, [firm.technician.personId])).toEqual([{ role: "decider" }]);
});

test("the last administrator stays", async () => {
  const grant = await grantOf(firm.administrator, "administrator");
  await expect(endRole(firm.administrator, grant, NOW)).rejects.toBeInstanceOf(ConflictError);
  const second = await makeActor(firm.employer, ["administrator"]);
  await endRole(second, grant, NOW);
  expect(await rolesOf(firm.administrator)).toEqual([]);
  await expect(endRole(second, await grantOf(second, "administrator"), NOW)).rejects.toBeInstanceOf(ConflictError);
});

test("two administrators who end each other at once leave one", async () => {
  const second = await makeActor(firm.employer, ["administrator"]);
  const [first, last] = [await grantOf(firm.administrator, "administrator"), await grantOf(second, "administrator")];
  const both = await Promise.allSettled([endRole(firm.administrator, last, NOW), endRole(second, first, NOW)]);
  expect(both.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
  expect([...(await rolesOf(firm.administrator)), ...(await rolesOf(second))]).toEqual(["administrator"]);
});

const refused = ["technician", "lead", "assessor", "decider"] as const;
const newcomer = { name: "Lotte", email: "lotte@example.test", roles: ["technician" as const], outsideLine: false };

test.each(refused)("a %s may neither add people, nor grant, nor end roles", async (who) => {
  const actor = firm[who];
  const grant = await grantOf(firm.technician, "technician");
  for (const act of [
    () => grantRole(actor, technicianAs("administrator"), NOW),
    () => endRole(actor, grant, NOW),
    () => addPerson(actor, newcomer, NOW),
  ]) {
    await expect(act()).rejects.toBeInstanceOf(ForbiddenError);
  }
  expect(await rolesOf(firm.technician)).toEqual(["technician"]);
});

test("another firm's people and roles look like none at all", async () => {
  const { administrator } = other;
  const grant = await grantOf(firm.technician, "technician");
  await expect(grantRole(administrator, technicianAs("lead"), NOW)).rejects.toBeInstanceOf(NotFoundError);
  await expect(endRole(administrator, grant, NOW)).rejects.toBeInstanceOf(NotFoundError);
  expect(await rolesOf(firm.technician)).toEqual(["technician"]);
});

test.each([["no id"], ["00000000-0000-4000-8000-000000000000"]])("%s is no person and no role", async (id) => {
  const person = grantRole(firm.administrator, { ...technicianAs("lead"), personId: id }, NOW);
  await expect(person).rejects.toBeInstanceOf(NotFoundError);
  await expect(endRole(firm.administrator, id, NOW)).rejects.toBeInstanceOf(NotFoundError);
});

test("a person of two firms keeps the roles at the one when those at the other end", async () => {
  await grantTo(firm.technician.personId, other.employer.id, "decider");
  await endRole(firm.administrator, await grantOf(firm.technician, "technician"), NOW);
  const person = await getSignedIn(firm.technician.sessionId, NOW);
  expect(person?.employers).toMatchObject([{ id: other.employer.id, roles: ["decider"] }]);
});

test("an added person gets account, roles and a mail whose link leads to the own account", async () => {
  await addPerson(firm.administrator, { ...newcomer, roles: ["technician", "lead", "technician"] }, NOW);
  const roles = await ownerRows(
    "SELECT role FROM role_grants g JOIN people p ON p.id = g.person_id WHERE p.email = $1 ORDER BY role",
    [newcomer.email],
  );
  expect(roles).toEqual([{ role: "lead" }, { role: "technician" }]);
  const [mail] = await ownerRows<{ body: string; to_email: string }>("SELECT body, to_email FROM mails");
  expect(mail?.to_email).toBe(newcomer.email);
  expect(mail?.body).toMatch(/\/sign-in\/link\?email=lotte%40example\.test&token=[\w-]{43}&back=%2Faccount\n/);
  expect(await ownerRows("SELECT data FROM jobs.job WHERE name = 'send-mail'")).toHaveLength(1);
});

test("whoever has an account keeps name and password, and is told to sign in as before", async () => {
  const known = await makePerson({ email: newcomer.email, name: "Lotte Brandvold", password: "three blue buoys" });
  expect(await addPerson(firm.administrator, { ...newcomer, name: "Somebody else" }, NOW)).toEqual({ id: known.id });
  expect(await ownerRows("SELECT name FROM people WHERE id = $1", [known.id])).toEqual([{ name: known.name }]);
  const [mail] = await ownerRows<{ body: string }>("SELECT body FROM mails");
  expect(mail?.body).toContain("Sign in as before");
  expect(await ownerRows("SELECT * FROM sign_in_links")).toEqual([]);
});

test("nobody is added twice, and then no mail goes out", async () => {
  await addPerson(firm.administrator, newcomer, NOW);
  await expect(addPerson(firm.administrator, newcomer, NOW)).rejects.toBeInstanceOf(ConflictError);
  expect(await ownerRows("SELECT id FROM mails")).toHaveLength(1);
});
