export type Ticks = { major: number[]; minor: number[]; decimals: number };

/** Steps a person can count in, with the number of minor parts each is divided into. */
const STEPS = [
  { step: 1, parts: 5 },
  { step: 2, parts: 4 },
  { step: 5, parts: 5 },
];
const MINOR_GAP_PX = 8;

/**
 * Ticks of an axis: as many labelled ones as keep their distance.
 * @param lengthPx length of the axis
 * @param minGapPx least distance between two labelled ticks
 */
export function axisTicks(from: number, to: number, lengthPx: number, minGapPx: number): Ticks {
  const span = to - from;
  if (!(span > 0) || !(lengthPx > 0)) return { major: [], minor: [], decimals: 0 };
  const least = (span * minGapPx) / lengthPx;
  const power = 10 ** Math.floor(Math.log10(least));
  const chosen = [...STEPS, { step: 10, parts: 5 }].find(({ step }) => step * power >= least * (1 - 1e-9)) ?? STEPS[0];
  const step = chosen.step * power;
  const minorStep = step / chosen.parts;
  const fine = (minorStep / span) * lengthPx >= MINOR_GAP_PX;
  const minor = fine ? multiples(minorStep, from, to).filter((value) => !isMultiple(value, step)) : [];
  return { major: multiples(step, from, to), minor, decimals: decimalsOf(step) };
}

function multiples(step: number, from: number, to: number): number[] {
  const slack = step * 1e-6;
  const first = Math.ceil((from - slack) / step);
  const last = Math.floor((to + slack) / step);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, at) => clean((first + at) * step));
}

const isMultiple = (value: number, step: number) => Math.abs(value / step - Math.round(value / step)) < 1e-6;
/** Takes away what the multiplication left in the last places: 0.30000000000000004 is 0.3. */
const clean = (value: number) => Number(value.toPrecision(12)) + 0;

function decimalsOf(step: number): number {
  for (let decimals = 0; decimals < 9; decimals++) if (isMultiple(step * 10 ** decimals, 1)) return decimals;
  return 9;
}
