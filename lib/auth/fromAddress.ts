import "server-only";
import { webEnv } from "@/lib/env";
import type { Limit } from "./throttle";

/** How many senders of unknown address share one count: a firm's worth (common practice, no source). */
const SHARING = 20;

/** Key and limit of a count for each network address; all whose address is not known share a count with room for many. */
export function fromAddress(
  what: string,
  headers: Pick<Headers, "get">,
  { points, seconds }: Limit,
): [key: string, limit: Limit] {
  const address = clientAddress(headers);
  if (address) return [`${what} from ${address}`, { points, seconds }];
  return [`${what} from anywhere`, { points: SHARING * points, seconds }];
}

/**
 * Where a request came from; null when that is not known. Each proxy of ours adds the address that it saw at the end of
 * the list, so with so many of them the address at that place from the end is the sender's; those before it are whatever
 * the sender wrote. Without a proxy that is all of the list: the web server fills it in only where the sender did not.
 */
function clientAddress(headers: Pick<Headers, "get">): string | null {
  const proxies = Number(webEnv().TRUSTED_PROXIES ?? 0);
  const listed = headers.get("x-forwarded-for")?.split(",") ?? [];
  return (proxies > 0 && listed.at(-proxies)?.trim()) || null;
}
