import type { Migration } from "#server/database/migrate.ts";

/** People and their sessions, the immutable catalogue and price-list documents, the shop's settings, e-mails. */
export const up: Migration = async ({ context: sequelize }) => {
  await sequelize.query(`
    CREATE TABLE people (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      name text NOT NULL CHECK (char_length(name) BETWEEN 1 AND 100),
      email text NOT NULL CHECK (char_length(email) BETWEEN 3 AND 254),
      password_hash text NOT NULL CHECK (password_hash LIKE '$argon2id$%'),
      role text NOT NULL CHECK (role IN ('customer', 'dealer', 'planner', 'floor', 'office')),
      email_verified_at timestamptz,
      disabled_at timestamptz,
      -- Sessions that began before this moment are over.
      sessions_valid_from timestamptz NOT NULL DEFAULT 'epoch',
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE UNIQUE INDEX people_email ON people (lower(email));

    CREATE TABLE sessions (
      sid text PRIMARY KEY,
      person_id uuid REFERENCES people (id) ON DELETE CASCADE,
      data text NOT NULL,
      expires timestamptz NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX sessions_by_person ON sessions (person_id) WHERE person_id IS NOT NULL;
    CREATE INDEX sessions_by_end ON sessions (expires);

    CREATE TABLE access_tokens (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      purpose text NOT NULL CHECK (purpose IN ('verify-email', 'reset-password', 'order-link')),
      token_hash text NOT NULL UNIQUE CHECK (token_hash ~ '^[0-9a-f]{64}$'),
      person_id uuid REFERENCES people (id) ON DELETE CASCADE,
      order_id uuid,
      expires_at timestamptz,
      used_at timestamptz,
      revoked_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now(),
      CONSTRAINT access_tokens_one_subject CHECK ((person_id IS NULL) <> (order_id IS NULL)),
      CONSTRAINT access_tokens_subject_fits CHECK ((purpose = 'order-link') = (order_id IS NOT NULL)),
      -- A link to an order ends 90 days after delivery, which is not known when it is made.
      CONSTRAINT access_tokens_end CHECK (purpose = 'order-link' OR expires_at IS NOT NULL)
    );
    CREATE INDEX access_tokens_by_person ON access_tokens (person_id, purpose) WHERE person_id IS NOT NULL;
    CREATE INDEX access_tokens_by_order ON access_tokens (order_id) WHERE order_id IS NOT NULL;

    CREATE TABLE catalogue_versions (
      version integer PRIMARY KEY CHECK (version >= 1),
      document jsonb NOT NULL,
      published_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE TABLE price_list_versions (
      version integer PRIMARY KEY CHECK (version >= 1),
      document jsonb NOT NULL,
      effective_on date NOT NULL
    );
    CREATE INDEX price_list_versions_by_date ON price_list_versions (effective_on, version);
    CREATE FUNCTION refuse_document_change() RETURNS trigger LANGUAGE plpgsql AS $$
      BEGIN
        RAISE EXCEPTION 'a version in % is never changed or deleted', TG_TABLE_NAME USING ERRCODE = 'restrict_violation';
      END
    $$;
    CREATE TRIGGER catalogue_versions_never_change BEFORE UPDATE OR DELETE ON catalogue_versions
      FOR EACH ROW EXECUTE FUNCTION refuse_document_change();
    CREATE TRIGGER price_list_versions_never_change BEFORE UPDATE OR DELETE ON price_list_versions
      FOR EACH ROW EXECUTE FUNCTION refuse_document_change();

    CREATE TABLE shop_settings (
      single_row boolean PRIMARY KEY DEFAULT true CHECK (single_row),
      name text NOT NULL CHECK (char_length(name) BETWEEN 1 AND 100),
      email text NOT NULL,
      phone text NOT NULL CHECK (phone ~ '^\\+1[2-9][0-9]{2}[2-9][0-9]{6}$'),
      address jsonb NOT NULL,
      time_zone text NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );

    CREATE TABLE emails (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      kind text NOT NULL,
      to_address text NOT NULL CHECK (to_address !~ '[[:cntrl:]]'),
      to_name text NOT NULL CHECK (to_name !~ '[[:cntrl:]]'),
      data jsonb NOT NULL,
      order_id uuid,
      person_id uuid REFERENCES people (id) ON DELETE SET NULL,
      state text NOT NULL DEFAULT 'waiting' CHECK (state IN ('waiting', 'sent')),
      message_id text NOT NULL UNIQUE,
      event_key text NOT NULL UNIQUE,
      attempts integer NOT NULL DEFAULT 0 CHECK (attempts >= 0),
      last_error text,
      created_at timestamptz NOT NULL DEFAULT now(),
      sent_at timestamptz,
      CONSTRAINT emails_sent_has_time CHECK (state <> 'sent' OR sent_at IS NOT NULL)
    );
    CREATE INDEX emails_newest_first ON emails (created_at DESC, id DESC);
    CREATE INDEX emails_waiting ON emails (created_at DESC, id DESC) WHERE state = 'waiting';

    CREATE TABLE rate_limits (
      key varchar(255) PRIMARY KEY,
      points integer NOT NULL DEFAULT 0,
      expire bigint
    );
    CREATE INDEX rate_limits_by_end ON rate_limits (expire);
  `);
};
