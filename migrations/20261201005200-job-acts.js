// What the operator does about a job that was tried as often as it may be. The queue's own row is left as it failed; to try
// again is a job of its own.
const up = `
CREATE TABLE job_acts (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  job_id uuid NOT NULL UNIQUE,
  job text NOT NULL,
  act text NOT NULL CHECK (act IN ('try again', 'leave')),
  reason text NOT NULL DEFAULT '' CHECK (length(reason) <= 1000),
  acted_by uuid NOT NULL REFERENCES people,
  acted_at timestamptz NOT NULL,
  CHECK (act = 'try again' OR reason <> '')
);
CREATE TRIGGER job_acts_kept BEFORE UPDATE OR DELETE ON job_acts FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER job_acts_trail AFTER INSERT ON job_acts FOR EACH ROW EXECUTE FUNCTION write_trail();
`;
const down = `DROP TABLE job_acts;`;

module.exports = { up: (q) => q.sequelize.query(up), down: (q) => q.sequelize.query(down) };
