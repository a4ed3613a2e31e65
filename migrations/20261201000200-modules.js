// module -> draft -> release -> assignment
const up = `
CREATE TABLE modules (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  employer_id uuid NOT NULL REFERENCES employers,
  code text NOT NULL CHECK (code ~ '^[A-Z0-9]+(-[A-Z0-9]+)*$' AND length(code) <= 24),
  created_by uuid NOT NULL REFERENCES people,
  created_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (employer_id, code)
);

CREATE TABLE drafts (
  module_id uuid PRIMARY KEY REFERENCES modules,
  title text NOT NULL,
  source text NOT NULL CHECK (octet_length(source) <= 65536),
  revision integer NOT NULL DEFAULT 1,
  saved_by uuid NOT NULL REFERENCES people,
  saved_at timestamptz NOT NULL DEFAULT now()
);
GRANT UPDATE ON drafts TO lagmark_web;

CREATE TABLE draft_writers (
  module_id uuid NOT NULL REFERENCES modules,
  person_id uuid NOT NULL REFERENCES people,
  wrote_at timestamptz NOT NULL DEFAULT now(),
  PRIMARY KEY (module_id, person_id)
);
COMMENT ON TABLE draft_writers IS 'whoever ever saved the text of a module cannot decide on a sitting of it';

CREATE TABLE releases (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  module_id uuid NOT NULL REFERENCES modules,
  employer_id uuid NOT NULL REFERENCES employers,
  number text NOT NULL CHECK (number ~ '^[1-9][0-9]*[.][0-9]+$'),
  kind text NOT NULL CHECK (kind IN ('first', 'editorial', 'minor', 'major')),
  title text NOT NULL,
  source text NOT NULL,
  tree jsonb NOT NULL,
  front_matter jsonb NOT NULL,
  checks jsonb NOT NULL CHECK (jsonb_typeof(checks) = 'array'),
  fingerprint text NOT NULL UNIQUE CHECK (fingerprint ~ '^[0-9a-f]{64}$'),
  reason text NOT NULL,
  released_by uuid NOT NULL REFERENCES people,
  released_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (module_id, number)
);
GRANT UPDATE (id) ON releases TO lagmark_web;

CREATE TABLE release_writers (
  release_id uuid NOT NULL REFERENCES releases,
  person_id uuid NOT NULL REFERENCES people,
  part text NOT NULL CHECK (part IN ('wrote', 'released')),
  PRIMARY KEY (release_id, person_id, part)
);

CREATE TABLE assignments (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  employer_id uuid NOT NULL REFERENCES employers,
  release_id uuid NOT NULL REFERENCES releases,
  technician_id uuid NOT NULL REFERENCES people,
  due_on date NOT NULL,
  assigned_by uuid NOT NULL REFERENCES people,
  assigned_at timestamptz NOT NULL DEFAULT now()
);
CREATE INDEX assignments_by_technician ON assignments (technician_id, employer_id);
CREATE INDEX assignments_by_release ON assignments (release_id);
`;
const down = `DROP TABLE assignments, release_writers, releases, draft_writers, drafts, modules;`;

module.exports = { up: (q) => q.sequelize.query(up), down: (q) => q.sequelize.query(down) };
