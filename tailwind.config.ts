import type { Config } from "tailwindcss";
import plugin from "tailwindcss/plugin";
import tokens from "./components/ui/tokens.json";

type Colours = Record<string, string>;

const variables = (colours: Colours) =>
  Object.fromEntries(Object.entries(colours).map(([name, value]) => [`--${name}`, value]));
const light = {
  ...variables(tokens.color.light),
  "--band-o": String(tokens.plot["band-opacity-light"]),
  colorScheme: "light",
};
const dark = {
  ...variables(tokens.color.dark),
  "--band-o": String(tokens.plot["band-opacity-dark"]),
  colorScheme: "dark",
};

const colours = Object.fromEntries(Object.keys(tokens.color.light).map((name) => [name, `var(--${name})`]));

/** Roles that change size on a phone read a variable, which app/globals.css sets by width. */
const RESPONSIVE = ["body", "h1", "display", "status"];
const rem = (px: number) => `${px / 16}rem`;
const roles = Object.fromEntries(
  Object.entries(tokens.type).map(([role, { size, line, weight }]) => {
    const moves = RESPONSIVE.includes(role);
    const lineHeight = moves ? `var(--line-${role})` : rem(line);
    return [role, [moves ? `var(--size-${role})` : rem(size), { lineHeight, fontWeight: String(weight) }]];
  }),
) as Record<string, [string, { lineHeight: string; fontWeight: string }]>;

const moves = (from: { ms: number; ease: string }) => ({ duration: `${from.ms}ms`, ease: from.ease });
const motion = {
  press: moves(tokens.motion.press),
  move: moves(tokens.motion.move),
  sweep: moves(tokens.motion.sweep),
};

export default {
  content: ["./app/**/*.{ts,tsx}", "./components/**/*.{ts,tsx}"],
  theme: {
    colors: { ...colours, transparent: "transparent", current: "currentColor" },
    fontFamily: { text: ["var(--f-text)"], plate: ["var(--f-plate)"], code: ["var(--f-code)"] },
    fontSize: roles,
    screens: {
      tablet: `${tokens.grid.tablet.min}px`,
      desk: `${tokens.grid.desktop.min}px`,
      wide: `${tokens.grid.desktop.max}px`,
    },
    borderRadius: { none: "0", control: `${tokens.radius.control}px`, focus: `${tokens.radius.focus}px` },
    boxShadow: {},
    extend: {
      // Named apart from the colours "control" and "rule-strong": one class sets one thing.
      borderWidth: { hair: "1px", line: "1.5px", strong: "2px" },
      maxWidth: { content: `${tokens.grid.desktop.max}px`, measure: "68ch" },
      minHeight: { control: "44px", field: "56px", row: "44px" },
      transitionDuration: { press: motion.press.duration, move: motion.move.duration, sweep: motion.sweep.duration },
      transitionTimingFunction: { press: motion.press.ease, move: motion.move.ease, sweep: motion.sweep.ease },
    },
  },
  plugins: [
    plugin(({ addBase }) => {
      addBase({
        ":root": light,
        "@media (prefers-color-scheme: dark)": { ':root:not([data-theme="light"])': dark },
        ':root[data-theme="dark"]': dark,
        // Paper is light whatever the screen was; the two accents are those of the printed identity.
        "@media print": {
          ':root, :root[data-theme="dark"], :root:not([data-theme="light"])': {
            ...light,
            ...variables(tokens.color.print),
            "--ground": "#FFFFFF",
            "--well": "#FFFFFF",
          },
        },
      });
    }),
  ],
} satisfies Config;
