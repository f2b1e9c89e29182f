import type { Migration } from "#server/database/migrate.ts";

/** Carts, orders, payments and what Stripe told us. Every invariant that money hangs on is a constraint here. */
export const up: Migration = async ({ context: sequelize }) => {
  await sequelize.query(`
    CREATE TABLE carts (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      person_id uuid REFERENCES people (id),
      closed_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE UNIQUE INDEX carts_one_open_per_person ON carts (person_id) WHERE closed_at IS NULL AND person_id IS NOT NULL;

    CREATE TABLE cart_lines (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      cart_id uuid NOT NULL REFERENCES carts (id) ON DELETE CASCADE,
      spec_code text NOT NULL,
      numbers jsonb NOT NULL DEFAULT '{}',
      engraving text NOT NULL DEFAULT '' CHECK (char_length(engraving) <= 12),
      special_request text NOT NULL DEFAULT '' CHECK (char_length(special_request) <= 500),
      quantity integer NOT NULL CHECK (quantity BETWEEN 1 AND 20),
      price_cents integer NOT NULL CHECK (price_cents >= 0),
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX cart_lines_by_cart ON cart_lines (cart_id, created_at);

    CREATE TABLE orders (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      number text NOT NULL UNIQUE CHECK (number ~ '^[0-9A-HJKMNP-TV-Z]{4}-[0-9A-HJKMNP-TV-Z]{4}$'),
      cart_id uuid NOT NULL REFERENCES carts (id),
      person_id uuid REFERENCES people (id),
      state text NOT NULL CHECK (state IN ('awaiting-payment', 'placed', 'accepted', 'in-work', 'ready', 'part-shipped',
        'shipped', 'delivered', 'on-hold', 'declined', 'cancelled')),
      contact_name text NOT NULL,
      contact_email text NOT NULL,
      contact_phone text NOT NULL CHECK (contact_phone ~ '^\\+1[2-9][0-9]{2}[2-9][0-9]{6}$'),
      delivery_method text NOT NULL CHECK (delivery_method IN ('pick-up', 'freight')),
      delivery_address jsonb,
      catalogue_version integer NOT NULL REFERENCES catalogue_versions (version),
      price_list_version integer NOT NULL REFERENCES price_list_versions (version),
      currency char(3) NOT NULL CHECK (currency = 'USD'),
      goods_cents integer NOT NULL CHECK (goods_cents >= 0),
      freight_cents integer NOT NULL CHECK (freight_cents >= 0),
      tax_cents integer NOT NULL CHECK (tax_cents >= 0),
      total_cents integer NOT NULL CHECK (total_cents > 0),
      tax_label text NOT NULL,
      tax_calculation text NOT NULL,
      content_hash text NOT NULL,
      search_text text NOT NULL DEFAULT '',
      estimated_ship_on date NOT NULL,
      promised_ship_on date,
      decline_reason text,
      placed_at timestamptz,
      opened_by uuid REFERENCES people (id),
      opened_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      CONSTRAINT orders_total_adds_up CHECK (total_cents = goods_cents + freight_cents + tax_cents),
      CONSTRAINT orders_freight_has_address CHECK ((delivery_method = 'freight') = (delivery_address IS NOT NULL)),
      CONSTRAINT orders_pick_up_costs_nothing CHECK (delivery_method = 'freight' OR freight_cents = 0),
      CONSTRAINT orders_placed_has_time CHECK (state IN ('awaiting-payment', 'cancelled') OR placed_at IS NOT NULL),
      CONSTRAINT orders_accepted_has_promise CHECK (
        state NOT IN ('accepted', 'in-work', 'ready', 'part-shipped', 'shipped', 'delivered') OR promised_ship_on IS NOT NULL),
      CONSTRAINT orders_declined_has_reason CHECK (state <> 'declined' OR decline_reason IS NOT NULL),
      CONSTRAINT orders_opened_whole CHECK ((opened_by IS NULL) = (opened_at IS NULL))
    );
    CREATE INDEX orders_by_state ON orders (state, placed_at, id);
    CREATE INDEX orders_by_person ON orders (person_id, placed_at DESC);
    CREATE INDEX orders_by_email ON orders (lower(contact_email), placed_at DESC);
    CREATE INDEX orders_by_cart ON orders (cart_id);
    CREATE UNIQUE INDEX orders_one_awaiting_per_cart ON orders (cart_id) WHERE state = 'awaiting-payment';

    CREATE TABLE order_lines (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      order_id uuid NOT NULL REFERENCES orders (id),
      position integer NOT NULL CHECK (position >= 1),
      spec_code text NOT NULL,
      numbers jsonb NOT NULL,
      engraving text NOT NULL CHECK (char_length(engraving) <= 12),
      special_request text NOT NULL CHECK (char_length(special_request) <= 500),
      special_request_answer text NOT NULL DEFAULT '' CHECK (char_length(special_request_answer) <= 500),
      quantity integer NOT NULL CHECK (quantity BETWEEN 1 AND 20),
      unit_cents integer NOT NULL CHECK (unit_cents >= 0),
      total_cents integer NOT NULL,
      build jsonb NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (order_id, position),
      CONSTRAINT order_lines_total_adds_up CHECK (total_cents = quantity * unit_cents)
    );

    CREATE TABLE order_history (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      order_id uuid NOT NULL REFERENCES orders (id),
      sequence bigint GENERATED ALWAYS AS IDENTITY,
      at timestamptz NOT NULL DEFAULT clock_timestamp(),
      state text NOT NULL,
      text text NOT NULL,
      person_id uuid REFERENCES people (id)
    );
    CREATE INDEX order_history_by_order ON order_history (order_id, sequence);

    CREATE TABLE payments (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      order_id uuid NOT NULL REFERENCES orders (id),
      cart_id uuid NOT NULL REFERENCES carts (id),
      state text NOT NULL CHECK (state IN ('opening', 'open', 'paid', 'expired', 'surplus')),
      amount_cents integer NOT NULL CHECK (amount_cents > 0),
      currency char(3) NOT NULL CHECK (currency = 'USD'),
      checkout_session text UNIQUE,
      payment_intent text UNIQUE,
      url text,
      expires_at timestamptz NOT NULL,
      paid_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      CONSTRAINT payments_open_has_session CHECK (state NOT IN ('open', 'paid', 'surplus') OR checkout_session IS NOT NULL),
      CONSTRAINT payments_paid_has_intent CHECK (state NOT IN ('paid', 'surplus') OR (payment_intent IS NOT NULL AND paid_at IS NOT NULL))
    );
    CREATE INDEX payments_by_order ON payments (order_id);
    CREATE UNIQUE INDEX payments_one_open_per_cart ON payments (cart_id) WHERE state IN ('opening', 'open');
    CREATE UNIQUE INDEX payments_one_paid_per_cart ON payments (cart_id) WHERE state = 'paid';

    CREATE TABLE refunds (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      payment_id uuid NOT NULL REFERENCES payments (id),
      amount_cents integer NOT NULL CHECK (amount_cents > 0),
      reason text NOT NULL CHECK (reason IN ('declined', 'paid-twice')),
      state text NOT NULL CHECK (state IN ('requested', 'pending', 'succeeded', 'failed')),
      stripe_refund text UNIQUE,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX refunds_by_payment ON refunds (payment_id);

    CREATE TABLE stripe_events (
      id text PRIMARY KEY,
      kind text NOT NULL,
      outcome text NOT NULL,
      payment_id uuid REFERENCES payments (id),
      received_at timestamptz NOT NULL DEFAULT now()
    );

    ALTER TABLE access_tokens ADD CONSTRAINT access_tokens_order FOREIGN KEY (order_id) REFERENCES orders (id);
    ALTER TABLE emails ADD CONSTRAINT emails_order FOREIGN KEY (order_id) REFERENCES orders (id);
    CREATE INDEX IF NOT EXISTS emails_by_order ON emails (order_id);

    CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
      BEGIN
        RAISE EXCEPTION 'rows of % are never changed or deleted', TG_TABLE_NAME USING ERRCODE = 'restrict_violation';
      END
    $$;
    CREATE TRIGGER order_history_is_append_only BEFORE UPDATE OR DELETE ON order_history
      FOR EACH ROW EXECUTE FUNCTION refuse_change();

    CREATE FUNCTION refund_within_payment() RETURNS trigger LANGUAGE plpgsql AS $$
      DECLARE captured integer; returned bigint;
      BEGIN
        SELECT amount_cents INTO captured FROM payments
          WHERE id = NEW.payment_id AND state IN ('paid', 'surplus') FOR UPDATE;
        IF captured IS NULL THEN
          RAISE EXCEPTION 'payment % was never taken', NEW.payment_id USING ERRCODE = 'check_violation';
        END IF;
        SELECT coalesce(sum(amount_cents), 0) INTO returned FROM refunds
          WHERE payment_id = NEW.payment_id AND state <> 'failed' AND id <> NEW.id;
        IF NEW.state <> 'failed' AND returned + NEW.amount_cents > captured THEN
          RAISE EXCEPTION 'refunds of payment % exceed what was captured', NEW.payment_id USING ERRCODE = 'check_violation';
        END IF;
        RETURN NEW;
      END
    $$;
    CREATE TRIGGER refunds_within_payment BEFORE INSERT OR UPDATE ON refunds
      FOR EACH ROW EXECUTE FUNCTION refund_within_payment();
  `);
};
