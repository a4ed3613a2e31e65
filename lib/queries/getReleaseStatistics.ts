import "server-only";
import { addMonths, dayIn } from "@/lib/calendar";
import { checkStatistics, type CheckStatistics, type CountedCase } from "@/lib/checks/statistics/checkStatistics";
import { LEAST_SITTINGS } from "@/lib/checks/statistics/discrimination";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { isId } from "./findOwn";

type Release = { releasedAt: Date; timeZone: string; checks: { id: string; title: string }[] };

export type ReleaseStatisticsView = {
  /** Sittings with a marking record. */
  sittings: number;
  leastSittings: number;
  /** When the figures are to be looked at: so many sittings or this day, whichever comes first. */
  review: { sittings: number; day: string };
  checks: (CheckStatistics & { title: string })[];
};

/** Default interval of a review; common practice, no source. */
const REVIEW = { sittings: 100, months: 12 };

/** What the marking records of a release's sittings come to, check by check; null when the employer has no such release. */
export async function getReleaseStatistics(actor: Actor, releaseId: string): Promise<ReleaseStatisticsView | null> {
  authorize(can.readStatistics(actor, actor), "read the figures of a release");
  if (!isId(releaseId)) return null;
  const [release] = await select<Release>(RELEASE, { releaseId, employerId: actor.employerId });
  if (!release) return null;
  const cases = await select<CountedCase>(CASES, { releaseId });
  const titles = new Map(release.checks.map(({ id, title }) => [id, title]));
  return {
    sittings: new Set(cases.map(({ sittingId }) => sittingId)).size,
    leastSittings: LEAST_SITTINGS,
    review: {
      sittings: REVIEW.sittings,
      day: addMonths(dayIn(release.timeZone, release.releasedAt), REVIEW.months),
    },
    checks: checkStatistics([...titles.keys()], cases).map((one) => ({ ...one, title: titles.get(one.checkId)! })),
  };
}

const RELEASE = `
  SELECT r.released_at AS "releasedAt", e.time_zone AS "timeZone",
    (SELECT jsonb_agg(jsonb_build_object('id', c -> 'id', 'title', c -> 'title')) FROM jsonb_array_elements(r.checks) c) AS checks
  FROM releases r JOIN employers e ON e.id = r.employer_id WHERE r.id = :releaseId AND r.employer_id = :employerId`;
// The newest record of each case; its rows stay where they are but for what was outside.
const CASES = `
  SELECT x.sitting_id AS "sittingId", x.check_id AS "checkId", x.number, x.met, x.by_clock AS "byClock",
    extract(epoch FROM x.handed_in_at - x.opened_at)::float8 AS seconds,
    (SELECT coalesce(jsonb_agg(DISTINCT jsonb_build_object('quantity', q ->> 'label', 'errorClass', o ->> 'errorClass')), '[]')
     FROM jsonb_array_elements(k.rows) o JOIN jsonb_array_elements(k.quantities) q ON q ->> 'of' = o ->> 'quantity'
     WHERE NOT (o ->> 'within')::boolean) AS outside
  FROM sittings s JOIN case_states x ON x.sitting_id = s.id JOIN marking_records k ON k.id = x.record_id
  WHERE s.release_id = :releaseId`;
