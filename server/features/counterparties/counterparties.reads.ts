import { containing } from '../../platform/database/like.ts'
import type { CounterpartyKind } from '../../../shared/domain/register/counterparty-kinds.ts'
import type { Db } from '../../platform/database/db.ts'

export interface CounterpartyReadRow {
  id: string
  name: string
  kind: CounterpartyKind
  address: string | null
  registration: string | null
  email: string | null
  telephone: string | null
  note: string | null
  transactions: string
  version: number
}

const columns = `
  c.id, c.name, c.kind, c.address, c.registration, c.email, c.telephone, c.note, c.version,
  (SELECT count(*) FROM transactions t WHERE t.counterparty_id = c.id) AS transactions`

export async function readCounterparty(db: Db, id: string): Promise<CounterpartyReadRow | null> {
  const [row]: CounterpartyReadRow[] = await db.query(
    `SELECT ${columns} FROM counterparties c WHERE c.id = $1`,
    [id],
  )
  return row ?? null
}

export interface CounterpartyFilter {
  q?: string
  sort?: 'name' | 'transactions'
  direction?: 'asc' | 'desc'
  offset: number
  limit: number
}

export async function readCounterparties(
  db: Db,
  filter: CounterpartyFilter,
): Promise<{ rows: CounterpartyReadRow[]; total: number }> {
  const where = `$1::text IS NULL OR plain_text(c.name) LIKE plain_text($1) OR plain_text(c.registration) LIKE plain_text($1) OR plain_text(c.address) LIKE plain_text($1)`
  const values = [containing(filter.q)]
  const column = filter.sort === 'transactions' ? 'transactions' : 'lower(c.name)'
  const order = `${column} ${filter.direction === 'desc' ? 'DESC' : 'ASC'}, c.id`
  const rows: CounterpartyReadRow[] = await db.query(
    `SELECT * FROM (SELECT ${columns} FROM counterparties c WHERE ${where}) c
      ORDER BY ${order} LIMIT $2 OFFSET $3`,
    [...values, filter.limit, filter.offset],
  )
  const [count]: { n: string }[] = await db.query(
    `SELECT count(*) AS n FROM counterparties c WHERE ${where}`,
    values,
  )
  return { rows, total: Number(count?.n ?? 0) }
}
