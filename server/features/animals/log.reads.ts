import type { Db } from '../../platform/database/db.ts'
import type { FactRow, KnownOnRow } from './chart.reads.ts'
import { knownOn } from './known-on.ts'

export interface LogReadRow extends FactRow, KnownOnRow {
  kind: string
  facts: Record<string, string | number | null>
  struck_reason: string | null
  total: number
}

const line = (kind: string, from: string, facts: string, struckBy: string | null) => `
  SELECT x.id, '${kind}' AS kind, json_build_object(${facts}) AS facts, x.happened_at, x.happened_on, x.recorded_at,
         x.recorded_by, ${struckBy ? `(SELECT v.reason FROM animal_voids v WHERE v.${struckBy} = x.id)` : 'NULL'} AS struck_reason
    FROM ${from}`

const codes = `'from', (SELECT e.code FROM enclosures e WHERE e.id = x.from_enclosure_id),
  'to', (SELECT e.code FROM enclosures e WHERE e.id = x.to_enclosure_id)`

/** Every ledger that tells something of one animal, laid over one another. */
const everything = [
  line(
    'weight',
    'weights x WHERE x.animal_id = $1',
    `'value', x.entered_value::text, 'unit', x.entered_unit, 'animals', x.animals_weighed, 'basis', x.basis,
     'method', x.method, 'confirmedReason', x.confirmed_reason`,
    'weight_id',
  ),
  line(
    'move',
    'moves x WHERE x.animal_id = $1',
    `${codes}, 'reason', x.reason, 'transfer', x.documented_transfer, 'againstRule', x.against_rule`,
    'move_id',
  ),
  line(
    'death',
    'deaths x WHERE x.animal_id = $1',
    `'death', x.kind, 'seen', x.seen_count, 'posted', x.posted_count, 'state', x.carcass_state,
     'place', x.carcass_place, 'note', x.note`,
    'death_id',
  ),
  line(
    'count',
    `count_entries x WHERE x.animal_id = $1
       AND NOT EXISTS (SELECT 1 FROM deaths d WHERE d.count_entry_id = x.id)`,
    `'change', x.kind, 'delta', x.delta, 'reason', x.reason,
     'other', (SELECT o.accession FROM count_entries h JOIN animals o ON o.id = h.animal_id
                WHERE h.transfer_id = x.transfer_id AND h.id <> x.id LIMIT 1)`,
    'count_entry_id',
  ),
  line(
    'statement',
    'count_statements x WHERE x.animal_id = $1',
    `'basis', x.basis, 'low', x.low, 'high', x.high, 'note', x.note`,
    null,
  ),
  line(
    'description',
    'animal_descriptions x JOIN taxa t ON t.id = x.taxon_id WHERE x.animal_id = $1',
    `'name', x.name, 'taxon', t.scientific_name, 'sex', x.sex, 'stage', x.stage, 'reason', x.reason`,
    null,
  ),
  line(
    'food-or-release',
    'food_statements x WHERE x.animal_id = $1',
    `'answer', x.answer, 'reason', x.reason`,
    null,
  ),
  line(
    'mark',
    'identifiers x WHERE x.animal_id = $1',
    `'mark', x.kind, 'value', x.value, 'place', x.place, 'twiceReason', x.twice_reason`,
    null,
  ),
  line(
    'mark-ended',
    'identifier_ends x JOIN identifiers i ON i.id = x.identifier_id WHERE i.animal_id = $1',
    `'mark', i.kind, 'value', i.value, 'reason', x.reason`,
    null,
  ),
  line(
    'lock',
    'movement_locks x WHERE x.animal_id = $1',
    `'lock', x.kind, 'source', x.source_label, 'reason', x.reason`,
    null,
  ),
  line(
    'lock-lifted',
    'movement_lock_lifts x JOIN movement_locks k ON k.id = x.lock_id WHERE k.animal_id = $1',
    `'lock', k.kind, 'source', k.source_label, 'reason', x.reason`,
    null,
  ),
  line(
    'discrepancy',
    'discrepancies x WHERE x.animal_id = $1',
    `'discrepancy', x.kind, 'forRole', x.for_role`,
    null,
  ),
  `SELECT z.id, 'discrepancy-resolved', json_build_object('discrepancy', q.kind, 'outcome', z.outcome, 'reason', z.reason),
          z.recorded_at, q.happened_on, z.recorded_at, z.recorded_by, NULL
     FROM discrepancy_resolutions z JOIN discrepancies q ON q.id = z.discrepancy_id WHERE q.animal_id = $1`,
].join(' UNION ALL ')

/** One log of everything recorded of an animal, the newest first. */
export function readLog(
  db: Db,
  animalId: string,
  page: { offset: number; limit: number },
): Promise<LogReadRow[]> {
  return db.query(
    `SELECT x.id, x.kind, x.facts, x.happened_at, x.happened_on::text AS happened_on, x.recorded_at, x.struck_reason,
            (SELECT p.printed_name FROM people p WHERE p.id = x.recorded_by) AS recorded_by_name,
            ${knownOn('$1', 'x.happened_at')} AS known_on,
            count(*) OVER ()::int AS total
       FROM (${everything}) x
      ORDER BY x.happened_at DESC, x.recorded_at DESC, x.id DESC LIMIT $2 OFFSET $3`,
    [animalId, page.limit, page.offset],
  )
}
