import type { Actor, Role } from "./actor";

/** A place in the navigation: `segment` is its folder under the employer, `covers` others it leads to, `href` an address of its own. */
export type Station = { label: string } & ({ segment: string; covers?: readonly string[] } | { href: string });

const DESK = { label: "Desk", segment: "desk" };
const CHECKS = { label: "Checks", segment: "checks", covers: ["assignments", "sittings", "cases", "records"] };
const MODULES = { label: "Modules", segment: "modules" };
const SITTINGS = { label: "Sittings", segment: "sittings", covers: ["records"] };
const PEOPLE = { label: "People", segment: "people" };
const QUEUE = { label: "Queue", segment: "queue" };
const RECORDS = { label: "Records", segment: "records" };
const REGISTER = { label: "Register", segment: "register" };
const CERTIFICATES = { label: "Certificates", segment: "certificates" };
const BENCH = { label: "Bench", href: "/bench" };

const STATIONS: Readonly<Record<Role, readonly Station[]>> = {
  technician: [DESK, CHECKS, BENCH, CERTIFICATES],
  lead: [MODULES, SITTINGS, PEOPLE, CERTIFICATES, BENCH],
  administrator: [MODULES, SITTINGS, PEOPLE, CERTIFICATES, BENCH],
  assessor: [QUEUE, RECORDS, REGISTER, BENCH],
  decider: [QUEUE, RECORDS, REGISTER, BENCH],
};

// Whoever holds several roles begins with the own work, then what waits for others, then the firm's.
const ORDER: readonly Role[] = ["technician", "assessor", "decider", "lead", "administrator"];

/** The stations of a person with these roles; those of several roles follow one another, each once. */
export function stationsOf(roles: readonly Role[]): readonly Station[] {
  return [...new Set(ORDER.filter((role) => roles.includes(role)).flatMap((role) => STATIONS[role]))];
}

export const stationAddress = (employerSlug: string, station: Station): string =>
  "href" in station ? station.href : `/${employerSlug}/${station.segment}`;

/** Addresses of the pages that belong to a station and do not lie under its own. */
export const coveredAddresses = (employerSlug: string, station: Station): readonly string[] =>
  "covers" in station ? (station.covers ?? []).map((segment) => `/${employerSlug}/${segment}`) : [];

/** Where a person begins at an employer. */
export function homeOf({ employerSlug, roles }: Pick<Actor, "employerSlug" | "roles">): string {
  const [first] = stationsOf(roles);
  return first ? stationAddress(employerSlug, first) : "/account";
}

const ON_THE_SCALE = 5;

/** The scale holds five at the most; whoever has more finds the rest under the own name. */
export const scaleStationsOf = (roles: readonly Role[]): readonly Station[] => stationsOf(roles).slice(0, ON_THE_SCALE);
export const menuStationsOf = (roles: readonly Role[]): readonly Station[] => stationsOf(roles).slice(ON_THE_SCALE);
