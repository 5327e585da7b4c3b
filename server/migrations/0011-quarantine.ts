import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Who recorded a fact, when it happened and when it was written down: the same columns on every ledger here. */
const recorded = (table: string) => `
  happened_at timestamptz NOT NULL,
  happened_on date NOT NULL,
  recorded_at timestamptz NOT NULL,
  recorded_by uuid CONSTRAINT fk_${table}_recorded_by REFERENCES people (id)`

const ofCase = (table: string) =>
  `case_id uuid NOT NULL CONSTRAINT fk_${table}_case REFERENCES quarantine_cases (id)`

/**
 * The protocol that every installation starts with: 30 days, looked at every day, two samples. A project default until
 * a licensed veterinarian confirms it.
 */
const simpleProtocol = {
  policy: {
    requiredDays: 30,
    deathExtensionDays: 14,
    signsExtensionDays: 14,
    maskingWindowDays: 14,
    transportDeathHours: 48,
    temperaturePauseHours: 24,
    criteria: [
      {
        criterionId: 'two-negatives',
        kind: 'negatives',
        testKey: 'wet-mount',
        count: 2,
        daysApart: 14,
        daysAfterMasking: 14,
      },
    ],
  },
  criterionNames: { 'two-negatives': 'Two clean wet mounts' },
  testNames: { 'wet-mount': 'wet mount' },
  steps: [
    {
      key: 'count-in',
      kind: 'husbandry',
      day: 0,
      untilDay: 0,
      daily: false,
      name: 'Count, photograph and weigh a few; start the log',
      short: 'count in',
    },
    {
      key: 'observe',
      kind: 'observe',
      day: 0,
      untilDay: 30,
      daily: true,
      name: 'Look at every animal: feeding, breathing, skin, deaths',
      short: 'look',
    },
    {
      key: 'sample-1',
      kind: 'sample',
      day: 14,
      untilDay: 16,
      daily: false,
      name: 'Wet mounts of skin and gill, at least 3 animals',
      short: 'wet mounts',
      testKey: 'wet-mount',
    },
    {
      key: 'sample-2',
      kind: 'sample',
      day: 28,
      untilDay: 30,
      daily: false,
      name: 'Wet mounts of skin and gill, second round',
      short: 'wet mounts',
      testKey: 'wet-mount',
    },
    {
      key: 'decide',
      kind: 'decide',
      day: 30,
      untilDay: 30,
      daily: false,
      name: 'Decision to clear',
      short: 'decision',
    },
  ],
}

