import { Glyph, type GlyphName } from "@/components/ui/Glyph";
import type { SittingState } from "@/lib/queries/sittingState";

const WORDS: Record<SittingState, { glyph: GlyphName; word: string }> = {
  "fee open": { glyph: "todo", word: "Fee open" },
  "not started": { glyph: "todo", word: "Not started" },
  sitting: { glyph: "awaiting", word: "Sitting" },
  "for decision": { glyph: "awaiting", word: "For decision" },
  issuing: { glyph: "awaiting", word: "Certificate being issued" },
  "certificate issued": { glyph: "within", word: "Competent" },
  "not yet competent": { glyph: "outside", word: "Not yet competent" },
};

/** Where a sitting stands, as a place on the line and a word. */
export function SittingStateWord({ state }: { state: SittingState }) {
  const { glyph, word } = WORDS[state];
  return (
    <span className="flex items-center gap-2.5 whitespace-nowrap">
      <Glyph name={glyph} />
      {word}
    </span>
  );
}
