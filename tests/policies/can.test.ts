import { expect, test } from "vitest";
import { ROLES, type Actor, type Role } from "@/lib/policies/actor";
import { can } from "@/lib/policies/can";

const someone = (roles: Role[], over: Partial<Actor> = {}): Actor => ({
  ...{ personId: "p", name: "Pelle", sessionId: "s", employerId: "e", employerSlug: "firm", employerName: "Firm" },
  ...{ roles, outsideLine: false, isOperator: false, passwordAt: null },
  ...over,
});
// The row acted on is of employer e and of another person, unless a test says "own".
const THEIRS = { employerId: "e", technicianId: "another", holderId: "another" };
const OWN = { employerId: "e", technicianId: "p", holderId: "p" };
type Act = keyof typeof can;
const acts = Object.keys(can) as Act[];

const ALLOWED: Record<Act, Role[]> = {
  readModules: ["lead", "administrator"],
  writeModule: ["lead"],
  releaseModule: ["lead"],
  assignRelease: ["lead"],
  readFees: ["administrator"],
  payFees: ["administrator"],
  sit: [],
  readSitting: ["lead", "assessor", "decider", "administrator"],
  readRecord: ["lead", "assessor", "decider"],
  readStatistics: ["lead"],
  reviewMarkings: ["lead"],
  readQueue: ["assessor", "decider"],
  judge: ["assessor"],
  answerQuestion: ["assessor"],
  decide: ["decider"],
  setStanding: ["decider"],
  readCertificate: ["lead", "assessor", "decider", "administrator"],
  readTrail: ["administrator"],
};
const everyRole = acts.flatMap((act) => ROLES.map((role) => [role, act, ALLOWED[act].includes(role)] as const));

test.each(everyRole)("%s of the firm: %s is %s", (role, act, allowed) => {
  expect(can[act](someone([role]), THEIRS)).toBe(allowed);
});

test.each(everyRole)("%s of another firm: %s is refused", (role, act) => {
  expect(can[act](someone([role], { employerId: "other" }), THEIRS)).toBe(false);
});

test.each(acts)("%s is refused without any role, even to an operator", (act) => {
  expect(can[act](someone([], { isOperator: true }), THEIRS)).toBe(false);
});

test.each(acts.filter((act) => ALLOWED[act].length > 0))("one of several roles is enough to %s", (act) => {
  expect(can[act](someone([...ROLES]), THEIRS)).toBe(true);
});

// What a person may do with the own sitting, record and certificate.
test.each<[Act, Role[], boolean]>([
  ["sit", ["technician"], true],
  ["sit", [], false],
  ["sit", ["lead"], false],
  ["readSitting", ["technician"], true],
  ["readSitting", [], true],
  ["readRecord", ["technician"], true],
  ["readRecord", [], true],
  ["readCertificate", ["technician"], true],
  ["readCertificate", [], true],
  ["judge", ["assessor"], false],
  ["answerQuestion", ["assessor"], false],
  ["setStanding", ["decider"], false],
])("own: %s as %j is %s", (act, roles, allowed) => {
  expect(can[act](someone(roles), OWN)).toBe(allowed);
});

// A certificate stays its holder's for life; a sitting is read at the firm it was sat at.
test.each<[Act, boolean]>([
  ["sit", false],
  ["readSitting", false],
  ["readRecord", false],
  ["readCertificate", true],
])("own, asked at another firm: %s is %s", (act, allowed) => {
  expect(can[act](someone(["technician"], { employerId: "other" }), OWN)).toBe(allowed);
});
