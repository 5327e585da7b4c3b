import type { RecordedDose } from '../../../shared/contracts/doses.contract.ts'
import {
  amountDiffers,
  exceptionsWithoutFigures,
} from '../../../shared/domain/dose/exceptions-without-figures.ts'
import { wentIn } from '../../../shared/domain/orders/dose-states.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import type { Actor } from '../../platform/http/request-context.ts'
import type { DoseReadRow, OtherStop } from './administrations.reads.ts'

/** A stored amount in words; null where none was stored. */
export const storedText = (value: string | null, unit: string | null) =>
  value === null || unit === null ? null : formatDose(value, unit as UnitCode).text

/** Whether this person may strike a record out now: a slip of the hand on its day, or as a veterinarian. */
function mayStrike(row: { recordedAt: Date; recordedBy: string }, { now, actor, zone }: Reader): boolean {
  const dayOf = (at: string) => facilityDateOf(at, zone)
  const isOwn = row.recordedBy === actor.personId && dayOf(row.recordedAt.toISOString()) === dayOf(now)
  return decide('dose.strike', actor.roles, { 'own-record-of-the-day': isOwn }).allowed
}

interface Reader {
  actor: Actor
  zone: string
  now: string
  /** Whoever may still calculate a dose of the order blind: what was recorded tells them no amount. */
  blind: boolean
}

/** Whoever recorded an amount knows it. */
const isLeftOut = (row: DoseReadRow, { blind, actor }: Reader) => blind && row.recorded_by !== actor.personId

export function presentRecord(row: DoseReadRow, all: readonly DoseReadRow[], reader: Reader): RecordedDose {
  return {
    id: row.id,
    key: row.dose_key,
    kind: row.kind,
    record: row.is_as_written ? 'intact' : 'broken',
    amountText:
      isLeftOut(row, reader) || !row.is_as_written
        ? null
        : storedText(row.amount_entered_value, row.amount_entered_unit),
    lotNumber: row.lot_number,
    happenedAt: row.happened_at.toISOString(),
    recordedAt: row.recorded_at.toISOString(),
    by: row.by_name,
    note: row.note,
    exceptions: saidExceptions(row, isLeftOut(row, reader)),
    struck:
      (row.struck_reason !== null &&
        row.struck_at && {
          reason: row.struck_reason,
          at: row.struck_at.toISOString(),
          by: row.struck_by ?? '',
        }) ||
      null,
    mayStrike:
      row.struck_reason === null &&
      mayStrike({ recordedAt: row.recorded_at, recordedBy: row.recorded_by }, reader),
    twice:
      row.struck_reason === null &&
      wentIn(row) &&
      all.some((one) => one.id !== row.id && one.dose_key === row.dose_key && wentIn(one)),
    stop:
      row.stop_at &&
      row.stop_cause &&
      presentStop(row, reader, {
        id: row.stop_id ?? '',
        at: row.stop_at.toISOString(),
        by: row.stop_by ?? '',
        cause: row.stop_cause,
        seen: row.stop_seen,
        rescue: row.stop_rescue,
        recorded_at: (row.stop_recorded_at ?? row.recorded_at).toISOString(),
        recorded_by: row.stop_recorded_by ?? '',
        before_start: false,
      }),
    otherStops: row.other_stops.map((stop) => presentStop(row, reader, stop)),
  }
}

const notAsRecorded: RecordedDose['exceptions'][number] = {
  ruleId: 'record',
  code: 'not-as-recorded',
  level: 'stop',
  title: doseWords.notAsRecorded,
  text: doseWords.notAsRecordedText,
  resolve: [],
}

/** What the record breaks; an amount in the words of it is left out with the others. */
function saidExceptions(row: DoseReadRow, leftOut: boolean): RecordedDose['exceptions'] {
  const found = JSON.parse(row.exceptions_text) as RecordedDose['exceptions']
  if (!row.is_as_written) return [notAsRecorded, ...exceptionsWithoutFigures(found)]
  if (!leftOut) return found
  return found.map((one) => (one.code === amountDiffers ? { ...one, text: doseWords.amountLeftOut } : one))
}

function presentStop(row: DoseReadRow, reader: Reader, stop: OtherStop): NonNullable<RecordedDose['stop']> {
  return {
    id: stop.id,
    at: new Date(stop.at).toISOString(),
    beforeStart: stop.before_start,
    mayStrike:
      row.struck_reason === null &&
      mayStrike({ recordedAt: new Date(stop.recorded_at), recordedBy: stop.recorded_by }, reader),
    by: stop.by,
    cause: stop.cause,
    seen: stop.seen,
    rescue: stop.rescue,
  }
}
