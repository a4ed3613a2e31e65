import type { Finding } from "../markNumber";
import type { Cause } from "./quantities";

/** What the log shows of each cause. */
const SEEN: Readonly<Record<Cause, string>> = {
  blockage: "Satellites on one side fell at a step and the others did not; gain control and current stayed.",
  interference: "All satellites fell together and the gain control backed off: more power came in, not less.",
  loss: "All satellites fell together, the gain control opened at a step and the current changed.",
  water: "All satellites fell over hours while the gain control opened and the current crept up.",
  nothing: "Each satellite fell and rose with its elevation alone; gain control and current stayed.",
};

const NAMED: Readonly<Record<string, string>> = {
  "nothing blockage": "elevation read as blockage",
  "interference loss": "interference read as a bad antenna",
  "interference water": "interference read as a bad antenna",
  "loss interference": "gain control read the wrong way round",
  "water interference": "gain control read the wrong way round",
  "water loss": "slow fall read as a step",
  "loss water": "step read as a slow fall",
};

export const explainCause = (cause: Cause, chosen: string): Finding => ({
  errorClass: NAMED[`${cause} ${chosen}`] ?? (chosen === "nothing" ? "fault missed" : null),
  reason: SEEN[cause],
});
