// The trail. A trigger writes the entry, so no row of the chain can come in without one; the worker's sealer
// links entries into a hash chain afterwards, so that no act ever waits for another act's lock.
const RECORDS = [
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
  "decisions",
  "certificates",
  "standings",
  "trainings",
];
const CHANGING = ["employers", "role_grants", "orders", "fees"];

const up = `
CREATE TABLE trail_entries (
  id bigint PRIMARY KEY GENERATED ALWAYS AS IDENTITY,
  at timestamptz NOT NULL DEFAULT now(),
  act text NOT NULL,
  actor_id uuid,
  employer_id uuid,
  subject_table text NOT NULL,
  subject_key text NOT NULL,
  row_sha256 text NOT NULL
);
CREATE INDEX trail_entries_by_employer ON trail_entries (employer_id, id DESC);
CREATE INDEX trail_entries_by_subject ON trail_entries (subject_table, subject_key, id DESC);
CREATE TABLE trail_unsealed (entry_id bigint PRIMARY KEY REFERENCES trail_entries);
CREATE TABLE trail_links (
  sequence bigint PRIMARY KEY,
  entry_id bigint NOT NULL UNIQUE REFERENCES trail_entries,
  entry_sha256 text NOT NULL,
  link_sha256 text NOT NULL
);
CREATE TABLE trail_heads (
  sequence bigint PRIMARY KEY REFERENCES trail_links,
  link_sha256 text NOT NULL,
  signed_at timestamptz NOT NULL,
  signature text NOT NULL
);
REVOKE INSERT ON trail_entries, trail_unsealed, trail_links, trail_heads FROM lagmark_web, lagmark_worker;
GRANT INSERT ON trail_links, trail_heads TO lagmark_worker;
GRANT DELETE ON trail_unsealed TO lagmark_worker;

-- The row as text, in UTC so that the same row always gives the same hash. Empty columns are left out: a column that a later
-- step adds does not change the hash of the rows that were there before it.
CREATE FUNCTION row_sha256(content jsonb) RETURNS text LANGUAGE sql IMMUTABLE
  RETURN (SELECT encode(sha256(convert_to(coalesce(jsonb_object_agg(f.key, f.value), '{}')::text, 'UTF8')), 'hex')
          FROM jsonb_each(content) f WHERE f.value <> 'null'::jsonb);

CREATE FUNCTION write_trail() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp SET timezone = 'UTC' AS $$
DECLARE
  content jsonb := to_jsonb(NEW);
  entry bigint;
BEGIN
  INSERT INTO trail_entries (act, actor_id, employer_id, subject_table, subject_key, row_sha256)
  VALUES (
    TG_TABLE_NAME || CASE TG_OP WHEN 'INSERT' THEN ' added' ELSE ' changed' END,
    nullif(current_setting('lagmark.actor', true), '')::uuid,
    coalesce((content->>'employer_id')::uuid, nullif(current_setting('lagmark.employer', true), '')::uuid),
    TG_TABLE_NAME,
    coalesce(content->>'id', content->>'case_id', (content->>'release_id') || '/' || (content->>'person_id') || '/' || (content->>'part')),
    row_sha256(content)
  ) RETURNING id INTO entry;
  INSERT INTO trail_unsealed VALUES (entry);
  RETURN NULL;
END $$;

CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION '% is a table of records: a row is followed, never changed', TG_TABLE_NAME
    USING CONSTRAINT = 'records_are_kept', ERRCODE = 'check_violation';
END $$;

${[...RECORDS, "trail_entries", "trail_links", "trail_heads"]
  .map(
    (table) =>
      `CREATE TRIGGER ${table}_kept BEFORE UPDATE OR DELETE ON ${table} FOR EACH ROW EXECUTE FUNCTION refuse_change();`,
  )
  .join("\n")}
${RECORDS.map((table) => `CREATE TRIGGER ${table}_trail AFTER INSERT ON ${table} FOR EACH ROW EXECUTE FUNCTION write_trail();`).join("\n")}
${CHANGING.map((table) => `CREATE TRIGGER ${table}_trail AFTER INSERT OR UPDATE ON ${table} FOR EACH ROW EXECUTE FUNCTION write_trail();`).join("\n")}
`;
const down = `
${[...RECORDS, ...CHANGING].map((table) => `DROP TRIGGER ${table}_trail ON ${table};`).join("\n")}
${RECORDS.map((table) => `DROP TRIGGER ${table}_kept ON ${table};`).join("\n")}
DROP TABLE trail_heads, trail_links, trail_unsealed, trail_entries;
DROP FUNCTION write_trail();
DROP FUNCTION refuse_change();
DROP FUNCTION row_sha256(jsonb);
`;

module.exports = { up: (q) => q.sequelize.query(up), down: (q) => q.sequelize.query(down) };
