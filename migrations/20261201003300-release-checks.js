// draft -> release check -> release. A run is working state and comes and goes; its finished result is a record.
const up = `
CREATE TABLE release_check_runs (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  fingerprint text NOT NULL CHECK (fingerprint ~ '^[0-9a-f]{64}$'),
  preview boolean NOT NULL,
  plan jsonb NOT NULL,
  employer_id uuid NOT NULL REFERENCES employers,
  asked_by uuid NOT NULL REFERENCES people,
  asked_at timestamptz NOT NULL,
  stopped_at timestamptz,
  tried integer NOT NULL DEFAULT 0,
  whole_tried integer NOT NULL DEFAULT 0,
  tally jsonb,
  finished_at timestamptz,
  UNIQUE (fingerprint, preview)
);
COMMENT ON COLUMN release_check_runs.preview IS 'a look at fewer cases, kept apart: it permits no release';
REVOKE INSERT ON release_check_runs FROM lagmark_web, lagmark_worker;
GRANT INSERT (fingerprint, preview, plan, employer_id, asked_by, asked_at), UPDATE (stopped_at) ON release_check_runs TO lagmark_web;
GRANT UPDATE (tried, whole_tried, tally, finished_at), DELETE ON release_check_runs TO lagmark_worker;

-- One a fingerprint, whoever asked for it: the same plan and engine give the same table.
CREATE TABLE release_checks (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  fingerprint text NOT NULL UNIQUE CHECK (fingerprint ~ '^[0-9a-f]{64}$'),
  plan jsonb NOT NULL,
  engine_version text NOT NULL,
  tally jsonb NOT NULL,
  finished_at timestamptz NOT NULL
);
REVOKE INSERT ON release_checks FROM lagmark_web;

-- What a release relied on, check by check; without a check: the sitting as a whole.
CREATE TABLE released_checks (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  release_id uuid NOT NULL REFERENCES releases,
  check_id text,
  release_check_id uuid REFERENCES release_checks,
  within boolean NOT NULL,
  reason text NOT NULL CHECK (length(reason) <= 2000),
  CHECK (within OR reason <> '')
);
CREATE UNIQUE INDEX released_checks_once ON released_checks (release_id, coalesce(check_id, ''));
REVOKE INSERT ON released_checks FROM lagmark_worker;
COMMENT ON COLUMN released_checks.reason IS 'why it was released outside a bound, in the words of the lead';

${["release_checks", "released_checks"]
  .map(
    (table) => `
CREATE TRIGGER ${table}_kept BEFORE UPDATE OR DELETE ON ${table} FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER ${table}_trail AFTER INSERT ON ${table} FOR EACH ROW EXECUTE FUNCTION write_trail();`,
  )
  .join("\n")}
`;
const down = `DROP TABLE released_checks, release_checks, release_check_runs;`;

module.exports = { up: (q) => q.sequelize.query(up), down: (q) => q.sequelize.query(down) };
