import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Sessions, rate limits, commands, counters, the audit chain, settings, people, roles and licences. */
export class Foundation1764600000001 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`CREATE EXTENSION IF NOT EXISTS btree_gist`)
    await q.query(`CREATE EXTENSION IF NOT EXISTS pg_trgm`)

    await q.query(`
      CREATE TABLE session (
        sid text CONSTRAINT pk_session PRIMARY KEY,
        sess json NOT NULL,
        expire timestamp(6) NOT NULL
      )`)
    await q.query(`CREATE INDEX ix_session_expire ON session (expire)`)

    await q.query(`
      CREATE TABLE rate_limits (
        key text CONSTRAINT pk_rate_limits PRIMARY KEY,
        hits integer NOT NULL,
        resets_at timestamptz NOT NULL
      )`)

    await q.query(`
      CREATE TABLE command_keys (
        key text NOT NULL,
        actor_id uuid NOT NULL,
        contract_id text NOT NULL,
        body_hash text NOT NULL,
        result text,
        recorded_at timestamptz NOT NULL,
        CONSTRAINT pk_command_keys PRIMARY KEY (key, actor_id)
      )`)

    await q.query(`
      CREATE TABLE counters (
        kind text CONSTRAINT pk_counters PRIMARY KEY,
        last_number integer NOT NULL CONSTRAINT ck_counters_not_negative CHECK (last_number >= 0)
      )`)

    await q.query(`
      CREATE TABLE audit_entries (
        seq bigint CONSTRAINT pk_audit_entries PRIMARY KEY,
        happened_at timestamptz NOT NULL,
        actor_id uuid,
        actor_name text NOT NULL,
        action text NOT NULL,
        subject_kind text NOT NULL,
        subject_id text NOT NULL,
        subject_label text NOT NULL,
        clinical boolean NOT NULL,
        text text NOT NULL,
        previous_hash text NOT NULL,
        hash text NOT NULL CONSTRAINT uq_audit_entries_hash UNIQUE
      )`)
    await q.query(`CREATE INDEX ix_audit_entries_subject ON audit_entries (subject_kind, subject_id, seq)`)
    await q.query(`CREATE INDEX ix_audit_entries_actor ON audit_entries (actor_id, seq)`)

    await q.query(`
      CREATE TABLE people (
        id uuid CONSTRAINT pk_people PRIMARY KEY,
        email text NOT NULL,
        printed_name text NOT NULL CONSTRAINT ck_people_printed_name CHECK (length(trim(printed_name)) > 0),
        password_hash text NOT NULL,
        must_change_password boolean NOT NULL,
        active boolean NOT NULL,
        preferences jsonb NOT NULL DEFAULT '{}',
        last_sign_in_at timestamptz,
        created_at timestamptz NOT NULL,
        version integer NOT NULL DEFAULT 1
      )`)
    await q.query(`CREATE UNIQUE INDEX uq_people_email ON people (lower(email))`)

    await q.query(`
      CREATE TABLE person_roles (
        id uuid CONSTRAINT pk_person_roles PRIMARY KEY,
        person_id uuid NOT NULL CONSTRAINT fk_person_roles_person REFERENCES people (id),
        role text NOT NULL CONSTRAINT ck_person_roles_role
          CHECK (role IN ('veterinarian', 'technician', 'keeper', 'registrar', 'administrator')),
        granted_at timestamptz NOT NULL,
        granted_by uuid,
        withdrawn_at timestamptz,
        withdrawn_by uuid
      )`)
    await q.query(
      `CREATE UNIQUE INDEX uq_person_roles_held ON person_roles (person_id, role) WHERE withdrawn_at IS NULL`,
    )

    await q.query(`
      CREATE TABLE licences (
        id uuid CONSTRAINT pk_licences PRIMARY KEY,
        person_id uuid NOT NULL CONSTRAINT fk_licences_person REFERENCES people (id),
        jurisdiction text NOT NULL,
        number text NOT NULL,
        valid_from date NOT NULL,
        valid_until date NOT NULL,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid,
        CONSTRAINT ck_licences_period CHECK (valid_until >= valid_from)
      )`)
    await q.query(`CREATE INDEX ix_licences_person ON licences (person_id)`)

    await q.query(`
      CREATE TABLE licence_voids (
        id uuid CONSTRAINT pk_licence_voids PRIMARY KEY,
        licence_id uuid NOT NULL CONSTRAINT fk_licence_voids_licence REFERENCES licences (id)
          CONSTRAINT uq_licence_voids_licence UNIQUE,
        reason text NOT NULL,
        recorded_at timestamptz NOT NULL,
        recorded_by uuid
      )`)

    await q.query(`
      CREATE TABLE sign_in_tries (
        id bigint GENERATED ALWAYS AS IDENTITY CONSTRAINT pk_sign_in_tries PRIMARY KEY,
        email_key text NOT NULL,
        address text NOT NULL,
        tried_at timestamptz NOT NULL,
        succeeded boolean NOT NULL
      )`)
    await q.query(`CREATE INDEX ix_sign_in_tries_email ON sign_in_tries (email_key, tried_at DESC)`)

    await q.query(`
      CREATE TABLE setting_versions (
        id uuid CONSTRAINT pk_setting_versions PRIMARY KEY,
        key text NOT NULL,
        value text NOT NULL,
        reason text,
        proposed_at timestamptz NOT NULL,
        proposed_by uuid,
        position bigint GENERATED ALWAYS AS IDENTITY
      )`)
    await q.query(`CREATE INDEX ix_setting_versions_key ON setting_versions (key, position DESC)`)
    await q.query(`
      CREATE TABLE setting_confirmations (
        id uuid CONSTRAINT pk_setting_confirmations PRIMARY KEY,
        setting_version_id uuid NOT NULL CONSTRAINT fk_setting_confirmations_version REFERENCES setting_versions (id)
          CONSTRAINT uq_setting_confirmations_version UNIQUE,
        confirmed_at timestamptz NOT NULL,
        confirmed_by uuid,
        reason text
      )`)

    await q.query(`GRANT UPDATE, DELETE ON session, rate_limits, people, counters TO pratique_app`)
    await q.query(`GRANT UPDATE (result) ON command_keys TO pratique_app`)
    await q.query(`GRANT UPDATE (withdrawn_at, withdrawn_by) ON person_roles TO pratique_app`)
    await q.query(`REVOKE DELETE ON people FROM pratique_app`)
  }

  async down(): Promise<void> {
    throw new Error('A landed migration is never taken back; add another one.')
  }
}
