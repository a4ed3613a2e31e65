import type { Direction } from "./direction";

/** One satellite from rise to set, as a receiver's log has it. */
export type Pass = {
  prn: number;
  /** Number of the log's reading at which this pass begins; a multiple of `trackEvery`. */
  first: number;
  /** One a reading; null where the satellite is in view and not tracked. */
  cn0DbHz: readonly (number | null)[];
  /** Direction at the pass's first reading and at every `trackEvery`-th after it, whole deg. */
  azimuthDeg: readonly number[];
  elevationDeg: readonly number[];
};

export type ReceiverLog = {
  /** UTC of the first reading, milliseconds since 1970. */
  startUnixMs: number;
  intervalS: number;
  readings: number;
  trackEvery: number;
  passes: readonly Pass[];
};

/** First and last reading, both meant. */
export type Readings = readonly [first: number, last: number];

export const wrapDeg = (angleDeg: number): number => ((angleDeg % 360) + 360) % 360;

/** From one azimuth to another the short way round, -180 to 180. */
export const turnDeg = (fromDeg: number, toDeg: number): number => wrapDeg(toDeg - fromDeg + 180) - 180;

type Track = Omit<Pass, "cn0DbHz">;

/** Where a satellite stands at a reading of its pass, evenly between the directions that are given. */
export function directionAt(pass: Track, trackEvery: number, reading: number): Direction {
  const { azimuthDeg } = pass;
  const [before, after, part] = between(pass, trackEvery, reading);
  return {
    azimuthDeg: wrapDeg(azimuthDeg[before] + part * turnDeg(azimuthDeg[before], azimuthDeg[after])),
    elevationDeg: elevationAt(pass, trackEvery, reading),
  };
}

export function elevationAt(pass: Track, trackEvery: number, reading: number): number {
  const [before, after, part] = between(pass, trackEvery, reading);
  return pass.elevationDeg[before] + part * (pass.elevationDeg[after] - pass.elevationDeg[before]);
}

/** The two places of a track that a reading lies between, and how far it is from the one to the other. */
function between({ first, azimuthDeg }: Track, trackEvery: number, reading: number): [number, number, number] {
  const place = (reading - first) / trackEvery;
  const before = Math.min(Math.floor(place), azimuthDeg.length - 1);
  return [before, Math.min(before + 1, azimuthDeg.length - 1), place - before];
}

/** Lower and upper elevation in deg; a satellite at the upper one is in the next band. */
export const ELEVATION_BANDS = [
  [5, 10],
  [10, 20],
  [20, 30],
  [30, 45],
  [45, 60],
  [60, 90],
] as const;

export type BandMean = { fromDeg: number; toDeg: number; readings: number; meanDbHz: number };

/**
 * Mean C/N0 of all satellites by elevation, the mean of the figures in dB-Hz as they stand in the log. NaN where a band
 * has no reading.
 * @param leaveOut readings that do not count, such as those of a fault
 */
export function bandMeans({ passes, trackEvery }: ReceiverLog, leaveOut: Readings | null): BandMean[] {
  const sums = ELEVATION_BANDS.map(() => ({ sum: 0, readings: 0 }));
  for (const pass of passes)
    pass.cn0DbHz.forEach((cn0, at) => {
      const reading = pass.first + at;
      if (cn0 === null || (leaveOut && reading >= leaveOut[0] && reading <= leaveOut[1])) return;
      const band = sums[bandOf(elevationAt(pass, trackEvery, reading))];
      if (!band) return;
      band.sum += cn0;
      band.readings++;
    });
  return ELEVATION_BANDS.map(([fromDeg, toDeg], n) => {
    const { sum, readings } = sums[n];
    return { fromDeg, toDeg, readings, meanDbHz: readings > 0 ? sum / readings : NaN };
  });
}

const bandOf = (elevationDeg: number): number =>
  elevationDeg >= 60 ? 5 : ELEVATION_BANDS.findIndex(([from, to]) => elevationDeg >= from && elevationDeg < to);

/** UTC of a reading as hh:mm:ss. */
export const utcOf = ({ startUnixMs, intervalS }: Pick<ReceiverLog, "startUnixMs" | "intervalS">, reading: number) =>
  new Date(startUnixMs + reading * intervalS * 1000).toISOString().slice(11, 19);
