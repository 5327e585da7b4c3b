import { z } from 'zod'
import { breathings, feedings, signCodes, skins } from '../domain/observations/observation.ts'
import { AccessionNumber, WholeCount } from './animal-primitives.ts'
import { contract } from './contract.ts'
import { NoticeState } from './notices.contract.ts'
import { Instant, LocalDate, noneTwice, Reason, RecordId } from './primitives.ts'
import { CaseNumber } from './quarantine-primitives.ts'
import { actAddresses } from './today.addresses.ts'

const HowMany = z.int().min(0).max(10_000_000)
const CountSaid = z
  .discriminatedUnion('basis', [
    z.strictObject({
      basis: z.enum(['counted', 'estimated']).describe('Counted, or estimated between two figures'),
      low: HowMany.describe('Lowest figure, whole animals'),
      high: HowMany.describe('Highest figure; the same where they were counted'),
    }),
    z.strictObject({ basis: z.literal('not-counted').describe('Not counted this time') }),
  ])
  .nullable()
  .describe('How many were seen; null when nothing was said')

const said = {
  lookedAt: z.boolean().describe('All were looked at'),
  feeding: z.enum(feedings).nullable().describe('How many ate; null when nothing was said'),
  breathing: z.enum(breathings).nullable().describe('Breathing; null when nothing was said'),
  skin: z.enum(skins).nullable().describe('Skin and fins; null when nothing was said'),
  signs: noneTwice(z.array(z.enum(signCodes)).max(signCodes.length)).describe('Signs with a code'),
  words: z.string().trim().max(2000).nullable().describe('In the observer’s own words'),
  count: CountSaid,
  foundDead: HowMany.nullable().describe('Bodies found; null when nothing was said, which is not 0'),
  // an entry that waits on a device since before there were these two says neither
  unwell: HowMany.nullable()
    .default(null)
    .describe('How many are moribund or not eating; null when nothing was said, which is not 0'),
  handled: z
    .boolean()
    .nullable()
    .default(null)
    .describe(
      'Whether animals were netted, moved, examined or sampled in the last 24 h; null when nothing was said',
    ),
  forVeterinarian: z.boolean().describe('Marked for the veterinarian; can wait for the round'),
  urgent: z.boolean().describe('Somebody is asked to come now'),
}

export const Observation = z.object({
  id: RecordId,
  ...said,
  enclosure: z.string().describe('Code of the enclosure'),
  cases: z.array(z.string()).describe('Numbers of the cases whose batch was there'),
  happenedAt: Instant.describe('When it was made'),
  happenedOn: LocalDate.describe('Day of the facility on which it was made'),
  saidAt: Instant.describe('The same by the clock of the device'),
  timeDoubtful: z.boolean().describe('The clock of the device ran ahead; the time of receipt is taken'),
  recordedAt: Instant.describe('When it reached the server'),
  recordedBy: z.string().describe('Who made it'),
  recordedById: z.string().nullable().describe('Id of that person'),
  origin: z.enum(['online', 'outbox']).describe('Sent at once, or kept on the device first'),
  unassignedDead: z.int().describe('Bodies of which nobody could say whose they are'),
  bodiesToName: z.int().describe('Of these, bodies that still wait for a name'),
  bodies: z
    .object({
      named: z.int().describe('How many were named'),
      reason: z.string().nullable().describe('Why the rest cannot be named'),
      by: z.string().describe('Who'),
      at: Instant.describe('When'),
    })
    .nullable()
    .describe('Bodies without a name that were named or explained later'),
  reviewed: z
    .object({
      by: z.string().describe('Who'),
      at: Instant.describe('When'),
      words: z.string().nullable().describe('What they said'),
    })
    .nullable()
    .describe('A veterinarian has read it'),
  voidedReason: z.string().nullable().describe('Why it was struck out, where it was'),
  deathsStanding: z
    .array(
      z.object({
        accession: AccessionNumber,
        count: z.int().describe('How many it names as dead'),
      }),
    )
    .describe(
      'Deaths that a struck observation had entered and that stand until they are struck out themselves',
    ),
  notice: z.object({ id: RecordId, state: NoticeState }).nullable().describe('Fate of an urgent call'),
})
export type Observation = z.infer<typeof Observation>

export const recordObservation = contract({
  id: 'recordObservation',
  method: 'post',
  path: '/observations',
  action: 'observation.flag',
  summary: 'What was seen at an enclosure; deaths and counts go into the ledgers with it',
  body: z.strictObject({
    id: RecordId,
    schemaVersion: z.int().min(1).max(1000).describe('Version of the form that it was made with; now 1'),
    origin: z.enum(['online', 'outbox']).describe('Sent at once, or kept on the device first'),
    device: z.string().trim().max(100).describe('Device that it was made on'),
    happenedAt: Instant.describe('When it was made, by the clock of the device'),
    enclosure: z.string().max(60).describe('Code of the enclosure'),
    ...said,
    deaths: noneTwice(
      z
        .array(
          z.strictObject({
            id: RecordId.describe('Id of the death'),
            accession: AccessionNumber,
            count: WholeCount,
          }),
        )
        .max(100),
    ).describe('Whose the bodies are, as far as anybody could say'),
    noticeId: RecordId.optional(),
  }),
  reply: { 201: Observation },
  problems: ['id-already-used', 'in-the-future', 'form-too-old', 'may-not'],
  idempotent: 'by-record-id',
})

