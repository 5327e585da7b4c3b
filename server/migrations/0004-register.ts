import type { MigrationInterface, QueryRunner } from 'typeorm'

/** When it was written down and by whom. */
const written = (table: string) => `
  recorded_at timestamptz NOT NULL,
  recorded_by uuid CONSTRAINT fk_${table}_recorded_by REFERENCES people (id)`

const named = (table: string, column: string) =>
  `${column} text NOT NULL CONSTRAINT ck_${table}_${column} CHECK (length(trim(${column})) > 0)`

/** A year, a month or a day, as exactly as it is known. */
const partialDate = (table: string, column: string) =>
  `${column} text CONSTRAINT ck_${table}_${column}
     CHECK (${column} ~ '^[1-9][0-9]{3}(-(0[1-9]|1[0-2])(-(0[1-9]|[12][0-9]|3[01]))?)?$')`

const sha256 = (table: string, column: string) =>
  `${column} text NOT NULL CONSTRAINT ck_${table}_${column} CHECK (${column} ~ '^[0-9a-f]{64}$')`

/** Papers, prints, permits, transactions in and out, and what has been exported. All but counterparties only grow. */
export class Register1764600000004 implements MigrationInterface {
  async up(q: QueryRunner): Promise<void> {
    await q.query(`
      CREATE TABLE documents (
        id uuid CONSTRAINT pk_documents PRIMARY KEY,
        parent_kind text NOT NULL,
        parent_id uuid NOT NULL,
        read_action text NOT NULL,
        write_action text NOT NULL,
        ${named('documents', 'title')},
        kind text NOT NULL,
        ${named('documents', 'file_name')},
        media_type text NOT NULL,
        bytes integer NOT NULL CONSTRAINT ck_documents_bytes CHECK (bytes > 0),
        ${sha256('documents', 'sha256')},
        ${written('documents')}
      )`)
    await q.query(`CREATE INDEX ix_documents_parent ON documents (parent_kind, parent_id)`)
    await q.query(`
      CREATE TABLE document_voids (
        id uuid CONSTRAINT pk_document_voids PRIMARY KEY,
        document_id uuid NOT NULL CONSTRAINT fk_document_voids_document REFERENCES documents (id)
          CONSTRAINT uq_document_voids_document UNIQUE,
        ${named('document_voids', 'reason')},
        ${written('document_voids')}
      )`)
    await q.query(`
      CREATE TABLE document_prints (
        id uuid CONSTRAINT pk_document_prints PRIMARY KEY,
        ${sha256('document_prints', 'fingerprint')},
        kind text NOT NULL,
        subject_id text NOT NULL,
        ${named('document_prints', 'subject_label')},
        version text NOT NULL,
        printed_by uuid CONSTRAINT fk_document_prints_printed_by REFERENCES people (id),
        printed_by_name text NOT NULL,
        printed_at timestamptz NOT NULL
      )`)
    await q.query(
      `CREATE INDEX ix_document_prints_fingerprint ON document_prints (fingerprint text_pattern_ops, printed_at DESC)`,
    )

    await q.query(`
      CREATE TABLE counterparties (
        id uuid CONSTRAINT pk_counterparties PRIMARY KEY,
        ${named('counterparties', 'name')},
        kind text NOT NULL CONSTRAINT ck_counterparties_kind
          CHECK (kind IN ('institution', 'dealer', 'collector', 'authority', 'person', 'other')),
        address text,
        registration text,
        email text,
        telephone text,
        note text,
        ${written('counterparties')},
        version integer NOT NULL DEFAULT 1
      )`)
    await q.query(`CREATE UNIQUE INDEX uq_counterparties_name ON counterparties (lower(name))`)

    await q.query(`
      CREATE TABLE permits (
        id uuid CONSTRAINT pk_permits PRIMARY KEY,
        number text NOT NULL CONSTRAINT uq_permits_number UNIQUE,
        ${named('permits', 'permit_number')},
        ${named('permits', 'authority')},
        kind text NOT NULL,
        valid_from date NOT NULL,
        valid_until date NOT NULL,
        quantity_allowed integer CONSTRAINT ck_permits_quantity CHECK (quantity_allowed > 0),
        counterparty_id uuid CONSTRAINT fk_permits_counterparty REFERENCES counterparties (id),
        purpose_code text,
        conditions text,
        ${written('permits')},
        CONSTRAINT ck_permits_period CHECK (valid_until >= valid_from)
      )`)
    await q.query(`CREATE INDEX ix_permits_valid_until ON permits (valid_until)`)
    await q.query(`
      CREATE TABLE permit_taxa (
        permit_id uuid NOT NULL CONSTRAINT fk_permit_taxa_permit REFERENCES permits (id),
        taxon_id uuid NOT NULL CONSTRAINT fk_permit_taxa_taxon REFERENCES taxa (id),
        CONSTRAINT pk_permit_taxa PRIMARY KEY (permit_id, taxon_id)
      )`)
    await q.query(`
      CREATE TABLE permit_voids (
        id uuid CONSTRAINT pk_permit_voids PRIMARY KEY,
        permit_id uuid NOT NULL CONSTRAINT fk_permit_voids_permit REFERENCES permits (id)
          CONSTRAINT uq_permit_voids_permit UNIQUE,
        ${named('permit_voids', 'reason')},
        ${written('permit_voids')}
      )`)

    await q.query(`
      CREATE TABLE transactions (
        id uuid CONSTRAINT pk_transactions PRIMARY KEY,
        number text NOT NULL CONSTRAINT uq_transactions_number UNIQUE,
        way text NOT NULL CONSTRAINT ck_transactions_way CHECK (way IN ('in', 'out')),
        kind text NOT NULL,
        stage text NOT NULL CONSTRAINT ck_transactions_stage CHECK (stage IN ('now', 'already')),
        ${partialDate('transactions', 'happened_text')} NOT NULL,
        happened_time text CONSTRAINT ck_transactions_happened_time CHECK (happened_time ~ '^[0-2][0-9]:[0-5][0-9]$'),
        happened_at timestamptz NOT NULL,
        happened_on date NOT NULL,
        counterparty_id uuid CONSTRAINT fk_transactions_counterparty REFERENCES counterparties (id),
        reference text,
        place text,
        ${partialDate('transactions', 'place_date')},
        place_method text,
        latitude double precision CONSTRAINT ck_transactions_latitude CHECK (latitude BETWEEN -90 AND 90),
        longitude double precision CONSTRAINT ck_transactions_longitude CHECK (longitude BETWEEN -180 AND 180),
        uncertainty_metres double precision CONSTRAINT ck_transactions_uncertainty CHECK (uncertainty_metres > 0),
        carrier text,
        waybill text,
        box_count integer CONSTRAINT ck_transactions_box_count CHECK (box_count > 0),
        sealed_at timestamptz,
        opened_at timestamptz,
        transport_note text,
        loan_due_on date,
        note text,
        ${sha256('transactions', 'content_hash')},
        ${written('transactions')},
        CONSTRAINT ck_transactions_coordinates CHECK ((latitude IS NULL) = (longitude IS NULL)),
        CONSTRAINT ck_transactions_opened CHECK (opened_at >= sealed_at)
      )`)
    await q.query(`CREATE INDEX ix_transactions_happened ON transactions (happened_at DESC, id)`)
    await q.query(`CREATE INDEX ix_transactions_counterparty ON transactions (counterparty_id)`)
    await q.query(`
      CREATE TABLE transaction_lines (
        id uuid CONSTRAINT pk_transaction_lines PRIMARY KEY,
        transaction_id uuid NOT NULL CONSTRAINT fk_transaction_lines_transaction REFERENCES transactions (id),
        position integer NOT NULL,
        animal_id uuid NOT NULL CONSTRAINT fk_transaction_lines_animal REFERENCES animals (id),
        accessioned boolean NOT NULL,
        count integer NOT NULL CONSTRAINT ck_transaction_lines_count CHECK (count > 0),
        estimate_low integer,
        estimate_high integer,
        dead_on_arrival integer CONSTRAINT ck_transaction_lines_dead CHECK (dead_on_arrival >= 0),
        their_number text,
        source_code text,
        enclosure_id uuid CONSTRAINT fk_transaction_lines_enclosure REFERENCES enclosures (id),
        count_entry_id uuid CONSTRAINT fk_transaction_lines_count_entry REFERENCES count_entries (id)
          CONSTRAINT uq_transaction_lines_count_entry UNIQUE,
        CONSTRAINT uq_transaction_lines_position UNIQUE (transaction_id, position),
        CONSTRAINT ck_transaction_lines_estimate CHECK (
          (estimate_low IS NULL) = (estimate_high IS NULL) AND estimate_low >= 0
          AND count BETWEEN estimate_low AND estimate_high)
      )`)
    await q.query(`CREATE INDEX ix_transaction_lines_animal ON transaction_lines (animal_id)`)
    await q.query(`
      CREATE TABLE transaction_voids (
        id uuid CONSTRAINT pk_transaction_voids PRIMARY KEY,
        transaction_id uuid NOT NULL CONSTRAINT fk_transaction_voids_transaction REFERENCES transactions (id)
          CONSTRAINT uq_transaction_voids_transaction UNIQUE,
        ${named('transaction_voids', 'reason')},
        ${written('transaction_voids')}
      )`)

    await q.query(`
      CREATE TABLE permit_uses (
        id uuid CONSTRAINT pk_permit_uses PRIMARY KEY,
        permit_id uuid NOT NULL CONSTRAINT fk_permit_uses_permit REFERENCES permits (id),
        transaction_id uuid NOT NULL CONSTRAINT fk_permit_uses_transaction REFERENCES transactions (id),
        line_id uuid NOT NULL CONSTRAINT fk_permit_uses_line REFERENCES transaction_lines (id),
        quantity integer NOT NULL CONSTRAINT ck_permit_uses_quantity CHECK (quantity > 0),
        excess integer NOT NULL CONSTRAINT ck_permit_uses_excess CHECK (excess >= 0 AND excess <= quantity),
        marks text[] NOT NULL,
        ${written('permit_uses')},
        CONSTRAINT uq_permit_uses_line UNIQUE (permit_id, line_id)
      )`)
    await q.query(`CREATE INDEX ix_permit_uses_transaction ON permit_uses (transaction_id)`)
    await q.query(`
      CREATE TABLE permit_use_explanations (
        id uuid CONSTRAINT pk_permit_use_explanations PRIMARY KEY,
        permit_use_id uuid NOT NULL CONSTRAINT fk_permit_use_explanations_use REFERENCES permit_uses (id)
          CONSTRAINT uq_permit_use_explanations_use UNIQUE,
        ${named('permit_use_explanations', 'reason')},
        ${written('permit_use_explanations')}
      )`)

    await q.query(`
      CREATE TABLE exports (
        id uuid CONSTRAINT pk_exports PRIMARY KEY,
        kind text NOT NULL,
        subject_id uuid NOT NULL,
        ${named('exports', 'subject_label')},
        format text NOT NULL,
        period_from date,
        period_until date,
        reason text,
        ${named('exports', 'file_name')},
        media_type text NOT NULL,
        bytes integer NOT NULL CONSTRAINT ck_exports_bytes CHECK (bytes > 0),
        ${sha256('exports', 'sha256')},
        ${sha256('exports', 'fingerprint')},
        exported_at timestamptz NOT NULL,
        exported_by uuid CONSTRAINT fk_exports_exported_by REFERENCES people (id),
        CONSTRAINT ck_exports_period CHECK (period_until >= period_from)
      )`)
    await q.query(`CREATE INDEX ix_exports_subject ON exports (subject_id, exported_at DESC)`)
    await q.query(`CREATE INDEX ix_exports_exported ON exports (exported_at DESC, id)`)

    await q.query(`
      GRANT UPDATE (name, kind, address, registration, email, telephone, note, version)
        ON counterparties TO pratique_app`)
  }

  async down(): Promise<void> {
    throw new Error('A landed migration is never taken back; add another one.')
  }
}
