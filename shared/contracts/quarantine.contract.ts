import { z } from 'zod'
import { contract } from './contract.ts'
import { Instant, listQuery, LocalDate, May, noneTwice, RecordId } from './primitives.ts'
import { AccessionNumber } from './animal-primitives.ts'
import { Animals, CaseNames, CaseNumber, CaseRow, HappenedAt, Unmet } from './quarantine-primitives.ts'
import { SignatureBlock } from './signing.contract.ts'

export const CaseMember = z.object({
  id: RecordId.describe('Id of the joining'),
  accession: AccessionNumber,
  name: z.string().describe('Common name, and house name where there is one'),
  scientificName: z.string().describe('Scientific name'),
  form: z.enum(['individual', 'group']).describe('An individual, or a group managed as one'),
  enclosure: z.string().nullable().describe('Code of the enclosure it is in; null when it is gone'),
  animals: Animals,
  joinedAt: Instant.describe('When it came in'),
  joinedOn: LocalDate.describe('Day on which it came in'),
  fromSplit: z.boolean().describe('Taken out of a group of the batch'),
})
export type CaseMember = z.infer<typeof CaseMember>

export const StandingLock = z.object({
  eventId: z.string().describe('Event that put it on; lifting names it'),
  cause: z
    .enum(['positive', 'notifiable-suspicion', 'veterinarian', 'held', 'recall'])
    .describe('Why it stands'),
  since: Instant.describe('Since when'),
  by: z.string().nullable().describe('Who put it on'),
  reason: z.string().nullable().describe('Why, in words'),
  fromCase: z.string().nullable().describe('Number of the case on the same water that it came from'),
})

export const CaseDeath = z.object({
  eventId: z.string().describe('Id of the death'),
  at: Instant.describe('When it was found'),
  on: LocalDate.describe('Day on which it was found'),
  count: z.int().describe('Bodies'),
  accession: z.string().nullable().describe('Of which animal or group; null when nobody could say'),
  finding: z
    .enum(['unexplained', 'explained-not-transmissible', 'explained-transmissible'])
    .describe('What a veterinarian signed; unexplained until then'),
  cause: z.string().nullable().describe('Signed cause'),
  signature: SignatureBlock.nullable().describe('Signature under the cause'),
})

export const CaseDetail = CaseRow.extend({
  asOf: Instant.describe('The instant that all of this holds for'),
  openedAt: Instant.describe('When the case was opened'),
  openedBy: z.string().describe('Who opened it'),
  protocol: z
    .object({
      code: z.string().describe('Code'),
      version: z.int().describe('Version'),
      name: z.string().describe('Name'),
      confirmed: z
        .boolean()
        .describe('Confirmed by a licensed veterinarian; else a project default or proposal'),
    })
    .describe('Protocol that the case runs under'),
  batch: z.array(CaseMember).describe('Animals and groups of the batch, dead ones included'),
  sharesWaterWith: z.array(z.string()).describe('Numbers of the cases on the same water now'),
  lastEntryOn: LocalDate.nullable().describe('Day of the last entry so far'),
  criteria: z
    .array(
      z.object({
        criterionId: z.string().describe('Key of the criterion'),
        name: z.string().describe('What has to be met'),
        met: z.boolean().describe('Met'),
        metOn: LocalDate.nullable().describe('Day on which it was met'),
        count: z.int().describe('Negatives that count now'),
        wanted: z.int().describe('Negatives wanted; 0 where it is declared'),
        earliestSampleOn: LocalDate.nullable().describe('First day on which a sample could meet it'),
      }),
    )
    .describe('Conditions before clearance besides days'),
  extensions: z
    .array(
      z.object({
        eventId: z.string().describe('Event that it comes from'),
        kind: z.enum(['death', 'signs', 'masking', 'not-feeding', 'positive']).describe('Why'),
        fromOn: LocalDate.describe('Since when'),
        untilOn: LocalDate.nullable().describe('Until when; null until a veterinarian ends it'),
        state: z.enum(['standing', 'withdrawn', 'ended']).describe('Whether it counts'),
      }),
    )
    .describe('Reasons to wait longer'),
  unmet: z.array(Unmet).describe('What stands between the case and clearance'),
  decisionsDue: z
    .array(
      z.object({
        code: z
          .enum(['exposure', 'recall', 'repeat-sample', 'positive-untreated'])
          .describe('What is to be decided or done'),
        eventId: z.string().describe('Event that it comes from'),
      }),
    )
    .describe('What waits for a decision of a veterinarian, or for whoever takes samples'),
  openDiscrepancies: z
    .int()
    .describe('Discrepancies of the batch that nobody has explained; they stop clearance'),
  locks: z.array(StandingLock).describe('Locks and holds that stand'),
  deaths: z.array(CaseDeath).describe('Deaths of the batch, the newest first'),
  runningPauses: z
    .array(
      z.object({
        pauseId: z.string().describe('Id of the pause'),
        since: Instant.describe('Since when'),
        cause: z.string().describe('Why'),
      }),
    )
    .describe('Pauses of this case that have not ended'),
  events: z
    .array(
      z.object({
        id: RecordId,
        kind: z.string().describe('Kind of event'),
        at: Instant.describe('When it happened'),
        on: LocalDate.describe('Day on which it happened'),
        recordedAt: Instant.describe('When it was entered'),
        recordedBy: z.string().describe('Who entered it'),
        reason: z.string().nullable().describe('In words'),
        voidedReason: z.string().nullable().describe('Why it was voided, where it was'),
      }),
    )
    .describe('Events entered for this case, the newest first'),
  clearance: z
    .object({
      signature: SignatureBlock.describe('Signature under it'),
      on: LocalDate.describe('Day of clearance'),
      against: z.int().describe('How many conditions were not met'),
      reason: z.string().nullable().describe('Why it was cleared against them'),
    })
    .nullable()
    .describe('The signed clearance; null until then'),
  names: CaseNames,
  version: z.int().describe('Version of the head'),
  may: May,
})
export type CaseDetail = z.infer<typeof CaseDetail>

