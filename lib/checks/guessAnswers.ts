import type { Random } from "@/lib/numeric/random";
import type { Answers, FieldSpec, FormSection } from "./kind";

/** What a blind guess writes into a field: a number drawn evenly from a range in the field's own unit, or a text of its own. */
export type Guess = readonly [from: number, to: number] | ((random: Random) => string);

/**
 * A form filled in by somebody who looks at nothing but the form. Choices are drawn evenly; a repeated section gets `lines`.
 * @param guesses by field id with its section, without a line number: `satellites.doppler`
 * @throws RangeError for a field that is no choice and has no guess
 */
export function guessAnswers(
  sections: readonly FormSection[],
  guesses: Readonly<Record<string, Guess>>,
  random: Random,
  lines = 1,
): Answers {
  const entries = sections.flatMap((section) => {
    const places = section.repeat ? Array.from({ length: lines }, (_, n) => `${section.id}.${n + 1}`) : [section.id];
    return places.flatMap((place) =>
      section.fields.map((field) => [`${place}.${field.id}`, guessOf(section.id, field, guesses, random)] as const),
    );
  });
  return Object.fromEntries(entries);
}

function guessOf(section: string, field: FieldSpec, guesses: Readonly<Record<string, Guess>>, random: Random): string {
  const name = `${section}.${field.id}`;
  const guess = Object.hasOwn(guesses, name) ? guesses[name] : null;
  if (typeof guess === "function") return guess(random);
  if (field.choices && !guess) return random.pick(field.choices).value;
  if (!guess) throw new RangeError(`guessAnswers: nobody says what to guess for ${name}`);
  return String(Number((guess[0] + random.uniform() * (guess[1] - guess[0])).toPrecision(4)));
}
