import { Column, Entity, PrimaryColumn } from 'typeorm'

/** A value proposed for a threshold of a rule; a ledger, each version taking the place of the one before. */
@Entity('rule_parameter_versions')
export class RuleParameterVersion {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text', name: 'rule_id' }) ruleId!: string
  @Column({ type: 'text', name: 'parameter_key' }) parameterKey!: string
  @Column({ type: 'numeric', name: 'entered_value' }) enteredValue!: string
  @Column({ type: 'text', name: 'entered_unit' }) enteredUnit!: string
  @Column({ type: 'text' }) reason!: string
  @Column({ type: 'uuid', name: 'supersedes_id', nullable: true }) supersedesId!: string | null
  @Column({ type: 'timestamptz', name: 'proposed_at' }) proposedAt!: Date
  @Column({ type: 'uuid', name: 'proposed_by' }) proposedBy!: string
}

/** A licensed veterinarian's confirmation of such a value; a ledger. */
@Entity('rule_parameter_confirmations')
export class RuleParameterConfirmation {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'version_id' }) versionId!: string
  @Column({ type: 'text' }) reason!: string
  @Column({ type: 'text' }) jurisdiction!: string
  @Column({ type: 'text', name: 'licence_number' }) licenceNumber!: string
  @Column({ type: 'timestamptz', name: 'confirmed_at' }) confirmedAt!: Date
  @Column({ type: 'date', name: 'confirmed_on' }) confirmedOn!: string
  @Column({ type: 'uuid', name: 'confirmed_by' }) confirmedBy!: string
}
