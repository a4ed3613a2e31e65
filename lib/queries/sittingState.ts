import "server-only";

/** The `<Check>` of a case in its release's tree, over the aliases r (release) and x (case); NULL where there is none. */
export const CHECK_ELEMENT = `
  (SELECT t FROM jsonb_array_elements(r.tree -> 'children') t
   WHERE t ->> 'tagName' = 'Check' AND t #>> '{properties,id}' = x.check_id LIMIT 1)`;

export type SittingState =
  "fee open" | "not started" | "sitting" | "for decision" | "issuing" | "certificate issued" | "not yet competent";

/**
 * Where an assignment stands, as one SQL expression over the aliases r (release), f (fee), s (sitting), d (decision),
 * c (certificate). For decision: every check has its record and no case is on its way, or the last day has passed.
 */
export const SITTING_STATE = `
  CASE
    WHEN d.outcome = 'not yet competent' THEN 'not yet competent'
    WHEN c.id IS NOT NULL THEN 'certificate issued'
    WHEN d.id IS NOT NULL THEN 'issuing'
    WHEN s.id IS NULL AND f.settled_at IS NULL THEN 'fee open'
    WHEN s.id IS NULL THEN 'not started'
    WHEN NOT EXISTS (SELECT 1 FROM case_states x WHERE x.sitting_id = s.id AND x.state <> 'marked')
      AND (s.last_day < (now() AT TIME ZONE (SELECT e.time_zone FROM employers e WHERE e.id = s.employer_id))::date
        OR (SELECT count(DISTINCT x.check_id) FROM case_states x WHERE x.sitting_id = s.id) = jsonb_array_length(r.checks))
      THEN 'for decision'
    ELSE 'sitting'
  END`;