export const listObservations = contract({
  id: 'listObservations',
  method: 'get',
  path: '/observations',
  action: 'collection.read',
  summary: 'Observations of a case or an enclosure, the newest first',
  query: z.strictObject({
    case: CaseNumber.optional(),
    enclosure: z.string().max(60).optional().describe('Code of an enclosure'),
    waiting: z
      .enum(['yes'])
      .optional()
      .describe('Only those marked for the veterinarian that nobody has read'),
    bodies: z.enum(['to-name']).optional().describe('Only those with bodies that still wait for a name'),
    cursor: z.string().max(500).optional().describe('Where the last page ended'),
    limit: z.coerce.number().int().min(1).max(200).optional().describe('Rows a page, 50 unless told'),
  }),
  reply: {
    200: z.object({
      rows: z.array(Observation).describe('Observations'),
      nextCursor: z.string().nullable().describe('Where the next page begins; null on the last'),
      total: z.int().describe('How many there are in all'),
    }),
  },
  problems: [],
})

export const reviewObservation = contract({
  ...actAddresses.reviewObservation,
  action: 'chart.write',
  summary: 'A veterinarian has read what was marked for them',
  params: z.strictObject({ id: RecordId }),
  body: z.strictObject({
    id: RecordId,
    words: z.string().trim().max(2000).optional().describe('What is to follow'),
  }),
  reply: { 201: Observation },
  problems: ['not-found', 'id-already-used'],
})

export const voidObservation = contract({
  id: 'voidObservation',
  method: 'post',
  path: '/observations/:id/void',
  action: 'observation.flag',
  summary:
    'Strike out an observation made by mistake; it stays readable. Its bodies without a name leave the clocks; deaths of named animals stand until they are struck out themselves',
  params: z.strictObject({ id: RecordId }),
  body: z.strictObject({ reason: Reason }),
  reply: { 200: Observation },
  problems: ['not-found', 'already-void', 'may-not', 'cause-signed'],
  idempotent: 'by-key',
})

export const nameBodies = contract({
  id: 'nameBodies',
  method: 'post',
  path: '/observations/:id/bodies',
  action: 'discrepancy.resolve',
  summary: 'Say whose the bodies were that nobody could name, or why that will never be known',
  params: z.strictObject({ id: RecordId }),
  body: z.strictObject({
    id: RecordId,
    deaths: noneTwice(
      z
        .array(
          z.strictObject({
            id: RecordId.describe('Id of the death'),
            accession: AccessionNumber,
            count: WholeCount,
          }),
        )
        .max(100),
    ).describe('Whose they are; each goes into the ledger of its animal'),
    reason: Reason.optional().describe('Why the rest cannot be named; needed where any is left'),
  }),
  reply: { 201: Observation },
  problems: [
    'not-found',
    'id-already-used',
    'already-explained',
    'already-void',
    'cause-signed',
    'reason-needed',
  ],
  idempotent: 'by-record-id',
})

/** Everything that a phone needs at a tank, kept on it for when there is no signal. */
export const getRound = contract({
  id: 'getRound',
  method: 'get',
  path: '/rounds',
  action: 'collection.read',
  summary: 'The enclosures of the round with who is in them and whether they were looked at today',
  reply: {
    200: z.object({
      at: Instant.describe('When this was asked'),
      on: LocalDate.describe('Day of the facility'),
      rows: z
        .array(
          z.object({
            enclosure: z.string().describe('Code of the enclosure'),
            name: z.string().describe('Name of the enclosure'),
            area: z.string().describe('Part of the house'),
            boundary: z.string().nullable().describe('Quarantine boundary that it lies in'),
            cases: z
              .array(
                z.object({
                  number: CaseNumber,
                  name: z.string().describe('The animals'),
                  dayNumber: z.int().nullable().describe('Day of the clock'),
                  held: z.boolean().describe('Held or locked'),
                }),
              )
              .describe('Cases whose batch is in it'),
            animals: z
              .array(
                z.object({
                  accession: AccessionNumber,
                  name: z.string().describe('Common name, and house name where there is one'),
                  form: z.enum(['individual', 'group']).describe('An individual or a group'),
                  count: z.int().describe('How many by the ledger'),
                }),
              )
              .describe('Who is in it'),
            lastLookAt: Instant.nullable().describe('Last observation'),
            looksToday: z.int().describe('Observations today'),
            waterBodyId: RecordId.nullable().describe('Its water, for readings'),
          }),
        )
        .describe('Enclosures in order of work: outside quarantine first, quarantine last'),
    }),
  },
  problems: [],
})