export const caseParams = z.strictObject({ number: CaseNumber })

/** Which cases a list holds: those of a state, or those with work of a kind. */
export const boardViews = ['running', 'due', 'overdue', 'ready', 'held', 'ended', 'all'] as const

export const listCases = contract({
  id: 'listCases',
  method: 'get',
  path: '/cases',
  action: 'collection.read',
  summary: 'Quarantine cases with their clocks, for the board; running ones unless told',
  query: listQuery(['clearance', 'number', 'work']).extend({
    view: z.enum(boardViews).optional().describe('Which cases; running unless told'),
    protocol: z.string().max(60).optional().describe('Only cases under the protocol with this code'),
    boundary: z.string().max(200).optional().describe('Only cases within this quarantine boundary'),
    asOf: Instant.optional().describe('As of an instant; now unless told'),
  }),
  reply: {
    200: z.object({
      rows: z.array(CaseRow).describe('Cases of this page'),
      nextCursor: z.string().nullable().describe('Where the next page begins; null on the last'),
      total: z.int().describe('How many there are in this view'),
      tally: z
        .object({
          running: z.int().describe('Running'),
          due: z.int().describe('With a step due today'),
          overdue: z.int().describe('With a step that is late'),
          ready: z.int().describe('Ready to clear'),
          held: z.int().describe('Held or locked'),
          ended: z.int().describe('Cleared, recalled or transferred'),
          all: z.int().describe('All cases ever'),
        })
        .describe('How many cases each view holds'),
      asOfOn: LocalDate.describe('Day of the facility that the clocks were asked for'),
      protocols: z.array(z.string()).describe('Codes of the protocols that cases were ever under'),
      boundaries: z.array(z.string()).describe('Quarantine boundaries that cases are within now'),
      names: CaseNames,
    }),
  },
  problems: [],
})

export const getCase = contract({
  id: 'getCase',
  method: 'get',
  path: '/cases/:number',
  action: 'collection.read',
  summary: 'One case: its clock explained, steps, conditions before clearance, batch',
  params: caseParams,
  query: z.strictObject({ asOf: Instant.optional().describe('As of an instant; now unless told') }),
  reply: { 200: CaseDetail },
  problems: ['not-found'],
})

export const openCase = contract({
  id: 'openCase',
  method: 'post',
  path: '/cases',
  action: 'case.open',
  summary: 'Open a quarantine case for a batch under a protocol',
  body: z.strictObject({
    id: RecordId,
    name: z.string().trim().min(1).max(120).optional().describe('Name of the case; the taxon unless told'),
    protocolVersionId: RecordId.describe('Version of the protocol'),
    members: noneTwice(
      z
        .array(
          z.strictObject({
            id: RecordId,
            accession: AccessionNumber,
            happenedAt: HappenedAt.describe(
              'When it came in; the beginning of its stay unless told',
            ).optional(),
          }),
        )
        .min(1, 'Choose at least one animal or group')
        .max(200),
      ['accession'],
    ).describe('The batch so far'),
    happenedAt: HappenedAt,
  }),
  reply: { 201: CaseDetail },
  problems: ['id-already-used', 'already-in-a-case', 'kinds-differ', 'not-here-then', 'in-the-future'],
  idempotent: 'by-record-id',
})

export const addMember = contract({
  id: 'addMember',
  method: 'post',
  path: '/cases/:number/members',
  action: 'case.open',
  summary: 'Another animal or group of the batch has come in; after closing it restarts the clock',
  params: caseParams,
  body: z.strictObject({
    id: RecordId,
    accession: AccessionNumber,
    happenedAt: HappenedAt.describe('When it came in; the beginning of its stay unless told').optional(),
  }),
  reply: { 201: CaseDetail },
  problems: [
    'not-found',
    'id-already-used',
    'already-in-a-case',
    'kinds-differ',
    'case-ended',
    'in-the-future',
  ],
  idempotent: 'by-record-id',
})

export const closeCase = contract({
  id: 'closeCase',
  method: 'post',
  path: '/cases/:number/closing',
  action: 'case.open',
  summary: 'The last of the batch is in: the clock begins',
  params: caseParams,
  body: z.strictObject({ id: RecordId, happenedAt: HappenedAt }),
  reply: { 201: CaseDetail },
  problems: ['not-found', 'id-already-used', 'already-closed', 'in-the-future'],
  idempotent: 'by-record-id',
})
