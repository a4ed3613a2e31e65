import {
  ellipseAreaM2,
  errorEllipse,
  reachInEllipse,
  type Ellipse,
  type Place,
} from "@/lib/gnss/interference/bearingFix";
import type { AskedQuantity } from "../askedQuantities";
import { formatNumber, formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { MarkedRow } from "../kind";
import { markWord } from "../markWord";
import type { Finding } from "../markNumber";
import { PROBABILITY, type LocateTruth } from "./drawCase";
import { fixWith } from "./findReflection";
import { placeByLevel } from "./placeByLevel";
import type { ReadEllipse } from "./readEllipse";

const ONE_SIGMA = 0.45; // of the 95 % ellipse's axes; 1/2.448 is 0.41

/** Whether the transmitter stands inside the candidate's own ellipse. */
export function markPosition(truth: LocateTruth, quantity: AskedQuantity, read: ReadEllipse): MarkedRow {
  const { typed, ellipse, problem } = read;
  const common = { quantity, handedIn: typed, tolerance: "inside", computed: placeText(truth.transmitter) };
  if (!ellipse) return markWord({ ...common, finding: { errorClass: null, reason: problem } });
  const isInside = reachInEllipse(ellipse, truth.transmitter) <= 1;
  const off = apartM(ellipse, truth.transmitter);
  return {
    ...markWord({
      ...common,
      understood: `${placeText(ellipse)}, ${sizeText(ellipse)}`,
      finding: isInside ? null : explainPosition(truth, ellipse, off),
    }),
    difference: formatQuantity(off, "m", 0),
  };
}

function explainPosition(truth: LocateTruth, ellipse: Ellipse, offM: number): Finding {
  const all = fixWith(truth.log);
  if (all && reachInEllipse(errorEllipse(all, PROBABILITY), ellipse) <= 0.5)
    return {
      errorClass: "reflection averaged in",
      reason: `This is where all bearings meet best. Stop ${truth.reflectionStop} saw a reflection and draws it away.`,
    };
  if (apartM(ellipse, placeByLevel(truth.log)) <= truth.ellipse.semiMajorM)
    return {
      errorClass: "level taken as distance",
      reason:
        "This is where the level of the strongest stop puts it. A level says nothing of the distance while the power is not known.",
    };
  const distance = `The transmitter stands ${formatQuantity(offM, "m", 0)} from your place, outside your ellipse.`;
  const isSmall = ellipseAreaM2(ellipse) <= ONE_SIGMA * ONE_SIGMA * ellipseAreaM2(truth.ellipse);
  return { errorClass: isSmall ? "ellipse of one sigma" : null, reason: distance };
}

/** The candidate's own area over that of weighted least squares without the reflection. */
export function markArea({ ellipse: least }: LocateTruth, quantity: AskedQuantity, read: ReadEllipse): MarkedRow {
  const allowed = formatUnderstood(quantity.tolerance, "1");
  const common = { quantity, handedIn: read.typed, tolerance: `at most × ${allowed}`, computed: sizeText(least) };
  if (!read.ellipse) return markWord({ ...common, finding: { errorClass: null, reason: read.problem } });
  const ratio = ellipseAreaM2(read.ellipse) / ellipseAreaM2(least);
  const times = `${formatNumber(ratio, 2)} times`;
  return {
    ...markWord({
      ...common,
      understood: sizeText(read.ellipse),
      finding:
        ratio <= quantity.tolerance
          ? null
          : {
              errorClass: "too wide",
              reason: `Your ellipse has ${times} the area that the log allows; ${allowed} is allowed.`,
            },
    }),
    difference: `×\u00a0${formatNumber(ratio, 2)}`,
  };
}

const apartM = (a: Place, b: Place) =>
  Math.sqrt((a.eastM - b.eastM) * (a.eastM - b.eastM) + (a.northM - b.northM) * (a.northM - b.northM));

export const placeText = ({ eastM, northM }: Place) =>
  `east ${formatQuantity(eastM, "m", 0)}, north ${formatQuantity(northM, "m", 0)}`;

export const sizeText = ({ semiMajorM, semiMinorM, azimuthDeg }: Ellipse) =>
  `half axes ${formatQuantity(semiMajorM, "m", 0)} and ${formatQuantity(semiMinorM, "m", 0)}, long axis at ${formatQuantity(azimuthDeg, "deg", 0)}`;
