import "server-only";

/**
 * What PostgreSQL cannot keep as text: the character U+0000, and half of a character (an unpaired surrogate). Both
 * would come back from it as a fault of ours, where the person who sent them can mend it.
 */
const UNSTORABLE = /\u0000|\p{Surrogate}/u;

export type Unstorable = { field: string | null; message: string };

/**
 * The first field that holds such a character; names of files and of fields count as text.
 * @param value a form or body that has passed its schema, which bounds its depth
 */
export function unstorableField(value: unknown, field: string | null = null): Unstorable | null {
  if (typeof value === "string") {
    const character = UNSTORABLE.exec(value)?.[0];
    return character === undefined ? null : { field, message: sentence(character) };
  }
  if (value instanceof File) return unstorableField(value.name, field);
  if (typeof value !== "object" || value === null) return null;
  for (const [name, given] of Object.entries(value)) {
    const found = unstorableField(name, field) ?? unstorableField(given, field ?? name);
    if (found) return found;
  }
  return null;
}

const sentence = (character: string) => {
  const code = character.charCodeAt(0).toString(16).toUpperCase().padStart(4, "0");
  return `The character U+${code} cannot be seen and cannot be kept. Delete it, or type the text again.`;
};
