import { problemAt, type Problem } from "@/lib/mdx/problem";
import { tagNamed } from "@/lib/mdx/tags";
import { placeInAttribute, plainAttribute, rangeOfAttribute, type WrittenPart } from "@/lib/mdx/writtenTag";

/** A tag inside a check whose kind the lead defines, while it is read: its attributes, and what is wrong with them. */
export class OwnPart {
  readonly problems: Problem[] = [];

  constructor(private readonly part: WrittenPart) {}

  text(name: string): string {
    const value = plainAttribute(this.part, this.part.tag, name);
    return value === undefined ? "" : String(value);
  }

  value(name: string): string | number | boolean | undefined {
    return plainAttribute(this.part, this.part.tag, name);
  }

  isFlagged(name: string): boolean {
    return plainAttribute(this.part, this.part.tag, name) === true;
  }

  /** @param offset of the character that is at fault, counted in the attribute's text */
  refuse(name: string, message: string, offset?: number): void {
    const at = offset === undefined ? rangeOfAttribute(this.part, name) : placeInAttribute(this.part, name, offset);
    this.problems.push(problemAt(at, "own-quantity", message));
  }

  /** What must be written and what must not; a value that is refused for itself has been told already. */
  requireOnly(needed: readonly string[], allowed: readonly string[] = []): boolean {
    const spec = tagNamed(this.part.tag)?.attributes ?? [];
    let whole = true;
    for (const { name, sample } of spec) {
      const isWritten = this.part.attributes.some((one) => one.name === name);
      if (needed.includes(name) && !isWritten) {
        this.refuse(name, `This <${this.part.tag}> needs ${name}. Write, for instance, ${name}=${sample}.`);
      } else if (isWritten && !needed.includes(name) && !allowed.includes(name)) {
        this.refuse(name, `${name} is not read in a check of this kind. Delete it.`);
      }
      if (needed.includes(name) && this.value(name) === undefined) whole = false;
    }
    return whole;
  }

  /** A text that is shown on a phone. */
  label(): string {
    const label = this.text("label");
    if (label.length > LONGEST_LABEL) this.refuse("label", `A label has at most ${LONGEST_LABEL} characters.`);
    return label;
  }
}

const LONGEST_LABEL = 80;

/** More parts of one sort than a check may have are refused at the first that is too many. */
export function tooMany(parts: readonly WrittenPart[], most: number): Problem[] {
  const surplus = parts[most];
  if (!surplus) return [];
  return [
    problemAt(surplus.range, "own-quantity", `A check has at most ${most} <${surplus.tag}>. Make two checks of it.`),
  ];
}
