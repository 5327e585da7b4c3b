import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { PermitMark } from '../../../shared/domain/register/judge-permit-use.ts'
import type { PermitKind } from '../../../shared/domain/register/permit-kinds.ts'

/** A permit as printed; a ledger. A wrong one is voided and entered again. */
@Entity('permits')
export class PermitRecord {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) number!: string
  @Column({ type: 'text', name: 'permit_number' }) permitNumber!: string
  @Column({ type: 'text' }) authority!: string
  @Column({ type: 'text' }) kind!: PermitKind
  @Column({ type: 'date', name: 'valid_from' }) validFrom!: string
  @Column({ type: 'date', name: 'valid_until' }) validUntil!: string
  /** Whole animals in all; null: no number is stated. */
  @Column({ type: 'integer', name: 'quantity_allowed', nullable: true }) quantityAllowed!: number | null
  @Column({ type: 'uuid', name: 'counterparty_id', nullable: true }) counterpartyId!: string | null
  @Column({ type: 'text', name: 'purpose_code', nullable: true }) purposeCode!: string | null
  @Column({ type: 'text', nullable: true }) conditions!: string | null
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}

/** A taxon that a permit is restricted to. */
@Entity('permit_taxa')
export class PermitTaxon {
  @PrimaryColumn({ type: 'uuid', name: 'permit_id' }) permitId!: string
  @PrimaryColumn({ type: 'uuid', name: 'taxon_id' }) taxonId!: string
}

/** The voiding of a permit; a ledger. */
@Entity('permit_voids')
export class PermitVoid {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'permit_id' }) permitId!: string
  @Column({ type: 'text' }) reason!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}

/** Animals taken under a permit, with the marks it had when it was entered; a ledger. */
@Entity('permit_uses')
export class PermitUseRecord {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'permit_id' }) permitId!: string
  @Column({ type: 'uuid', name: 'transaction_id' }) transactionId!: string
  @Column({ type: 'uuid', name: 'line_id' }) lineId!: string
  @Column({ type: 'integer' }) quantity!: number
  /** Whole animals of the quantity that the permit did not cover. */
  @Column({ type: 'integer' }) excess!: number
  @Column({ type: 'text', array: true }) marks!: PermitMark[]
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}

/** What the registrar wrote about a use that its permit does not cover; a ledger. */
@Entity('permit_use_explanations')
export class PermitUseExplanation {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'permit_use_id' }) permitUseId!: string
  @Column({ type: 'text' }) reason!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}
