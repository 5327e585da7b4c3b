import { Column, Entity, PrimaryColumn } from 'typeorm'

/** A proposed value of a setting; a ledger, never changed. */
@Entity('setting_versions')
export class SettingVersion {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) key!: string
  @Column({ type: 'text' }) value!: string
  @Column({ type: 'text', nullable: true }) reason!: string | null
  @Column({ type: 'timestamptz', name: 'proposed_at' }) proposedAt!: Date
  @Column({ type: 'uuid', name: 'proposed_by', nullable: true }) proposedBy!: string | null
}

/** The confirmation of a proposed value; a ledger, never changed. */
@Entity('setting_confirmations')
export class SettingConfirmation {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'setting_version_id' }) settingVersionId!: string
  @Column({ type: 'timestamptz', name: 'confirmed_at' }) confirmedAt!: Date
  @Column({ type: 'uuid', name: 'confirmed_by', nullable: true }) confirmedBy!: string | null
  @Column({ type: 'text', nullable: true }) reason!: string | null
}
