import type { ReactNode } from "react";
import { Glyph, type GlyphName } from "./Glyph";

/** Glyph and word, as a status stands in a row of a table. */
export function StatusWord({ glyph, strong, children }: { glyph: GlyphName; strong?: boolean; children: ReactNode }) {
  return (
    <span className={strong ? "flex items-center gap-2 font-semibold" : "inline-flex items-center gap-2"}>
      <Glyph name={glyph} />
      <span>{children}</span>
    </span>
  );
}
