/** Where in a file something is wrong: lines and columns from 1 in text, bytes from 0 in samples. */
export type FilePosition = { line: number; column: number } | { byte: number };

/** A file does not hold what its format promises. The message is a sentence for people and begins with the place. */
export class FormatError extends Error {
  override name = "FormatError";
  readonly position: FilePosition;

  constructor(position: FilePosition, sentence: string) {
    super(`${"line" in position ? `${position.line}:${position.column}` : `byte ${position.byte}`}: ${sentence}`);
    this.position = position;
  }
}
