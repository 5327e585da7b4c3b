import { Column, Entity, PrimaryColumn } from 'typeorm'

/** What one watch leaves for the next; a ledger. */
@Entity('handover_notes')
export class HandoverNoteRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text', nullable: true }) about!: string | null
  @Column({ type: 'text' }) words!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by' }) recordedBy!: string
}

/** That somebody has read it; a ledger. */
@Entity('handover_reads')
export class HandoverReadRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'note_id' }) noteId!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by' }) recordedBy!: string
}
