import "server-only";
import { webEnv } from "@/lib/env";

export const isSecure = (): boolean => webEnv().PUBLIC_ORIGIN.startsWith("https:");

/** Never readable by a script; sent along when a link from a mail is followed, not with another site's posts. */
export const sessionCookie = () => ({
  // Browsers accept the prefix only with Secure, Path=/ and no domain, so that no other host can plant the cookie.
  name: isSecure() ? "__Host-lagmark-session" : "lagmark-session",
  options: { httpOnly: true, sameSite: "lax", path: "/", secure: isSecure() } as const,
});
