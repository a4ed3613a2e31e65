import { REFERENCE_SLOTS, slotPlaceM } from "@/lib/gnss/sky/constellation";
import { directionsFrom } from "@/lib/gnss/sky/direction";
import type { Pass } from "@/lib/gnss/sky/receiverLog";
import type { Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import { ALL_PRNS } from "../searchCapture";

export type SkyPass = Omit<Pass, "cn0DbHz">;

export type SkyTimes = { startUnixMs: number; intervalS: number; readings: number; trackEvery: number };

const LOWEST_DEG = 5; // the receiver's own elevation mask
const LATITUDE_DEG = [25, 60] as const; // either side of the equator; nearer the poles no GPS satellite is high

/** Passes of the reference constellation over a drawn site; which number stands in which slot is drawn as well. */
export function drawSky(random: Random, { startUnixMs, intervalS, readings, trackEvery }: SkyTimes): SkyPass[] {
  const directionOf = directionsFrom({
    latitudeDeg: random.pick([-1, 1]) * between(random, ...LATITUDE_DEG),
    longitudeDeg: between(random, -180, 180),
  });
  const prns = random.shuffle(ALL_PRNS);
  const places = Math.ceil((readings - 1) / trackEvery) + 1;
  const stepS = trackEvery * intervalS;
  return REFERENCE_SLOTS.flatMap((slot, n) => {
    const passes: { prn: number; first: number; azimuthDeg: number[]; elevationDeg: number[] }[] = [];
    let open = false;
    for (let place = 0; place < places; place++) {
      const { azimuthDeg, elevationDeg } = directionOf(slotPlaceM(slot, startUnixMs / 1000 + place * stepS));
      const inView = elevationDeg >= LOWEST_DEG;
      if (inView && !open) passes.push({ prn: prns[n], first: place * trackEvery, azimuthDeg: [], elevationDeg: [] });
      open = inView;
      if (!inView) continue;
      const pass = passes[passes.length - 1];
      pass.azimuthDeg.push(Math.round(azimuthDeg) % 360);
      pass.elevationDeg.push(Math.round(elevationDeg));
    }
    // One direction alone has no reading but its own.
    return passes.filter((pass) => pass.azimuthDeg.length > 1);
  });
}

/** Readings of a pass: from its first direction to its last, or to the end of the log. */
export const lengthOf = ({ first, azimuthDeg }: SkyPass, { trackEvery, readings }: SkyTimes): number =>
  Math.min((azimuthDeg.length - 1) * trackEvery + 1, readings - first);
