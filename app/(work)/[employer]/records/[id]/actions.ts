"use server";
import { revalidatePath } from "next/cache";
import { z } from "zod";
import { action } from "@/lib/auth/action";
import { answerQuestion } from "@/lib/commands/answerQuestion";
import { askQuestion } from "@/lib/commands/askQuestion";

const question = z.object({
  record: z.uuid(),
  quantity: z.string().min(1, "Choose a quantity.").max(64),
  words: z.string().trim().min(1, "Write your question.").max(2000),
});

export const askQuestionAction = action(question, async ({ record, quantity, words }, actor) => {
  await askQuestion(actor, { markingRecordId: record, quantity, words });
  revalidatePath(`/${actor.employerSlug}/records`, "layout");
});

const answer = z.object({ question: z.uuid(), words: z.string().trim().min(1, "Write your answer.").max(2000) });

export const answerQuestionAction = action(answer, async ({ question: questionId, words }, actor) => {
  await answerQuestion(actor, { questionId, words });
  revalidatePath(`/${actor.employerSlug}/records`, "layout");
  revalidatePath(`/${actor.employerSlug}/queue`, "layout");
});
