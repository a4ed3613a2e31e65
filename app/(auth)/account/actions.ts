"use server";
import "server-only";
import { revalidatePath } from "next/cache";
import { personAction } from "@/lib/auth/action";
import { forgive, throttle } from "@/lib/auth/throttle";
import { endSession } from "@/lib/commands/endSession";
import { renamePerson } from "@/lib/commands/renamePerson";
import { setPassword } from "@/lib/commands/setPassword";
import { endSessionInput, renamePersonInput, setPasswordInput } from "@/lib/schemas/people";

const PASSWORD_CHANGES = { points: 8, seconds: 900 };

export const renamePersonAction = personAction(renamePersonInput, async ({ name }, person) => {
  await renamePerson(person, name);
  revalidatePath("/account");
});

export const setPasswordAction = personAction(setPasswordInput, async ({ current, password }, person) => {
  const key = `set password ${person.personId}`;
  await throttle(key, PASSWORD_CHANGES);
  await setPassword(person, { current, password });
  await forgive(key, PASSWORD_CHANGES);
  revalidatePath("/account");
});

export const endSessionAction = personAction(endSessionInput, async ({ sessionId }, person) => {
  await endSession(person, sessionId);
  revalidatePath("/account");
});
