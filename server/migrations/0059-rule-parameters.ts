import type { MigrationInterface, QueryRunner } from 'typeorm'

/** A facility's own values of the thresholds of the cautions, who confirmed them, and what a vet said to a rule often overridden. */
export class RuleParameters1764600000059 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE rule_parameter_versions (
        id uuid CONSTRAINT pk_rule_parameter_versions PRIMARY KEY,
        rule_id text NOT NULL,
        parameter_key text NOT NULL,
        entered_value numeric NOT NULL,
        entered_unit text NOT NULL,
        reason text NOT NULL CONSTRAINT ck_rule_parameter_versions_reason CHECK (length(trim(reason)) >= 3),
        supersedes_id uuid CONSTRAINT fk_rule_parameter_versions_supersedes REFERENCES rule_parameter_versions (id)
          CONSTRAINT uq_rule_parameter_versions_supersedes UNIQUE,
        proposed_at timestamptz NOT NULL,
        proposed_by uuid NOT NULL CONSTRAINT fk_rule_parameter_versions_proposed_by REFERENCES people (id),
        position bigint GENERATED ALWAYS AS IDENTITY
      )`)
    // of one threshold there is one first proposal; every other takes the place of the one before it
    await q.query(`
      CREATE UNIQUE INDEX uq_rule_parameter_versions_first ON rule_parameter_versions (rule_id, parameter_key)
        WHERE supersedes_id IS NULL`)
    await q.query(`
      CREATE TABLE rule_parameter_confirmations (
        id uuid CONSTRAINT pk_rule_parameter_confirmations PRIMARY KEY,
        version_id uuid NOT NULL
          CONSTRAINT fk_rule_parameter_confirmations_version REFERENCES rule_parameter_versions (id)
          CONSTRAINT uq_rule_parameter_confirmations_version UNIQUE,
        reason text NOT NULL CONSTRAINT ck_rule_parameter_confirmations_reason CHECK (length(trim(reason)) >= 3),
        jurisdiction text NOT NULL
          CONSTRAINT ck_rule_parameter_confirmations_jurisdiction CHECK (length(trim(jurisdiction)) > 0),
        licence_number text NOT NULL,
        confirmed_at timestamptz NOT NULL,
        confirmed_on date NOT NULL,
        confirmed_by uuid NOT NULL CONSTRAINT fk_rule_parameter_confirmations_by REFERENCES people (id)
      )`)
    await q.query(`
      CREATE TABLE caution_reviews (
        id uuid CONSTRAINT pk_caution_reviews PRIMARY KEY,
        rule_id text NOT NULL,
        month text NOT NULL CONSTRAINT ck_caution_reviews_month CHECK (month ~ '^[0-9]{4}-(0[1-9]|1[0-2])$'),
        fired_count integer NOT NULL CONSTRAINT ck_caution_reviews_fired CHECK (fired_count > 0),
        overridden_count integer NOT NULL
          CONSTRAINT ck_caution_reviews_overridden CHECK (overridden_count BETWEEN 0 AND fired_count),
        answer text NOT NULL CONSTRAINT ck_caution_reviews_answer CHECK (answer IN ('keep', 'proposed')),
        reason text NOT NULL CONSTRAINT ck_caution_reviews_reason CHECK (length(trim(reason)) >= 3),
        version_id uuid CONSTRAINT fk_caution_reviews_version REFERENCES rule_parameter_versions (id),
        recorded_at timestamptz NOT NULL,
        recorded_by uuid NOT NULL CONSTRAINT fk_caution_reviews_recorded_by REFERENCES people (id),
        CONSTRAINT ck_caution_reviews_proposal CHECK ((answer = 'proposed') = (version_id IS NOT NULL))
      )`)
    await q.query(`CREATE INDEX ix_caution_reviews_month ON caution_reviews (month, rule_id)`)
  }

  async down(): Promise<void> {
    return Promise.reject(new Error('Records are never taken down'))
  }
}
