import type { Answers, BuiltCase, WrongMethod } from "../kind";
import type { SkyViewTruth } from "./drawCase";
import { choiceBySky, nearestRoomM } from "./isFair";
import type { SkyViewParameters } from "./parameters";
import { givenIn } from "./publicCase";
import { choiceOf, distanceM, roomsM, survey, type Roof, type Surveyed } from "./survey";
import { answersFor } from "./solve";
import { degreesShare, planeShare } from "./wrong-shares";

type Wrong = WrongMethod<SkyViewParameters, SkyViewTruth>;
type Built = BuiltCase<SkyViewTruth>;

/** Typical wrong surveys; each differs from the right one in the named step alone. */
export const wrongMethods: Readonly<Record<string, Wrong>> = {
  "area-on-the-plot": {
    label: "Area on a polar plot taken for the share of the sky",
    misses: ["blocked"],
    solve: (built) => withShare(built, planeShare),
  },
  "degrees-of-elevation": {
    label: "Degrees of elevation counted instead of the solid angle",
    misses: ["blocked"],
    solve: (built) => withShare(built, degreesShare),
  },
  "share-of-the-quadrant": {
    label: "Share of the quadrant's own sky given instead of the whole sky's",
    misses: ["quadrantBlocked"],
    solve: (built) =>
      changed(built, (one) => ({ ...one, quadrantsPercent: one.quadrantsPercent.map((share) => 4 * share) })),
  },
  "nearest-emitter": {
    label: "Room taken to the nearest emitter, whatever its keep-out distance",
    misses: ["room"],
    solve: (built) =>
      changed(built, (one, roof) => ({ ...one, roomM: nearestRoomM(roomsM(placeOf(roof, one), roof.emitters)) })),
  },
  "nearest-the-hatch": {
    label: "The position nearest the hatch chosen",
    misses: ["choice"],
    solve({ publicCase }) {
      const { roof, rules } = givenIn(publicCase);
      const awayM = (one: Surveyed) => distanceM(placeOf(roof, one), roof.hatch);
      const surveyed = survey(roof, rules);
      return answersFor(surveyed, surveyed.reduce((a, b) => (awayM(b) < awayM(a) ? b : a)).id);
    },
  },
  "emitters-overlooked": {
    label: "Chosen by the sky alone, emitters overlooked",
    misses: ["choice"],
    solve({ publicCase }) {
      const { roof, rules } = givenIn(publicCase);
      const surveyed = survey(roof, rules);
      return answersFor(surveyed, choiceBySky(surveyed, rules));
    },
  },
};

function withShare({ publicCase }: Built, share: typeof planeShare): Answers {
  const { roof, rules } = givenIn(publicCase);
  const surveyed = survey(roof, rules, share);
  return answersFor(surveyed, choiceOf(surveyed));
}

/** The right survey with one figure of each position changed; the choice stays. */
function changed({ publicCase }: Built, change: (one: Surveyed, roof: Roof) => Surveyed): Answers {
  const { roof, rules } = givenIn(publicCase);
  const surveyed = survey(roof, rules);
  return answersFor(
    surveyed.map((one) => change(one, roof)),
    choiceOf(surveyed),
  );
}

const placeOf = ({ positions }: Roof, { id }: Surveyed) => positions.find((position) => position.id === id)!;
