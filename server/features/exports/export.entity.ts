import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { ExportFormat } from '../../../shared/domain/register/export-formats.ts'

/** A file that left the house, with the hash of its bytes and of what it says; a ledger. */
@Entity('exports')
export class ExportRecord {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) kind!: 'acquisition-history'
  @Column({ type: 'uuid', name: 'subject_id' }) subjectId!: string
  @Column({ type: 'text', name: 'subject_label' }) subjectLabel!: string
  @Column({ type: 'text' }) format!: ExportFormat
  @Column({ type: 'date', name: 'period_from', nullable: true }) periodFrom!: string | null
  @Column({ type: 'date', name: 'period_until', nullable: true }) periodUntil!: string | null
  @Column({ type: 'text', nullable: true }) reason!: string | null
  @Column({ type: 'text', name: 'file_name' }) fileName!: string
  @Column({ type: 'text', name: 'media_type' }) mediaType!: string
  @Column({ type: 'integer' }) bytes!: number
  @Column({ type: 'text' }) sha256!: string
  @Column({ type: 'text' }) fingerprint!: string
  @Column({ type: 'timestamptz', name: 'exported_at' }) exportedAt!: Date
  @Column({ type: 'uuid', name: 'exported_by', nullable: true }) exportedBy!: string | null
}
