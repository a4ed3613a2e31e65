import { expect, test } from "vitest";
import { ownerRows } from "../support/owner";

// What each process may do with each table. A new table without its row here fails.
type Rights = { read: boolean; add: boolean; change: string[]; remove: boolean };
const rights = (text: string, ...change: string[]): Rights => ({
  ...{ read: text.includes("read"), add: text.includes("add"), remove: text.includes("remove"), change },
});
const NONE = rights("");

const EVERY = { web: rights("read add"), worker: rights("read add") };
const TABLES: Record<string, { web: Rights; worker: Rights }> = {
  employers: EVERY,
  people: { ...EVERY, web: rights("read add", "name", "password_hash") },
  role_grants: { ...EVERY, web: rights("read add", "ended_at", "ended_by") },
  sessions: { ...EVERY, web: rights("read add", "ended_at", "password_at") },
  sign_in_links: { ...EVERY, web: rights("read add remove") },
  throttles: { ...EVERY, web: rights("read add remove", "expire", "key", "points") },
  trainings: EVERY,
  modules: EVERY,
  drafts: { ...EVERY, web: rights("read add", "module_id", "revision", "saved_at", "saved_by", "source", "title") },
  draft_writers: EVERY,
  // The right to change an id is the right to lock the row; a trigger refuses the change itself.
  releases: { ...EVERY, web: rights("read add", "id") },
  release_writers: EVERY,
  // The web process asks (columns of its own) and stops; what was counted comes from the worker alone.
  release_check_runs: {
    web: rights("read", "stopped_at"),
    worker: rights("read remove", "finished_at", "tally", "tried", "whole_tried"),
  },
  release_checks: { ...EVERY, web: rights("read") },
  released_checks: { ...EVERY, worker: rights("read") },
  assignments: EVERY,
  orders: { ...EVERY, web: rights("read add", "checkout_session_id", "checkout_url", "closed_at", "paid_at") },
  fees: { ...EVERY, web: rights("read add", "order_id", "settled_at") },
  stripe_events: { ...EVERY, web: rights("read add", "outcome") },
  sittings: { web: rights("read add", "id"), worker: rights("read add", "id") },
  cases: { web: rights("read add", "id"), worker: rights("read add", "id") },
  case_views: { ...EVERY, web: rights("read") },
  case_secrets: { ...EVERY, web: NONE },
  captures: { ...EVERY, web: rights("read") },
  case_answers: { ...EVERY, web: rights("read add", "answers", "case_id", "revision", "saved_at") },
  hand_ins: EVERY,
  // Of these the web process may add what a person judged; a trigger refuses any other.
  marking_records: EVERY,
  questions: EVERY,
  question_answers: EVERY,
  marking_reviews: EVERY,
  review_findings: { ...EVERY, web: rights("read") },
  review_acts: EVERY,
  job_acts: EVERY,
  closings: { ...EVERY, web: rights("read") },
  progress: {
    web: rights("read"),
    worker: rights("read add remove", "done", "fault", "job", "step", "subject_id", "total", "updated_at"),
  },
  decisions: EVERY,
  certificates: { web: rights("read", "id"), worker: rights("read add") },
  standings: EVERY,
  // The web process may ask for one (columns of its own), and never put a file in.
  verifications: { web: rights("read"), worker: rights("read remove", "pdf", "signed_at") },
  mails: { ...EVERY, worker: rights("read add", "body", "sent_at") },
  trail_entries: { web: rights("read"), worker: rights("read") },
  trail_unsealed: { web: rights("read"), worker: rights("read remove") },
  trail_links: { web: rights("read"), worker: rights("read add") },
  trail_heads: { web: rights("read"), worker: rights("read add") },
  schema_steps: { web: NONE, worker: NONE },
};

const SQL = `
  SELECT t.tablename AS name, has_table_privilege($1, t.tablename, 'SELECT') AS read,
    has_table_privilege($1, t.tablename, 'INSERT') AS add, has_table_privilege($1, t.tablename, 'DELETE') AS remove,
    coalesce((SELECT json_agg(c.column_name ORDER BY c.column_name) FROM information_schema.columns c
      WHERE c.table_schema = 'public' AND c.table_name = t.tablename
        AND has_column_privilege($1, t.tablename, c.column_name, 'UPDATE')), '[]') AS change
  FROM pg_tables t WHERE t.schemaname = 'public' ORDER BY 1`;

test.each(["web", "worker"] as const)("the %s process has the rights of its table and no more", async (process) => {
  const rows = await ownerRows<Rights & { name: string }>(SQL, [`lagmark_${process}`]);
  const found = Object.fromEntries(rows.map(({ name, ...held }) => [name, held]));
  expect(found).toEqual(Object.fromEntries(Object.entries(TABLES).map(([name, both]) => [name, both[process]])));
});

test("neither process can empty a table, make one, or lend itself another role", async () => {
  const [held] = await ownerRows<Record<string, number | boolean>>(`
    SELECT count(*) FILTER (WHERE has_table_privilege(r.rolname, t.tablename, 'TRUNCATE'))::int AS truncate,
      bool_or(has_schema_privilege(r.rolname, 'public', 'CREATE')) AS "create",
      count(DISTINCT m.roleid)::int AS roles, bool_or(r.rolsuper OR r.rolcreaterole OR r.rolbypassrls) AS above
    FROM pg_roles r CROSS JOIN pg_tables t LEFT JOIN pg_auth_members m ON m.member = r.oid
    WHERE r.rolname IN ('lagmark_web', 'lagmark_worker') AND t.schemaname = 'public'`);
  expect(held).toEqual({ truncate: 0, create: false, roles: 0, above: false });
});
