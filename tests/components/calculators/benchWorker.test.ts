import { readFileSync } from "node:fs";
import path from "node:path";
import { beforeEach, expect, test, vi } from "vitest";

/* The service worker is a plain file of its own; here it runs against a small stand-in of a browser's caches. */
const SOURCE = readFileSync(path.resolve(import.meta.dirname, "../../../public/bench-worker.js"), "utf8");
const ORIGIN = "https://lagmark.example";

type Listener = (event: Record<string, unknown>) => void;
let listeners: Record<string, Listener>;
let stored: Map<string, Map<string, Response>>;
let network: ReturnType<typeof vi.fn>;

const pathOf = (asked: string | { url: string }) =>
  new URL(typeof asked === "string" ? asked : asked.url, ORIGIN).pathname;

beforeEach(() => {
  listeners = {};
  stored = new Map([
    ["bench-old", new Map()],
    ["another", new Map()],
  ]);
  network = vi.fn(async (asked: string | { url: string }) => new Response(`fresh ${pathOf(asked)}`));
  const cacheOf = (entries: Map<string, Response>) => ({
    keys: async () => [...entries.keys()].map((key) => ({ url: ORIGIN + key })),
    put: async (key: string, response: Response) => void entries.set(key, response),
    addAll: async (keys: string[]) => keys.forEach((key) => entries.set(key, new Response(`kept ${key}`))),
  });
  const caches = {
    open: async (name: string) => cacheOf(stored.get(name) ?? stored.set(name, new Map()).get(name)!),
    keys: async () => [...stored.keys()],
    delete: async (name: string) => stored.delete(name),
    match: async (asked: string | { url: string }) =>
      [...stored.values()].map((entries) => entries.get(pathOf(asked))).find((found) => found !== undefined),
  };
  const self = {
    location: { origin: ORIGIN },
    clients: { claim: async () => {} },
    skipWaiting: () => {},
    addEventListener: (type: string, listener: Listener) => (listeners[type] = listener),
  };
  new Function("self", "caches", "fetch", SOURCE)(self, caches, network);
});

const kept = async (version: string, files: string[]) => {
  let done: Promise<unknown> = Promise.resolve();
  listeners.message({ data: { kind: "keep", version, files }, waitUntil: (work: Promise<unknown>) => (done = work) });
  await done;
};

/** The answer of the worker; null when it leaves the request to the browser. */
const asked = async (address: string, mode = "no-cors", method = "GET"): Promise<string | null> => {
  let answer: Promise<Response> | null = null;
  const request = { url: new URL(address, ORIGIN).href, mode, method };
  listeners.fetch({ request, respondWith: (work: Promise<Response>) => (answer = work) });
  return answer === null ? null : (await (answer as Promise<Response>)).clone().text();
};
const FILES = ["/_next/static/a.js", "/_next/static/b.css"];

test("keeps the page and its scripts, asked for without cookies, and drops an older build's", async () => {
  await kept("new", FILES);
  expect([...stored.keys()].sort()).toEqual(["another", "bench-new"]);
  expect([...stored.get("bench-new")!.keys()].sort()).toEqual([...FILES, "/bench"]);
  expect(network).toHaveBeenCalledExactlyOnceWith("/bench", { credentials: "omit", cache: "no-store" });
});

test("without a network the bench opens whatever its query; with one the newest page comes", async () => {
  await kept("new", FILES);
  expect(await asked("/bench?open=two-codes&a=3", "navigate")).toBe("fresh /bench");
  network.mockRejectedValue(new TypeError("no network"));
  expect(await asked("/bench?open=two-codes&a=3", "navigate")).toBe("fresh /bench");
  expect(await asked("/_next/static/a.js")).toBe("kept /_next/static/a.js");
});

test("never answers for other pages, other places or anything that is sent", async () => {
  await kept("new", FILES);
  for (const page of ["/", "/sign-in", "/saltmarsh/checks", "/bench/other"])
    expect(await asked(page, "navigate")).toBeNull();
  for (const address of ["/api/files/1", "/bench?_rsc=x", "https://elsewhere.example/_next/static/a.js"])
    expect(await asked(address)).toBeNull();
  expect(await asked("/bench", "navigate", "POST")).toBeNull();
});

test("does not keep what is no script of ours, nor a page that failed", async () => {
  network.mockResolvedValue(new Response("down", { status: 503 }));
  await kept("new", [...FILES, "/api/me"]);
  expect([...stored.get("bench-new")!.keys()]).toEqual(FILES);
  expect(stored.has("bench-old")).toBe(true);
});

test("a kept script is a new answer: a worker's own address, which names its other scripts, stays what was asked for", async () => {
  await kept("new", FILES);
  const answer = new Response("worker");
  Object.defineProperty(answer, "url", { value: `${ORIGIN}/_next/static/worker.js` });
  stored.get("bench-new")!.set("/_next/static/worker.js", answer);
  let given: Promise<Response> | null = null;
  const request = { url: `${ORIGIN}/_next/static/worker.js#params=a`, mode: "same-origin", method: "GET" };
  listeners.fetch({ request, respondWith: (work: Promise<Response>) => (given = work) });
  expect((await given!).url).toBe("");
  expect(await (await given!).text()).toBe("worker");
});
