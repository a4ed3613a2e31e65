import { decibels, pow10, pow10Db } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { guessAnswers } from "../guessAnswers";
import type { Answers, PublicCase, Trial } from "../kind";
import { buildCase } from "./buildCase";
import type { StandOffTruth } from "./drawCase";
import { markAnswers } from "./markAnswers";
import type { StandOffParameters } from "./parameters";
import { answersFor, given, usableOf, work } from "./solve";
import { decidingCn0DbHz, effectiveOf } from "./standOffOf";

/** How the release check tries the kind. */
export const trial: Trial<StandOffParameters, StandOffTruth> = {
  whole: true,
  build: buildCase,
  judge: ({ truth }, plan, answers) => markAnswers(truth, plan, answers),
  read: ({ publicCase }, _plan, random) => read(publicCase, random),
  guess: ({ sections }, _plan, random) => guessAnswers(sections, { ...GUESSES, ...effectiveGuesses(sections) }, random),
  difficulty: ({ truth }) => [
    {
      label: "C/N0 lost by the deciding satellite",
      unit: "dB",
      value: decidingCn0DbHz(truth.site) - Math.min(...truth.effectiveDbHz),
      from: 5,
      to: 45,
    },
    {
      label: "Recovery over the distance given",
      unit: "1",
      value: truth.recoveryM / truth.site.distanceM,
      from: 1.2,
      to: 8,
    },
  ],
};

/** Levels added up in tenths or halves of a dB, some of them a little off; distances in two or three figures. */
function read(publicCase: PublicCase, random: Random): Answers {
  const { site, q } = given(publicCase);
  const right = work(site, q);
  const slipDb = 0.15 * random.gaussian(); // of all roundings on the way
  const receivedDbm = rounded(right.receivedDbm + slipDb, random.pick([0.1, 0.5]));
  const effectiveDbHz = site.satellites.map(({ cn0DbHz }) =>
    rounded(effectiveOf(site, receivedDbm, q, cn0DbHz) + 0.1 * random.gaussian(), random.pick([0.1, 0.5])),
  );
  const stretched = right.recoveryM * pow10((0.2 * random.gaussian()) / (10 * site.exponent));
  const recoveryM = Number(stretched.toPrecision(random.pick([2, 3])));
  return answersFor(site, { receivedDbm, effectiveDbHz, usable: usableOf(site, effectiveDbHz), recoveryM });
}

const rounded = (value: number, step: number) => Math.round(value / step) * step;

const GUESSES = {
  "interference.received": [-110, -70] as const,
  "receiver.usable": (random: Random) => String(random.integer(0, 3)),
  "receiver.recovery": (random: Random) => pow10Db(decibels(20) + random.uniform() * decibels(250)).toPrecision(2), // 20 m to 5 km, evenly by factors
};

const effectiveGuesses = (sections: PublicCase["sections"]) =>
  Object.fromEntries(
    sections.flatMap(({ id, fields }) =>
      id === "effective" ? fields.map((field) => [`effective.${field.id}`, [15, 35] as const]) : [],
    ),
  );
