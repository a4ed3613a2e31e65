// Records of verifications that somebody asked to keep. The web process notes that one is wanted, the worker, who has the
// issuer's key, reads the register and signs what it says. No part of the chain: anybody may ask, the file proves itself,
// and the worker removes the row after a day. Nothing is kept of who asked.
const up = `
CREATE TABLE verifications (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  certificate_id uuid NOT NULL REFERENCES certificates,
  file_sha256 text CHECK (file_sha256 ~ '^[0-9a-f]{64}$'),
  asked_at timestamptz NOT NULL,
  pdf bytea,
  signed_at timestamptz,
  CHECK ((pdf IS NULL) = (signed_at IS NULL))
);
CREATE INDEX verifications_by_age ON verifications (asked_at);
COMMENT ON COLUMN verifications.file_sha256 IS 'of the file that was held against the register; empty when none was';
REVOKE INSERT ON verifications FROM lagmark_web, lagmark_worker;
GRANT INSERT (certificate_id, file_sha256, asked_at) ON verifications TO lagmark_web;
GRANT UPDATE (pdf, signed_at), DELETE ON verifications TO lagmark_worker;
`;
const down = `DROP TABLE verifications;`;

module.exports = { up: (q) => q.sequelize.query(up), down: (q) => q.sequelize.query(down) };
