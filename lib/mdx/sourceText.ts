import type { Place, Range } from "@/lib/mdx/problem";

/** The source with its lines counted, to turn an offset into a place and back into text. */
export class SourceText {
  private readonly starts: number[] = [0];

  constructor(readonly text: string) {
    for (const match of text.matchAll(/\r\n|\r|\n/g)) this.starts.push(match.index + match[0].length);
  }

  placeAt(offset: number): Place {
    let low = 0;
    let high = this.starts.length - 1;
    while (low < high) {
      const middle = Math.ceil((low + high) / 2);
      if ((this.starts[middle] ?? 0) <= offset) low = middle;
      else high = middle - 1;
    }
    return { line: low + 1, column: offset - (this.starts[low] ?? 0) + 1 };
  }

  offsetAt({ line, column }: Place): number {
    return (this.starts[line - 1] ?? this.text.length) + column - 1;
  }

  slice({ from, to }: Range): string {
    return this.text.slice(this.offsetAt(from), this.offsetAt(to));
  }
}
