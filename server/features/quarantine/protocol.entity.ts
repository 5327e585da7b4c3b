import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { ProtocolContent } from '../../../shared/domain/protocol/protocol-content.ts'
import type { SourceMark } from '../../../shared/domain/sources.ts'

/** A protocol under its code; what it says stands in its versions. */
@Entity('protocols')
export class ProtocolRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) code!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}

/** One version of a protocol as proposed; never changed. */
@Entity('protocol_versions')
export class ProtocolVersionRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'protocol_id' }) protocolId!: string
  @Column({ type: 'integer' }) version!: number
  @Column({ type: 'text' }) name!: string
  @Column({ type: 'jsonb' }) content!: ProtocolContent
  @Column({ type: 'text' }) source!: string
  @Column({ type: 'text' }) mark!: SourceMark
  @Column({ type: 'text', nullable: true }) reason!: string | null
  @Column({ type: 'timestamptz', name: 'proposed_at' }) proposedAt!: Date
  @Column({ type: 'uuid', name: 'proposed_by', nullable: true }) proposedBy!: string | null
}

@Entity('protocol_confirmations')
export class ProtocolConfirmationRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'protocol_version_id' }) protocolVersionId!: string
  @Column({ type: 'text', nullable: true }) reason!: string | null
  @Column({ type: 'timestamptz', name: 'confirmed_at' }) confirmedAt!: Date
  @Column({ type: 'uuid', name: 'confirmed_by' }) confirmedBy!: string
}
