import { expect, test } from "vitest";
import { ROLES } from "@/lib/policies/actor";
import { homeOf, menuStationsOf, scaleStationsOf, stationAddress, stationsOf } from "@/lib/policies/stations";

const labels = (...roles: Parameters<typeof stationsOf>[0]) => stationsOf(roles).map(({ label }) => label);

test.each([
  ["technician", ["Desk", "Checks", "Bench", "Certificates"]],
  ["lead", ["Modules", "Sittings", "People", "Certificates", "Bench"]],
  ["administrator", ["Modules", "Sittings", "People", "Certificates", "Bench"]],
  ["assessor", ["Queue", "Records", "Register", "Bench"]],
  ["decider", ["Queue", "Records", "Register", "Bench"]],
] as const)("a %s finds the own stations", (role, stations) => expect(labels(role)).toEqual(stations));

test("several roles: every station once, the own work first, five on the scale and the rest in the menu", () => {
  const all = labels(...ROLES);
  expect(new Set(all).size).toBe(all.length);
  expect(all[0]).toBe("Desk");
  expect([...scaleStationsOf(ROLES), ...menuStationsOf(ROLES)]).toEqual(stationsOf(ROLES));
  expect(scaleStationsOf(ROLES)).toHaveLength(5);
});

test("a station is a folder of the employer; the bench is open to anyone", () => {
  expect(stationsOf(["technician"]).map((station) => stationAddress("firm", station))).toEqual([
    "/firm/desk",
    "/firm/checks",
    "/bench",
    "/firm/certificates",
  ]);
});

test.each([
  [["technician"], "/firm/desk"],
  [["lead", "administrator"], "/firm/modules"],
  [["decider"], "/firm/queue"],
  [[], "/account"],
] as const)("%j begins at %s", (roles, home) => expect(homeOf({ employerSlug: "firm", roles })).toBe(home));
