import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Products and their lots, dose lines and who confirmed them. */
export class Formulary1764600000012 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE products (
        id uuid CONSTRAINT pk_products PRIMARY KEY,
        agent text NOT NULL,
        product_name text NOT NULL CONSTRAINT ck_products_name CHECK (length(trim(product_name)) > 0),
        form text NOT NULL CONSTRAINT ck_products_form CHECK (form IN ('liquid', 'powder', 'crystals')),
        strength_entered_value numeric NOT NULL CONSTRAINT ck_products_strength CHECK (strength_entered_value > 0),
        strength_entered_unit text NOT NULL,
        strength_basis text NOT NULL,
        density_g_per_ml double precision CONSTRAINT ck_products_density CHECK (density_g_per_ml > 0),
        in_use boolean NOT NULL,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid CONSTRAINT fk_products_recorded_by REFERENCES people (id),
        version integer NOT NULL DEFAULT 1
      )`)
    await q.query(`CREATE INDEX ix_products_agent ON products (agent)`)

    await q.query(`
      CREATE TABLE product_lots (
        id uuid CONSTRAINT pk_product_lots PRIMARY KEY,
        product_id uuid NOT NULL CONSTRAINT fk_product_lots_product REFERENCES products (id),
        lot_number text NOT NULL,
        expires_on date NOT NULL,
        received_on date NOT NULL,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid CONSTRAINT fk_product_lots_recorded_by REFERENCES people (id),
        CONSTRAINT uq_product_lots_number UNIQUE (product_id, lot_number)
      )`)

    await q.query(`
      CREATE TABLE lot_events (
        id uuid CONSTRAINT pk_lot_events PRIMARY KEY,
        lot_id uuid NOT NULL CONSTRAINT fk_lot_events_lot REFERENCES product_lots (id),
        kind text NOT NULL CONSTRAINT ck_lot_events_kind
          CHECK (kind IN ('recalled', 'set-aside', 'stored-cold', 'precipitate', 'returned-to-use', 'used-up')),
        happened_at timestamptz NOT NULL,
        happened_on date NOT NULL,
        note text,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid CONSTRAINT fk_lot_events_recorded_by REFERENCES people (id)
      )`)
    await q.query(`CREATE INDEX ix_lot_events_lot ON lot_events (lot_id, happened_at)`)

    await q.query(`
      CREATE TABLE dose_lines (
        id uuid CONSTRAINT pk_dose_lines PRIMARY KEY,
        agent text NOT NULL,
        use text NOT NULL,
        low double precision,
        high double precision NOT NULL,
        unit text NOT NULL,
        basis text NOT NULL,
        longest_contact_minutes double precision,
        water text NOT NULL CONSTRAINT ck_dose_lines_water CHECK (water IN ('fresh', 'marine', 'both')),
        source text NOT NULL,
        mark text NOT NULL,
        reason text,
        supersedes_id uuid CONSTRAINT fk_dose_lines_supersedes REFERENCES dose_lines (id)
          CONSTRAINT uq_dose_lines_supersedes UNIQUE,
        proposed_at timestamptz NOT NULL,
        proposed_by uuid CONSTRAINT fk_dose_lines_proposed_by REFERENCES people (id),
        CONSTRAINT ck_dose_lines_range CHECK (high > 0 AND (low IS NULL OR (low > 0 AND low <= high)))
      )`)

    await q.query(`
      CREATE TABLE dose_line_confirmations (
        id uuid CONSTRAINT pk_dose_line_confirmations PRIMARY KEY,
        dose_line_id uuid NOT NULL CONSTRAINT fk_dose_line_confirmations_line REFERENCES dose_lines (id)
          CONSTRAINT uq_dose_line_confirmations_line UNIQUE,
        confirmed_at timestamptz NOT NULL,
        confirmed_by uuid NOT NULL CONSTRAINT fk_dose_line_confirmations_by REFERENCES people (id),
        reason text
      )`)

    await q.query(`GRANT UPDATE ON products TO pratique_app`)
  }

  async down(): Promise<void> {
    throw new Error('A landed migration is never taken back; add another one.')
  }
}
