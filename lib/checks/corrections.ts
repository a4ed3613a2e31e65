import type { CheckKind, Marking, Trial } from "./kind";

/**
 * A later marking of a released kind version, where its own was found wrong. How the version draws its cases never
 * changes. Revision 1 is the version's own marking; the next correction is 2, and stays here for ever.
 */
export type Correction = {
  kind: string;
  version: number;
  revision: number;
  /** One sentence for the technician and the lead: what was wrong, and what it did to a result. */
  reason: string;
  mark: CheckKind["mark"];
  /** The same for the release check; null only where the kind has no trial. */
  judge: Trial["judge"] | null;
};

/** None yet. */
export const CORRECTIONS: readonly Correction[] = [];

/** The last correction of each kind version that has one. */
export const newestCorrections = (corrections: readonly Correction[] = CORRECTIONS): Correction[] =>
  corrections.filter((one) => !corrections.some((other) => isOf(other, one) && other.revision > one.revision));

export const markingName = ({ kind, version, revision }: Pick<Correction, "kind" | "version" | "revision">): string =>
  `${kind}@${version}.${revision}`;

/** A kind as what is handed in from now on is marked: it draws as ever, and marks by its newest correction. */
export function corrected(kind: CheckKind, corrections: readonly Correction[] = CORRECTIONS): CheckKind {
  const own = { kind: kind.id, version: kind.version };
  const correction = newestCorrections(corrections).find((one) => isOf(one, own));
  if (!correction) return kind;
  const { mark, judge } = correction;
  const named = (marking: Marking): Marking => ({ ...marking, marking: markingName(correction) });
  return {
    ...kind,
    mark: (...given) => named(mark(...given)),
    ...(kind.trial && judge && { trial: { ...kind.trial, judge: (...given) => named(judge(...given)) } }),
  };
}

type Of = Pick<Correction, "kind" | "version">;
const isOf = (one: Of, other: Of): boolean => one.kind === other.kind && one.version === other.version;
