import { expect, test } from "vitest";
import { actorAt } from "@/lib/policies/actorAt";

const person = {
  personId: "p",
  name: "Orla",
  sessionId: "s",
  isOperator: false,
  passwordAt: null,
  employers: [
    { id: "1", slug: "beacon", name: "Beacon", roles: ["decider" as const], outsideLine: true },
    { id: "2", slug: "masts", name: "Masts", roles: ["lead" as const, "assessor" as const], outsideLine: false },
  ],
};

test("roles and line are those of the employer that is named", () => {
  expect(actorAt(person, "masts")).toMatchObject({ employerId: "2", roles: ["lead", "assessor"], outsideLine: false });
  expect(actorAt(person, "beacon")).toMatchObject({ employerId: "1", roles: ["decider"], outsideLine: true });
});

test("no employer named means the first", () => expect(actorAt(person)?.employerSlug).toBe("beacon"));

test.each([["elsewhere"], [""], ["Beacon"], ["undefined"]])("nobody at %j", (slug) => {
  expect(actorAt(person, slug)).toBeNull();
});

test("nobody anywhere without a role", () => expect(actorAt({ ...person, employers: [] })).toBeNull());
