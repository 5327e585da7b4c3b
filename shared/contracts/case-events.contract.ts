import { z } from 'zod'
import { contract } from './contract.ts'
import { Reason, RecordId } from './primitives.ts'
import { caseParams, CaseDetail } from './quarantine.contract.ts'
import { HappenedAt } from './quarantine-primitives.ts'
import { ChosenLicence } from './signing.contract.ts'

const Words = z.string().trim().max(2000).describe('In words')
const base = { id: RecordId, happenedAt: HappenedAt, note: Words.optional() }
const EventId = z.string().min(1).max(120)

/** What anybody at the tank may report (deaths are recorded for the animal, moves for the place). */
export const reportEvent = contract({
  id: 'reportEvent',
  method: 'post',
  path: '/cases/:number/events',
  action: 'clock.report',
  summary: 'Report something that the clock goes by',
  params: caseParams,
  body: z.strictObject({
    ...base,
    event: z
      .discriminatedUnion('kind', [
        z.strictObject({
          kind: z
            .literal('addition')
            .describe('Material or gear came in; animals are known from their moves'),
          what: z.enum(['wet-material', 'undisinfected-gear']).describe('What came in'),
          into: z.enum(['same-water', 'connected-water', 'same-room']).describe('Where to'),
        }),
        z.strictObject({
          kind: z.literal('breach').describe('Contact with another unit'),
          how: z.enum(['escape', 'splash', 'net', 'other']).describe('How'),
          otherUnitStatus: z.enum(['lower', 'same-or-higher']).describe('Status of the other unit'),
        }),
        z.strictObject({
          kind: z.literal('clinical-signs').describe('New clinical signs'),
          signs: Words.min(1).describe('What was seen'),
        }),
        z.strictObject({
          kind: z.literal('not-feeding').describe('Not feeding'),
          subject: Words.min(1).describe('The animal, or the group as a whole'),
        }),
        z.strictObject({
          kind: z.literal('feeding').describe('Feeding again'),
          subject: Words.min(1).describe('As it was reported'),
        }),
        z.strictObject({
          kind: z.literal('pause-started').describe('The clock stands still from here on'),
          cause: z.enum(['life-support-failure', 'temperature-out-of-range']).describe('Why'),
        }),
        z.strictObject({
          kind: z.literal('pause-ended').describe('The clock goes on'),
          pauseId: EventId.describe('Id of the pause'),
        }),
      ])
      .describe('What happened'),
  }),
  reply: { 201: CaseDetail },
  problems: ['not-found', 'id-already-used', 'case-ended', 'in-the-future', 'period-reversed'],
  idempotent: 'by-record-id',
})

/** What only a veterinarian says. */
export const decideEvent = contract({
  id: 'decideEvent',
  method: 'post',
  path: '/cases/:number/decisions',
  action: 'case.configure',
  summary: 'A veterinarian’s decision about the clock, with its reason',
  params: caseParams,
  body: z.strictObject({
    id: RecordId,
    happenedAt: HappenedAt,
    reason: Reason,
    decision: z
      .discriminatedUnion('kind', [
        z.strictObject({
          kind: z.literal('extension-ended').describe('An extension ends'),
          extensionEventId: EventId.describe('Event that the extension comes from'),
        }),
        z.strictObject({
          kind: z
            .literal('transport-death-extends')
            .describe('A death soon after arrival extends all the same'),
          deathEventId: EventId.describe('The death'),
        }),
        z.strictObject({
          kind: z.literal('criterion-declared').describe('A condition is met, or no longer'),
          criterionId: z.string().max(60).describe('Key of the criterion'),
          met: z.boolean().describe('Met'),
        }),
        z.strictObject({
          kind: z.literal('protocol-changed').describe('Another version of a protocol from here on'),
          protocolVersionId: RecordId.describe('The version'),
        }),
        z.strictObject({
          kind: z.literal('voided').describe('An entered event has never been'),
          voidsEventId: EventId.describe('The event'),
        }),
      ])
      .describe('What is decided'),
  }),
  reply: { 201: CaseDetail },
  problems: ['not-found', 'id-already-used', 'case-ended', 'already-void', 'in-the-future'],
  idempotent: 'by-record-id',
})

