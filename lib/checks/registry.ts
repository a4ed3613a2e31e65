import { chain } from "./chain/chain";
import { cn0 } from "./cn0/cn0";
import { correlatorReading } from "./correlator-reading/correlatorReading";
import { delayEntry } from "./delay-entry/delayEntry";
import { falseLock } from "./false-lock/falseLock";
import { formula } from "./formula/formula";
import { interferer } from "./interferer/interferer";
import { jammedOrNot } from "./jammed-or-not/jammedOrNot";
import { corrected } from "./corrections";
import type { CheckKind } from "./kind";
import { locate } from "./locate/locate";
import { lostDecibels } from "./lost-decibels/lostDecibels";
import { pulseAcceptance } from "./pulse-acceptance/pulseAcceptance";
import { satellites } from "./satellites/satellites";
import { searchPlan } from "./search-plan/searchPlan";
import { sidePeak } from "./side-peak/sidePeak";
import { skyView } from "./sky-view/skyView";
import { standOff } from "./stand-off/standOff";
import { written } from "./written/written";

/** Every version of every kind that a release may name; a released version stays here for ever. Newest of a kind first. */
export const KINDS: readonly CheckKind[] = [
  correlatorReading,
  falseLock,
  sidePeak,
  satellites,
  searchPlan,
  cn0,
  lostDecibels,
  chain,
  skyView,
  interferer,
  standOff,
  locate,
  jammedOrNot,
  delayEntry,
  pulseAcceptance,
  formula,
  written,
];

/**
 * A kind by its name, the newest version unless one is given; it marks by its newest correction.
 * @throws RangeError for a kind or a version that no release can name
 */
export function kindOf(id: string, version?: number): CheckKind {
  const found = KINDS.find((kind) => kind.id === id && (version === undefined || kind.version === version));
  if (!found) throw new RangeError(`kindOf: no kind ${id}${version === undefined ? "" : ` of version ${version}`}`);
  return corrected(found);
}
