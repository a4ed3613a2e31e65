/** Stands in for next/headers: `vi.mock("next/headers", () => import("@/tests/support/nextHeaders"))`. */
type Cookie = { name: string; value: string; maxAge?: number; httpOnly?: boolean; sameSite?: string; secure?: boolean };

const jar = new Map<string, Cookie>();
let sent = new Headers();

export const cookies = async () => ({
  get: (name: string) => jar.get(name),
  getAll: () => [...jar.values()],
  set: (cookie: Cookie) => void (cookie.maxAge === 0 ? jar.delete(cookie.name) : jar.set(cookie.name, cookie)),
});

export const headers = async () => sent;

/** A browser that was never here. */
export function newBrowser(requestHeaders: Record<string, string> = {}): void {
  jar.clear();
  sent = new Headers({ "x-forwarded-for": "192.0.2.7", ...requestHeaders });
}

export const cookieNamed = (name: string): Cookie | undefined => jar.get(name);
