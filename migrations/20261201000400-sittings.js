// sitting -> case -> answers -> hand-in -> marking record. Each step is a later row; only the autosaved answers change in place.
const up = `
CREATE TABLE sittings (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  number bigint NOT NULL UNIQUE GENERATED ALWAYS AS IDENTITY (START WITH 20001),
  assignment_id uuid NOT NULL UNIQUE REFERENCES assignments,
  release_id uuid NOT NULL REFERENCES releases,
  technician_id uuid NOT NULL REFERENCES people,
  employer_id uuid NOT NULL REFERENCES employers,
  terms text NOT NULL,
  started_at timestamptz NOT NULL DEFAULT now(),
  last_day date NOT NULL
);
CREATE INDEX sittings_by_technician ON sittings (technician_id);
CREATE INDEX sittings_by_employer ON sittings (employer_id, started_at);
-- Locking a row asks for the right to update it; the guard below lets nothing change.
GRANT UPDATE (id) ON sittings TO lagmark_web, lagmark_worker;
COMMENT ON COLUMN sittings.terms IS 'version of the conditions that the technician accepted on starting';

CREATE TABLE cases (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  sitting_id uuid NOT NULL REFERENCES sittings,
  check_id text NOT NULL,
  kind text NOT NULL,
  kind_version integer NOT NULL,
  number integer NOT NULL CHECK (number >= 1),
  requested_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (sitting_id, check_id, number)
);
GRANT UPDATE (id) ON cases TO lagmark_web, lagmark_worker;

-- What the technician may see.
CREATE TABLE case_views (
  case_id uuid PRIMARY KEY REFERENCES cases,
  view jsonb NOT NULL,
  files jsonb NOT NULL DEFAULT '[]',
  draws integer NOT NULL,
  opened_at timestamptz NOT NULL,
  ends_at timestamptz NOT NULL CHECK (ends_at > opened_at)
);
REVOKE INSERT ON case_views FROM lagmark_web;

-- Seed and truth, sealed with the worker's key on top. The web process cannot read this table at all.
CREATE TABLE case_secrets (
  case_id uuid PRIMARY KEY REFERENCES cases,
  sealed bytea NOT NULL,
  truth_sha256 text NOT NULL,
  engine_version text NOT NULL
);
REVOKE ALL ON case_secrets FROM lagmark_web;

CREATE TABLE captures (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  case_id uuid NOT NULL REFERENCES cases,
  name text NOT NULL,
  storage_key text NOT NULL UNIQUE,
  media_type text NOT NULL,
  size_bytes bigint NOT NULL CHECK (size_bytes >= 0),
  sha256 text NOT NULL CHECK (sha256 ~ '^[0-9a-f]{64}$'),
  labels hstore NOT NULL DEFAULT '',
  UNIQUE (case_id, name)
);
REVOKE INSERT ON captures FROM lagmark_web;

CREATE TABLE case_answers (
  case_id uuid PRIMARY KEY REFERENCES cases,
  answers jsonb NOT NULL CHECK (octet_length(answers::text) <= 65536),
  revision integer NOT NULL,
  saved_at timestamptz NOT NULL
);
GRANT UPDATE ON case_answers TO lagmark_web;

CREATE TABLE hand_ins (
  case_id uuid PRIMARY KEY REFERENCES cases,
  answers jsonb NOT NULL,
  words text NOT NULL DEFAULT '',
  by_clock boolean NOT NULL,
  handed_in_at timestamptz NOT NULL
);

CREATE TABLE marking_records (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  case_id uuid NOT NULL REFERENCES hand_ins,
  sequence integer NOT NULL CHECK (sequence >= 1),
  marking text NOT NULL,
  engine_version text NOT NULL,
  rows jsonb NOT NULL,
  quantities jsonb NOT NULL,
  within_count integer NOT NULL,
  needs integer NOT NULL,
  met boolean NOT NULL,
  workings jsonb NOT NULL,
  duration_ms integer NOT NULL,
  reason text NOT NULL DEFAULT '',
  marked_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (case_id, sequence),
  CHECK (sequence = 1 OR reason <> '')
);
REVOKE INSERT ON marking_records FROM lagmark_web;

CREATE TABLE questions (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  marking_record_id uuid NOT NULL REFERENCES marking_records,
  quantity text NOT NULL,
  words text NOT NULL CHECK (length(words) BETWEEN 1 AND 2000),
  asked_by uuid NOT NULL REFERENCES people,
  asked_at timestamptz NOT NULL DEFAULT now()
);

-- How far a job has come, for the person who waits; overwritten as it goes.
CREATE TABLE progress (
  subject_id uuid NOT NULL,
  job text NOT NULL,
  step text NOT NULL,
  done integer NOT NULL,
  total integer NOT NULL,
  fault text,
  updated_at timestamptz NOT NULL DEFAULT now(),
  PRIMARY KEY (subject_id, job)
);
GRANT UPDATE, DELETE ON progress TO lagmark_worker;
REVOKE INSERT ON progress FROM lagmark_web;

-- No case is drawn while the fee is open, by whatever way the row comes in.
CREATE FUNCTION case_needs_settled_fee() RETURNS trigger LANGUAGE plpgsql SET search_path = public, pg_temp AS $$
BEGIN
  IF NOT EXISTS (SELECT 1 FROM sittings s JOIN fees f ON f.assignment_id = s.assignment_id
                 WHERE s.id = NEW.sitting_id AND f.settled_at IS NOT NULL)
    THEN RAISE EXCEPTION 'the fee of this sitting is open' USING CONSTRAINT = 'cases_fee_settled', ERRCODE = 'check_violation'; END IF;
  RETURN NEW;
END $$;
CREATE TRIGGER cases_fee_settled BEFORE INSERT ON cases FOR EACH ROW EXECUTE FUNCTION case_needs_settled_fee();
`;
const down = `
DROP TABLE progress, questions, marking_records, hand_ins, case_answers, captures, case_secrets, case_views, cases, sittings;
DROP FUNCTION case_needs_settled_fee();
`;

module.exports = { up: (q) => q.sequelize.query(up), down: (q) => q.sequelize.query(down) };
