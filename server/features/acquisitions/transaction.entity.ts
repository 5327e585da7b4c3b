import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { SourceCode } from '../../../shared/domain/register/permit-kinds.ts'
import type { TransactionKind } from '../../../shared/domain/register/transaction-kinds.ts'

/** Animals came or went; a ledger. A wrong one is voided and entered again. */
@Entity('transactions')
export class TransactionRecord {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) number!: string
  @Column({ type: 'text' }) way!: 'in' | 'out'
  @Column({ type: 'text' }) kind!: TransactionKind
  @Column({ type: 'text' }) stage!: 'now' | 'already'
  /** The date as entered: a day, a month or a year. */
  @Column({ type: 'text', name: 'happened_text' }) happenedText!: string
  @Column({ type: 'text', name: 'happened_time', nullable: true }) happenedTime!: string | null
  /** Where it stands in the ledgers; exact only with a time. */
  @Column({ type: 'timestamptz', name: 'happened_at' }) happenedAt!: Date
  @Column({ type: 'date', name: 'happened_on' }) happenedOn!: string
  @Column({ type: 'uuid', name: 'counterparty_id', nullable: true }) counterpartyId!: string | null
  @Column({ type: 'text', nullable: true }) reference!: string | null
  @Column({ type: 'text', nullable: true }) place!: string | null
  @Column({ type: 'text', name: 'place_date', nullable: true }) placeDate!: string | null
  @Column({ type: 'text', name: 'place_method', nullable: true }) placeMethod!: string | null
  @Column({ type: 'double precision', nullable: true }) latitude!: number | null
  @Column({ type: 'double precision', nullable: true }) longitude!: number | null
  @Column({ type: 'double precision', name: 'uncertainty_metres', nullable: true })
  uncertaintyMetres!: number | null
  @Column({ type: 'text', nullable: true }) carrier!: string | null
  @Column({ type: 'text', nullable: true }) waybill!: string | null
  @Column({ type: 'integer', name: 'box_count', nullable: true }) boxCount!: number | null
  @Column({ type: 'timestamptz', name: 'sealed_at', nullable: true }) sealedAt!: Date | null
  @Column({ type: 'timestamptz', name: 'opened_at', nullable: true }) openedAt!: Date | null
  @Column({ type: 'text', name: 'transport_note', nullable: true }) transportNote!: string | null
  @Column({ type: 'date', name: 'loan_due_on', nullable: true }) loanDueOn!: string | null
  @Column({ type: 'text', nullable: true }) note!: string | null
  /** SHA-256 of what was sent: the same form sent again is the same transaction. */
  @Column({ type: 'text', name: 'content_hash' }) contentHash!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}

/** One animal or group of a transaction; a ledger. */
@Entity('transaction_lines')
export class TransactionLine {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'transaction_id' }) transactionId!: string
  @Column({ type: 'integer' }) position!: number
  @Column({ type: 'uuid', name: 'animal_id' }) animalId!: string
  /** This transaction gave it its accession number. */
  @Column({ type: 'boolean' }) accessioned!: boolean
  @Column({ type: 'integer' }) count!: number
  @Column({ type: 'integer', name: 'estimate_low', nullable: true }) estimateLow!: number | null
  @Column({ type: 'integer', name: 'estimate_high', nullable: true }) estimateHigh!: number | null
  @Column({ type: 'integer', name: 'dead_on_arrival', nullable: true }) deadOnArrival!: number | null
  @Column({ type: 'text', name: 'their_number', nullable: true }) theirNumber!: string | null
  @Column({ type: 'text', name: 'source_code', nullable: true }) sourceCode!: SourceCode | null
  @Column({ type: 'uuid', name: 'enclosure_id', nullable: true }) enclosureId!: string | null
  /** Its line in the count ledger; null where the ledger could give nothing. */
  @Column({ type: 'uuid', name: 'count_entry_id', nullable: true }) countEntryId!: string | null
}

/** The voiding of a transaction; a ledger. */
@Entity('transaction_voids')
export class TransactionVoid {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'transaction_id' }) transactionId!: string
  @Column({ type: 'text' }) reason!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}
