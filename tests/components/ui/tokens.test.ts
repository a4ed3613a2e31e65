import { expect, test } from "vitest";
import tokens from "@/components/ui/tokens.json";

type Theme = keyof Pick<typeof tokens.color, "light" | "dark">;
type Name = keyof typeof tokens.color.light;

/** Contrast ratio: WCAG 2.2, definitions of "contrast ratio" and "relative luminance". */
function contrast(a: string, b: string): number {
  const luminance = (hex: string) => {
    const [red, green, blue] = [1, 3, 5].map((at) => {
      const level = parseInt(hex.slice(at, at + 2), 16) / 255;
      return level <= 0.04045 ? level / 12.92 : ((level + 0.055) / 1.055) ** 2.4;
    });
    return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
  };
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return (light + 0.05) / (dark + 0.05);
}

const of = (theme: Theme, a: Name, b: Name) => contrast(tokens.color[theme][a], tokens.color[theme][b]);
const THEMES: Theme[] = ["light", "dark"];
const SURFACES: Name[] = ["ground", "sheet", "well"];

// WCAG 2.2, success criterion 1.4.3: 4.5 to 1 for text.
test.each(THEMES)("every text colour is legible on every surface, %s", (theme) => {
  const texts: Name[] = ["ink", "ink-2", "ink-3", "plus", "plus-deep", "minus-deep", "caution-deep"];
  for (const text of texts)
    for (const surface of SURFACES)
      expect(of(theme, text, surface), `${text} on ${surface}`).toBeGreaterThanOrEqual(4.5);
});

// Success criterion 1.4.6: 7 to 1, kept for figures with units.
test.each(THEMES)("values reach the higher contrast, %s", (theme) => {
  const values: Name[] = ["ink", "ink-2", "plus-deep", "minus-deep"];
  for (const value of values)
    for (const surface of SURFACES)
      expect(of(theme, value, surface), `${value} on ${surface}`).toBeGreaterThanOrEqual(7);
});

test.each(THEMES)("words on filled keys and on washes are legible, %s", (theme) => {
  const pairs: [Name, Name][] = [
    ["plus-on", "plus"],
    ["minus-on", "minus-deep"],
    ["caution-on", "caution"],
    ["ink", "plus-wash"],
    ["ink", "minus-wash"],
    ["ink", "caution-wash"],
    ["minus-deep", "minus-wash"],
  ];
  for (const [text, fill] of pairs) expect(of(theme, text, fill), `${text} on ${fill}`).toBeGreaterThanOrEqual(4.5);
});

// Success criterion 1.4.11: 3 to 1 for the borders of controls and the shapes of a status.
test.each(THEMES)("borders of controls and shapes of a status stand out, %s", (theme) => {
  for (const shape of ["control", "plus", "minus"] as const) {
    for (const surface of SURFACES)
      expect(of(theme, shape, surface), `${shape} on ${surface}`).toBeGreaterThanOrEqual(3);
  }
});
