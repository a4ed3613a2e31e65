/** Tables whose every new row writes an entry, and whose rows never change. */
export const RECORD_TABLES = [
  "releases",
  "release_writers",
  "assignments",
  "sittings",
  "cases",
  "case_views",
  "case_secrets",
  "captures",
  "hand_ins",
  "marking_records",
  "questions",
  "question_answers",
  "decisions",
  "certificates",
  "standings",
  "trainings",
  "closings",
  "marking_reviews",
  "review_findings",
  "review_acts",
  "release_checks",
  "released_checks",
  "job_acts",
] as const;

/** Tables whose rows may change, with an entry for every change. */
export const CHANGING_TABLES = ["employers", "role_grants", "orders", "fees"] as const;

export const TRAILED_TABLES = [...RECORD_TABLES, ...CHANGING_TABLES] as const;

/** The chain's own tables: rows are added and never change. */
export const CHAIN_TABLES = ["trail_entries", "trail_links", "trail_heads"] as const;