export const enterResult = contract({
  id: 'enterResult',
  method: 'post',
  path: '/cases/:number/results',
  action: 'result.enter',
  summary: 'Enter the result of a sample',
  params: caseParams,
  body: z.strictObject({
    ...base,
    happenedAt: HappenedAt.describe('When the result was reported'),
    takenAt: HappenedAt.describe('When the sample was taken; this day counts'),
    testKey: z.string().min(1).max(60).describe('Key of the test'),
    result: z.enum(['negative', 'positive', 'inconclusive', 'insufficient']).describe('Result'),
    pathogenName: z.string().trim().min(1).max(120).optional().describe('Of a positive: what was found'),
    pathogenStatus: z
      .enum(['listed', 'facility-critical', 'other'])
      .optional()
      .describe('Of a positive: on the notifiable list, critical to this facility, or neither'),
  }),
  reply: { 201: CaseDetail },
  problems: ['not-found', 'id-already-used', 'in-the-future', 'period-reversed'],
  idempotent: 'by-record-id',
})

export const recordStep = contract({
  id: 'recordStep',
  method: 'post',
  path: '/cases/:number/steps',
  action: 'sample.take',
  summary: 'A step of the protocol was done, or tried in vain',
  params: caseParams,
  body: z.strictObject({
    ...base,
    stepKey: z.string().min(1).max(60).describe('Key of the step'),
    outcome: z.enum(['done', 'failed']).describe('Done, or tried in vain'),
  }),
  reply: { 201: CaseDetail },
  problems: ['not-found', 'id-already-used', 'in-the-future', 'case-ended'],
  idempotent: 'by-record-id',
})

/** Stopping is never gated: no password, no reason, also from a phone that had no signal. */
export const holdCase = contract({
  id: 'holdCase',
  method: 'post',
  path: '/cases/:number/holds',
  action: 'case.hold',
  summary: 'Hold a case at once: no movement, no clearance, until a veterinarian lifts it',
  params: caseParams,
  body: z.strictObject({
    id: RecordId,
    happenedAt: HappenedAt,
    reason: Words.optional(),
    origin: z.enum(['online', 'outbox']).describe('Entered with a signal, or kept on the device before'),
    device: z.string().trim().max(100).describe('Device that it was entered on'),
  }),
  reply: { 201: CaseDetail },
  problems: ['not-found', 'id-already-used', 'case-ended', 'in-the-future'],
  idempotent: 'by-record-id',
})

export const lockCase = contract({
  id: 'lockCase',
  method: 'post',
  path: '/cases/:number/locks',
  action: 'case.lock',
  summary: 'Lock a case: no movement and no clearance on this water',
  params: caseParams,
  body: z.strictObject({
    id: RecordId,
    happenedAt: HappenedAt,
    reason: Reason,
    cause: z.enum(['notifiable-suspicion', 'veterinarian']).describe('Why'),
  }),
  reply: { 201: CaseDetail },
  problems: ['not-found', 'id-already-used', 'case-ended', 'in-the-future'],
  idempotent: 'by-record-id',
})

export const liftLock = contract({
  id: 'liftLock',
  method: 'post',
  path: '/cases/:number/lifts',
  action: 'hold.lift',
  summary: 'Lift a hold or a lock, with a reason',
  params: caseParams,
  body: z.strictObject({
    id: RecordId,
    happenedAt: HappenedAt,
    lockEventId: EventId.describe('Event that put it on'),
    reason: Reason,
  }),
  reply: { 201: CaseDetail },
  problems: ['not-found', 'id-already-used', 'not-locked', 'in-the-future'],
  idempotent: 'by-record-id',
})

export const signDeathCause = contract({
  id: 'signDeathCause',
  method: 'post',
  path: '/cases/:number/deaths/:deathId/cause',
  action: 'necropsy.sign',
  summary: 'Sign the cause of a death; explained and not transmissible withdraws its extension',
  params: caseParams.extend({ deathId: EventId.describe('Id of the death') }),
  body: z.strictObject({
    finding: z
      .enum(['explained-not-transmissible', 'explained-transmissible', 'unexplained'])
      .describe('What was found'),
    cause: z.string().trim().min(3).max(500).describe('The cause, in words'),
    licenceId: ChosenLicence,
    password: z.string().min(1).max(200).describe('Password of the signer, again'),
  }),
  reply: { 200: CaseDetail },
  problems: ['not-found', 'licence-not-valid', 'licence-not-chosen', 'password-wrong', 'sign-in-locked'],
  idempotent: 'by-key',
})
