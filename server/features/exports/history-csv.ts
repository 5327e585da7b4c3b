import { writeLocalInstant } from '../../../shared/domain/time/write-local-instant.ts'
import type { HistoryEvent } from '../../../shared/contracts/exports.contract.ts'
import type { CsvTable } from '../../platform/csv/csv-stream.ts'
import type { HistoryContent } from './read-history.ts'

/** Column names of the history as CSV; documented for whoever reads a file years from now. */
export const historyColumns = [
  'accession',
  'event_date',
  'event_id',
  'event',
  'count_change',
  'count_after',
  'found_low',
  'found_high',
  'from_enclosure',
  'to_enclosure',
  'place',
  'latitude',
  'longitude',
  'uncertainty_metres',
  'other_accession',
  'transaction',
  'counterparty',
  'reference',
  'their_number',
  'dead_on_arrival',
  'source_code',
  'permits',
  'documents',
  'remarks',
  'recorded_at',
  'recorded_by',
  'struck_out_at',
  'struck_out_reason',
  'struck_out_change',
] as const

/** The date as exactly as it is known; with time and offset where the time of day is known. */
export function eventDateOf(event: HistoryEvent, zone: string): string {
  return event.exact ? writeLocalInstant(event.at, zone) : event.on
}

/**
 * One event a row, in the order in which it happened. The numbers of `count_change` add up to the last `count_after`
 * less the opening count; what was struck out has its number in a column of its own, so that no sum takes it in.
 */
export function historyCsv(content: HistoryContent, zone: string, variant: CsvTable['variant']): CsvTable {
  return {
    variant,
    header: historyColumns,
    rows: content.events.map((event) => [
      content.accession,
      eventDateOf(event, zone),
      event.eventId,
      event.kind,
      event.voided || event.delta === 0 ? null : event.delta,
      event.countAfter,
      event.found?.low ?? null,
      event.found?.high ?? null,
      event.from?.code ?? null,
      event.to?.code ?? null,
      event.site?.locality ?? null,
      event.site?.latitude ?? null,
      event.site?.longitude ?? null,
      event.site?.uncertaintyMetres ?? null,
      event.otherAccession,
      event.transaction,
      event.counterparty,
      event.reference,
      event.theirNumber,
      event.deadOnArrival,
      event.sourceCode,
      event.permits
        .map((permit) => `${permit.authority} ${permit.permitNumber}: ${String(permit.quantity)}`)
        .join('; '),
      event.documents
        .filter((paper) => paper.voided === null)
        .map((paper) => `${paper.title} (${paper.sha256.slice(0, 16)})`)
        .join('; '),
      [event.transport, event.note].filter(Boolean).join(' '),
      writeLocalInstant(event.recordedAt, zone),
      event.recordedBy,
      event.voided === null ? null : writeLocalInstant(event.voided.at, zone),
      event.voided?.reason ?? null,
      event.voided === null || event.delta === 0 ? null : event.delta,
    ]),
  }
}
