import "server-only";
import { AppError, InvalidError, NotFoundError, ThrottledError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { actorAt } from "@/lib/policies/actorAt";
import { isSameOrigin } from "./isSameOrigin";
import { signedIn } from "./signedIn";

type Call<Params> = { request: Request; params: Params; actor: Actor };
type Handler<Params> = (request: Request, context: { params: Promise<Params> }) => Promise<Response>;

/**
 * A route handler for a signed-in person of an employer, named in the path or as `?employer=`. A plain value is
 * answered as JSON, our own errors as JSON with their status; a request that writes must come from our own pages.
 */
export const route =
  <Params extends object = object>(handle: (call: Call<Params>) => Promise<Response | object>): Handler<Params> =>
  async (request, context) => {
    try {
      if (!isSameOrigin(request)) return refusal(403, "This request came from another site.");
      const person = await signedIn();
      if (!person) return refusal(401, "You are signed out. Sign in and do this again.");
      const params = await context.params;
      const actor = actorAt(person, employerOf(request, params));
      if (!actor) throw new NotFoundError("employer");
      const answer = await handle({ request, params, actor });
      return answer instanceof Response ? answer : Response.json(answer, { headers: PRIVATE });
    } catch (error) {
      if (!(error instanceof AppError)) throw error;
      return refusal(error.status, error.publicMessage, error);
    }
  };

const PRIVATE = { "cache-control": "private, no-store" };

const employerOf = (request: Request, params: object): string =>
  "employer" in params ? String(params.employer) : (new URL(request.url).searchParams.get("employer") ?? "");

const refusal = (status: number, message: string, error?: AppError): Response =>
  Response.json(
    { message, ...(error instanceof InvalidError && { fields: error.fields }) },
    {
      status,
      headers: { ...PRIVATE, ...(error instanceof ThrottledError && { "retry-after": String(error.waitSeconds) }) },
    },
  );
