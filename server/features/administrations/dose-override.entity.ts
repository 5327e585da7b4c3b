import { Column, Entity, PrimaryColumn } from 'typeorm'

/** A stop at one dose that a veterinarian overrode: the text is in signed_texts, the columns here are copies. Sealed. */
@Entity('dose_overrides')
export class DoseOverrideRow {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'order_version_id' }) orderVersionId!: string
  @Column({ type: 'text', name: 'dose_key' }) doseKey!: string
  @Column({ type: 'uuid', name: 'signed_text_id' }) signedTextId!: string
  @Column({ type: 'text', name: 'rule_id' }) ruleId!: string
  @Column({ type: 'text' }) code!: string
  @Column({ type: 'text' }) reason!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by' }) recordedBy!: string
}
