import "server-only";

/**
 * Where a request came from, for throttles. The last address in the list is the one that our own proxy (or, without
 * one, the server itself) saw; those before it are whatever the sender wrote.
 */
export const clientAddress = (headers: Pick<Headers, "get">): string =>
  headers.get("x-forwarded-for")?.split(",").at(-1)?.trim() || "unknown";
