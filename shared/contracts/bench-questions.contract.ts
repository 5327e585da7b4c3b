import { z } from 'zod'
import { quarantineKinds } from '../domain/quarantine/quarantine-kind.ts'
import { AskedEvent, AskedPolicy, WholePolicy } from './clock-question.ts'
import { contract } from './contract.ts'
import { Instant, LocalDate } from './primitives.ts'
import { CaseStatusName } from './quarantine-primitives.ts'

const EventId = z.string().describe('Name of the event')
const Text = z.string().describe('In words')
const Params = z.record(z.string(), z.union([z.string(), z.number()])).describe('Figures and names in it')

/** Which day it is for a batch, from its events alone. */
export const askQuarantineClock = contract({
  id: 'askQuarantineClock',
  method: 'post',
  path: '/bench/quarantine-clock',
  action: 'collection.read',
  summary: 'Quarantine clock: day, legs, holds and earliest clearance of a batch, from its events alone',
  body: z.strictObject({
    zone: z.string().min(1).max(60).describe('Time zone whose calendar counts, for example Europe/Lisbon'),
    asOf: z.union([LocalDate, Instant]).describe('Day or instant asked about; a day is asked at its end'),
    quarantineKind: z.enum(quarantineKinds).describe('Quarantine kind of the batch'),
    policy: AskedPolicy.optional(),
    events: z.array(AskedEvent).max(500).describe('What happened, in any order'),
  }),
  reply: {
    200: z.object({
      status: CaseStatusName,
      asOfOn: LocalDate.describe('Day asked about'),
      day0On: LocalDate.nullable().describe('Day 0; null while the batch is open'),
      dayNumber: z.int().nullable().describe('Days since day 0; null while the batch is open'),
      requiredDays: z.int().describe('Days required from day 0'),
      pausedMinutes: z.number().describe('Minutes that the clock stood still'),
      pausedDays: z.int().describe('The same, summed and rounded up to days'),
      earliestClearanceOn: LocalDate.nullable().describe('Earliest clearance; null while open or locked'),
      earliestIfUnlockedOn: LocalDate.nullable().describe('The same if every lock were lifted now'),
      legs: z
        .array(
          z.object({
            day0On: LocalDate.describe('Day 0 of the leg'),
            startedByEventId: EventId,
            endedByEventId: EventId.nullable().describe('Restart that ended it'),
            endedOn: LocalDate.nullable().describe('Day of the restart that ended it'),
            daysRun: z.int().nullable().describe('Days that it had counted; they no longer count'),
          }),
        )
        .describe('The parts between restarts, in order of time'),
      holds: z
        .array(
          z.object({
            eventId: EventId,
            kind: z.enum(['lock', 'pause']).describe('A lock stops clearance, a pause stops the count'),
            cause: z.string().describe('Why'),
            from: Instant.describe('Since when'),
          }),
        )
        .describe('What holds it on that day'),
      extensions: z
        .array(
          z.object({
            eventId: EventId,
            kind: z.string().describe('Why it has to wait longer'),
            fromOn: LocalDate.describe('First day'),
            untilOn: LocalDate.nullable().describe('Last day; null until a veterinarian ends it'),
            provisional: z.boolean().describe('While a treatment runs the day may move'),
            state: z.enum(['standing', 'withdrawn', 'ended']).describe('Whether it counts'),
          }),
        )
        .describe('Reasons to wait longer'),
      unmet: z
        .array(
          z.object({
            code: z.string().describe('Stable code'),
            params: Params,
            text: Text,
            overridable: z.boolean().describe('Whether a veterinarian may clear against it with a reason'),
          }),
        )
        .describe('What stands between the batch and clearance'),
      reasons: z
        .array(
          z.object({
            code: z.string().describe('Stable code'),
            eventId: EventId,
            at: Instant.describe('When the event happened'),
            standing: z.boolean().describe('False when it no longer counts'),
            params: Params,
            text: Text,
          }),
        )
        .describe('Every change of the clock, in time order'),
      policy: WholePolicy.describe('The policy that counted, defaults filled in'),
    }),
  },
  problems: ['not-computable'],
  idempotent: 'nothing-kept',
})

const Id = z.string().min(1).max(120)
const existence = {
  existsFrom: Instant.optional().describe('Since when; always unless told'),
  existsUntil: Instant.optional().describe('Until when; still there unless told'),
}

/** What is joined to a water at an instant, from a map of valves and pumps alone. */
export const askConnectedWater = contract({
  id: 'askConnectedWater',
  method: 'post',
  path: '/bench/connected-water',
  action: 'collection.read',
  summary: 'Connected water: which bodies share one water at an instant, from their valves and pumps alone',
  body: z.strictObject({
    at: Instant.describe('The instant asked about'),
    bodies: z
      .array(
        z.strictObject({
          waterBodyId: Id.describe('Name of the body'),
          kind: z.enum(['enclosure', 'sump', 'loop']).describe('What it is'),
          litres: z
            .number()
            .positive()
            .max(1e11)
            .optional()
            .describe('Its net volume in litres, where it is known'),
          ...existence,
        }),
      )
      .min(1)
      .max(1000)
      .describe('Bodies of water'),
    connections: z
      .array(
        z.strictObject({
          connectionId: Id.describe('Name of the connection'),
          kind: z.enum(['valve', 'pump']).describe('What it is'),
          bodyAId: Id.describe('One end'),
          bodyBId: Id.describe('The other end'),
          ...existence,
        }),
      )
      .max(5000)
      .describe('Valves and pumps between them'),
    ledger: z
      .array(
        z.strictObject({
          connectionId: Id.describe('The connection'),
          state: z.enum(['open', 'shut']).describe('A running pump is open'),
          at: Instant.describe('When it was opened or shut'),
          recordedAt: Instant.optional().describe('When that was written down; at once unless told'),
          voided: z.boolean().optional().describe('Struck through: it does not count'),
        }),
      )
      .max(20_000)
      .describe('What was opened and shut when, in any order'),
  }),
  reply: {
    200: z.object({
      at: Instant.describe('The instant asked about'),
      waters: z
        .array(
          z.object({
            waterBodyIds: z.array(z.string()).describe('Bodies that share it'),
            litres: z.number().nullable().describe('Their volumes added; null where one is not known'),
            litresNotKnownOf: z.array(z.string()).describe('Bodies whose volume was not given'),
            connections: z
              .array(
                z.object({
                  connectionId: z.string().describe('Name of the connection'),
                  state: z.enum(['open', 'shut', 'unknown']).describe('Its state'),
                  inside: z.boolean().describe('Both ends lie in this water'),
                }),
              )
              .describe('Every connection that touches it'),
            unknownConnectionIds: z
              .array(z.string())
              .describe('Taken as open, since nobody recorded their state'),
          }),
        )
        .describe('Every separate water at that instant'),
    }),
  },
  problems: ['not-computable'],
  idempotent: 'nothing-kept',
})
