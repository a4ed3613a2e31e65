import "server-only";
import type { NextApiRequest, NextApiResponse } from "next";
import NextAuth from "next-auth";
import { webEnv } from "@/lib/env";
import { authOptions, type AuthCall } from "./authOptions";
import { sessionCookie } from "./sessionCookie";

type Asked = {
  /** As in the library's addresses: "callback", "credentials". */
  path: [string, string?];
  method: "GET" | "POST";
  headers: Pick<Headers, "get">;
  fields?: Record<string, string>;
  cookies?: Record<string, string>;
};
/** `error` is the library's word for a refusal; `session` the new value of the session cookie, empty to remove it. */
export type AuthAnswer = { error: string | null; session: string | null };

/**
 * Put one request to the sign-in library, inside this process: our actions are the only way to it, and none of its own
 * addresses is open. They work without scripts, and Next refuses them from other sites.
 */
export async function askNextAuth(asked: Asked): Promise<AuthAnswer> {
  // The library reads its own address from here.
  process.env.NEXTAUTH_URL = webEnv().PUBLIC_ORIGIN;
  const guard = asked.method === "POST" ? await put({ path: ["csrf"], method: "GET", headers: asked.headers }) : null;
  const { csrfToken } = (guard?.body ?? {}) as { csrfToken?: string };
  const answer = await put({
    ...asked,
    fields: { ...asked.fields, ...(csrfToken && { csrfToken }) },
    cookies: { ...asked.cookies, ...guard?.cookies },
  });
  const error = answer.location ? new URL(answer.location, webEnv().PUBLIC_ORIGIN).searchParams.get("error") : null;
  return { error, session: answer.cookies[sessionCookie().name] ?? null };
}

type Answer = { location: string | null; body: unknown; cookies: Record<string, string> };

async function put({ path, method, headers, fields, cookies }: Asked): Promise<Answer> {
  const call: AuthCall = { headers };
  const answer: Answer = { location: null, body: null, cookies: {} };
  const request = {
    method,
    headers: {},
    cookies: cookies ?? {},
    query: { nextauth: path, ...(method === "GET" && fields) },
    body: method === "POST" ? fields : undefined,
  };
  await NextAuth(request as unknown as NextApiRequest, recorder(answer), authOptions(call));
  if (call.thrown) throw call.thrown;
  return answer;
}

// What the library does to a response, kept instead of sent.
function recorder(answer: Answer): NextApiResponse {
  const response = {
    status: () => response,
    getHeader: () => [],
    setHeader(name: string, value: string | string[]) {
      if (name === "Location") answer.location = String(value);
      if (name === "Set-Cookie") for (const line of [value].flat()) keep(line);
      return response;
    },
    send: (body: unknown) => void (answer.body = body),
    end: () => undefined,
  };
  const keep = (line: string) => {
    const [, name, value] = /^([^=]+)=([^;]*)/.exec(line)!;
    answer.cookies[name] = decodeURIComponent(value);
  };
  return response as unknown as NextApiResponse;
}
