import { Column, Entity, PrimaryColumn } from 'typeorm'

/** The head of an order: its number, its draft while there is one, and the row that is locked for every change. */
@Entity('orders')
export class OrderHead {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) number!: string
  @Column({ type: 'uuid', name: 'enclosure_id' }) enclosureId!: string
  /** `none`: nothing is being written, the newest signed version is the order. */
  @Column({ type: 'text' }) stage!: 'draft' | 'proposed' | 'none'
  @Column({ type: 'text', name: 'draft_text', nullable: true }) draftText!: string | null
  @Column({ type: 'timestamptz', name: 'created_at' }) createdAt!: Date
  @Column({ type: 'uuid', name: 'created_by', nullable: true }) createdBy!: string | null
  @Column({ type: 'timestamptz', name: 'changed_at' }) changedAt!: Date
  @Column({ type: 'uuid', name: 'changed_by', nullable: true }) changedBy!: string | null
  @Column({ type: 'integer', default: 1 }) version!: number
}

/** A signed version: the text is in signed_texts, the columns here are copies for searching and joining. Sealed. */
@Entity('order_versions')
export class OrderVersion {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'order_id' }) orderId!: string
  @Column({ type: 'integer', name: 'version_no' }) versionNo!: number
  @Column({ type: 'uuid', name: 'signed_text_id' }) signedTextId!: string
  @Column({ type: 'text' }) agent!: string
  @Column({ type: 'uuid', name: 'product_id' }) productId!: string
  @Column({ type: 'uuid', name: 'lot_id', nullable: true }) lotId!: string | null
  @Column({ type: 'uuid', name: 'enclosure_id' }) enclosureId!: string
  @Column({ type: 'uuid', name: 'determination_id' }) determinationId!: string
  @Column({ type: 'double precision', name: 'net_volume_litres' }) netVolumeLitres!: number
  @Column({ type: 'double precision', name: 'allowed_drift_percent' }) allowedDriftPercent!: number
  @Column({ type: 'numeric', name: 'amount_entered_value' }) amountEnteredValue!: string
  @Column({ type: 'text', name: 'amount_entered_unit' }) amountEnteredUnit!: string
  @Column({ type: 'double precision', name: 'target_mg_per_l', nullable: true }) targetMgPerL!: number | null
  @Column({ type: 'integer' }) doses!: number
  @Column({ type: 'double precision', name: 'interval_hours', nullable: true }) intervalHours!: number | null
  @Column({ type: 'double precision', name: 'contact_minutes', nullable: true }) contactMinutes!:
    number | null
  @Column({ type: 'timestamptz', name: 'starts_at' }) startsAt!: Date
  @Column({ type: 'timestamptz', name: 'signed_at' }) signedAt!: Date
  @Column({ type: 'uuid', name: 'signed_by' }) signedBy!: string
}

/** Whom a signed version treats. Sealed. */
@Entity('order_version_animals')
export class OrderVersionAnimal {
  @PrimaryColumn({ type: 'uuid', name: 'order_version_id' }) orderVersionId!: string
  @PrimaryColumn({ type: 'uuid', name: 'animal_id' }) animalId!: string
  @Column({ type: 'uuid', name: 'taxon_id' }) taxonId!: string
}

/** Holds, lifts and the end of an order; a ledger. */
@Entity('order_events')
export class OrderEventRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'order_id' }) orderId!: string
  @Column({ type: 'text' }) kind!: 'held' | 'hold-lifted' | 'discontinued'
  @Column({ type: 'text', nullable: true }) reason!: string | null
  @Column({ type: 'timestamptz', name: 'happened_at' }) happenedAt!: Date
  @Column({ type: 'date', name: 'happened_on' }) happenedOn!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}

/** A veterinarian's dated declaration of earlier experience with an agent in a taxon here; a ledger. */
@Entity('agent_experience')
export class AgentExperience {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) agent!: string
  @Column({ type: 'uuid', name: 'taxon_id' }) taxonId!: string
  @Column({ type: 'uuid', name: 'order_version_id', nullable: true }) orderVersionId!: string | null
  @Column({ type: 'timestamptz', name: 'declared_at' }) declaredAt!: Date
  @Column({ type: 'uuid', name: 'declared_by' }) declaredBy!: string
}
