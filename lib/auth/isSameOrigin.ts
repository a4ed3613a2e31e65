import "server-only";
import { webEnv } from "@/lib/env";

const READING = new Set(["GET", "HEAD", "OPTIONS"]);

/** Whether a request that writes was made by a page of ours. Browsers say the origin of every such request. */
export function isSameOrigin(request: Pick<Request, "method" | "headers">): boolean {
  if (READING.has(request.method)) return true;
  const origin = request.headers.get("origin");
  if (!origin || !URL.canParse(origin)) return false;
  return origin === webEnv().PUBLIC_ORIGIN || new URL(origin).host === request.headers.get("host");
}
