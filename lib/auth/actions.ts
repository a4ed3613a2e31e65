"use server";
import "server-only";
import { redirect } from "next/navigation";
import { confirmPassword } from "@/lib/commands/confirmPassword";
import { confirmPasswordInput } from "@/lib/schemas/people";
import { personAction } from "./action";
import { signOut } from "./sign-in";
import { forgive, throttle } from "./throttle";

// A session left open on a bench must not be a place to guess at passwords.
const CONFIRMATIONS = { points: 8, seconds: 900 };

/** Give the password again, to sign a decision or a standing within the next five minutes. */
export const confirmPasswordAction = personAction(confirmPasswordInput, async ({ password }, person) => {
  const key = `confirm ${person.personId}`;
  await throttle(key, CONFIRMATIONS);
  await confirmPassword(person, password);
  await forgive(key, CONFIRMATIONS);
});

export async function signOutAction(): Promise<void> {
  await signOut();
  redirect("/sign-in");
}
