/*
 * Subframes broadcast by GPS satellites, 300 bits each as hexadecimal digits, four zero bits at the end, as published
 * in the test data of an open-source orbit library (Apache licence), with what they say: time of week of the hand-over
 * word, subframe number, week number in ten bits.
 */
export const GPS_SUBFRAMES = [
  {
    hex: "8b030854068892030900060162f57126c4c680d21f5fdfcc40a7978070bc00ffd4307a443c40",
    handOverS: 5016,
    subframe: 1,
    week: 194,
  },
  {
    hex: "8b0308540d2ea746b030f34bb0912d308f53300904199380148d3fca68580d378bd40e11fd40",
    handOverS: 10122,
    subframe: 2,
    week: null,
  },
  {
    hex: "8b0308540326b70ffe3cceee041fc9004128d12d58220319126b123f7db4ffa35bbd7be89080",
    handOverS: 2418,
    subframe: 3,
    week: null,
  },
  {
    hex: "8b0308540008c3c7978c9dcda8a6533a6f2ca78c052ab26a21a7f17a01ce0526c4732e9bb840",
    handOverS: 24,
    subframe: 4,
    week: null,
  },
  {
    hex: "8b030854001cc0c5a3f0ad493ede0afd37008e84318fd742311b44484c0dfedaab307c003f80",
    handOverS: 84,
    subframe: 4,
    week: null,
  },
] as const;

/**
 * The bits as they were sent. The digits give the data bits upright, with the parity as received; a satellite sends the
 * 24 data bits of a word turned over when the last bit of the word before is 1 (IS-GPS-200, 20.3.5.2).
 */
export function sentBits(hex: string): number[] {
  const bits = [...hex].flatMap((digit) => [8, 4, 2, 1].map((weight) => (Number.parseInt(digit, 16) & weight ? 1 : 0)));
  const isData = (n: number) => n % 30 < 24;
  const lastBefore = (n: number) => (n < 30 ? 0 : bits[n - (n % 30) - 1]);
  return bits.slice(0, 300).map((bit, n) => (isData(n) ? bit ^ lastBefore(n) : bit));
}
