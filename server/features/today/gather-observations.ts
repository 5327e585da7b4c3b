import type { Notice } from '../../../shared/contracts/notices.contract.ts'
import type { Observation } from '../../../shared/contracts/observations.contract.ts'
import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import { isForRoles } from '../../../shared/domain/today/today-kinds.ts'
import { waiting, work } from './work.ts'
import type { Moment } from './work.ts'

/** Urgent calls that nobody has seen: for everybody who may answer one. They are late from the moment they are raised. */
export function gatherNotices(notices: readonly Notice[], moment: Moment): TodayWork[] {
  return notices.map((notice) =>
    work({
      id: `urgent-call:${notice.id}`,
      kind: 'urgent-call',
      state: 'late',
      latestAt: notice.raisedAt,
      at: notice.raisedAt,
      params: {
        noticeId: notice.id,
        enclosure: notice.enclosure,
        words: notice.words,
        by: notice.raisedBy,
        fate: notice.state,
        ...(notice.caseNumber === null ? {} : { case: notice.caseNumber }),
      },
      acts: decide('notice.see', moment.actor.roles, {
        'another-person': notice.raisedById !== moment.actor.personId,
      }).allowed
        ? ['mark-seen']
        : [],
    }),
  )
}

/** Observations marked for the veterinarian that nobody has read. */
export function gatherFlagged(observations: readonly Observation[], moment: Moment): TodayWork[] {
  const mayRead = decide('chart.write', moment.actor.roles).allowed
  return observations.map((one) =>
    waiting({
      id: `observation-flagged:${one.id}`,
      kind: 'observation-flagged',
      at: one.happenedAt,
      params: {
        observationId: one.id,
        enclosure: one.enclosure,
        by: one.recordedBy,
        dead: one.foundDead ?? 0,
        ...(one.unwell === null ? {} : { unwell: one.unwell }),
        ...(one.words === null ? {} : { words: one.words }),
        ...(one.cases[0] === undefined ? {} : { case: one.cases[0] }),
      },
      acts: mayRead ? ['mark-read'] : [],
    }),
  )
}

/** Bodies that nobody could name: the veterinarian asks what died, the registrar which count is too high now. */
export function gatherBodies(observations: readonly Observation[], moment: Moment): TodayWork[] {
  return observations.flatMap((one) =>
    (['bodies-veterinarian', 'bodies-registrar'] as const)
      .filter((kind) => isForRoles(kind, moment.actor.roles))
      .map((kind) =>
        waiting({
          id: `${kind}:${one.id}`,
          kind,
          at: one.happenedAt,
          params: {
            observationId: one.id,
            enclosure: one.enclosure,
            by: one.recordedBy,
            dead: one.bodiesToName,
            ...(one.cases[0] === undefined ? {} : { case: one.cases[0] }),
          },
        }),
      ),
  )
}
