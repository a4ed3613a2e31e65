import "server-only";
import type { AuthOptions } from "next-auth";
import Credentials from "next-auth/providers/credentials";
import MailedLink from "next-auth/providers/email";
import { endSession } from "@/lib/commands/endSession";
import { mailSignInLink } from "@/lib/commands/mailSignInLink";
import { SESSION_SECONDS, startSession } from "@/lib/commands/startSession";
import { webEnv } from "@/lib/env";
import { log } from "@/lib/log";
import { getSignedIn } from "@/lib/queries/getSignedIn";
import { emailAddress } from "@/lib/schemas/people";
import { adapter } from "./adapter";
import { safeBack } from "./safeBack";
import { isSecure, sessionCookie } from "./sessionCookie";
import { signInWithPassword } from "./signInWithPassword";
import { throttleMailedLink } from "./throttleMailedLink";

/** One request to the sign-in library. `thrown` is what went wrong on our side, which the library would only hint at. */
export type AuthCall = { headers: Pick<Headers, "get">; thrown?: unknown };

/** How the sign-in library is set up, for one call. */
export const authOptions = (call: AuthCall): AuthOptions => ({
  secret: webEnv().NEXTAUTH_SECRET,
  session: { strategy: "jwt", maxAge: SESSION_SECONDS },
  useSecureCookies: isSecure(),
  cookies: { sessionToken: sessionCookie() },
  adapter: {
    ...adapter,
    useVerificationToken: (link) => watched(call, async () => adapter.useVerificationToken!(link)),
  },
  providers: [
    Credentials({
      credentials: { email: {}, password: {} },
      authorize: (given) => watched(call, () => signInWithPassword(given, call.headers)),
    }),
    MailedLink({
      normalizeIdentifier: (text) => emailAddress.parse(text),
      // An address without an account is answered like any other: the command then writes nothing.
      sendVerificationRequest: ({ identifier, url }) =>
        watched(call, () => mailSignInLink(identifier, safeBack(new URL(url).searchParams.get("callbackUrl")))),
    }),
  ],
  callbacks: {
    signIn: ({ account, email }) =>
      watched(call, async () => {
        if (email?.verificationRequest) await throttleMailedLink(account!.providerAccountId, call.headers);
        return true;
      }),
    // The cookie says a session's id and nothing else. An account comes along when somebody signs in, only then.
    jwt: ({ token, user, account }) =>
      watched(call, async () => {
        if (!account) return token;
        const passwordAt = account.type === "credentials" ? new Date() : null;
        return { sid: (await startSession({ personId: user.id, passwordAt })).id };
      }),
    redirect: ({ url }) => url,
  },
  events: {
    signOut: async ({ token: { sid } }) => {
      const person = sid ? await getSignedIn(sid, new Date()) : null;
      if (person) await endSession(person, person.sessionId);
    },
  },
  logger: {
    // The library would write out requests and statements; its code says enough.
    error: (code) => log.error({ code }, "sign-in"),
    warn: (code) => log.warn({ code }, "sign-in"),
    debug: () => undefined,
  },
});

async function watched<R>(call: AuthCall, run: () => Promise<R>): Promise<R> {
  try {
    return await run();
  } catch (error) {
    call.thrown = error;
    throw error;
  }
}
