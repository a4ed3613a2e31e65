import { L1_HZ } from "@/lib/gnss/constants";
import { sinTurns } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import type { SkyTimes } from "../receiver-log/drawSky";
import type { Event } from "./drawEvent";

export type Columns = {
  gainDb: number[];
  /** Receiver's clock against the oscillator of the station. */
  clockNs: number[];
  /** Position against the surveyed one. */
  eastM: number[];
  northM: number[];
  upM: number[];
  /** Measured less predicted for the surveyed position: mean over the satellites, and their standard deviation. */
  dopplerMeanHz: number[];
  dopplerSpreadHz: number[];
};

const GAIN_NOISE_DB = 0.15;
const CLOCK_NOISE_NS = 4;
const CLOCK_WANDER_NS = 6;
const LEVEL_NOISE_M = 0.8;
const UP_NOISE_M = 1.6;
const DOPPLER_NOISE_HZ = 0.12;
const SPREAD_HZ = 0.4;
/** Of a horizontal speed, on the Dopplers of satellites all round at middle elevation: v / wavelength times about a half. */
const SPREAD_HZ_PER_M_S = 0.5 / 0.19;

/** The instruments beside C/N0; noise levels: common practice, no source. */
export function drawColumns(random: Random, { intervalS, readings }: SkyTimes, event: Event): Columns {
  const gain = between(random, 24, 38);
  const clock = between(random, -40, 40);
  const wander = { start: random.uniform(), turns: intervalS / between(random, 1500, 4000) };
  const column = (value: (reading: number) => number, noise: number, decimals: 1 | 2, noisier = event.noisier) =>
    Array.from({ length: readings }, (_, reading) => {
      const noisy = noise * (reading >= event.first ? noisier : 1);
      const unit = decimals === 1 ? 10 : 100;
      return Math.round(unit * (value(reading) + noisy * random.gaussian())) / unit + 0; // no minus zero
    });
  const pulledS = (reading: number) => Math.max(0, reading - event.pullsFrom) * intervalS;
  const isPulled = (reading: number) => reading > event.pullsFrom;
  const ofWander = (reading: number) => sinTurns(wander.start + reading * wander.turns);
  const [eastMS, northMS] = event.speedMS;
  const speedMS = Math.sqrt(eastMS * eastMS + northMS * northMS);
  return {
    // The noise of the gain control is its own and does not grow.
    gainDb: column((reading) => gain + (reading >= event.first ? event.gainDb : 0), GAIN_NOISE_DB, 1, 1),
    clockNs: column(
      (reading) => clock + CLOCK_WANDER_NS * ofWander(reading) + event.clockNsS * pulledS(reading),
      CLOCK_NOISE_NS,
      1,
    ),
    eastM: column((reading) => 0.5 * ofWander(reading) + eastMS * pulledS(reading), LEVEL_NOISE_M, 1),
    northM: column((reading) => -0.5 * ofWander(reading) + northMS * pulledS(reading), LEVEL_NOISE_M, 1),
    upM: column((reading) => ofWander(reading), UP_NOISE_M, 1),
    dopplerMeanHz: column((reading) => (isPulled(reading) ? L1_HZ * event.clockNsS * 1e-9 : 0), DOPPLER_NOISE_HZ, 2),
    dopplerSpreadHz: column(
      (reading) => SPREAD_HZ + (isPulled(reading) ? SPREAD_HZ_PER_M_S * speedMS : 0),
      0.2 * SPREAD_HZ,
      2,
    ).map(Math.abs),
  };
}
