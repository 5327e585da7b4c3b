import { describe, expect, it } from 'vitest'
import { z } from 'zod'
import type { ClockEvent, ClockEventBody } from '../../shared/domain/quarantine/clock-event.ts'
import { clock, local, policy } from '../domain/quarantine/a-clock.ts'
import table from './clock-cases/clock-dates.json' with { type: 'json' }

/** A row: what happened at which local time, when it was asked, and the dates that must come out. */
const rows = z.array(
  z.object({
    id: z.string(),
    what: z.string(),
    source: z.string().min(10),
    verification: z.literal('computed-by-hand'),
    zone: z.string(),
    requiredDays: z.int(),
    deathExtensionDays: z.int(),
    maskingWindowDays: z.int(),
    events: z.array(z.looseObject({ at: z.string(), kind: z.string() })),
    asOf: z.string(),
    expected: z.object({
      day0On: z.iso.date(),
      earliestClearanceOn: z.iso.date(),
      dayNumber: z.int().optional(),
    }),
  }),
)
const cases = rows.parse(table)

describe('clock dates', () => {
  it.each(cases.map((row) => [row.id, row.what, row] as const))('%s: %s', (_, __, row) => {
    const { zone, requiredDays, deathExtensionDays, maskingWindowDays, expected } = row
    const events = row.events.map(({ at, ...body }, i): ClockEvent => ({
      eventId: `${row.id} ${i}`,
      caseId: 'fish',
      at: local(at, zone),
      ...(body as unknown as ClockEventBody),
    }))
    const answer = clock({
      cases: [{ caseId: 'fish', policy: policy({ requiredDays, deathExtensionDays, maskingWindowDays }) }],
      events,
      asOf: row.asOf,
      zone,
    })
    expect(answer).toMatchObject(expected)
  })
  it('holds every row once', () => {
    expect(cases.length).toBeGreaterThanOrEqual(21)
    expect(new Set(cases.map(({ id }) => id)).size).toBe(cases.length)
  })
})
