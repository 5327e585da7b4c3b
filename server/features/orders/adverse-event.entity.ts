import { Column, Entity, PrimaryColumn } from 'typeorm'

/** Something that went wrong with animals under an order, as it was seen; a ledger. */
@Entity('adverse_events')
export class AdverseEventRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'order_id' }) orderId!: string
  @Column({ type: 'text', name: 'dose_key', nullable: true }) doseKey!: string | null
  @Column({ type: 'text' }) seen!: string
  @Column({ type: 'integer', name: 'affected_count', nullable: true }) affectedCount!: number | null
  @Column({ type: 'timestamptz', name: 'happened_at' }) happenedAt!: Date
  @Column({ type: 'date', name: 'happened_on' }) happenedOn!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by' }) recordedBy!: string
}

/** What a veterinarian found of it: one for each; a ledger. */
@Entity('adverse_event_reviews')
export class AdverseEventReviewRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'event_id' }) eventId!: string
  @Column({ type: 'text' }) finding!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by' }) recordedBy!: string
}
