import { wrapDeg } from "@/lib/gnss/sky/receiverLog";

/** Clockwise from `fromDeg` to `toDeg`, which may be beyond north. */
export type Sector = { fromDeg: number; toDeg: number };

export const isInSector = ({ fromDeg, toDeg }: Sector, azimuthDeg: number): boolean =>
  wrapDeg(azimuthDeg - fromDeg) <= wrapDeg(toDeg - fromDeg);