/** Protocols, quarantine cases with the events of their clocks, steps done, and what keepers observe. */
export class Quarantine1764600000011 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE protocols (
        id uuid CONSTRAINT pk_protocols PRIMARY KEY,
        code text NOT NULL CONSTRAINT uq_protocols_code UNIQUE
          CONSTRAINT ck_protocols_code CHECK (code ~ '^[A-Z0-9][A-Z0-9-]{0,19}$'),
        recorded_at timestamptz NOT NULL,
        recorded_by uuid CONSTRAINT fk_protocols_recorded_by REFERENCES people (id)
      )`)
    await q.query(`
      CREATE TABLE protocol_versions (
        id uuid CONSTRAINT pk_protocol_versions PRIMARY KEY,
        protocol_id uuid NOT NULL CONSTRAINT fk_protocol_versions_protocol REFERENCES protocols (id),
        version integer NOT NULL CONSTRAINT ck_protocol_versions_version CHECK (version >= 1),
        name text NOT NULL CONSTRAINT ck_protocol_versions_name CHECK (length(trim(name)) > 0),
        content jsonb NOT NULL,
        source text NOT NULL,
        mark text NOT NULL CONSTRAINT ck_protocol_versions_mark CHECK (mark IN ('V', 'V2', 'C', 'M', 'P')),
        reason text,
        proposed_at timestamptz NOT NULL,
        proposed_by uuid CONSTRAINT fk_protocol_versions_proposed_by REFERENCES people (id),
        CONSTRAINT uq_protocol_versions_version UNIQUE (protocol_id, version)
      )`)
    await q.query(`
      CREATE TABLE protocol_confirmations (
        id uuid CONSTRAINT pk_protocol_confirmations PRIMARY KEY,
        protocol_version_id uuid NOT NULL
          CONSTRAINT fk_protocol_confirmations_version REFERENCES protocol_versions (id)
          CONSTRAINT uq_protocol_confirmations_version UNIQUE,
        reason text,
        confirmed_at timestamptz NOT NULL,
        confirmed_by uuid NOT NULL CONSTRAINT fk_protocol_confirmations_confirmed_by REFERENCES people (id)
      )`)

    await q.query(`
      CREATE TABLE quarantine_cases (
        id uuid CONSTRAINT pk_quarantine_cases PRIMARY KEY,
        number text NOT NULL CONSTRAINT uq_quarantine_cases_number UNIQUE,
        name text NOT NULL CONSTRAINT ck_quarantine_cases_name CHECK (length(trim(name)) > 0),
        quarantine_kind text NOT NULL CONSTRAINT ck_quarantine_cases_kind
          CHECK (quarantine_kind IN ('fish', 'amphibian', 'reptile', 'bird', 'mammal', 'invertebrate')),
        protocol_version_id uuid NOT NULL
          CONSTRAINT fk_quarantine_cases_protocol_version REFERENCES protocol_versions (id),
        ${recorded('quarantine_cases')},
        version integer NOT NULL DEFAULT 1
      )`)
    await q.query(`
      CREATE TABLE case_members (
        id uuid CONSTRAINT pk_case_members PRIMARY KEY,
        ${ofCase('case_members')},
        animal_id uuid NOT NULL CONSTRAINT fk_case_members_animal REFERENCES animals (id),
        ${recorded('case_members')}
      )`)
    await q.query(`CREATE INDEX ix_case_members_case ON case_members (case_id)`)
    await q.query(`CREATE INDEX ix_case_members_animal ON case_members (animal_id)`)

    await q.query(`
      CREATE TABLE observations (
        id uuid CONSTRAINT pk_observations PRIMARY KEY,
        enclosure_id uuid NOT NULL CONSTRAINT fk_observations_enclosure REFERENCES enclosures (id),
        schema_version integer NOT NULL,
        origin text NOT NULL CONSTRAINT ck_observations_origin CHECK (origin IN ('online', 'outbox')),
        device text NOT NULL,
        said_at timestamptz NOT NULL,
        time_doubtful boolean NOT NULL,
        looked_at boolean NOT NULL,
        feeding text CONSTRAINT ck_observations_feeding CHECK (feeding IN ('all', 'some', 'none')),
        breathing text CONSTRAINT ck_observations_breathing CHECK (breathing IN ('normal', 'fast', 'not-seen')),
        skin text CONSTRAINT ck_observations_skin CHECK (skin IN ('clean', 'marks', 'not-seen')),
        signs text[] NOT NULL,
        words text,
        count_basis text CONSTRAINT ck_observations_count_basis
          CHECK (count_basis IN ('counted', 'estimated', 'not-counted')),
        count_low integer CONSTRAINT ck_observations_count_low CHECK (count_low >= 0),
        count_high integer,
        found_dead integer CONSTRAINT ck_observations_found_dead CHECK (found_dead >= 0),
        unassigned_dead integer NOT NULL CONSTRAINT ck_observations_unassigned CHECK (unassigned_dead >= 0),
        for_veterinarian boolean NOT NULL,
        urgent boolean NOT NULL,
        ${recorded('observations')},
        CONSTRAINT ck_observations_count CHECK (
          (count_basis IN ('counted', 'estimated')) IS TRUE = (count_low IS NOT NULL AND count_high IS NOT NULL)),
        CONSTRAINT ck_observations_count_range CHECK (count_high >= count_low
          AND (count_basis = 'estimated' OR count_high = count_low)),
        CONSTRAINT ck_observations_dead CHECK (unassigned_dead <= coalesce(found_dead, 0))
      )`)
    await q.query(
      `CREATE INDEX ix_observations_enclosure_time ON observations (enclosure_id, happened_at DESC)`,
    )
    await q.query(`
      CREATE TABLE observation_cases (
        observation_id uuid NOT NULL CONSTRAINT fk_observation_cases_observation REFERENCES observations (id),
        ${ofCase('observation_cases')},
        CONSTRAINT pk_observation_cases PRIMARY KEY (observation_id, case_id)
      )`)
    await q.query(`CREATE INDEX ix_observation_cases_case ON observation_cases (case_id)`)
    await q.query(`
      CREATE TABLE observation_deaths (
        observation_id uuid NOT NULL CONSTRAINT fk_observation_deaths_observation REFERENCES observations (id),
        death_id uuid NOT NULL CONSTRAINT fk_observation_deaths_death REFERENCES deaths (id),
        CONSTRAINT pk_observation_deaths PRIMARY KEY (observation_id, death_id)
      )`)
    await q.query(`
      CREATE TABLE observation_voids (
        id uuid CONSTRAINT pk_observation_voids PRIMARY KEY,
        observation_id uuid NOT NULL CONSTRAINT fk_observation_voids_observation REFERENCES observations (id)
          CONSTRAINT uq_observation_voids_observation UNIQUE,
        reason text NOT NULL,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid CONSTRAINT fk_observation_voids_recorded_by REFERENCES people (id)
      )`)
    // A veterinarian has read what was marked for them
    await q.query(`
      CREATE TABLE observation_reviews (
        id uuid CONSTRAINT pk_observation_reviews PRIMARY KEY,
        observation_id uuid NOT NULL CONSTRAINT fk_observation_reviews_observation REFERENCES observations (id),
        words text,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid CONSTRAINT fk_observation_reviews_recorded_by REFERENCES people (id)
      )`)
    await q.query(`CREATE INDEX ix_observation_reviews_observation ON observation_reviews (observation_id)`)

    // The clock is computed from these and from stays, deaths and valves; nothing of it is stored
    await q.query(`
      CREATE TABLE case_events (
        id uuid CONSTRAINT pk_case_events PRIMARY KEY,
        ${ofCase('case_events')},
        kind text NOT NULL,
        facts jsonb NOT NULL,
        reason text,
        origin text NOT NULL CONSTRAINT ck_case_events_origin CHECK (origin IN ('online', 'outbox')),
        device text,
        observation_id uuid CONSTRAINT fk_case_events_observation REFERENCES observations (id),
        signed_text_id uuid CONSTRAINT fk_case_events_signed_text REFERENCES signed_texts (id),
        ${recorded('case_events')},
        CONSTRAINT ck_case_events_signed CHECK (
          kind NOT IN ('cleared', 'death-cause-signed') OR signed_text_id IS NOT NULL)
      )`)
    await q.query(`CREATE INDEX ix_case_events_case_time ON case_events (case_id, happened_at)`)
    // Two veterinarians who clear at one moment: the second finds the case cleared
    await q.query(
      `CREATE UNIQUE INDEX uq_case_events_cleared ON case_events (case_id) WHERE kind = 'cleared'`,
    )
    await q.query(`CREATE UNIQUE INDEX uq_case_events_void ON case_events ((facts ->> 'voidsEventId'))
                    WHERE kind = 'voided'`)

    await q.query(
      `CREATE VIEW live_case_events AS
         SELECT e.* FROM case_events e
          WHERE e.kind <> 'voided' AND NOT EXISTS (
            SELECT 1 FROM case_events v WHERE v.kind = 'voided' AND v.facts ->> 'voidsEventId' = e.id::text)`,
    )
    await q.query(`REVOKE INSERT ON live_case_events FROM pratique_app`)

    await q.query(`
      CREATE TABLE case_step_records (
        id uuid CONSTRAINT pk_case_step_records PRIMARY KEY,
        ${ofCase('case_step_records')},
        step_key text NOT NULL,
        outcome text NOT NULL CONSTRAINT ck_case_step_records_outcome CHECK (outcome IN ('done', 'failed')),
        note text,
        ${recorded('case_step_records')}
      )`)
    await q.query(`CREATE INDEX ix_case_step_records_case ON case_step_records (case_id, happened_at)`)

    await q.query(
      `INSERT INTO protocols (id, code, recorded_at)
       VALUES ('019a0000-0011-7000-8000-000000000001', 'QP-30', '2026-01-01T00:00:00Z')`,
    )
    await q.query(
      `INSERT INTO protocol_versions (id, protocol_id, version, name, content, source, mark, proposed_at)
       VALUES ('019a0000-0011-7000-8000-000000000002', '019a0000-0011-7000-8000-000000000001', 1,
               'Simple quarantine, 30 days', $1,
               'The 30 days: public quarantine standard of an accreditation body. All else: project default.', 'P',
               '2026-01-01T00:00:00Z')`,
      [JSON.stringify(simpleProtocol)],
    )

    // The head of a case can be locked, and its name corrected. Everything else is a ledger.
    await q.query(`GRANT UPDATE (name, version) ON quarantine_cases TO pratique_app`)
  }

  async down(): Promise<void> {
    throw new Error('A landed migration is never taken back; add another one.')
  }
}
