import type { FacilityDate } from '../time/instant.ts'
import type { EventOf } from './clock-event.ts'
import type { ClockReasonCode, ClockReasonParams } from './clock-reason.ts'
import type { QuarantineKind } from './quarantine-kind.ts'

/** Whether an event sets day 0 to its own date, and what its history says. */
export type EntryVerdict = {
  [Code in ClockReasonCode]: { restarts: boolean; code: Code; params: ClockReasonParams[Code] }
}[ClockReasonCode]

const who = (event: { animalCount?: number; animalName?: string; heldAfter?: number }) => ({
  animalCount: event.animalCount ?? 0,
  animalName: event.animalName ?? '',
  heldAfter: event.heldAfter ?? 0,
})

/**
 * Whether something that came in after closing starts the days again (rule K06 a and b).
 *
 * Into the same or connected water anything restarts: animals of any kind, and wet material. In the same room but
 * other water, animals of the same quarantine kind restart; another kind, and material, do not. Undisinfected gear that
 * was shared always restarts.
 *
 * @param caseKind quarantine kind of the batch
 * @source quarantine-practice (same kind in the area: V); the rest project-default
 */
export function classifyEntry(
  event: EventOf<'addition'> | EventOf<'arrival'>,
  caseKind: QuarantineKind,
  happenedOn: FacilityDate,
): EntryVerdict {
  if (event.kind === 'arrival')
    return {
      restarts: true,
      code: 'restarted-animals',
      params: { ...who(event), happenedOn, water: 'same-water' },
    }
  if (event.what === 'undisinfected-gear')
    return { restarts: true, code: 'restarted-gear', params: { happenedOn } }
  if (event.into !== 'same-room') {
    return event.what === 'wet-material'
      ? { restarts: true, code: 'restarted-wet-material', params: { happenedOn } }
      : {
          restarts: true,
          code: 'restarted-animals',
          params: { ...who(event), happenedOn, water: event.into },
        }
  }
  if (event.what === 'wet-material')
    return { restarts: false, code: 'no-restart-other-water', params: { happenedOn } }
  return event.quarantineKind === null || event.quarantineKind === caseKind
    ? { restarts: true, code: 'restarted-same-room', params: { ...who(event), happenedOn } }
    : { restarts: false, code: 'no-restart-other-kind', params: { ...who(event), happenedOn } }
}

/** Whether contact with another unit starts the days again: only with one of lower status (rule K06 c). */
export function classifyBreach(event: EventOf<'breach'>, happenedOn: FacilityDate): EntryVerdict {
  return event.otherUnitStatus === 'lower'
    ? { restarts: true, code: 'restarted-breach', params: { happenedOn, how: event.how } }
    : { restarts: false, code: 'no-restart-status', params: { happenedOn } }
}
