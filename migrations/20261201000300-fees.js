// One fee per sitting, due from the assignment on, the same whatever the outcome. One order may pay several fees.
const up = `
CREATE TABLE orders (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  employer_id uuid NOT NULL REFERENCES employers,
  amount_minor integer NOT NULL CHECK (amount_minor > 0),
  currency text NOT NULL CHECK (currency ~ '^[a-z]{3}$'),
  ordered_by uuid NOT NULL REFERENCES people,
  ordered_at timestamptz NOT NULL DEFAULT now(),
  checkout_session_id text UNIQUE,
  checkout_url text,
  paid_at timestamptz,
  closed_at timestamptz,
  CHECK (paid_at IS NULL OR closed_at IS NULL)
);
CREATE INDEX orders_by_employer ON orders (employer_id, ordered_at);
GRANT UPDATE (checkout_session_id, checkout_url, paid_at, closed_at) ON orders TO lagmark_web;
COMMENT ON COLUMN orders.closed_at IS 'abandoned: the hosted page expired or was left; its fees may be ordered again';

CREATE TABLE fees (
  id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
  assignment_id uuid NOT NULL UNIQUE REFERENCES assignments,
  employer_id uuid NOT NULL REFERENCES employers,
  amount_minor integer NOT NULL CHECK (amount_minor > 0),
  currency text NOT NULL CHECK (currency ~ '^[a-z]{3}$'),
  due_at timestamptz NOT NULL DEFAULT now(),
  order_id uuid REFERENCES orders,
  settled_at timestamptz,
  CHECK (settled_at IS NULL OR order_id IS NOT NULL)
);
CREATE INDEX fees_by_employer ON fees (employer_id) WHERE settled_at IS NULL;
GRANT UPDATE (order_id, settled_at) ON fees TO lagmark_web;

CREATE TABLE stripe_events (
  id text PRIMARY KEY,
  type text NOT NULL,
  outcome text NOT NULL DEFAULT '',
  received_at timestamptz NOT NULL DEFAULT now()
);
GRANT UPDATE (outcome) ON stripe_events TO lagmark_web;

-- Paid is paid: neither an order nor a fee goes back to open, whoever asks.
CREATE FUNCTION refuse_unpaying() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  -- A column is named only where the row has it: PL/pgSQL looks up all names of an expression.
  IF TG_TABLE_NAME = 'orders' THEN
    IF OLD.paid_at IS NOT NULL AND NEW.paid_at IS DISTINCT FROM OLD.paid_at
      THEN RAISE EXCEPTION 'order % is paid', OLD.id; END IF;
  ELSIF OLD.settled_at IS NOT NULL
    THEN RAISE EXCEPTION 'fee % is settled', OLD.id; END IF;
  RETURN NEW;
END $$;
CREATE TRIGGER orders_paid_once BEFORE UPDATE ON orders FOR EACH ROW EXECUTE FUNCTION refuse_unpaying();
CREATE TRIGGER fees_settled_once BEFORE UPDATE ON fees FOR EACH ROW EXECUTE FUNCTION refuse_unpaying();
`;
const down = `DROP TABLE stripe_events, fees, orders; DROP FUNCTION refuse_unpaying();`;

module.exports = { up: (q) => q.sequelize.query(up), down: (q) => q.sequelize.query(down) };
