import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Treatment orders, their signed versions, holds, doses and second calculations. */
export class Orders1764600000013 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE orders (
        id uuid CONSTRAINT pk_orders PRIMARY KEY,
        number text NOT NULL CONSTRAINT uq_orders_number UNIQUE,
        enclosure_id uuid NOT NULL CONSTRAINT fk_orders_enclosure REFERENCES enclosures (id),
        stage text NOT NULL CONSTRAINT ck_orders_stage CHECK (stage IN ('draft', 'proposed', 'none')),
        draft_text text,
        created_at timestamptz NOT NULL,
        created_by uuid CONSTRAINT fk_orders_created_by REFERENCES people (id),
        changed_at timestamptz NOT NULL,
        changed_by uuid CONSTRAINT fk_orders_changed_by REFERENCES people (id),
        version integer NOT NULL DEFAULT 1,
        CONSTRAINT ck_orders_draft CHECK ((stage = 'none') = (draft_text IS NULL))
      )`)
    await q.query(`CREATE INDEX ix_orders_enclosure ON orders (enclosure_id)`)

    await q.query(`
      CREATE TABLE order_versions (
        id uuid CONSTRAINT pk_order_versions PRIMARY KEY,
        order_id uuid NOT NULL CONSTRAINT fk_order_versions_order REFERENCES orders (id),
        version_no integer NOT NULL CONSTRAINT ck_order_versions_no CHECK (version_no > 0),
        signed_text_id uuid NOT NULL CONSTRAINT fk_order_versions_text REFERENCES signed_texts (id)
          CONSTRAINT uq_order_versions_text UNIQUE,
        agent text NOT NULL,
        product_id uuid NOT NULL CONSTRAINT fk_order_versions_product REFERENCES products (id),
        lot_id uuid CONSTRAINT fk_order_versions_lot REFERENCES product_lots (id),
        enclosure_id uuid NOT NULL CONSTRAINT fk_order_versions_enclosure REFERENCES enclosures (id),
        determination_id uuid NOT NULL CONSTRAINT fk_order_versions_determination REFERENCES volume_determinations (id),
        net_volume_litres double precision NOT NULL,
        allowed_drift_percent double precision NOT NULL,
        amount_entered_value numeric NOT NULL,
        amount_entered_unit text NOT NULL,
        target_mg_per_l double precision,
        doses integer NOT NULL CONSTRAINT ck_order_versions_doses CHECK (doses > 0),
        interval_hours double precision CONSTRAINT ck_order_versions_interval CHECK (interval_hours > 0),
        contact_minutes double precision,
        starts_at timestamptz NOT NULL,
        signed_at timestamptz NOT NULL,
        signed_by uuid NOT NULL CONSTRAINT fk_order_versions_signed_by REFERENCES people (id),
        CONSTRAINT uq_order_versions_no UNIQUE (order_id, version_no)
      )`)
    await q.query(`CREATE INDEX ix_order_versions_agent ON order_versions (agent, starts_at)`)

    await q.query(`
      CREATE TABLE order_version_animals (
        order_version_id uuid NOT NULL CONSTRAINT fk_order_version_animals_version REFERENCES order_versions (id),
        animal_id uuid NOT NULL CONSTRAINT fk_order_version_animals_animal REFERENCES animals (id),
        taxon_id uuid NOT NULL CONSTRAINT fk_order_version_animals_taxon REFERENCES taxa (id),
        CONSTRAINT pk_order_version_animals PRIMARY KEY (order_version_id, animal_id)
      )`)
    await q.query(`CREATE INDEX ix_order_version_animals_animal ON order_version_animals (animal_id)`)

    await q.query(`
      CREATE TABLE order_events (
        id uuid CONSTRAINT pk_order_events PRIMARY KEY,
        order_id uuid NOT NULL CONSTRAINT fk_order_events_order REFERENCES orders (id),
        kind text NOT NULL CONSTRAINT ck_order_events_kind CHECK (kind IN ('held', 'hold-lifted', 'discontinued')),
        reason text,
        happened_at timestamptz NOT NULL,
        happened_on date NOT NULL,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid CONSTRAINT fk_order_events_recorded_by REFERENCES people (id)
      )`)
    await q.query(`CREATE INDEX ix_order_events_order ON order_events (order_id, happened_at)`)

    await q.query(`
      CREATE TABLE dose_calculations (
        id uuid CONSTRAINT pk_dose_calculations PRIMARY KEY,
        order_version_id uuid NOT NULL CONSTRAINT fk_dose_calculations_version REFERENCES order_versions (id),
        dose_key text NOT NULL,
        part text NOT NULL CONSTRAINT ck_dose_calculations_part CHECK (part IN ('first', 'second')),
        enclosure_read text,
        mark_read text,
        lot_read text,
        lot_id uuid CONSTRAINT fk_dose_calculations_lot REFERENCES product_lots (id),
        strength_entered_value numeric,
        strength_entered_unit text,
        amount_entered_value numeric NOT NULL CONSTRAINT ck_dose_calculations_amount CHECK (amount_entered_value > 0),
        amount_entered_unit text NOT NULL,
        net_volume_litres double precision,
        agrees boolean,
        difference_percent double precision,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid NOT NULL CONSTRAINT fk_dose_calculations_recorded_by REFERENCES people (id)
      )`)
    await q.query(
      `CREATE INDEX ix_dose_calculations_dose ON dose_calculations (order_version_id, dose_key, recorded_at)`,
    )

    await q.query(`
      CREATE TABLE doses (
        id uuid CONSTRAINT pk_doses PRIMARY KEY,
        order_version_id uuid NOT NULL CONSTRAINT fk_doses_version REFERENCES order_versions (id),
        dose_key text NOT NULL,
        kind text NOT NULL CONSTRAINT ck_doses_kind CHECK (kind IN ('given', 'recorded', 'withheld', 'refused')),
        lot_id uuid CONSTRAINT fk_doses_lot REFERENCES product_lots (id),
        amount_entered_value numeric,
        amount_entered_unit text,
        given_mg_per_l double precision,
        second_calculation_id uuid CONSTRAINT fk_doses_second REFERENCES dose_calculations (id),
        note text,
        facts_text text,
        exceptions_text text NOT NULL,
        happened_at timestamptz NOT NULL,
        happened_on date NOT NULL,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid NOT NULL CONSTRAINT fk_doses_recorded_by REFERENCES people (id),
        CONSTRAINT ck_doses_amount CHECK (kind NOT IN ('given', 'recorded') OR amount_entered_value > 0)
      )`)
    await q.query(`CREATE INDEX ix_doses_version ON doses (order_version_id, dose_key, happened_at)`)
    await q.query(`CREATE INDEX ix_doses_happened ON doses (happened_at)`)

    await q.query(`
      CREATE TABLE bath_stops (
        id uuid CONSTRAINT pk_bath_stops PRIMARY KEY,
        dose_id uuid NOT NULL CONSTRAINT fk_bath_stops_dose REFERENCES doses (id),
        cause text NOT NULL CONSTRAINT ck_bath_stops_cause CHECK (cause IN ('time-up', 'stopped')),
        seen text,
        rescue text,
        happened_at timestamptz NOT NULL,
        happened_on date NOT NULL,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid NOT NULL CONSTRAINT fk_bath_stops_recorded_by REFERENCES people (id)
      )`)
    await q.query(`CREATE INDEX ix_bath_stops_dose ON bath_stops (dose_id, happened_at)`)

    await q.query(`
      CREATE TABLE agent_experience (
        id uuid CONSTRAINT pk_agent_experience PRIMARY KEY,
        agent text NOT NULL,
        taxon_id uuid NOT NULL CONSTRAINT fk_agent_experience_taxon REFERENCES taxa (id),
        order_version_id uuid CONSTRAINT fk_agent_experience_version REFERENCES order_versions (id),
        declared_at timestamptz NOT NULL,
        declared_by uuid NOT NULL CONSTRAINT fk_agent_experience_by REFERENCES people (id)
      )`)
    await q.query(`CREATE INDEX ix_agent_experience_agent ON agent_experience (agent, taxon_id)`)

    await q.query(`GRANT UPDATE ON orders TO pratique_app`)
  }

  async down(): Promise<void> {
    throw new Error('A landed migration is never taken back; add another one.')
  }
}
