import type { Answers } from "./kind";

/** The text typed into a field, "" when there is none; names that every object inherits are no answers. */
export function answerOf(answers: Answers, fieldId: string): string {
  const text = Object.hasOwn(answers, fieldId) ? answers[fieldId] : "";
  return typeof text === "string" ? text : "";
}

export const isBlank = (text: string) => text.trim() === "";
