import type { DataSource } from 'typeorm'
import { chainHash, chainStart } from './append-to-chain.ts'

export interface ChainReport {
  entries: number
  /** The first place where the chain does not hold; null when it holds throughout. */
  brokenAt: { seq: number; why: 'gap' | 'link' | 'hash' | 'projection' } | null
  lastHash: string
}

interface Row {
  seq: string
  happened_at: Date
  actor_id: string | null
  actor_name: string
  action: string
  subject_kind: string
  subject_id: string
  subject_label: string
  clinical: boolean
  text: string
  previous_hash: string
  hash: string
}

interface EntryText {
  seq: number
  at: string
  actor: { id: string | null; name: string }
  action: string
  subject: { kind: string; id: string; label: string }
  clinical: boolean
}

/** The columns beside the text are copies of it for searching; they must say the same. */
function columnsAgree(row: Row): boolean {
  const said = JSON.parse(row.text) as EntryText
  return (
    said.seq === Number(row.seq) &&
    said.at === row.happened_at.toISOString() &&
    said.actor.id === row.actor_id &&
    said.actor.name === row.actor_name &&
    said.action === row.action &&
    said.subject.kind === row.subject_kind &&
    said.subject.id === row.subject_id &&
    said.subject.label === row.subject_label &&
    said.clinical === row.clinical
  )
}

/** Walks the whole chain in pages and recomputes every link. */
export async function verifyChain(dataSource: DataSource, pageSize = 2000): Promise<ChainReport> {
  let entries = 0
  let lastHash = chainStart
  for (;;) {
    const rows: Row[] = await dataSource.query(
      'SELECT a.* FROM audit_entries a WHERE a.seq > $1 ORDER BY a.seq LIMIT $2',
      [entries, pageSize],
    )
    for (const row of rows) {
      const seq = Number(row.seq)
      const broken = (why: 'gap' | 'link' | 'hash' | 'projection') => ({
        entries,
        lastHash,
        brokenAt: { seq, why },
      })
      if (seq !== entries + 1) return broken('gap')
      if (row.previous_hash !== lastHash) return broken('link')
      if (row.hash !== chainHash(lastHash, row.text)) return broken('hash')
      if (!columnsAgree(row)) return broken('projection')
      entries = seq
      lastHash = row.hash
    }
    if (rows.length < pageSize) return { entries, brokenAt: null, lastHash }
  }
}
