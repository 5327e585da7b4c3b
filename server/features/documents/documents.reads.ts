import type { Action } from '../../../shared/domain/permissions/table.ts'
import type { DocumentKind } from '../../../shared/domain/register/document-kinds.ts'
import type { Db } from '../../platform/database/db.ts'
import type { FileOnRecord } from '../../platform/files/serve-kept.ts'

export interface DocumentReadRow {
  id: string
  parent_kind: string
  parent_id: string
  read_action: Action
  title: string
  kind: DocumentKind
  file_name: string
  media_type: string
  bytes: number
  sha256: string
  recorded_at: Date
  recorded_by_name: string | null
  voided_reason: string | null
  voided_at: Date | null
  voided_by_name: string | null
}

const columns = `
  d.id, d.parent_kind, d.parent_id, d.read_action, d.title, d.kind, d.file_name, d.media_type, d.bytes, d.sha256, d.recorded_at,
  p.printed_name AS recorded_by_name, v.reason AS voided_reason, v.recorded_at AS voided_at,
  w.printed_name AS voided_by_name`
const joins = `
  documents d LEFT JOIN people p ON p.id = d.recorded_by
  LEFT JOIN document_voids v ON v.document_id = d.id LEFT JOIN people w ON w.id = v.recorded_by`

export async function readDocument(db: Db, id: string): Promise<DocumentReadRow | null> {
  const [row]: DocumentReadRow[] = await db.query(`SELECT ${columns} FROM ${joins} WHERE d.id = $1`, [id])
  return row ?? null
}

/** The papers of some records of one kind, in the order in which they were attached; voided ones too. */
export function readDocumentsOf(
  db: Db,
  parentKind: string,
  parentIds: readonly string[],
): Promise<DocumentReadRow[]> {
  return db.query(
    `SELECT ${columns} FROM ${joins} WHERE d.parent_kind = $1 AND d.parent_id = ANY($2::uuid[])
      ORDER BY d.recorded_at, d.id`,
    [parentKind, parentIds],
  )
}

export interface PrintReadRow {
  fingerprint: string
  kind: string
  subject_id: string
  subject_label: string
  version: string
  printed_by_name: string
  printed_at: Date
}

/** Every print whose fingerprint begins with these digits, the newest first. */
export function readPrints(db: Db, digits: string): Promise<PrintReadRow[]> {
  return db.query(
    `SELECT r.fingerprint, r.kind, r.subject_id, r.subject_label, r.version, r.printed_by_name, r.printed_at
       FROM document_prints r WHERE r.fingerprint LIKE $1 || '%' ORDER BY r.printed_at DESC, r.id`,
    [digits],
  )
}

/** Every paper ever attached, with the file it stands on. */
export function readFilesOnRecord(db: Db): Promise<FileOnRecord[]> {
  return db.query(`SELECT d.id, d.sha256, d.title AS label FROM documents d ORDER BY d.recorded_at, d.id`)
}
