import "server-only";
import { z } from "zod";
import { InvalidError, NotFoundError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { actorAt } from "@/lib/policies/actorAt";
import type { SignedIn } from "@/lib/queries/getSignedIn";
import { toResult, type ActionResult } from "./actionResult";
import { formValues } from "./formValues";
import { requirePerson } from "./requirePerson";
import { unstorableField } from "./unstorableField";

type Input = FormData | Readonly<Record<string, unknown>>;
type Action<R> = (previous: unknown, input: Input) => Promise<ActionResult<R>>;

/**
 * A server action of an employer's page: who first, then what. The form says the employer in a hidden field
 * `employer`; the rest must be what the schema allows.
 */
export const action =
  <S extends z.ZodType, R>(schema: S, run: (input: z.output<S>, actor: Actor) => Promise<R>): Action<R> =>
  async (_previous, input) => {
    const person = await requirePerson();
    const { employer, ...values } = formValues(input);
    return toResult(async () => {
      const actor = actorAt(person, String(employer));
      if (!actor) throw new NotFoundError("employer");
      return run(parsed(schema, values), actor);
    });
  };

/** The same for what a person does about the own account, whatever the employer. */
export const personAction =
  <S extends z.ZodType, R>(schema: S, run: (input: z.output<S>, person: SignedIn) => Promise<R>): Action<R> =>
  async (_previous, input) => {
    const person = await requirePerson();
    const { employer: _employer, ...values } = formValues(input);
    return toResult(() => run(parsed(schema, values), person));
  };

/**
 * @param stored false for what is only read and answered: any character is welcome then
 * @throws InvalidError with the sentences of every field that the schema refuses, or that holds what cannot be stored
 */
export function parsed<S extends z.ZodType>(schema: S, values: unknown, { stored = true } = {}): z.output<S> {
  const { data, error } = schema.safeParse(values);
  if (!error) {
    const found = stored && unstorableField(data);
    if (found) throw new InvalidError(found.message, found.field === null ? {} : { [found.field]: [found.message] });
    return data as z.output<S>;
  }
  const { fieldErrors, formErrors } = z.flattenError(error) as {
    fieldErrors: Record<string, string[]>;
    formErrors: string[];
  };
  throw new InvalidError(formErrors[0] ?? "Not stored yet. See the fields that are marked.", fieldErrors);
}
