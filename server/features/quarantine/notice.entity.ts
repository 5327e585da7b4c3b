import { Column, Entity, PrimaryColumn } from 'typeorm'
import { RecordedFact } from './recorded-fact.entity.ts'

/** An urgent observation that somebody has to be told of. */
@Entity('notices')
export class NoticeRow extends RecordedFact {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'observation_id' }) observationId!: string
  @Column({ type: 'uuid', name: 'enclosure_id' }) enclosureId!: string
  @Column({ type: 'text', name: 'case_number', nullable: true }) caseNumber!: string | null
  @Column({ type: 'text' }) words!: string
}

/** One attempt to reach one person; a ledger. */
@Entity('notice_deliveries')
export class NoticeDeliveryRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'notice_id' }) noticeId!: string
  @Column({ type: 'text', name: 'to_name' }) toName!: string
  @Column({ type: 'text', name: 'to_address' }) toAddress!: string
  @Column({ type: 'text' }) outcome!: 'sent' | 'failed'
  @Column({ type: 'text', nullable: true }) error!: string | null
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
}

/** Somebody has seen it, or has telephoned. */
@Entity('notice_acts')
export class NoticeActRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'notice_id' }) noticeId!: string
  @Column({ type: 'text' }) kind!: 'seen' | 'telephoned'
  @Column({ type: 'text', nullable: true }) whom!: string | null
  @Column({ type: 'timestamptz', name: 'happened_at' }) happenedAt!: Date
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}
