import type { ReactNode } from "react";
import { Glyph, type GlyphName } from "@/components/ui/Glyph";
import { Value } from "@/components/ui/Value";

type ReadingProps = {
  label: string;
  value: number | string | null;
  unit?: string;
  decimals?: number;
  signed?: boolean;
  /** The figure that decides stands first and largest. */
  deciding?: boolean;
  children?: ReactNode;
};

/** One figure of a calculator: quiet label, figure with unit, and what it means. */
export function Reading({ label, value, unit, decimals, signed, deciding, children }: ReadingProps) {
  return (
    <div className="reading">
      <p className="text-label font-normal text-ink-2">{label}</p>
      <p>
        <Value value={value} unit={unit} decimals={decimals} signed={signed} size={deciding ? "l" : "m"} />
      </p>
      {children && <p className="text-dense text-ink-2 figures">{children}</p>}
    </div>
  );
}

/** The outcome in words, with the glyph whose place says it again. */
export function Verdict({ glyph, children }: { glyph: GlyphName; children: ReactNode }) {
  return (
    <p className="reading-verdict" role="status">
      <Glyph name={glyph} size={24} className="flex-none" />
      <span>{children}</span>
    </p>
  );
}
