import { z } from "zod";

/** Field ids of a form's section, `reading.lag` or `satellites.3.doppler`; values as typed. */
const fieldId = z.string().regex(/^[\w-]{1,40}(\.\d{1,2})?\.[\w-]{1,40}$/);
const typed = z.string().max(2000, "An answer has at most 2 000 characters.");
/** Of all of them together: with their names well under what is kept of one case. */
const LONGEST = 20_000;

export const answersSchema = z
  .record(fieldId, typed)
  .refine((answers) => Object.keys(answers).length <= 400, "There are too many answers.")
  .refine((answers) => Object.values(answers).join("").length <= LONGEST, "The answers are too long.");

export const saveAnswersInput = z
  .object({ answers: answersSchema, revision: z.int().min(1).max(1_000_000_000) })
  .strict();

export const handInInput = z
  .object({ answers: answersSchema, words: z.string().max(4000, "At most 4 000 characters.") })
  .strict();
