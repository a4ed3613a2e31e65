// Where each case stands follows from which later rows exist; written once here so that no two queries disagree.
const up = `
CREATE VIEW case_states AS
SELECT c.id, c.sitting_id, c.check_id, c.kind, c.kind_version, c.number, c.requested_at,
       v.opened_at, v.ends_at, h.handed_in_at, h.by_clock, m.id AS record_id, m.met, m.marked_at,
       CASE WHEN m.id IS NOT NULL THEN 'marked' WHEN h.case_id IS NOT NULL THEN 'handed in'
            WHEN v.case_id IS NOT NULL THEN 'open' ELSE 'building' END AS state
FROM cases c
LEFT JOIN case_views v ON v.case_id = c.id
LEFT JOIN hand_ins h ON h.case_id = c.id
LEFT JOIN LATERAL (SELECT r.id, r.met, r.marked_at FROM marking_records r WHERE r.case_id = c.id ORDER BY r.sequence DESC LIMIT 1) m ON true;

CREATE VIEW certificate_standings AS
SELECT c.id AS certificate_id, s.standing, s.ground, s.reason, s.set_by, s.set_at, s.sequence
FROM certificates c
JOIN LATERAL (SELECT * FROM standings s WHERE s.certificate_id = c.id ORDER BY s.sequence DESC LIMIT 1) s ON true;
`;
const down = `DROP VIEW certificate_standings; DROP VIEW case_states;`;

module.exports = { up: (q) => q.sequelize.query(up), down: (q) => q.sequelize.query(down) };
