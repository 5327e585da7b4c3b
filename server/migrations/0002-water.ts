import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Who recorded a fact, when it happened and when it was written down: the same columns on every ledger here. */
const recorded = (table: string) => `
  happened_at timestamptz NOT NULL,
  happened_on date NOT NULL,
  recorded_at timestamptz NOT NULL,
  recorded_by uuid CONSTRAINT fk_${table}_recorded_by REFERENCES people (id)`

/** Enclosures, the map of their water, readings, water events and volumes. Valves are ledgers, never a column. */
export class Water1764600000002 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE enclosures (
        id uuid CONSTRAINT pk_enclosures PRIMARY KEY,
        code text NOT NULL CONSTRAINT ck_enclosures_code CHECK (code ~ '^[A-Z0-9][A-Z0-9.-]{0,19}$')
          CONSTRAINT uq_enclosures_code UNIQUE,
        name text NOT NULL CONSTRAINT ck_enclosures_name CHECK (length(trim(name)) > 0),
        kind text NOT NULL CONSTRAINT ck_enclosures_kind
          CHECK (kind IN ('tank', 'pool', 'pen', 'tub', 'dip-bucket', 'land-area', 'transport')),
        area text NOT NULL,
        boundary text CONSTRAINT ck_enclosures_boundary CHECK (length(trim(boundary)) > 0),
        air_space text CONSTRAINT ck_enclosures_air_space CHECK (length(trim(air_space)) > 0),
        treatment_vessel boolean NOT NULL,
        fill_mark text,
        fill_mark_entered_value numeric,
        fill_mark_entered_unit text,
        fill_mark_litres double precision CONSTRAINT ck_enclosures_fill_mark_positive CHECK (fill_mark_litres > 0),
        description text,
        in_use_from timestamptz NOT NULL,
        in_use_until timestamptz,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid CONSTRAINT fk_enclosures_recorded_by REFERENCES people (id),
        version integer NOT NULL DEFAULT 1,
        CONSTRAINT ck_enclosures_fill_mark CHECK (NOT treatment_vessel OR fill_mark_litres IS NOT NULL),
        CONSTRAINT ck_enclosures_land CHECK (kind <> 'land-area' OR NOT treatment_vessel),
        CONSTRAINT ck_enclosures_in_use CHECK (in_use_until > in_use_from)
      )`)

    await q.query(`
      CREATE TABLE water_bodies (
        id uuid CONSTRAINT pk_water_bodies PRIMARY KEY,
        code text NOT NULL CONSTRAINT ck_water_bodies_code CHECK (code ~ '^[A-Z0-9][A-Z0-9.-]{0,19}$')
          CONSTRAINT uq_water_bodies_code UNIQUE,
        name text NOT NULL CONSTRAINT ck_water_bodies_name CHECK (length(trim(name)) > 0),
        kind text NOT NULL CONSTRAINT ck_water_bodies_kind CHECK (kind IN ('enclosure', 'sump', 'loop')),
        enclosure_id uuid CONSTRAINT fk_water_bodies_enclosure REFERENCES enclosures (id)
          CONSTRAINT uq_water_bodies_enclosure UNIQUE,
        in_use_from timestamptz NOT NULL,
        in_use_until timestamptz,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid CONSTRAINT fk_water_bodies_recorded_by REFERENCES people (id),
        version integer NOT NULL DEFAULT 1,
        CONSTRAINT ck_water_bodies_enclosure CHECK ((kind = 'enclosure') = (enclosure_id IS NOT NULL)),
        CONSTRAINT ck_water_bodies_in_use CHECK (in_use_until > in_use_from)
      )`)

    await q.query(`
      CREATE TABLE connections (
        id uuid CONSTRAINT pk_connections PRIMARY KEY,
        code text NOT NULL CONSTRAINT ck_connections_code CHECK (code ~ '^[A-Z0-9][A-Z0-9.-]{0,19}$')
          CONSTRAINT uq_connections_code UNIQUE,
        name text NOT NULL CONSTRAINT ck_connections_name CHECK (length(trim(name)) > 0),
        kind text NOT NULL CONSTRAINT ck_connections_kind CHECK (kind IN ('valve', 'pump')),
        from_body_id uuid NOT NULL CONSTRAINT fk_connections_from_body REFERENCES water_bodies (id),
        to_body_id uuid NOT NULL CONSTRAINT fk_connections_to_body REFERENCES water_bodies (id),
        in_use_from timestamptz NOT NULL,
        in_use_until timestamptz,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid CONSTRAINT fk_connections_recorded_by REFERENCES people (id),
        version integer NOT NULL DEFAULT 1,
        CONSTRAINT ck_connections_two_bodies CHECK (from_body_id <> to_body_id),
        CONSTRAINT ck_connections_in_use CHECK (in_use_until > in_use_from)
      )`)
    await q.query(`CREATE INDEX ix_connections_from_body ON connections (from_body_id)`)
    await q.query(`CREATE INDEX ix_connections_to_body ON connections (to_body_id)`)

    await q.query(`
      CREATE TABLE connection_states (
        id uuid CONSTRAINT pk_connection_states PRIMARY KEY,
        connection_id uuid NOT NULL CONSTRAINT fk_connection_states_connection REFERENCES connections (id),
        open boolean NOT NULL,
        note text,
        ${recorded('connection_states')}
      )`)
    await q.query(
      `CREATE INDEX ix_connection_states_newest
         ON connection_states (connection_id, happened_at DESC, recorded_at DESC, id DESC)`,
    )

    await q.query(`
      CREATE TABLE life_support_units (
        id uuid CONSTRAINT pk_life_support_units PRIMARY KEY,
        code text NOT NULL CONSTRAINT ck_life_support_units_code CHECK (code ~ '^[A-Z0-9][A-Z0-9.-]{0,19}$')
          CONSTRAINT uq_life_support_units_code UNIQUE,
        name text NOT NULL CONSTRAINT ck_life_support_units_name CHECK (length(trim(name)) > 0),
        kind text NOT NULL CONSTRAINT ck_life_support_units_kind
          CHECK (kind IN ('filter', 'biofilter', 'foam-fractionator', 'ozone', 'uv', 'carbon', 'heater', 'chiller',
                          'pump', 'aeration')),
        water_body_id uuid NOT NULL CONSTRAINT fk_life_support_units_water_body REFERENCES water_bodies (id),
        in_use_from timestamptz NOT NULL,
        in_use_until timestamptz,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid CONSTRAINT fk_life_support_units_recorded_by REFERENCES people (id),
        version integer NOT NULL DEFAULT 1,
        CONSTRAINT ck_life_support_units_in_use CHECK (in_use_until > in_use_from)
      )`)
    await q.query(`CREATE INDEX ix_life_support_units_water_body ON life_support_units (water_body_id)`)

    // "is_on": ON is a reserved word
    await q.query(`
      CREATE TABLE life_support_states (
        id uuid CONSTRAINT pk_life_support_states PRIMARY KEY,
        unit_id uuid NOT NULL CONSTRAINT fk_life_support_states_unit REFERENCES life_support_units (id),
        is_on boolean NOT NULL,
        note text,
        ${recorded('life_support_states')}
      )`)
    await q.query(
      `CREATE INDEX ix_life_support_states_newest
         ON life_support_states (unit_id, happened_at DESC, recorded_at DESC, id DESC)`,
    )

    await q.query(`
      CREATE TABLE readings (
        id uuid CONSTRAINT pk_readings PRIMARY KEY,
        water_body_id uuid NOT NULL CONSTRAINT fk_readings_water_body REFERENCES water_bodies (id),
        parameter text NOT NULL,
        entered_value numeric NOT NULL,
        entered_unit text NOT NULL,
        below boolean NOT NULL,
        scale text,
        canonical_value double precision NOT NULL CONSTRAINT ck_readings_finite
          CHECK (canonical_value > '-Infinity' AND canonical_value < 'Infinity'),
        canonical_unit text NOT NULL,
        instrument text,
        note text,
        ${recorded('readings')},
        CONSTRAINT ck_readings_ph_scale CHECK ((parameter = 'ph') = (scale IS NOT NULL))
      )`)
    await q.query(
      `CREATE INDEX ix_readings_newest ON readings (water_body_id, parameter, happened_at DESC, recorded_at DESC)`,
    )
    await q.query(`CREATE INDEX ix_readings_body_time ON readings (water_body_id, happened_at DESC)`)

    await q.query(`
      CREATE TABLE water_ranges (
        id uuid CONSTRAINT pk_water_ranges PRIMARY KEY,
        enclosure_id uuid NOT NULL CONSTRAINT fk_water_ranges_enclosure REFERENCES enclosures (id),
        parameter text NOT NULL,
        entered_unit text NOT NULL,
        outer_low_entered_value numeric,
        inner_low_entered_value numeric,
        inner_high_entered_value numeric,
        outer_high_entered_value numeric,
        canonical_unit text NOT NULL,
        outer_low double precision,
        inner_low double precision,
        inner_high double precision,
        outer_high double precision,
        withdrawn boolean NOT NULL,
        reason text,
        position bigint GENERATED ALWAYS AS IDENTITY,
        ${recorded('water_ranges')},
        CONSTRAINT ck_water_ranges_order CHECK (
          outer_low <= inner_low AND inner_low < inner_high AND inner_high <= outer_high
          AND outer_low < inner_high AND outer_low < outer_high AND inner_low < outer_high),
        CONSTRAINT ck_water_ranges_some CHECK (withdrawn
          OR num_nonnulls(outer_low, inner_low, inner_high, outer_high) > 0)
      )`)
    await q.query(
      `CREATE INDEX ix_water_ranges_newest ON water_ranges (enclosure_id, parameter, happened_at DESC, position DESC)`,
    )

    await q.query(`
      CREATE TABLE water_events (
        id uuid CONSTRAINT pk_water_events PRIMARY KEY,
        water_body_id uuid NOT NULL CONSTRAINT fk_water_events_water_body REFERENCES water_bodies (id),
        kind text NOT NULL CONSTRAINT ck_water_events_kind
          CHECK (kind IN ('water-change', 'backwash', 'media-change', 'top-off')),
        amount_entered_value numeric,
        amount_entered_unit text,
        amount_litres double precision CONSTRAINT ck_water_events_amount CHECK (amount_litres > 0),
        share_entered_value numeric,
        share_percent double precision CONSTRAINT ck_water_events_share CHECK (share_percent > 0 AND share_percent <= 100),
        life_support_unit_id uuid CONSTRAINT fk_water_events_unit REFERENCES life_support_units (id),
        note text,
        ${recorded('water_events')},
        CONSTRAINT ck_water_events_how_much CHECK (
          kind <> 'water-change' OR num_nonnulls(amount_litres, share_percent) = 1)
      )`)
    await q.query(`CREATE INDEX ix_water_events_body_time ON water_events (water_body_id, happened_at DESC)`)

    await q.query(`
      CREATE TABLE isolations (
        id uuid CONSTRAINT pk_isolations PRIMARY KEY,
        note text,
        ${recorded('isolations')}
      )`)
    await q.query(`
      CREATE TABLE isolation_bodies (
        isolation_id uuid NOT NULL CONSTRAINT fk_isolation_bodies_isolation REFERENCES isolations (id),
        water_body_id uuid NOT NULL CONSTRAINT fk_isolation_bodies_body REFERENCES water_bodies (id),
        CONSTRAINT pk_isolation_bodies PRIMARY KEY (isolation_id, water_body_id)
      )`)
    await q.query(`CREATE INDEX ix_isolation_bodies_body ON isolation_bodies (water_body_id)`)
    await q.query(`
      CREATE TABLE isolation_tests (
        id uuid CONSTRAINT pk_isolation_tests PRIMARY KEY,
        isolation_id uuid NOT NULL CONSTRAINT fk_isolation_tests_isolation REFERENCES isolations (id),
        method text NOT NULL,
        passed boolean NOT NULL,
        ${recorded('isolation_tests')}
      )`)
    await q.query(
      `CREATE INDEX ix_isolation_tests_isolation ON isolation_tests (isolation_id, happened_at DESC)`,
    )
    await q.query(`
      CREATE TABLE isolation_ends (
        id uuid CONSTRAINT pk_isolation_ends PRIMARY KEY,
        isolation_id uuid NOT NULL CONSTRAINT fk_isolation_ends_isolation REFERENCES isolations (id)
          CONSTRAINT uq_isolation_ends_isolation UNIQUE,
        note text,
        ${recorded('isolation_ends')}
      )`)

    await q.query(`
      CREATE TABLE volume_determinations (
        id uuid CONSTRAINT pk_volume_determinations PRIMARY KEY,
        method text NOT NULL CONSTRAINT ck_volume_determinations_method
          CHECK (method IN ('geometry', 'metered', 'dilution', 'estimated')),
        gross_volume_litres double precision CONSTRAINT ck_volume_determinations_gross CHECK (gross_volume_litres > 0),
        net_volume_litres double precision NOT NULL CONSTRAINT ck_volume_determinations_net
          CHECK (net_volume_litres > 0 AND net_volume_litres < 'Infinity'),
        error_percent double precision CONSTRAINT ck_volume_determinations_error
          CHECK (error_percent > 0 AND error_percent <= 100),
        displacement_subtracted boolean NOT NULL,
        inputs text NOT NULL,
        working text NOT NULL,
        isolation_id uuid CONSTRAINT fk_volume_determinations_isolation REFERENCES isolations (id),
        note text,
        next_check_on date,
        ${recorded('volume_determinations')},
        CONSTRAINT ck_volume_determinations_net_in_gross CHECK (net_volume_litres <= gross_volume_litres),
        CONSTRAINT ck_volume_determinations_by CHECK (recorded_by IS NOT NULL),
        CONSTRAINT uq_volume_determinations_by UNIQUE (id, recorded_by)
      )`)
    await q.query(`
      CREATE TABLE volume_determination_bodies (
        determination_id uuid NOT NULL CONSTRAINT fk_volume_determination_bodies_determination
          REFERENCES volume_determinations (id),
        water_body_id uuid NOT NULL CONSTRAINT fk_volume_determination_bodies_body REFERENCES water_bodies (id),
        CONSTRAINT pk_volume_determination_bodies PRIMARY KEY (determination_id, water_body_id)
      )`)
    await q.query(
      `CREATE INDEX ix_volume_determination_bodies_body ON volume_determination_bodies (water_body_id)`,
    )
    await q.query(`
      CREATE TABLE volume_determination_valves (
        determination_id uuid NOT NULL CONSTRAINT fk_volume_determination_valves_determination
          REFERENCES volume_determinations (id),
        connection_id uuid NOT NULL CONSTRAINT fk_volume_determination_valves_connection REFERENCES connections (id),
        open boolean NOT NULL,
        CONSTRAINT pk_volume_determination_valves PRIMARY KEY (determination_id, connection_id)
      )`)
    // The determiner is repeated here so that the database itself refuses a person who confirms their own figure
    await q.query(`
      CREATE TABLE volume_confirmations (
        id uuid CONSTRAINT pk_volume_confirmations PRIMARY KEY,
        determination_id uuid NOT NULL CONSTRAINT uq_volume_confirmations_determination UNIQUE,
        determined_by uuid NOT NULL,
        note text,
        confirmed_at timestamptz NOT NULL,
        confirmed_by uuid NOT NULL CONSTRAINT fk_volume_confirmations_confirmed_by REFERENCES people (id),
        CONSTRAINT fk_volume_confirmations_determination FOREIGN KEY (determination_id, determined_by)
          REFERENCES volume_determinations (id, recorded_by),
        CONSTRAINT ck_volume_confirmations_another_person CHECK (confirmed_by <> determined_by)
      )`)

    // A correction: the wrong row stays, is struck through, and the right one is entered beside it
    await q.query(`
      CREATE TABLE water_voids (
        id uuid CONSTRAINT pk_water_voids PRIMARY KEY,
        reading_id uuid CONSTRAINT fk_water_voids_reading REFERENCES readings (id)
          CONSTRAINT uq_water_voids_reading UNIQUE,
        water_event_id uuid CONSTRAINT fk_water_voids_event REFERENCES water_events (id)
          CONSTRAINT uq_water_voids_event UNIQUE,
        connection_state_id uuid CONSTRAINT fk_water_voids_connection_state REFERENCES connection_states (id)
          CONSTRAINT uq_water_voids_connection_state UNIQUE,
        life_support_state_id uuid CONSTRAINT fk_water_voids_life_support_state REFERENCES life_support_states (id)
          CONSTRAINT uq_water_voids_life_support_state UNIQUE,
        determination_id uuid CONSTRAINT fk_water_voids_determination REFERENCES volume_determinations (id)
          CONSTRAINT uq_water_voids_determination UNIQUE,
        isolation_id uuid CONSTRAINT fk_water_voids_isolation REFERENCES isolations (id)
          CONSTRAINT uq_water_voids_isolation UNIQUE,
        reason text NOT NULL,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid CONSTRAINT fk_water_voids_recorded_by REFERENCES people (id),
        CONSTRAINT ck_water_voids_one CHECK (num_nonnulls(reading_id, water_event_id, connection_state_id,
          life_support_state_id, determination_id, isolation_id) = 1)
      )`)

    // Places are drafts with a version; their codes never change. Everything else here is a ledger or sealed.
    await q.query(`
      GRANT UPDATE (name, kind, area, boundary, air_space, treatment_vessel, fill_mark, fill_mark_entered_value,
        fill_mark_entered_unit, fill_mark_litres, description, in_use_until, version) ON enclosures TO pratique_app`)
    await q.query(`GRANT UPDATE (name, in_use_until, version) ON water_bodies TO pratique_app`)
    await q.query(`GRANT UPDATE (name, in_use_until, version) ON connections TO pratique_app`)
    await q.query(`GRANT UPDATE (name, in_use_until, version) ON life_support_units TO pratique_app`)
  }

  async down(): Promise<void> {
    throw new Error('A landed migration is never taken back; add another one.')
  }
}
