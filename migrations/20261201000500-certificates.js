// decision -> certificate -> standing, and the mails that tell people.
const up = `
CREATE TABLE decisions (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  sitting_id uuid NOT NULL UNIQUE REFERENCES sittings,
  outcome text NOT NULL CHECK (outcome IN ('competent', 'not yet competent')),
  reason text NOT NULL CHECK (length(reason) BETWEEN 1 AND 4000),
  declaration text NOT NULL,
  outside_line boolean NOT NULL,
  evidence jsonb NOT NULL,
  evidence_sha256 text NOT NULL CHECK (evidence_sha256 ~ '^[0-9a-f]{64}$'),
  signed_afresh_at timestamptz NOT NULL,
  decided_by uuid NOT NULL REFERENCES people,
  decided_at timestamptz NOT NULL
);

CREATE TABLE certificates (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  number text NOT NULL UNIQUE CHECK (number ~ '^LM-[0-9A-HJKMNP-TV-Z]{5}-[0-9A-HJKMNP-TV-Z]{5}-[0-9A-HJKMNP-TV-Z]$'),
  decision_id uuid NOT NULL UNIQUE REFERENCES decisions,
  sitting_id uuid NOT NULL UNIQUE REFERENCES sittings,
  employer_id uuid NOT NULL REFERENCES employers,
  holder_id uuid NOT NULL REFERENCES people,
  record jsonb NOT NULL,
  record_text text NOT NULL,
  fingerprint text NOT NULL UNIQUE CHECK (fingerprint = encode(sha256(convert_to(record_text, 'UTF8')), 'hex')),
  effective_on date NOT NULL,
  last_day date NOT NULL CHECK (last_day >= effective_on),
  pdf bytea NOT NULL,
  pdf_sha256 text NOT NULL CHECK (pdf_sha256 = encode(sha256(pdf), 'hex')),
  issued_at timestamptz NOT NULL
);
REVOKE INSERT ON certificates FROM lagmark_web;
CREATE INDEX certificates_by_holder ON certificates (holder_id);
CREATE INDEX certificates_by_employer ON certificates (employer_id, issued_at);
GRANT UPDATE (id) ON certificates TO lagmark_web;

CREATE TABLE standings (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  certificate_id uuid NOT NULL REFERENCES certificates,
  sequence integer NOT NULL CHECK (sequence >= 1),
  standing text NOT NULL CHECK (standing IN ('valid', 'suspended', 'withdrawn', 'superseded')),
  ground text NOT NULL,
  reason text NOT NULL DEFAULT '',
  set_by uuid NOT NULL REFERENCES people,
  set_at timestamptz NOT NULL,
  UNIQUE (certificate_id, sequence)
);

CREATE TABLE mails (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  to_email text NOT NULL,
  subject text NOT NULL,
  body text NOT NULL,
  certificate_id uuid REFERENCES certificates,
  written_at timestamptz NOT NULL DEFAULT now(),
  sent_at timestamptz
);
GRANT UPDATE (body, sent_at) ON mails TO lagmark_worker;
COMMENT ON COLUMN mails.body IS 'emptied once sent: a mailed sign-in link must not stay readable';

CREATE FUNCTION certificate_needs_settled_fee() RETURNS trigger LANGUAGE plpgsql SET search_path = public, pg_temp AS $$
BEGIN
  IF NOT EXISTS (SELECT 1 FROM sittings s JOIN fees f ON f.assignment_id = s.assignment_id
                 WHERE s.id = NEW.sitting_id AND f.settled_at IS NOT NULL)
    THEN RAISE EXCEPTION 'the fee of this sitting is open' USING CONSTRAINT = 'certificates_fee_settled', ERRCODE = 'check_violation'; END IF;
  IF NOT EXISTS (SELECT 1 FROM decisions d WHERE d.id = NEW.decision_id AND d.sitting_id = NEW.sitting_id AND d.outcome = 'competent')
    THEN RAISE EXCEPTION 'no decision of competent' USING CONSTRAINT = 'certificates_decided', ERRCODE = 'check_violation'; END IF;
  RETURN NEW;
END $$;
CREATE TRIGGER certificates_fee_settled BEFORE INSERT ON certificates FOR EACH ROW EXECUTE FUNCTION certificate_needs_settled_fee();

-- Withdrawn and superseded are final.
CREATE FUNCTION standing_may_follow() RETURNS trigger LANGUAGE plpgsql SET search_path = public, pg_temp AS $$
BEGIN
  IF EXISTS (SELECT 1 FROM standings s WHERE s.certificate_id = NEW.certificate_id AND s.standing IN ('withdrawn', 'superseded'))
    THEN RAISE EXCEPTION 'this standing is final' USING CONSTRAINT = 'standings_final', ERRCODE = 'check_violation'; END IF;
  IF NEW.sequence <> 1 + (SELECT count(*) FROM standings s WHERE s.certificate_id = NEW.certificate_id)
    THEN RAISE EXCEPTION 'standings follow one another' USING CONSTRAINT = 'standings_in_order', ERRCODE = 'check_violation'; END IF;
  RETURN NEW;
END $$;
CREATE TRIGGER standings_may_follow BEFORE INSERT ON standings FOR EACH ROW EXECUTE FUNCTION standing_may_follow();
`;
const down = `
DROP TABLE mails, standings, certificates, decisions;
DROP FUNCTION standing_may_follow();
DROP FUNCTION certificate_needs_settled_fee();
`;

module.exports = { up: (q) => q.sequelize.query(up), down: (q) => q.sequelize.query(down) };
