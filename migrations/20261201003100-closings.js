// sitting -> closing: the last day passed before the sitting was decided. One row a sitting, so that it is told once.
const up = `
CREATE TABLE closings (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  sitting_id uuid NOT NULL UNIQUE REFERENCES sittings,
  unfinished boolean NOT NULL,
  closed_at timestamptz NOT NULL
);
REVOKE INSERT ON closings FROM lagmark_web;
COMMENT ON COLUMN closings.unfinished IS 'a check had no marking record, or one not met had a fresh case left';
CREATE TRIGGER closings_kept BEFORE UPDATE OR DELETE ON closings FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER closings_trail AFTER INSERT ON closings FOR EACH ROW EXECUTE FUNCTION write_trail();
`;
const down = `DROP TABLE closings;`;

module.exports = { up: (q) => q.sequelize.query(up), down: (q) => q.sequelize.query(down) };
