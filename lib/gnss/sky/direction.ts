import { atan2, cosTurns, PI, sinTurns } from "@/lib/numeric/elementary";
import type { Place } from "./constellation";

/** WGS 84, NIMA TR8350.2, 3rd ed., Table 3.1: semi-major axis and flattening. */
const EARTH_AXIS_M = 6_378_137;
const FLATTENING = 1 / 298.257223563;
const ECCENTRICITY_SQUARED = FLATTENING * (2 - FLATTENING);

/** Geodetic, deg. */
export type Site = { latitudeDeg: number; longitudeDeg: number };
/** Azimuth from north over east, 0 to 360; elevation above the horizon, deg. */
export type Direction = { azimuthDeg: number; elevationDeg: number };

/** Turns a place into a direction as seen from a site on the ellipsoid; the site's own terms are worked out once. */
export function directionsFrom({ latitudeDeg, longitudeDeg }: Site): (place: Place) => Direction {
  const [sinLat, cosLat] = [sinTurns(latitudeDeg / 360), cosTurns(latitudeDeg / 360)];
  const [sinLon, cosLon] = [sinTurns(longitudeDeg / 360), cosTurns(longitudeDeg / 360)];
  const normalM = EARTH_AXIS_M / Math.sqrt(1 - ECCENTRICITY_SQUARED * sinLat * sinLat);
  const own = [normalM * cosLat * cosLon, normalM * cosLat * sinLon, normalM * (1 - ECCENTRICITY_SQUARED) * sinLat];
  return (place) => {
    const [x, y, z] = [place[0] - own[0], place[1] - own[1], place[2] - own[2]];
    const outward = cosLon * x + sinLon * y;
    const east = cosLon * y - sinLon * x;
    const north = cosLat * z - sinLat * outward;
    const up = cosLat * outward + sinLat * z;
    const azimuthDeg = (atan2(east, north) * 180) / PI;
    return {
      azimuthDeg: azimuthDeg < 0 ? azimuthDeg + 360 : azimuthDeg,
      elevationDeg: (atan2(up, Math.sqrt(east * east + north * north)) * 180) / PI,
    };
  };
}
