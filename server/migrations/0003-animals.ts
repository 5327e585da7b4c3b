import type { MigrationInterface, QueryRunner } from 'typeorm'
import { countRules } from './0003-animals-rules.ts'

/** Who recorded a fact, when it happened and when it was written down: the same columns on every ledger here. */
const recorded = (table: string) => `
  happened_at timestamptz NOT NULL,
  happened_on date NOT NULL,
  recorded_at timestamptz NOT NULL,
  recorded_by uuid CONSTRAINT fk_${table}_recorded_by REFERENCES people (id)`

const written = (table: string) => `
  recorded_at timestamptz NOT NULL,
  recorded_by uuid CONSTRAINT fk_${table}_recorded_by REFERENCES people (id)`

const animal = (table: string) =>
  `animal_id uuid NOT NULL CONSTRAINT fk_${table}_animal REFERENCES animals (id)`

/** Partial dates: a year, a month or a day, as exactly as it is known. */
const partialDate = `'^[1-9][0-9]{3}(-(0[1-9]|1[0-2])(-(0[1-9]|[12][0-9]|3[01]))?)?$'`

/** Taxa, animals and groups, and what happens to them: counts, weights, moves, deaths, locks, discrepancies. */
export class Animals1764600000003 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE taxa (
        id uuid CONSTRAINT pk_taxa PRIMARY KEY,
        scientific_name text NOT NULL CONSTRAINT ck_taxa_scientific_name CHECK (length(trim(scientific_name)) > 0),
        common_name text NOT NULL CONSTRAINT ck_taxa_common_name CHECK (length(trim(common_name)) > 0),
        taxon_group text NOT NULL,
        quarantine_kind text NOT NULL CONSTRAINT ck_taxa_quarantine_kind
          CHECK (quarantine_kind IN ('fish', 'amphibian', 'reptile', 'bird', 'mammal', 'invertebrate')),
        note text,
        ${written('taxa')},
        version integer NOT NULL DEFAULT 1
      )`)
    await q.query(`CREATE UNIQUE INDEX uq_taxa_scientific_name ON taxa (lower(scientific_name))`)

    await q.query(`
      CREATE TABLE taxon_weight_bands (
        id uuid CONSTRAINT pk_taxon_weight_bands PRIMARY KEY,
        taxon_id uuid NOT NULL CONSTRAINT fk_taxon_weight_bands_taxon REFERENCES taxa (id),
        stage text,
        low_entered_value numeric NOT NULL,
        high_entered_value numeric NOT NULL,
        entered_unit text NOT NULL,
        low_kg double precision NOT NULL,
        high_kg double precision NOT NULL,
        source text NOT NULL,
        mark text NOT NULL CONSTRAINT ck_taxon_weight_bands_mark CHECK (mark IN ('V', 'V2', 'C', 'M', 'P')),
        position bigint GENERATED ALWAYS AS IDENTITY,
        ${written('taxon_weight_bands')},
        CONSTRAINT ck_taxon_weight_bands_order CHECK (low_kg > 0 AND high_kg >= low_kg AND high_kg < 'Infinity')
      )`)
    await q.query(
      `CREATE INDEX ix_taxon_weight_bands_newest ON taxon_weight_bands (taxon_id, stage, position DESC)`,
    )
    await q.query(`
      CREATE TABLE taxon_sensitivities (
        id uuid CONSTRAINT pk_taxon_sensitivities PRIMARY KEY,
        taxon_id uuid NOT NULL CONSTRAINT fk_taxon_sensitivities_taxon REFERENCES taxa (id),
        code text NOT NULL,
        level text NOT NULL CONSTRAINT ck_taxon_sensitivities_level
          CHECK (level IN ('avoid', 'caution', 'tolerates', 'none')),
        note text,
        position bigint GENERATED ALWAYS AS IDENTITY,
        ${written('taxon_sensitivities')}
      )`)
    await q.query(
      `CREATE INDEX ix_taxon_sensitivities_newest
         ON taxon_sensitivities (taxon_id, code, position DESC)`,
    )

    await q.query(`
      CREATE TABLE animals (
        id uuid CONSTRAINT pk_animals PRIMARY KEY,
        accession text NOT NULL CONSTRAINT uq_animals_accession UNIQUE,
        form text NOT NULL CONSTRAINT ck_animals_form CHECK (form IN ('individual', 'group')),
        split_from_id uuid CONSTRAINT fk_animals_split_from REFERENCES animals (id),
        taxon_id uuid NOT NULL CONSTRAINT fk_animals_taxon REFERENCES taxa (id),
        name text,
        sex text NOT NULL,
        stage text NOT NULL,
        birth_kind text,
        birth_date text CONSTRAINT ck_animals_birth_date CHECK (birth_date ~ ${partialDate}),
        birth_approximate boolean NOT NULL,
        ${written('animals')},
        version integer NOT NULL DEFAULT 1
      )`)
    await q.query(`CREATE INDEX ix_animals_taxon ON animals (taxon_id)`)
    await q.query(`CREATE INDEX ix_animals_split_from ON animals (split_from_id)`)

    await q.query(`
      CREATE TABLE animal_descriptions (
        id uuid CONSTRAINT pk_animal_descriptions PRIMARY KEY,
        ${animal('animal_descriptions')},
        taxon_id uuid NOT NULL CONSTRAINT fk_animal_descriptions_taxon REFERENCES taxa (id),
        name text,
        sex text NOT NULL,
        stage text NOT NULL,
        birth_kind text,
        birth_date text,
        birth_approximate boolean NOT NULL,
        reason text,
        position bigint GENERATED ALWAYS AS IDENTITY,
        ${recorded('animal_descriptions')}
      )`)
    await q.query(
      `CREATE INDEX ix_animal_descriptions_newest
         ON animal_descriptions (animal_id, happened_at DESC, position DESC)`,
    )

    await q.query(`
      CREATE TABLE identifiers (
        id uuid CONSTRAINT pk_identifiers PRIMARY KEY,
        ${animal('identifiers')},
        kind text NOT NULL,
        value text NOT NULL,
        value_key text NOT NULL CONSTRAINT ck_identifiers_value_key CHECK (length(value_key) > 0),
        place text,
        twice_reason text,
        ${recorded('identifiers')}
      )`)
    await q.query(`CREATE INDEX ix_identifiers_value_key ON identifiers (value_key)`)
    await q.query(`CREATE INDEX ix_identifiers_animal ON identifiers (animal_id)`)
    await q.query(`
      CREATE TABLE identifier_ends (
        id uuid CONSTRAINT pk_identifier_ends PRIMARY KEY,
        identifier_id uuid NOT NULL CONSTRAINT fk_identifier_ends_identifier REFERENCES identifiers (id)
          CONSTRAINT uq_identifier_ends_identifier UNIQUE,
        reason text NOT NULL,
        ${recorded('identifier_ends')}
      )`)

    await q.query(`
      CREATE TABLE count_entries (
        id uuid CONSTRAINT pk_count_entries PRIMARY KEY,
        ${animal('count_entries')},
        kind text NOT NULL,
        delta integer NOT NULL CONSTRAINT ck_count_entries_delta CHECK (delta <> 0),
        transfer_id uuid,
        reason text,
        ${recorded('count_entries')},
        CONSTRAINT ck_count_entries_transfer CHECK ((kind ~ '^(split|merge)-(in|out)$') = (transfer_id IS NOT NULL)),
        CONSTRAINT ck_count_entries_reason CHECK (kind <> 'count-adjustment' OR reason IS NOT NULL)
      )`)
    await q.query(`CREATE INDEX ix_count_entries_animal_time ON count_entries (animal_id, happened_at)`)
    await q.query(
      `CREATE INDEX ix_count_entries_transfer ON count_entries (transfer_id) WHERE transfer_id IS NOT NULL`,
    )
    await q.query(`
      CREATE TABLE count_statements (
        id uuid CONSTRAINT pk_count_statements PRIMARY KEY,
        ${animal('count_statements')},
        basis text NOT NULL CONSTRAINT ck_count_statements_basis CHECK (basis IN ('counted', 'estimated')),
        low integer NOT NULL CONSTRAINT ck_count_statements_low CHECK (low >= 0),
        high integer NOT NULL,
        note text,
        ${recorded('count_statements')},
        CONSTRAINT ck_count_statements_range CHECK (high >= low AND (basis = 'estimated' OR high = low))
      )`)
    await q.query(
      `CREATE INDEX ix_count_statements_newest
         ON count_statements (animal_id, happened_at DESC, recorded_at DESC, id DESC)`,
    )

    await q.query(`
      CREATE TABLE moves (
        id uuid CONSTRAINT pk_moves PRIMARY KEY,
        ${animal('moves')},
        kind text NOT NULL CONSTRAINT ck_moves_kind CHECK (kind IN ('arrival', 'move', 'departure')),
        from_enclosure_id uuid CONSTRAINT fk_moves_from_enclosure REFERENCES enclosures (id),
        to_enclosure_id uuid CONSTRAINT fk_moves_to_enclosure REFERENCES enclosures (id),
        reason text,
        documented_transfer text,
        against_rule text,
        automatic boolean NOT NULL,
        ${recorded('moves')},
        CONSTRAINT ck_moves_places CHECK (from_enclosure_id IS DISTINCT FROM to_enclosure_id),
        CONSTRAINT ck_moves_kind_places CHECK (
          (kind = 'arrival') = (from_enclosure_id IS NULL) AND (kind = 'departure') = (to_enclosure_id IS NULL))
      )`)
    await q.query(`CREATE INDEX ix_moves_animal_time ON moves (animal_id, happened_at)`)
    await q.query(`
      CREATE TABLE stays (
        began_with_move_id uuid CONSTRAINT pk_stays PRIMARY KEY
          CONSTRAINT fk_stays_move REFERENCES moves (id),
        ${animal('stays')},
        enclosure_id uuid NOT NULL CONSTRAINT fk_stays_enclosure REFERENCES enclosures (id),
        during tstzrange NOT NULL CONSTRAINT ck_stays_during CHECK (NOT isempty(during) AND lower_inc(during)),
        CONSTRAINT ex_stays_one_place EXCLUDE USING gist (animal_id WITH =, during WITH &&)
      )`)
    await q.query(`CREATE INDEX ix_stays_enclosure ON stays USING gist (enclosure_id, during)`)

    await q.query(`
      CREATE TABLE weights (
        id uuid CONSTRAINT pk_weights PRIMARY KEY,
        ${animal('weights')},
        entered_value numeric NOT NULL,
        entered_unit text NOT NULL,
        animals_weighed integer NOT NULL CONSTRAINT ck_weights_animals_weighed CHECK (animals_weighed >= 1),
        weight_kg double precision NOT NULL CONSTRAINT ck_weights_positive
          CHECK (weight_kg > 0 AND weight_kg < 'Infinity'),
        basis text NOT NULL CONSTRAINT ck_weights_basis CHECK (basis IN ('measured', 'estimated')),
        method text,
        doubt text,
        confirmed_reason text,
        ${recorded('weights')},
        CONSTRAINT ck_weights_confirmed CHECK (confirmed_reason IS NULL OR doubt IS NOT NULL)
      )`)
    await q.query(
      `CREATE INDEX ix_weights_newest ON weights (animal_id, happened_at DESC, recorded_at DESC, id DESC)`,
    )

    await q.query(`
      CREATE TABLE deaths (
        id uuid CONSTRAINT pk_deaths PRIMARY KEY,
        ${animal('deaths')},
        kind text NOT NULL CONSTRAINT ck_deaths_kind CHECK (kind IN ('found-dead', 'died-seen', 'euthanised')),
        seen_count integer NOT NULL CONSTRAINT ck_deaths_seen CHECK (seen_count >= 1),
        posted_count integer NOT NULL,
        count_entry_id uuid CONSTRAINT fk_deaths_count_entry REFERENCES count_entries (id),
        enclosure_id uuid CONSTRAINT fk_deaths_enclosure REFERENCES enclosures (id),
        carcass_state text,
        carcass_place text,
        note text,
        ${recorded('deaths')},
        CONSTRAINT ck_deaths_posted CHECK (posted_count >= 0 AND posted_count <= seen_count),
        CONSTRAINT ck_deaths_entry CHECK ((posted_count > 0) = (count_entry_id IS NOT NULL))
      )`)
    await q.query(`CREATE INDEX ix_deaths_animal_time ON deaths (animal_id, happened_at)`)

    // A correction: the wrong row stays, is struck through, and the right one is entered beside it
    await q.query(`
      CREATE TABLE animal_voids (
        id uuid CONSTRAINT pk_animal_voids PRIMARY KEY,
        count_entry_id uuid CONSTRAINT fk_animal_voids_count_entry REFERENCES count_entries (id)
          CONSTRAINT uq_animal_voids_count_entry UNIQUE,
        move_id uuid CONSTRAINT fk_animal_voids_move REFERENCES moves (id) CONSTRAINT uq_animal_voids_move UNIQUE,
        weight_id uuid CONSTRAINT fk_animal_voids_weight REFERENCES weights (id)
          CONSTRAINT uq_animal_voids_weight UNIQUE,
        death_id uuid CONSTRAINT fk_animal_voids_death REFERENCES deaths (id) CONSTRAINT uq_animal_voids_death UNIQUE,
        reason text NOT NULL,
        ${written('animal_voids')},
        CONSTRAINT ck_animal_voids_one CHECK (num_nonnulls(count_entry_id, move_id, weight_id, death_id) = 1)
      )`)

    await q.query(`
      CREATE TABLE discrepancies (
        id uuid CONSTRAINT pk_discrepancies PRIMARY KEY,
        ${animal('discrepancies')},
        kind text NOT NULL,
        for_role text NOT NULL CONSTRAINT ck_discrepancies_role CHECK (for_role IN ('veterinarian', 'registrar')),
        source_kind text NOT NULL,
        source_id uuid NOT NULL,
        facts jsonb NOT NULL,
        ${recorded('discrepancies')}
      )`)
    await q.query(`CREATE INDEX ix_discrepancies_animal ON discrepancies (animal_id)`)
    await q.query(`
      CREATE TABLE discrepancy_resolutions (
        id uuid CONSTRAINT pk_discrepancy_resolutions PRIMARY KEY,
        discrepancy_id uuid NOT NULL CONSTRAINT fk_discrepancy_resolutions_discrepancy REFERENCES discrepancies (id)
          CONSTRAINT uq_discrepancy_resolutions_discrepancy UNIQUE,
        outcome text NOT NULL,
        reason text NOT NULL,
        ${written('discrepancy_resolutions')}
      )`)

    await q.query(`
      CREATE TABLE movement_locks (
        id uuid CONSTRAINT pk_movement_locks PRIMARY KEY,
        ${animal('movement_locks')},
        kind text NOT NULL CONSTRAINT ck_movement_locks_kind CHECK (kind IN ('boundary', 'all')),
        source_kind text NOT NULL,
        source_id uuid NOT NULL,
        source_label text NOT NULL,
        reason text NOT NULL,
        ${recorded('movement_locks')}
      )`)
    await q.query(`CREATE INDEX ix_movement_locks_animal ON movement_locks (animal_id)`)
    await q.query(`CREATE INDEX ix_movement_locks_source ON movement_locks (source_id)`)
    await q.query(`
      CREATE TABLE movement_lock_lifts (
        id uuid CONSTRAINT pk_movement_lock_lifts PRIMARY KEY,
        lock_id uuid NOT NULL CONSTRAINT fk_movement_lock_lifts_lock REFERENCES movement_locks (id)
          CONSTRAINT uq_movement_lock_lifts_lock UNIQUE,
        reason text NOT NULL,
        ${recorded('movement_lock_lifts')}
      )`)

    for (const statement of countRules) await q.query(statement)

    // Taxa and the heads of animals are drafts; an accession number, a form and a parent never change
    await q.query(
      `GRANT UPDATE (scientific_name, common_name, taxon_group, quarantine_kind, note, version) ON taxa TO pratique_app`,
    )
    await q.query(`
      GRANT UPDATE (taxon_id, name, sex, stage, birth_kind, birth_date, birth_approximate, version)
        ON animals TO pratique_app`)
    await q.query(`GRANT UPDATE, DELETE ON stays TO pratique_app`)
  }

  async down(): Promise<void> {
    throw new Error('A landed migration is never taken back; add another one.')
  }
}
