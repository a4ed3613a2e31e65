import "server-only";
import { AppError, InvalidError, NotFoundError, ThrottledError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { actorAt } from "@/lib/policies/actorAt";
import type { SignedIn } from "@/lib/queries/getSignedIn";
import { isSameOrigin } from "./isSameOrigin";
import { signedIn } from "./signedIn";

type Asked<Params> = { request: Request; params: Params };
type Handler<Params> = (request: Request, context: { params: Promise<Params> }) => Promise<Response>;

/**
 * A route handler for a signed-in person of an employer, named in the path or as `?employer=`. A plain value is
 * answered as JSON, our own errors as JSON with their status; a request that writes must come from our own pages.
 */
export const route = <Params extends object = object>(
  handle: (call: Asked<Params> & { actor: Actor }) => Promise<Response | object>,
): Handler<Params> =>
  personRoute<Params>(async ({ person, ...asked }) => {
    const actor = actorAt(person, employerOf(asked.request, asked.params));
    if (!actor) throw new NotFoundError("employer");
    return handle({ ...asked, actor });
  });

/** The same for what belongs to a person, whatever the employer. */
export const personRoute =
  <Params extends object = object>(
    handle: (call: Asked<Params> & { person: SignedIn }) => Promise<Response | object>,
  ): Handler<Params> =>
  async (request, context) => {
    try {
      if (!isSameOrigin(request)) return refusal(403, "This request came from another site.");
      const person = await signedIn();
      if (!person) return refusal(401, "You are signed out. Sign in and do this again.");
      const answer = await handle({ request, params: await context.params, person });
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
