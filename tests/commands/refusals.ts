import { expect, test } from "vitest";
import { ROLES, type Actor, type Role } from "@/lib/policies/actor";
import type { Firm } from "../support/factories";
import { everythingStored } from "../support/written";

const NO_SUCH_ID = "00000000-0000-4000-8000-000000000000";

type Setting = { firm: Firm; other: Firm; id: string };
type Refusals = {
  allowed: Role;
  /** The row that the act is about, of `firm`. */
  setting: () => Setting;
  act: (actor: Actor, id: string) => Promise<unknown>;
  /** Where the row has a name of its own and not an id. */
  noSuchId?: string;
};

/** Every role but the one allowed is refused, every role of another firm sees no such row, and neither leaves a trace. */
export function refusals({ allowed, setting, act, noSuchId = NO_SUCH_ID }: Refusals): void {
  test(`refuses every role of the firm but ${allowed}, also whoever held it`, async () => {
    const { firm, id } = setting();
    const refused = ROLES.filter((role) => role !== allowed).map((role) => firm[role]);
    await expectRefused([...refused, { ...firm[allowed], roles: [] }], (actor) => act(actor, id), "ForbiddenError");
  });

  test("to everybody of another firm it looks like no id at all", async () => {
    const { firm, other, id } = setting();
    const unknown = await errorOf(() => act(firm[allowed], noSuchId));
    const everybody = ROLES.map((role) => other[role]);
    const [message] = await expectRefused(everybody, (actor) => act(actor, id), "NotFoundError");
    expect(message).toBe(unknown.message);
  });

  test("what is no id is not found either", async () => {
    const { firm } = setting();
    await expectRefused([firm[allowed]], (actor) => act(actor, "no id"), "NotFoundError");
  });
}

/** @returns what each was told */
async function expectRefused(actors: readonly Actor[], act: (actor: Actor) => Promise<unknown>, name: string) {
  const before = await everythingStored();
  const told: string[] = [];
  for (const actor of actors) {
    const error = await errorOf(() => act(actor));
    expect(error.name, actor.roles.join()).toBe(name);
    told.push(error.message);
  }
  expect(await everythingStored()).toEqual(before);
  return told;
}

async function errorOf(act: () => Promise<unknown>): Promise<Error> {
  const outcome = await act().catch((error: Error) => error);
  if (outcome instanceof Error) return outcome;
  throw new Error("what had to be refused was done");
}
