// People, employers, roles, sessions. Roles lagmark_web and lagmark_worker are made by whoever makes the cluster.
// Every later table: web and worker may read and add; changing or deleting is granted table by table, so that
// a table of records stays a table of records unless a step says otherwise.
const up = `
CREATE EXTENSION IF NOT EXISTS hstore;
GRANT USAGE ON SCHEMA public TO lagmark_web, lagmark_worker;
ALTER DEFAULT PRIVILEGES IN SCHEMA public GRANT SELECT, INSERT ON TABLES TO lagmark_web, lagmark_worker;
ALTER DEFAULT PRIVILEGES IN SCHEMA public GRANT USAGE, SELECT ON SEQUENCES TO lagmark_web, lagmark_worker;

CREATE TABLE employers (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  slug text NOT NULL UNIQUE CHECK (slug ~ '^[a-z0-9]+(-[a-z0-9]+)*$'),
  name text NOT NULL CHECK (length(name) BETWEEN 1 AND 120),
  issuer_standing text NOT NULL DEFAULT 'Employer attestation',
  time_zone text NOT NULL DEFAULT 'Europe/London',
  created_at timestamptz NOT NULL DEFAULT now()
);

CREATE TABLE people (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  email text NOT NULL UNIQUE CHECK (email = lower(email) AND email LIKE '%_@_%'),
  name text NOT NULL CHECK (length(name) BETWEEN 1 AND 120),
  password_hash text,
  is_operator boolean NOT NULL DEFAULT false,
  created_at timestamptz NOT NULL DEFAULT now()
);
GRANT UPDATE (name, password_hash) ON people TO lagmark_web;

CREATE TABLE role_grants (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  person_id uuid NOT NULL REFERENCES people,
  employer_id uuid NOT NULL REFERENCES employers,
  role text NOT NULL CHECK (role IN ('technician', 'lead', 'assessor', 'decider', 'administrator')),
  outside_line boolean NOT NULL DEFAULT false,
  granted_by uuid REFERENCES people,
  granted_at timestamptz NOT NULL DEFAULT now(),
  ended_by uuid REFERENCES people,
  ended_at timestamptz CHECK (ended_at >= granted_at)
);
CREATE UNIQUE INDEX role_grants_held_once ON role_grants (person_id, employer_id, role) WHERE ended_at IS NULL;
CREATE INDEX role_grants_by_employer ON role_grants (employer_id, role) WHERE ended_at IS NULL;
GRANT UPDATE (ended_by, ended_at) ON role_grants TO lagmark_web;
COMMENT ON COLUMN role_grants.outside_line IS 'for deciders: not in the line of the people they decide on';

CREATE TABLE sessions (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  person_id uuid NOT NULL REFERENCES people,
  created_at timestamptz NOT NULL DEFAULT now(),
  expires_at timestamptz NOT NULL,
  password_at timestamptz,
  ended_at timestamptz
);
CREATE INDEX sessions_by_person ON sessions (person_id) WHERE ended_at IS NULL;
GRANT UPDATE (password_at, ended_at) ON sessions TO lagmark_web;
COMMENT ON COLUMN sessions.password_at IS 'when the password was last given in this session; deciding needs it within five minutes';

CREATE TABLE sign_in_links (
  token_hash text PRIMARY KEY,
  email text NOT NULL,
  expires_at timestamptz NOT NULL
);
GRANT DELETE ON sign_in_links TO lagmark_web;

CREATE TABLE throttles (key text PRIMARY KEY, points integer NOT NULL DEFAULT 0, expire bigint);
GRANT UPDATE, DELETE ON throttles TO lagmark_web;

CREATE TABLE trainings (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  employer_id uuid NOT NULL REFERENCES employers,
  trainer_id uuid NOT NULL REFERENCES people,
  technician_id uuid NOT NULL REFERENCES people CHECK (technician_id <> trainer_id),
  ended_on date NOT NULL,
  recorded_by uuid NOT NULL REFERENCES people,
  recorded_at timestamptz NOT NULL DEFAULT now()
);
CREATE INDEX trainings_by_technician ON trainings (technician_id, trainer_id);
`;
const down = `
DROP TABLE trainings, throttles, sign_in_links, sessions, role_grants, people, employers;
ALTER DEFAULT PRIVILEGES IN SCHEMA public REVOKE ALL ON TABLES FROM lagmark_web, lagmark_worker;
ALTER DEFAULT PRIVILEGES IN SCHEMA public REVOKE ALL ON SEQUENCES FROM lagmark_web, lagmark_worker;
REVOKE USAGE ON SCHEMA public FROM lagmark_web, lagmark_worker;
DROP EXTENSION hstore;
`;

module.exports = { up: (q) => q.sequelize.query(up), down: (q) => q.sequelize.query(down) };
