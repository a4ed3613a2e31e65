import { beforeEach, expect, test, vi } from "vitest";

const LIMIT = { points: 30, seconds: 60 };
const from = (addresses: string | null) => new Headers(addresses === null ? {} : { "x-forwarded-for": addresses });

/** Settings are read once in a process, so each number of proxies is a process of its own. */
async function keyWith(proxies: string, addresses: string | null) {
  process.env.TRUSTED_PROXIES = proxies;
  const { fromAddress } = await import("@/lib/auth/fromAddress");
  const [key, limit] = fromAddress("public", from(addresses), LIMIT);
  return { key, points: limit.points };
}
beforeEach(() => vi.resetModules());

const OWN = (address: string) => ({ key: `public from ${address}`, points: 30 });
const SHARED = { key: "public from anywhere", points: 600 };

// RFC 7239, 5.2 and 8.1, says of the standard header what holds of this one too: each proxy adds the address it saw at the
// end, and nothing before what a trusted proxy wrote can be believed.
test.each([
  ["without a proxy the sender may have written anything", "0", "203.0.113.9", SHARED],
  ["nor is the number believed to be more than none when it is not set", "", "203.0.113.9", SHARED],
  ["one proxy: the address it saw", "1", "192.0.2.7", OWN("192.0.2.7")],
  ["one proxy: what stands before is the sender's own claim", "1", "203.0.113.9, 192.0.2.7", OWN("192.0.2.7")],
  ["two proxies: the last address is that of the first of them", "2", "192.0.2.7, 10.0.0.2", OWN("192.0.2.7")],
  ["two proxies and a claim", "2", "203.0.113.9,192.0.2.7, 10.0.0.2", OWN("192.0.2.7")],
  ["fewer addresses than proxies: the request came another way", "2", "192.0.2.7", SHARED],
  ["a proxy that says nothing", "1", null, SHARED],
  ["an empty place", "1", "192.0.2.7, ", SHARED],
])("%s", async (_what, proxies, addresses, expected) => {
  expect(await keyWith(proxies, addresses)).toEqual(expected);
});
