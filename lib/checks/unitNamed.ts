import { UNITS, type Unit } from "@/lib/gnss/units";

/** Ways to write a unit that people use besides the printed one; keys in small letters. */
const OTHER_NAMES: Readonly<Record<string, Unit>> = {
  percent: "%",
  "per cent": "%",
  chips: "chip",
  usec: "us",
  msec: "ms",
  sec: "s",
  seconds: "s",
  second: "s",
  minutes: "min",
  minute: "min",
  metre: "m",
  metres: "m",
  meter: "m",
  meters: "m",
  hertz: "Hz",
  "db hz": "dB-Hz",
  dbhz: "dB-Hz",
  "db·hz": "dB-Hz",
  "db.hz": "dB-Hz",
  "db*hz": "dB-Hz",
  σ: "sigma",
  "σ²": "sigma2",
  "σ^2": "sigma2",
  σ2: "sigma2",
  "sigma^2": "sigma2",
  "sigma²": "sigma2",
  "°": "deg",
  degrees: "deg",
  hours: "h",
  hour: "h",
  "db/100 m": "dB/100m",
  ω: "ohm",
  "ω/km": "ohm/km",
};

const LETTERS: readonly (readonly [string, Unit])[] = (Object.keys(UNITS) as Unit[])
  .filter((unit) => unit !== "1")
  .map((unit) => [unit, unit]);

/** Unit behind a number, whatever its letters' size where that cannot mislead: "KHZ" is kHz. Undefined for an unknown one. */
export const unitNamed = (name: string): Unit | undefined => EXACT.get(name) ?? SMALL.get(name.toLowerCase());

const EXACT = new Map<string, Unit>(LETTERS);
const SMALL = new Map<string, Unit>([
  ...LETTERS.map(([name, unit]) => [name.toLowerCase(), unit] as const),
  ...Object.entries(OTHER_NAMES),
]);
