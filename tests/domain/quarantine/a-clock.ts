import type { CaseClock, SharedWaterSpell } from '../../../shared/domain/quarantine/case-clock.ts'
import type { ClockEvent, ClockEventBody } from '../../../shared/domain/quarantine/clock-event.ts'
import { type ClockPolicy, defaultClockPolicy } from '../../../shared/domain/quarantine/clock-policy.ts'
import { computeClocks } from '../../../shared/domain/quarantine/compute-clocks.ts'
import type { QuarantineKind } from '../../../shared/domain/quarantine/quarantine-kind.ts'
import { instantOfLocalTime } from '../../../shared/domain/time/local-time.ts'

export const lisbon = 'Europe/Lisbon'

/** The instant of a wall-clock time such as `2026-09-18 20:15` in the zone. */
export function local(text: string, zone = lisbon): string {
  const [date = '', time = '12:00'] = text.split(' ')
  return instantOfLocalTime(date, time, zone)
}

/** An event at a local time, its id made from what it is and when unless one is given. */
export function event(
  at: string,
  body: ClockEventBody,
  given: { caseId?: string; zone?: string; eventId?: string } = {},
): ClockEvent {
  const { caseId = 'fish', zone = lisbon } = given
  return { eventId: given.eventId ?? `${caseId} ${body.kind} ${at}`, caseId, at: local(at, zone), ...body }
}

export const boxOfFish: ClockEventBody = { kind: 'arrival', quarantineKind: 'fish' }

export function policy(change: Partial<ClockPolicy> = {}): ClockPolicy {
  return { ...defaultClockPolicy, ...change }
}

export interface Asked {
  events: readonly ClockEvent[]
  asOf: string
  zone?: string
  cases?: readonly { caseId: string; quarantineKind?: QuarantineKind; policy?: ClockPolicy }[]
  sharedWater?: readonly SharedWaterSpell[]
}

/** The clocks by case id; a refusal fails the test. */
export function clocks(asked: Asked): Record<string, CaseClock> {
  const zone = asked.zone ?? lisbon
  const cases = asked.cases ?? [{ caseId: 'fish' }]
  const answer = computeClocks({
    cases: cases.map((one) => ({ quarantineKind: 'fish', policy: defaultClockPolicy, ...one })),
    events: asked.events,
    sharedWater: asked.sharedWater ?? [],
    asOf: asked.asOf.includes('T') ? asked.asOf : local(asked.asOf, zone),
    zone,
  })
  if (!answer.ok) throw new Error(`refused: ${JSON.stringify(answer.refusal)}`)
  return Object.fromEntries(answer.value.map((clock) => [clock.caseId, clock]))
}

/** The clock of the case `fish`, or of the only case. */
export function clock(asked: Asked): CaseClock {
  const all = clocks(asked)
  const one = all.fish ?? Object.values(all)[0]
  if (!one) throw new Error('no case')
  return one
}

/** Codes of the reasons that count. */
export function standingCodes(one: CaseClock): string[] {
  return one.reasons.filter(({ standing }) => standing).map(({ code }) => code)
}
