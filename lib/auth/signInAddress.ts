import "server-only";
import { headers } from "next/headers";
import { safeBack } from "./safeBack";

/** The sign-in page, told where to come back to. proxy.ts says which page is asked for. */
export async function signInAddress(): Promise<string> {
  const back = safeBack((await headers()).get("x-page"));
  return back ? `/sign-in?back=${encodeURIComponent(back)}` : "/sign-in";
}
