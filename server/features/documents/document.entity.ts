import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { Action } from '../../../shared/domain/permissions/table.ts'
import type { DocumentKind } from '../../../shared/domain/register/document-kinds.ts'

/** A paper on file. Its bytes lie in the file store under their hash; a ledger. */
@Entity('documents')
export class DocumentRecord {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  /** The record it belongs to: a transaction, a permit. */
  @Column({ type: 'text', name: 'parent_kind' }) parentKind!: string
  @Column({ type: 'uuid', name: 'parent_id' }) parentId!: string
  /** The right that opens the record it belongs to, and the one that changes it. */
  @Column({ type: 'text', name: 'read_action' }) readAction!: Action
  @Column({ type: 'text', name: 'write_action' }) writeAction!: Action
  @Column({ type: 'text' }) title!: string
  @Column({ type: 'text' }) kind!: DocumentKind
  @Column({ type: 'text', name: 'file_name' }) fileName!: string
  @Column({ type: 'text', name: 'media_type' }) mediaType!: string
  @Column({ type: 'integer' }) bytes!: number
  @Column({ type: 'text' }) sha256!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}

/** The voiding of a paper that was attached wrongly; a ledger. */
@Entity('document_voids')
export class DocumentVoid {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'uuid', name: 'document_id' }) documentId!: string
  @Column({ type: 'text' }) reason!: string
  @Column({ type: 'timestamptz', name: 'recorded_at' }) recordedAt!: Date
  @Column({ type: 'uuid', name: 'recorded_by', nullable: true }) recordedBy!: string | null
}

/** One printing of a record, found again by the fingerprint on the paper; a ledger. */
@Entity('document_prints')
export class DocumentPrint {
  @PrimaryColumn({ type: 'uuid' }) id!: string
  @Column({ type: 'text' }) fingerprint!: string
  @Column({ type: 'text' }) kind!: string
  @Column({ type: 'text', name: 'subject_id' }) subjectId!: string
  @Column({ type: 'text', name: 'subject_label' }) subjectLabel!: string
  @Column({ type: 'text' }) version!: string
  @Column({ type: 'uuid', name: 'printed_by', nullable: true }) printedBy!: string | null
  @Column({ type: 'text', name: 'printed_by_name' }) printedByName!: string
  @Column({ type: 'timestamptz', name: 'printed_at' }) printedAt!: Date
}
