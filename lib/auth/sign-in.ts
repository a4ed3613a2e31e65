import "server-only";
import { cookies, headers } from "next/headers";
import { SESSION_SECONDS } from "@/lib/commands/startSession";
import { askNextAuth, type AuthAnswer } from "./askNextAuth";
import { sessionCookie } from "./sessionCookie";

/** Whether address and password belong together; then a session is begun. @throws ThrottledError */
export async function signInByPassword(email: string, password: string): Promise<boolean> {
  const fields = { email, password };
  return begin(
    await askNextAuth({ path: ["callback", "credentials"], method: "POST", headers: await headers(), fields }),
  );
}

/** Whether the link of a mail still holds; then it is used up and a session begun. */
export async function signInByLink(email: string, token: string): Promise<boolean> {
  const fields = { email, token };
  return begin(await askNextAuth({ path: ["callback", "email"], method: "GET", headers: await headers(), fields }));
}

/** Mail a link to whoever has an account with this address; nothing tells whether anybody has. @throws ThrottledError */
export async function askForLink(email: string, back: string | null): Promise<void> {
  const fields = { email, callbackUrl: back ?? "/sign-in" };
  await askNextAuth({ path: ["signin", "email"], method: "POST", headers: await headers(), fields });
}

/** End this session, here and in the table. */
export async function signOut(): Promise<void> {
  const jar = await cookies();
  const { name, options } = sessionCookie();
  const held = jar.get(name);
  if (held) {
    await askNextAuth({
      path: ["signout"],
      method: "POST",
      headers: await headers(),
      fields: { callbackUrl: "/" },
      cookies: { [name]: held.value },
    });
  }
  jar.set({ name, value: "", ...options, maxAge: 0 });
}

async function begin({ error, session }: AuthAnswer): Promise<boolean> {
  if (error || !session) return false;
  const { name, options } = sessionCookie();
  (await cookies()).set({ name, value: session, ...options, maxAge: SESSION_SECONDS });
  return true;
}
