import type { CountEntry, CountKind } from '../../../shared/domain/ledger/count-entry.ts'
import type { Move } from '../../../shared/domain/ledger/move.ts'
import type { Db } from '../../platform/database/db.ts'

export interface StoredAnimal {
  id: string
  accession: string
  ledger: number
  entries: CountEntry[]
  moves: Move[]
  stays: { enclosureId: string; from: string; until: string | null }[]
  head: string
  newest: string
}

const described = (x: string) =>
  `concat_ws('|', ${x}.taxon_id, coalesce(${x}.name, ''), ${x}.sex, ${x}.stage, coalesce(${x}.birth_kind, ''),
     coalesce(${x}.birth_date, ''), ${x}.birth_approximate)`

const instant = (x: string) => `to_char(${x} AT TIME ZONE 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"')`

/** What is stored of every animal, with the sum of its ledger as the lists compute it. */
export async function readStored(db: Db): Promise<StoredAnimal[]> {
  const rows: {
    id: string
    accession: string
    ledger: number
    entries: { id: string; kind: CountKind; delta: number; at: string; transfer: string | null }[]
    moves: { id: string; from: string | null; to: string | null; at: string }[]
    stays: StoredAnimal['stays']
    head: string
    newest: string
  }[] = await db.query(
    `SELECT a.id, a.accession, ${described('a')} AS head,
            (SELECT ${described('d')} FROM animal_descriptions d WHERE d.animal_id = a.id
              ORDER BY d.happened_at DESC, d.position DESC LIMIT 1) AS newest,
            coalesce((SELECT sum(e.delta) FROM live_count_entries e WHERE e.animal_id = a.id), 0)::int AS ledger,
            coalesce((SELECT json_agg(json_build_object('id', e.id, 'kind', e.kind, 'delta', e.delta,
                        'at', ${instant('e.happened_at')}, 'transfer', e.transfer_id))
                        FROM live_count_entries e WHERE e.animal_id = a.id), '[]') AS entries,
            coalesce((SELECT json_agg(json_build_object('id', m.id, 'from', m.from_enclosure_id,
                        'to', m.to_enclosure_id, 'at', ${instant('m.happened_at')}))
                        FROM live_moves m WHERE m.animal_id = a.id), '[]') AS moves,
            coalesce((SELECT json_agg(json_build_object('enclosureId', s.enclosure_id,
                        'from', ${instant('lower(s.during)')}, 'until', ${instant('upper(s.during)')})
                        ORDER BY lower(s.during))
                        FROM stays s WHERE s.animal_id = a.id), '[]') AS stays
       FROM animals a ORDER BY a.accession`,
  )
  return rows.map((row) => ({
    ...row,
    entries: row.entries.map((e) => ({
      entryId: e.id,
      animalId: row.id,
      kind: e.kind,
      delta: e.delta,
      at: e.at,
      recordedAt: e.at,
      transferId: e.transfer,
    })),
    moves: row.moves.map((m) => ({
      moveId: m.id,
      animalId: row.id,
      fromEnclosureId: m.from,
      toEnclosureId: m.to,
      at: m.at,
      recordedAt: m.at,
    })),
  }))
}
