import { Glyph, type GlyphName } from "@/components/ui/Glyph";

const GLYPHS: Record<string, GlyphName> = {
  Valid: "valid",
  Suspended: "suspended",
  Withdrawn: "withdrawn",
  Superseded: "expired",
  Expired: "expired",
  "Not yet valid": "awaiting",
};

/** The word of a standing with its place on the line. */
export function StandingGlyph({ standing, daysLeft }: { standing: string; daysLeft?: number }) {
  const lapsing = standing === "Valid" && daysLeft !== undefined && daysLeft <= 90;
  return (
    <span className="flex items-center gap-2.5 whitespace-nowrap font-semibold">
      <Glyph name={lapsing ? "expiring" : (GLYPHS[standing] ?? "none")} />
      {standing}
      {lapsing && <span className="font-normal">, {daysLeft === 1 ? "last day" : `${daysLeft} days left`}</span>}
    </span>
  );
}
