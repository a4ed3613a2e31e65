import { expect, test } from "vitest";
import { z } from "zod";
import { parsed } from "@/lib/auth/action";
import { toResult } from "@/lib/auth/actionResult";
import { formValues } from "@/lib/auth/formValues";
import { ConflictError, InvalidError, SignInAfreshError } from "@/lib/errors";
import { addPersonInput, setPasswordInput } from "@/lib/schemas/people";

function form(...fields: [string, string][]): FormData {
  const data = new FormData();
  for (const [name, value] of fields) data.append(name, value);
  return data;
}

test("a field that occurs twice is a list, and the framework's own fields are left out", () => {
  const sent = form(["$ACTION_KEY", "k"], ["roles", "lead"], ["roles", "decider"], ["name", "Ines"]);
  expect(formValues(sent)).toEqual({ roles: ["lead", "decider"], name: "Ines" });
});

test("what a client component sends as an object is taken as it is", () => {
  expect(formValues({ revision: 3 })).toEqual({ revision: 3 });
});

test("refused fields come back with their sentences, and a field that nobody asked for is refused", () => {
  const schema = z.object({ day: z.iso.date("Enter a day.") }).strict();
  expect(parsed(schema, { day: "2026-12-01" })).toEqual({ day: "2026-12-01" });
  const refused = { publicMessage: expect.any(String), fields: { day: ["Enter a day."] } };
  expect(() => parsed(schema, { day: "tomorrow" })).toThrow(expect.objectContaining(refused));
  expect(() => parsed(schema, { day: "2026-12-01", more: "x" })).toThrow(InvalidError);
});

test("words for people pass, with what the screen needs to go on", async () => {
  const thrown = (error: Error) => toResult(() => Promise.reject(error));
  expect(await thrown(new ConflictError("Decided already."))).toEqual({ ok: false, message: "Decided already." });
  const invalid = new InvalidError("No.", { day: ["Past."] });
  expect(await thrown(invalid)).toEqual({ ok: false, message: "No.", fields: { day: ["Past."] } });
  expect(await thrown(new SignInAfreshError())).toMatchObject({ ok: false, afresh: true });
});

test("a bug keeps its words to itself", async () => {
  const bug = new Error("SELECT password_hash FROM people");
  await expect(toResult(() => Promise.reject(bug))).rejects.toBe(bug);
});

test("name, address and roles of a new person are brought to one form", () => {
  const typed = { name: "  A\u030Ase \t Holl ", email: " Ase@Example.TEST", roles: "lead" };
  const newcomer = { name: "Åse Holl", email: "ase@example.test", roles: ["lead"], outsideLine: false };
  expect(addPersonInput.parse(typed)).toEqual(newcomer);
});

test.each([
  ["no role", { roles: undefined }, "roles"],
  ["a role that is none", { roles: ["operator"] }, "roles"],
  ["an address without a host", { email: "ase@" }, "email"],
  ["a name of spaces", { name: "   " }, "name"],
])("%s is refused at its field", (_what, over, field) => {
  const { error } = addPersonInput.safeParse({ name: "Åse", email: "ase@example.test", roles: ["lead"], ...over });
  expect(error?.issues[0]?.path[0]).toBe(field);
});

test.each([
  ["eleven characters", { password: "elevenchars", again: "elevenchars" }, "password"],
  ["two that differ", { password: "three blue buoys", again: "three blue boys" }, "again"],
])("a new password of %s is refused", (_what, typed, field) => {
  expect(setPasswordInput.safeParse(typed).error?.issues[0]?.path[0]).toBe(field);
});
