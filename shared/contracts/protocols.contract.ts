import { z } from 'zod'
import { protocolStepKinds } from '../domain/protocol/protocol-content.ts'
import { contract } from './contract.ts'
import { Instant, Reason, RecordId } from './primitives.ts'

const Days = z.int().min(0).max(3650)
const Key = z
  .string()
  .regex(/^[a-z0-9][a-z0-9-]{0,39}$/, 'Small letters, digits and hyphens')
  .describe('Key that records and results name')
export const ProtocolCode = z
  .string()
  .regex(/^[A-Z0-9][A-Z0-9-]{0,19}$/, 'Capital letters, digits and hyphens, up to 20')
  .describe('Code of the protocol, for example QP-30')

const Criterion = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('negatives').describe('Negative results in a row'),
    criterionId: Key,
    testKey: Key,
    count: z.int().min(1).max(20).describe('How many in a row'),
    daysApart: Days.describe('Days at least between one and the next'),
    daysAfterMasking: Days.describe(
      'Days at least from the last treatment that can hide findings to the last of them',
    ),
  }),
  z.strictObject({
    kind: z.literal('declared').describe('A veterinarian declares it met'),
    criterionId: Key,
  }),
])

export const ProtocolContentBody = z
  .strictObject({
    policy: z
      .strictObject({
        requiredDays: Days.min(1).describe('Days from day 0 to the earliest clearance'),
        deathExtensionDays: Days.describe('Days from an unexplained death'),
        signsExtensionDays: Days.describe('Days from new clinical signs'),
        maskingWindowDays: Days.describe('Days from the end of a treatment that can hide findings'),
        transportDeathHours: z
          .number()
          .min(0)
          .max(720)
          .describe('True hours after arrival within which a death is put down to the journey'),
        temperaturePauseHours: z
          .number()
          .min(0)
          .max(720)
          .describe('True hours after which a spell outside the temperature range pauses the clock'),
        criteria: z.array(Criterion).max(20).describe('What has to be met before clearance'),
      })
      .describe('What the clock goes by'),
    steps: z
      .array(
        z.strictObject({
          key: Key,
          kind: z.enum(protocolStepKinds).describe('Kind of work'),
          day: Days.describe('First day of its window, from day 0'),
          untilDay: Days.describe('Last day of its window'),
          daily: z.boolean().describe('On every day of the window'),
          name: z.string().trim().min(1).max(200).describe('What is done'),
          short: z.string().trim().min(1).max(30).describe('The same in two words'),
          testKey: Key.optional(),
          masks: z
            .boolean()
            .optional()
            .describe('Treatment that hides what the tests look for; taken so unless false'),
          maskingWindowDays: Days.optional().describe(
            'Days that it hides them after its end, where not the usual',
          ),
          fadingDays: Days.optional().describe(
            'Days until the agent is out of the water, where it is left to fade',
          ),
        }),
      )
      .min(1)
      .max(100)
      .describe('Steps in order of their days'),
    criterionNames: z.record(Key, z.string().trim().min(1).max(100)).describe('Names of the criteria'),
    testNames: z.record(Key, z.string().trim().min(1).max(100)).describe('Names of the tests'),
  })
  .describe('Everything that the version says')

export const ProtocolVersion = z.object({
  id: RecordId,
  code: ProtocolCode,
  version: z.int().describe('Number of the version'),
  name: z.string().describe('Name'),
  content: ProtocolContentBody,
  source: z.string().describe('Where its figures come from'),
  mark: z.string().describe('How well the source is known: V, V2, C, M or P'),
  state: z
    .enum(['default', 'proposed', 'confirmed'])
    .describe('Project default, not confirmed; proposed; or confirmed by a licensed veterinarian'),
  proposedBy: z.string().nullable().describe('Who proposed it; null for a project default'),
  proposedAt: Instant.describe('When it was proposed'),
  reason: z.string().nullable().describe('Why it was proposed'),
  confirmedBy: z.string().nullable().describe('Who confirmed it'),
  confirmedAt: Instant.nullable().describe('When it was confirmed'),
  current: z.boolean().describe('The version that new cases take'),
})
export type ProtocolVersion = z.infer<typeof ProtocolVersion>

export const listProtocols = contract({
  id: 'listProtocols',
  method: 'get',
  path: '/protocols',
  action: 'collection.read',
  summary: 'Every version of every protocol, with who confirmed it',
  reply: {
    200: z.object({ rows: z.array(ProtocolVersion).describe('Versions, by code, the newest first') }),
  },
  problems: [],
})

export const proposeProtocol = contract({
  id: 'proposeProtocol',
  method: 'post',
  path: '/protocols',
  action: 'formulary.propose',
  summary: 'Propose a protocol, or a new version of one',
  body: z.strictObject({
    id: RecordId,
    code: ProtocolCode,
    name: z.string().trim().min(1).max(120).describe('Name'),
    content: ProtocolContentBody,
    source: z.string().trim().min(3).max(500).describe('Where its figures come from'),
    mark: z.enum(['V', 'V2', 'C', 'M', 'P']).describe('How well the source is known'),
    reason: Reason,
  }),
  reply: { 201: ProtocolVersion },
  problems: ['id-already-used'],
  idempotent: 'by-record-id',
})

export const confirmProtocol = contract({
  id: 'confirmProtocol',
  method: 'post',
  path: '/protocols/:code/versions/:version/confirmation',
  action: 'formulary.confirm',
  summary: 'Confirm a version of a protocol; new cases take it from then on',
  params: z.strictObject({
    code: z.string().max(60).describe('Code of the protocol'),
    version: z.string().max(60).describe('Number of the version'),
  }),
  body: z.strictObject({ reason: Reason.optional() }),
  reply: { 200: ProtocolVersion },
  problems: ['not-found', 'already-confirmed', 'licence-not-valid', 'sign-in-locked'],
  idempotent: 'by-key',
})
