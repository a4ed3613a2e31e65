// Somebody who has met a kind of check as often as it may be met is assigned all the same: why, in the lead's words.
const up = `
ALTER TABLE assignments ADD COLUMN exposure_note text CHECK (length(exposure_note) BETWEEN 1 AND 1000);
COMMENT ON COLUMN assignments.exposure_note IS 'where it stands, the limit on repeat exposure does not hold in the sitting';
`;
const down = `ALTER TABLE assignments DROP COLUMN exposure_note;`;

module.exports = { up: (q) => q.sequelize.query(up), down: (q) => q.sequelize.query(down) };
