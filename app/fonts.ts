import localFont from "next/font/local";

// Self-hosted OFL-1.1 files of the @fontsource packages. Each alphabet is its own family, so that one list of families
// (globals.css) decides the order of fallback; no fallback with adjusted metrics, which would answer for Greek and µ too.
const text = localFont({
  src: [
    {
      path: "../node_modules/@fontsource/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-400-normal.woff2",
      weight: "400",
    },
    {
      path: "../node_modules/@fontsource/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-500-normal.woff2",
      weight: "500",
    },
    {
      path: "../node_modules/@fontsource/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-600-normal.woff2",
      weight: "600",
    },
    {
      path: "../node_modules/@fontsource/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-700-normal.woff2",
      weight: "700",
    },
  ],
  variable: "--font-text",
  display: "swap",
  adjustFontFallback: false,
});

const textItalic = localFont({
  src: "../node_modules/@fontsource/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-400-italic.woff2",
  weight: "400",
  style: "italic",
  variable: "--font-text-italic",
  display: "swap",
  preload: false,
  adjustFontFallback: false,
});

const textExtended = localFont({
  src: [
    {
      path: "../node_modules/@fontsource/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-ext-400-normal.woff2",
      weight: "400",
    },
    {
      path: "../node_modules/@fontsource/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-ext-600-normal.woff2",
      weight: "600",
    },
    {
      path: "../node_modules/@fontsource/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-ext-700-normal.woff2",
      weight: "700",
    },
  ],
  variable: "--font-text-extended",
  display: "swap",
  preload: false,
  adjustFontFallback: false,
});

const greek = localFont({
  src: [
    { path: "../node_modules/@fontsource/fira-sans/files/fira-sans-greek-400-normal.woff2", weight: "400" },
    { path: "../node_modules/@fontsource/fira-sans/files/fira-sans-greek-500-normal.woff2", weight: "500" },
    { path: "../node_modules/@fontsource/fira-sans/files/fira-sans-greek-600-normal.woff2", weight: "600" },
  ],
  variable: "--font-greek",
  display: "swap",
  preload: false,
  adjustFontFallback: false,
});

// The Greek file lacks the micro sign; of the Latin one nothing else is wanted.
const micro = localFont({
  src: [
    { path: "../node_modules/@fontsource/fira-sans/files/fira-sans-latin-400-normal.woff2", weight: "400" },
    { path: "../node_modules/@fontsource/fira-sans/files/fira-sans-latin-600-normal.woff2", weight: "600" },
  ],
  declarations: [{ prop: "unicode-range", value: "U+00B5" }],
  variable: "--font-micro",
  display: "swap",
  preload: false,
  adjustFontFallback: false,
});

const plate = localFont({
  src: "../node_modules/@fontsource/b612/files/b612-latin-700-normal.woff2",
  weight: "700",
  variable: "--font-plate",
  display: "swap",
  adjustFontFallback: false,
});

const code = localFont({
  src: [
    { path: "../node_modules/@fontsource/commit-mono/files/commit-mono-latin-400-normal.woff2", weight: "400" },
    { path: "../node_modules/@fontsource/commit-mono/files/commit-mono-latin-500-normal.woff2", weight: "500" },
    { path: "../node_modules/@fontsource/commit-mono/files/commit-mono-latin-600-normal.woff2", weight: "600" },
    { path: "../node_modules/@fontsource/commit-mono/files/commit-mono-latin-700-normal.woff2", weight: "700" },
    {
      path: "../node_modules/@fontsource/commit-mono/files/commit-mono-latin-400-italic.woff2",
      weight: "400",
      style: "italic",
    },
  ],
  variable: "--font-code",
  display: "swap",
  preload: false,
  adjustFontFallback: false,
});

/** Classes for the html element: they define the variables that app/globals.css builds the three stacks from. */
export const fontVariables = [text, textItalic, textExtended, greek, micro, plate, code]
  .map((font) => font.variable)
  .join(" ");
