import { z } from 'zod'
import { quarantineKinds } from '../domain/quarantine/quarantine-kind.ts'
import { protocolStepKinds } from '../domain/protocol/protocol-content.ts'
import { Instant, LocalDate, RecordId } from './primitives.ts'

export const CaseNumber = z.string().trim().min(1).max(60).describe('Number of the case, for example Q-115')
export const HappenedAt = Instant.describe('When it happened; at most 5 minutes ahead of the server')
export const QuarantineKindOfCase = z.enum(quarantineKinds).describe('Quarantine kind of the batch')
export const CaseStatusName = z
  .enum(['open', 'in-quarantine', 'locked', 'cleared', 'recalled', 'transferred'])
  .describe('State of the case')

/** A fact in codes and figures; shared/messages makes the sentence. Dates end in On, instants in At. */
const Params = z
  .record(z.string(), z.union([z.string(), z.number()]))
  .describe('Figures and names for the sentence')

export const ClockReasonView = z.object({
  code: z.string().describe('Code of the sentence'),
  rule: z.string().describe('Rule of the clock, for developers; never shown'),
  eventId: z.string().describe('Event that it comes from'),
  at: Instant.describe('When the event happened'),
  standing: z.boolean().describe('False when it no longer counts; it is shown all the same'),
  effect: z.looseObject({ kind: z.string().describe('What changed') }).describe('What it did to the clock'),
  params: Params,
})
export type ClockReasonView = z.infer<typeof ClockReasonView>

export const Unmet = z.object({
  code: z.string().describe('Code of the sentence'),
  params: Params,
  overridable: z.boolean().describe('Whether a veterinarian may clear against it with a reason'),
})

/** How many animals: the same figure twice where they were counted. */
export const Animals = z
  .object({
    low: z.int().describe('At least'),
    high: z.int().describe('At most'),
  })
  .describe('How many animals')

const StepState = z
  .enum(['done', 'due', 'to-come', 'overdue', 'failed'])
  .describe('Where the step stands on the day asked about')

export const CaseStepView = z.object({
  key: z.string().describe('Key of the step'),
  kind: z.enum(protocolStepKinds).describe('Kind of work'),
  name: z.string().describe('What is done'),
  short: z.string().describe('The same in two words'),
  day: z.int().describe('First day of its window, from day 0'),
  untilDay: z.int().describe('Last day of its window'),
  on: LocalDate.describe('Date of the first day'),
  untilOn: LocalDate.describe('Date of the last day'),
  state: StepState,
  doneOn: LocalDate.nullable().describe('Day on which it was done'),
  doneBy: z.string().nullable().describe('Who did it'),
  note: z.string().nullable().describe('What came of it'),
  lateDays: z.int().describe('Days late'),
  daily: z
    .object({
      doneDays: z.int().describe('Days with an observation'),
      passedDays: z.int().describe('Days that have been, today included'),
      missedOn: z.array(LocalDate).describe('Days without'),
    })
    .nullable()
    .describe('Of a step that is done every day'),
})
export type CaseStepView = z.infer<typeof CaseStepView>

export const CaseLegView = z.object({
  day0On: LocalDate.describe('Day 0 of the leg'),
  endedOn: LocalDate.nullable().describe('Day of the restart that ended it; null for the running leg'),
  daysRun: z.int().nullable().describe('Days that it had counted; they no longer count'),
  endReason: ClockReasonView.nullable().describe('Why it ended'),
  steps: z.array(CaseStepView).describe('Steps dated by it; on an ended leg those that were done'),
})

/** What the board and the head of a case show of it. */
export const CaseRow = z.object({
  id: RecordId,
  number: CaseNumber,
  name: z.string().describe('The animals, for example Cownose ray'),
  quarantineKind: QuarantineKindOfCase,
  status: CaseStatusName,
  held: z.boolean().describe('A hold stands; only a veterinarian lifts it'),
  enclosures: z.array(z.string()).describe('Codes of the enclosures that the batch is in'),
  areas: z.array(z.string()).describe('Parts of the house, in the order of work'),
  boundaries: z.array(z.string()).describe('Quarantine boundaries that the batch is within'),
  protocolCode: z.string().describe('Code of the protocol in force'),
  animals: Animals,
  members: z.int().describe('Animals and groups of the batch with an accession number of their own'),
  day0On: LocalDate.nullable().describe('Day 0; null while the batch is open'),
  dayNumber: z.int().nullable().describe('Days since day 0, or up to clearance'),
  requiredDays: z.int().describe('Days required from day 0'),
  pausedDays: z.int().describe('Days that the clock stood still, summed and rounded up'),
  earliestClearanceOn: LocalDate.nullable().describe('Earliest clearance; null while open or locked'),
  readyToClear: z.boolean().describe('Nothing stands against clearance today'),
  endedOn: LocalDate.nullable().describe('Day of clearance or transfer'),
  legs: z.array(CaseLegView).describe('Legs in order of time, the running one last'),
  pauses: z
    .array(
      z.object({
        fromOn: LocalDate.describe('First day'),
        untilOn: LocalDate.nullable().describe('Last day; null while it lasts'),
      }),
    )
    .describe('When the clock stood still'),
  counts: z
    .array(Animals.extend({ on: LocalDate.describe('From this day on') }))
    .describe('How many animals there were, at each change'),
  reasons: z.array(ClockReasonView).describe('Every change of the clock, in time order'),
  forVeterinarian: z.int().describe('Observations that wait for a veterinarian'),
})
export type CaseRow = z.infer<typeof CaseRow>

export const CaseNames = z
  .object({
    cases: z.record(z.string(), z.string()).describe('Number of each case that a sentence names, by id'),
    criteria: z.record(z.string(), z.string()).describe('Name of each criterion'),
    tests: z.record(z.string(), z.string()).describe('Name of each test'),
  })
  .describe('Names for the sentences')
