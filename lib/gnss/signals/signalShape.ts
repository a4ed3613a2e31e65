import type { Modulation } from "./signal";

/**
 * Autocorrelation of a signal's own modulation with a random code against the delay in chips: even, 1 at 0, straight lines
 * between the half periods of its subcarriers, 0 from one chip on. Unlike the sum of the parts' powers it holds the
 * product of two subcarriers in one component, whose sign makes the data's peak differ from the pilot's.
 */
export function signalShape(modulation: Modulation): (delayChips: number) => number {
  const shapes = chipShapes(modulation);
  const pieces = shapes[0].pieces.length;
  const corners = Float64Array.from({ length: pieces + 1 }, (_, lag) =>
    shapes.reduce((sum, { share, pieces: shape }) => {
      let product = 0;
      for (let n = 0; n + lag < pieces; n++) product += shape[n] * shape[n + lag];
      return sum + (share * product) / pieces;
    }, 0),
  );
  return (delayChips) => {
    const place = Math.abs(delayChips) * pieces;
    if (place >= pieces) return 0;
    const n = Math.floor(place);
    return corners[n] + (place - n) * (corners[n + 1] - corners[n]);
  };
}

/** Waves of a chip in pieces of equal length, each with the share of the chips that have it. */
function chipShapes(modulation: Modulation): { share: number; pieces: number[] }[] {
  switch (modulation.kind) {
    case "BPSK-R":
    case "BPSK-R in turns":
      return [{ share: 1, pieces: [1] }];
    case "BOC":
      return [{ share: 1, pieces: subcarrier(modulation.m, modulation.n, halvesOf(modulation.m, modulation.n)) }];
    case "CBOC": {
      const count = Math.max(...modulation.parts.map(({ m }) => halvesOf(m, modulation.n)));
      const waves = modulation.parts.map(({ m, amplitude }) =>
        subcarrier(m, modulation.n, count).map((sign) => amplitude * sign),
      );
      return [{ share: 1, pieces: waves[0].map((_, n) => waves.reduce((sum, wave) => sum + wave[n], 0)) }];
    }
    case "TMBOC": {
      const { m, fastM, n, fastPlaces, periodChips } = modulation;
      const [fast, count] = [fastPlaces.length / periodChips, halvesOf(fastM, n)];
      return [
        { share: 1 - fast, pieces: subcarrier(m, n, count) },
        { share: fast, pieces: subcarrier(fastM, n, count) },
      ];
    }
  }
}

const halvesOf = (m: number, n: number): number => (2 * m) / n;

/** Signs of a sine-phased square wave over a chip, in so many pieces, a multiple of its half periods. */
const subcarrier = (m: number, n: number, count: number): number[] =>
  Array.from({ length: count }, (_, piece) => (Math.floor((piece * halvesOf(m, n)) / count) % 2 === 0 ? 1 : -1));
