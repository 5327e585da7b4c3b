import { Column, Entity, PrimaryColumn } from 'typeorm'

/** A signed text with its seal; sealed for ever. */
@Entity('signed_texts')
export class SignedText {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text', name: 'subject_kind' }) subjectKind!: string
  @Column({ type: 'uuid', name: 'subject_id' }) subjectId!: string
  @Column({ type: 'text', name: 'subject_label' }) subjectLabel!: string
  @Column({ type: 'text' }) meaning!: string
  @Column({ type: 'text' }) text!: string
  @Column({ type: 'text' }) hash!: string
  @Column({ type: 'text' }) signature!: string
  @Column({ type: 'text', name: 'key_id' }) keyId!: string
  @Column({ type: 'uuid', name: 'signer_id' }) signerId!: string
  @Column({ type: 'timestamptz', name: 'signed_at' }) signedAt!: Date
}
