import { containing } from '../../platform/database/like.ts'
import type { ExportFormat } from '../../../shared/domain/register/export-formats.ts'
import type { Db } from '../../platform/database/db.ts'
import type { FileOnRecord } from '../../platform/files/serve-kept.ts'

export interface ExportReadRow {
  id: string
  subject_label: string
  format: ExportFormat
  period_from: string | null
  period_until: string | null
  reason: string | null
  file_name: string
  media_type: string
  bytes: number
  sha256: string
  fingerprint: string
  exported_at: Date
  exported_by_name: string | null
}

const columns = `
  x.id, x.subject_label, x.format, x.period_from::text, x.period_until::text, x.reason, x.file_name, x.media_type,
  x.bytes, x.sha256, x.fingerprint, x.exported_at, p.printed_name AS exported_by_name`
const joins = `exports x LEFT JOIN people p ON p.id = x.exported_by`

export async function readExport(db: Db, id: string): Promise<ExportReadRow | null> {
  const [row]: ExportReadRow[] = await db.query(`SELECT ${columns} FROM ${joins} WHERE x.id = $1`, [id])
  return row ?? null
}

export interface ExportFilter {
  q?: string
  animalId?: string
  sort?: 'exported' | 'accession'
  direction?: 'asc' | 'desc'
  offset: number
  limit: number
}

export async function readExports(
  db: Db,
  filter: ExportFilter,
): Promise<{ rows: ExportReadRow[]; total: number }> {
  const where = `
    ($1::text IS NULL OR plain_text(x.subject_label) LIKE plain_text($1) OR plain_text(x.reason) LIKE plain_text($1) OR plain_text(p.printed_name) LIKE plain_text($1)
      OR plain_text(x.file_name) LIKE plain_text($1))
    AND ($2::uuid IS NULL OR x.subject_id = $2)`
  const values = [containing(filter.q), filter.animalId ?? null]
  const direction = filter.direction ?? (filter.sort === 'accession' ? 'asc' : 'desc')
  const order = `${filter.sort === 'accession' ? 'x.subject_label' : 'x.exported_at'} ${direction === 'asc' ? 'ASC' : 'DESC'}, x.id`
  const rows: ExportReadRow[] = await db.query(
    `SELECT ${columns} FROM ${joins} WHERE ${where} ORDER BY ${order} LIMIT $3 OFFSET $4`,
    [...values, filter.limit, filter.offset],
  )
  const [count]: { n: string }[] = await db.query(`SELECT count(*) AS n FROM ${joins} WHERE ${where}`, values)
  return { rows, total: Number(count?.n ?? 0) }
}

/** Every export ever made, with the file it stands on. */
export function readFilesOnRecord(db: Db): Promise<FileOnRecord[]> {
  return db.query(`SELECT x.id, x.sha256, x.file_name AS label FROM exports x ORDER BY x.exported_at, x.id`)
}
