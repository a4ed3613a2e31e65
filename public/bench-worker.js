/*
 * Keeps the bench for use without a network: its page and its scripts and nothing else. Registered by the bench alone, for
 * addresses that begin with /bench and, since that is what the calculators' own workers are, for those of scripts. A version
 * is named after the scripts of one build; an older one is thrown away when a newer one is whole.
 */
const PREFIX = "bench-";
const PAGE = "/bench";
const SCRIPTS = "/_next/static/";

self.addEventListener("install", () => self.skipWaiting());
self.addEventListener("activate", (event) => event.waitUntil(self.clients.claim()));

self.addEventListener("message", (event) => {
  const { kind, version, files } = event.data ?? {};
  if (kind === "keep") event.waitUntil(keep(PREFIX + version, files));
});

self.addEventListener("fetch", (event) => {
  const { request } = event;
  const url = new URL(request.url);
  if (request.method !== "GET" || url.origin !== self.location.origin) return;
  if (request.mode === "navigate" && url.pathname === PAGE) event.respondWith(pageOf(request));
  else if (url.pathname.startsWith(SCRIPTS)) event.respondWith(scriptOf(request));
});

/** The page is asked for without cookies, so that nothing of a person can be in it; headers and nonce stay with it. */
async function keep(name, files) {
  const scripts = files.filter((file) => file.startsWith(SCRIPTS));
  const cache = await caches.open(name);
  const kept = new Set((await cache.keys()).map(({ url }) => new URL(url).pathname));
  await cache.addAll(scripts.filter((file) => !kept.has(file)));
  const page = await fetch(PAGE, { credentials: "omit", cache: "no-store" });
  if (!page.ok) return;
  await cache.put(PAGE, page);
  const names = await caches.keys();
  await Promise.all(names.filter((old) => old.startsWith(PREFIX) && old !== name).map((old) => caches.delete(old)));
}

/** From the network while there is one: a newer build is seen at once. */
async function pageOf(request) {
  try {
    return await fetch(request);
  } catch (error) {
    const page = await caches.match(PAGE);
    if (page) return page;
    throw error;
  }
}

/**
 * Scripts carry a hash of their content in the name: what is kept is what would come. A calculator's worker finds its other
 * scripts in its own address, which a kept answer would replace by the one it was fetched under; a new answer has none.
 */
async function scriptOf(request) {
  const kept = await caches.match(request, { ignoreSearch: true });
  return kept ? new Response(kept.body, { status: kept.status, headers: kept.headers }) : fetch(request);
}
