import type { Order } from '../../../shared/contracts/orders.contract.ts'
import type { RecordedDoseRow } from './orders.reads.ts'

interface Exception {
  ruleId: string
  level: string
  title: string
}

/**
 * A stop, or a mark that the record itself earned: an amount that is not the ordered one, a dose before the signature.
 * Warnings of the water stand beside most baths, and are counted only.
 */
const isBreach = ({ ruleId, level }: Exception): boolean => level === 'stop' || ruleId === 'record'

/** A record as the calendar of its order says it: titles only, which name no amount. */
export function presentRecord(row: RecordedDoseRow): Order['calendar'][number]['records'][number] {
  const found = JSON.parse(row.exceptions_text) as Exception[]
  const breaches = found.filter(isBreach)
  return {
    kind: row.kind,
    happenedAt: row.happened_at.toISOString(),
    by: row.by_name ?? '',
    stoppedAt: row.stopped_at?.toISOString() ?? null,
    broke: [...new Set(breaches.map(({ title }) => title))],
    warnings: found.length - breaches.length,
    record: row.is_as_written ? 'intact' : 'broken',
  }
}
