import type { Answers, PublicCase } from "../kind";
import { Q_OF, type InterferenceType } from "./interference-types";
import { decidingCn0DbHz, effectiveOf, interferenceDbm, recoveryM, type StandOffSite } from "./standOffOf";

/** What somebody worked out, before it is written down. */
export type Worked = { receivedDbm: number; effectiveDbHz: number[]; usable: number; recoveryM: number };

/** The right method, from the public case alone. */
export function solve(publicCase: PublicCase): Answers {
  const { site, q } = given(publicCase);
  return answersFor(site, work(site, q));
}

export function given({ data }: PublicCase): { site: StandOffSite; q: number } {
  const site = data as unknown as StandOffSite & { interference: InterferenceType };
  return { site, q: Q_OF[site.interference] };
}

export function work(site: StandOffSite, q: number): Worked {
  const receivedDbm = interferenceDbm(site);
  const effectiveDbHz = site.satellites.map(({ cn0DbHz }) => effectiveOf(site, receivedDbm, q, cn0DbHz));
  return {
    receivedDbm,
    effectiveDbHz,
    usable: usableOf(site, effectiveDbHz),
    recoveryM: recoveryM(site, q, decidingCn0DbHz(site)),
  };
}

export const usableOf = ({ thresholdDbHz }: StandOffSite, effectiveDbHz: readonly number[]): number =>
  effectiveDbHz.filter((value) => value >= thresholdDbHz).length;

/** As a careful person writes it down. */
export function answersFor({ satellites }: StandOffSite, worked: Worked): Answers {
  const effective = satellites.map(({ prn }, n) => [`effective.prn${prn}`, worked.effectiveDbHz[n].toFixed(1)]);
  return {
    "interference.received": worked.receivedDbm.toFixed(1),
    ...Object.fromEntries(effective),
    "receiver.usable": String(worked.usable),
    "receiver.recovery": String(Number(worked.recoveryM.toPrecision(3))),
  };
}
