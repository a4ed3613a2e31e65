// A corrected marking is held against the records that an older one made: review -> finding (one a case) -> what the lead
// does about each sitting. A marking again is a marking record that follows, never a change.
const TABLES = ["marking_reviews", "review_findings", "review_acts"];
const up = `
CREATE TABLE marking_reviews (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  employer_id uuid NOT NULL REFERENCES employers,
  kind text NOT NULL,
  kind_version integer NOT NULL,
  marking text NOT NULL,
  reason text NOT NULL CHECK (reason <> ''),
  cases integer NOT NULL CHECK (cases >= 1),
  asked_by uuid NOT NULL REFERENCES people,
  asked_at timestamptz NOT NULL,
  UNIQUE (employer_id, marking)
);
COMMENT ON COLUMN marking_reviews.marking IS 'kind, version and revision of the corrected marking, "false-lock@1.2"';
COMMENT ON COLUMN marking_reviews.cases IS 'how many cases had a record of an older marking when it was asked for';

CREATE TABLE review_findings (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  review_id uuid NOT NULL REFERENCES marking_reviews,
  case_id uuid NOT NULL REFERENCES hand_ins,
  record_id uuid NOT NULL REFERENCES marking_records,
  met_before boolean NOT NULL,
  met boolean NOT NULL,
  changed_rows jsonb NOT NULL,
  marking jsonb NOT NULL,
  engine_version text NOT NULL,
  duration_ms integer NOT NULL,
  found_at timestamptz NOT NULL,
  UNIQUE (review_id, case_id)
);
REVOKE INSERT ON review_findings FROM lagmark_web;
COMMENT ON COLUMN review_findings.record_id IS 'the record it was held against, the newest of its case then';

CREATE TABLE review_acts (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  review_id uuid NOT NULL REFERENCES marking_reviews,
  sitting_id uuid NOT NULL REFERENCES sittings,
  act text NOT NULL CHECK (act IN ('mark again', 'leave')),
  reason text NOT NULL DEFAULT '' CHECK (length(reason) <= 2000),
  acted_by uuid NOT NULL REFERENCES people,
  acted_at timestamptz NOT NULL,
  UNIQUE (review_id, sitting_id),
  CHECK (act = 'mark again' OR reason <> '')
);
${TABLES.map(
  (table) => `
CREATE TRIGGER ${table}_kept BEFORE UPDATE OR DELETE ON ${table} FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER ${table}_trail AFTER INSERT ON ${table} FOR EACH ROW EXECUTE FUNCTION write_trail();`,
).join("")}
`;
const down = `DROP TABLE ${TABLES.toReversed().join(", ")};`;

module.exports = { up: (q) => q.sequelize.query(up), down: (q) => q.sequelize.query(down) };
