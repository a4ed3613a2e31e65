import { expect, test } from "vitest";
import { ROLES, type Actor, type Role } from "@/lib/policies/actor";
import { canPeople, endsLastAdministrator } from "@/lib/policies/people";

const withRoles = (...roles: Role[]): Actor => ({
  personId: "p",
  name: "Pelle",
  sessionId: "s",
  employerId: "e",
  employerSlug: "firm",
  employerName: "Firm",
  roles,
  outsideLine: false,
  isOperator: false,
  passwordAt: null,
});

const ALLOWED: Record<keyof typeof canPeople, Role[]> = {
  read: ["lead", "administrator"],
  add: ["administrator"],
  grantRole: ["administrator"],
  endRole: ["administrator"],
  recordTraining: ["lead", "administrator"],
};
const acts = Object.keys(canPeople) as (keyof typeof canPeople)[];
const everyRole = acts.flatMap((act) => ROLES.map((role) => [role, act, ALLOWED[act].includes(role)] as const));

test.each(everyRole)("%s: %s people is %s", (role, act, allowed) => {
  expect(canPeople[act](withRoles(role))).toBe(allowed);
});

test.each(acts)("%s is refused without any role, even to an operator", (act) => {
  expect(canPeople[act]({ ...withRoles(), isOperator: true })).toBe(false);
});

test.each(acts)("one of several roles is enough to %s", (act) => {
  expect(canPeople[act](withRoles("technician", "administrator"))).toBe(true);
});

test.each([
  ["the only administrator", "administrator", ["a"], true],
  ["one of two administrators", "administrator", ["a", "b"], false],
  ["a lead, whoever administers", "lead", ["b"], false],
] as const)("ending the role of %s", (_who, role, administrators, last) => {
  expect(
    endsLastAdministrator(
      { id: "a", role },
      administrators.map((id) => ({ id })),
    ),
  ).toBe(last);
});
