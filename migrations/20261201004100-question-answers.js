// question -> answer: what an assessor says of a quantity that was questioned. One answer a question, read by both sides.
const up = `
CREATE TABLE question_answers (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  question_id uuid NOT NULL UNIQUE REFERENCES questions,
  words text NOT NULL CHECK (length(words) BETWEEN 1 AND 2000),
  answered_by uuid NOT NULL REFERENCES people,
  answered_at timestamptz NOT NULL DEFAULT now()
);
CREATE TRIGGER question_answers_kept BEFORE UPDATE OR DELETE ON question_answers FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER question_answers_trail AFTER INSERT ON question_answers FOR EACH ROW EXECUTE FUNCTION write_trail();
`;
const down = `DROP TABLE question_answers;`;

module.exports = { up: (q) => q.sequelize.query(up), down: (q) => q.sequelize.query(down) };
