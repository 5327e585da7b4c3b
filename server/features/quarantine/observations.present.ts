import type { Observation } from '../../../shared/contracts/observations.contract.ts'
import type { Notice } from '../../../shared/contracts/notices.contract.ts'
import { noticeState } from '../../../shared/domain/notices/notice-state.ts'
import type { NoticeReadRow } from './notices.reads.ts'
import type { ObservationReadRow } from './observations.reads.ts'

function presentCount(row: ObservationReadRow): Observation['count'] {
  if (row.count_basis === null) return null
  if (row.count_basis === 'not-counted') return { basis: 'not-counted' }
  return { basis: row.count_basis, low: row.count_low ?? 0, high: row.count_high ?? 0 }
}

export function presentObservation(row: ObservationReadRow): Observation {
  return {
    id: row.id,
    enclosure: row.enclosure_code,
    cases: row.case_numbers,
    happenedAt: row.happened_at.toISOString(),
    happenedOn: row.happened_on,
    saidAt: row.said_at.toISOString(),
    timeDoubtful: row.time_doubtful,
    recordedAt: row.recorded_at.toISOString(),
    recordedBy: row.recorded_by_name ?? '',
    recordedById: row.recorded_by,
    origin: row.origin,
    lookedAt: row.looked_at,
    feeding: row.feeding,
    breathing: row.breathing,
    skin: row.skin,
    signs: row.signs,
    words: row.words,
    count: presentCount(row),
    foundDead: row.found_dead,
    unwell: row.unwell_count,
    handled: row.handled,
    unassignedDead: row.unassigned_dead,
    bodiesToName: row.bodies_to_name,
    bodies:
      row.bodies_named === null || row.bodies_at === null
        ? null
        : {
            named: row.bodies_named,
            reason: row.bodies_reason,
            by: row.bodies_by ?? '',
            at: row.bodies_at.toISOString(),
          },
    forVeterinarian: row.for_veterinarian,
    urgent: row.urgent,
    reviewed: row.reviewed_at
      ? { by: row.reviewed_by ?? '', at: row.reviewed_at.toISOString(), words: row.reviewed_words }
      : null,
    voidedReason: row.voided_reason,
    deathsStanding: row.deaths_standing,
    notice:
      row.notice_id === null
        ? null
        : {
            id: row.notice_id,
            state: noticeState({ seen: row.notice_seen, sent: row.notice_sent, failed: row.notice_failed }),
          },
  }
}

const iso = (text: string) => new Date(text).toISOString()

/** An urgent call with its fate. Whoever was reached after failed attempts is not among the failed. */
export function presentNotice(row: NoticeReadRow): Notice {
  const sent = row.deliveries.filter(({ outcome }) => outcome === 'sent')
  const failed = new Map(
    row.deliveries
      .filter(({ outcome, address }) => outcome === 'failed' && !sent.some((one) => one.address === address))
      .map((one) => [one.address, one]),
  )
  const acts = (kind: 'seen' | 'telephoned') =>
    row.acts
      .filter((act) => act.kind === kind)
      .map(({ by, at, whom }) => ({ by: by ?? '', at: iso(at), whom }))
  return {
    id: row.id,
    observationId: row.observation_id,
    enclosure: row.enclosure_code,
    caseNumber: row.case_number,
    words: row.words,
    raisedAt: row.happened_at.toISOString(),
    raisedBy: row.recorded_by_name ?? '',
    raisedById: row.recorded_by,
    state: noticeState({ seen: acts('seen').length, sent: sent.length, failed: failed.size }),
    sentTo: sent.map(({ name, at }) => ({ name, at: iso(at) })),
    failed: [...failed.values()].map(({ name, at, error }) => ({ name, at: iso(at), error: error ?? '' })),
    seen: acts('seen'),
    telephoned: acts('telephoned'),
  }
}
