// A hand-in that a person judges: the marking record says who. The web process may add such records and no other; who sat
// the case never judges it.
const up = `
ALTER TABLE marking_records ADD COLUMN judged_by uuid REFERENCES people;
COMMENT ON COLUMN marking_records.judged_by IS 'the assessor, where no machine marks; empty otherwise';
GRANT INSERT ON marking_records TO lagmark_web;

CREATE FUNCTION marking_record_hand() RETURNS trigger LANGUAGE plpgsql SET search_path = public, pg_temp AS $$
DECLARE
  judged boolean;
  technician uuid;
  employer uuid;
BEGIN
  SELECT c.kind = 'written', s.technician_id, s.employer_id INTO judged, technician, employer
  FROM cases c JOIN sittings s ON s.id = c.sitting_id WHERE c.id = NEW.case_id;
  IF judged IS DISTINCT FROM (NEW.judged_by IS NOT NULL) OR (NEW.judged_by IS NULL AND current_user = 'lagmark_web')
    THEN RAISE EXCEPTION 'a written case is judged by a person, any other marked by the worker'
      USING CONSTRAINT = 'marking_records_hand', ERRCODE = 'check_violation'; END IF;
  IF NEW.judged_by = technician OR (NEW.judged_by IS NOT NULL AND NOT EXISTS (
      SELECT 1 FROM role_grants g WHERE g.person_id = NEW.judged_by AND g.employer_id = employer AND g.role = 'assessor' AND g.ended_at IS NULL))
    THEN RAISE EXCEPTION 'only an assessor of the employer who did not sit the case judges it'
      USING CONSTRAINT = 'marking_records_judge', ERRCODE = 'check_violation'; END IF;
  RETURN NEW;
END $$;
CREATE TRIGGER marking_records_hand BEFORE INSERT ON marking_records FOR EACH ROW EXECUTE FUNCTION marking_record_hand();
`;
const down = `
DROP TRIGGER marking_records_hand ON marking_records;
DROP FUNCTION marking_record_hand();
REVOKE INSERT ON marking_records FROM lagmark_web;
ALTER TABLE marking_records DROP COLUMN judged_by;
`;

module.exports = { up: (q) => q.sequelize.query(up), down: (q) => q.sequelize.query(down) };
