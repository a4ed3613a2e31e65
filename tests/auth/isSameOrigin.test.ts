import { expect, test } from "vitest";
import { isSameOrigin } from "@/lib/auth/isSameOrigin";

// The origin of the settings, whatever host a proxy names, and the host of the request itself.
const own = () => process.env.PUBLIC_ORIGIN!;
const asked = (method: string, headers: Record<string, string>) =>
  isSameOrigin({ method, headers: new Headers(headers) });

test.each(["POST", "PUT", "PATCH", "DELETE"])("accepts a %s from our own pages", (method) => {
  expect(asked(method, { origin: own(), host: "behind-a-proxy:3000" })).toBe(true);
  expect(asked(method, { origin: "http://10.0.0.7:3000", host: "10.0.0.7:3000" })).toBe(true);
});

const host = "lagmark.example";
test.each<[string, Record<string, string>]>([
  ["another site", { origin: "https://elsewhere.example", host }],
  ["another port of our host", { origin: "http://lagmark.example:8080", host }],
  ["a host that only begins like ours", { origin: "https://lagmark.example.elsewhere.example", host }],
  ["a page without an origin", { origin: "null", host }],
  ["a program that names no origin", { host }],
  ["an origin that is none", { origin: "lagmark.example", host }],
])("refuses what writes from %s", (_from, headers) => expect(asked("POST", headers)).toBe(false));

test.each(["GET", "HEAD"])("a %s may come from anywhere: it changes nothing", (method) => {
  expect(asked(method, { origin: "https://elsewhere.example", host })).toBe(true);
});
