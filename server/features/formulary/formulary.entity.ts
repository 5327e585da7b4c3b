import { Column, Entity, PrimaryColumn } from 'typeorm'

/** A product on the shelf, with its strength as on the label. */
@Entity('products')
export class ProductRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) agent!: string
  @Column({ type: 'text', name: 'product_name' }) productName!: string
  @Column({ type: 'text' }) form!: string
  @Column({ type: 'numeric', name: 'strength_entered_value' }) strengthEnteredValue!: string
  @Column({ type: 'text', name: 'strength_entered_unit' }) strengthEnteredUnit!: string
  @Column({ type: 'text', name: 'strength_basis' }) strengthBasis!: string
  @Column({ type: 'double precision', name: 'density_g_per_ml', nullable: true }) densityGPerMl!:
    number | null
  @Column({ type: 'boolean', name: 'in_use' }) inUse!: boolean
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
  @Column({ type: 'integer', default: 1 }) version!: number
}

/** A lot that came in; a ledger. */
@Entity('product_lots')
export class LotRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'product_id' }) productId!: string
  @Column({ type: 'text', name: 'lot_number' }) lotNumber!: string
  @Column({ type: 'date', name: 'expires_on' }) expiresOn!: string
  @Column({ type: 'date', name: 'received_on' }) receivedOn!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}

/** What happened to a lot; a ledger. */
@Entity('lot_events')
export class LotEventRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'lot_id' }) lotId!: string
  @Column({ type: 'text' }) kind!: string
  @Column({ type: 'timestamptz', name: 'happened_at' }) happenedAt!: Date
  @Column({ type: 'date', name: 'happened_on' }) happenedOn!: string
  @Column({ type: 'text', nullable: true }) note!: string | null
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}

/** A published range as this facility has it; a ledger, superseded by later lines. */
@Entity('dose_lines')
export class DoseLineRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) agent!: string
  @Column({ type: 'text' }) use!: string
  @Column({ type: 'double precision', nullable: true }) low!: number | null
  @Column({ type: 'double precision' }) high!: number
  @Column({ type: 'text' }) unit!: string
  @Column({ type: 'text' }) basis!: string
  @Column({ type: 'double precision', name: 'longest_contact_minutes', nullable: true })
  longestContactMinutes!: number | null
  @Column({ type: 'text' }) water!: string
  @Column({ type: 'text' }) source!: string
  @Column({ type: 'text' }) mark!: string
  @Column({ type: 'text', nullable: true }) reason!: string | null
  @Column({ type: 'uuid', name: 'supersedes_id', nullable: true }) supersedesId!: string | null
  @Column({ type: 'timestamptz', name: 'proposed_at' }) proposedAt!: Date
  @Column({ type: 'uuid', name: 'proposed_by', nullable: true }) proposedBy!: string | null
}

/** A licensed veterinarian's confirmation of a dose line; a ledger. */
@Entity('dose_line_confirmations')
export class DoseLineConfirmation {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'dose_line_id' }) doseLineId!: string
  @Column({ type: 'timestamptz', name: 'confirmed_at' }) confirmedAt!: Date
  @Column({ type: 'uuid', name: 'confirmed_by' }) confirmedBy!: string
  @Column({ type: 'text', nullable: true }) reason!: string | null
}
