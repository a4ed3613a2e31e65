import { L1_HZ } from "@/lib/gnss/constants";
import type { Place } from "@/lib/gnss/interference/bearingFix";
import { freeSpaceLossDb } from "@/lib/gnss/linkBudget";
import { cosTurns, pow10, sinTurns } from "@/lib/numeric/elementary";
import { heardRows, type LogRow } from "./patrolLog";

const SUPPOSED_DBM = 10; // the 10 mW that everybody supposes

/** Where a level puts the transmitter: on the bearing of the strongest stop, as far off as free space would have it. */
export function placeByLevel(log: readonly LogRow[]): Place {
  const strongest = heardRows(log).reduce((best, row) => (row.levelDbm > best.levelDbm ? row : best));
  const lossDb = SUPPOSED_DBM - strongest.levelDbm;
  const distanceM = pow10((lossDb - freeSpaceLossDb(1, L1_HZ)) / 20);
  const turns = strongest.bearingDeg / 360;
  return {
    eastM: strongest.eastM + distanceM * sinTurns(turns),
    northM: strongest.northM + distanceM * cosTurns(turns),
  };
}
