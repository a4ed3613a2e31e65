import "server-only";
import { decode } from "next-auth/jwt";
import { cookies } from "next/headers";
import { cache } from "react";
import { webEnv } from "@/lib/env";
import { getSignedIn, type SignedIn } from "@/lib/queries/getSignedIn";
import { sessionCookie } from "./sessionCookie";

/** Who is signed in, or null. The cookie carries a session id and nothing else; the rest is read once a request. */
export const signedIn = cache(async (): Promise<SignedIn | null> => {
  const cookie = (await cookies()).get(sessionCookie().name);
  const sessionId = cookie && (await sessionIdIn(cookie.value));
  return sessionId ? getSignedIn(sessionId, new Date()) : null;
});

// A cookie that another key sealed, or nobody, is no cookie.
async function sessionIdIn(token: string): Promise<string | null> {
  try {
    return (await decode({ token, secret: webEnv().NEXTAUTH_SECRET }))?.sid ?? null;
  } catch {
    return null;
  }
}
