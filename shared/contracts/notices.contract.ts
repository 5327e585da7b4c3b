import { z } from 'zod'
import { contract } from './contract.ts'
import { Instant, RecordId } from './primitives.ts'
import { actAddresses } from './today.addresses.ts'

export const NoticeState = z
  .enum(['sending', 'not-sent', 'sent', 'seen'])
  .describe('Sending; not sent (rings nobody); sent to somebody; seen by somebody')

const Act = z.object({
  by: z.string().describe('Who'),
  at: Instant.describe('When'),
  whom: z.string().nullable().describe('Whom they reached, on the telephone'),
})

export const Notice = z.object({
  id: RecordId,
  observationId: RecordId.describe('The observation that calls'),
  enclosure: z.string().describe('Code of the enclosure'),
  caseNumber: z.string().nullable().describe('Case whose animals are there'),
  words: z.string().describe('What was seen'),
  raisedAt: Instant.describe('When it was raised'),
  raisedBy: z.string().describe('Who raised it'),
  raisedById: RecordId.nullable().describe('Id of that person, who cannot also mark it seen'),
  state: NoticeState,
  sentTo: z
    .array(z.object({ name: z.string().describe('Whom'), at: Instant.describe('When') }))
    .describe('Who was reached by mail'),
  failed: z
    .array(
      z.object({
        name: z.string().describe('Whom'),
        at: Instant.describe('Last attempt'),
        error: z.string().describe('What the mail server said'),
      }),
    )
    .describe('Who was not reached'),
  seen: z.array(Act).describe('Who has seen it'),
  telephoned: z.array(Act).describe('Who has telephoned'),
})
export type Notice = z.infer<typeof Notice>

const params = z.strictObject({ id: RecordId })

export const getOnCall = contract({
  id: 'getOnCall',
  method: 'get',
  path: '/on-call',
  action: 'facility.read',
  summary: 'Whom to telephone, kept on every phone for when there is no signal',
  reply: {
    200: z.object({
      asOf: Instant.describe('When this list was given out'),
      people: z
        .array(
          z.object({
            name: z.string().describe('Name or post'),
            phone: z.string().nullable().describe('Telephone number or extension'),
            email: z.string().nullable().describe('E-mail address that urgent calls go to'),
          }),
        )
        .describe('In the order in which to call'),
    }),
  },
  problems: [],
})

export const getNotice = contract({
  id: 'getNotice',
  method: 'get',
  path: '/notices/:id',
  action: 'collection.read',
  summary: 'The fate of an urgent call',
  params,
  reply: { 200: Notice },
  problems: ['not-found'],
})

export const listNotices = contract({
  id: 'listNotices',
  method: 'get',
  path: '/notices',
  action: 'collection.read',
  summary: 'Urgent calls that nobody has seen yet, the newest first',
  query: z.strictObject({
    state: z.enum(['open', 'all']).optional().describe('Only unseen ones unless told'),
  }),
  reply: { 200: z.object({ rows: z.array(Notice).describe('Urgent calls, at most 100') }) },
  problems: [],
})

export const noteSeen = contract({
  ...actAddresses.noteSeen,
  action: 'notice.see',
  summary: 'I have seen this urgent call, which another person raised, and see to it',
  params,
  body: z.strictObject({ id: RecordId }),
  reply: { 201: Notice },
  problems: ['not-found', 'id-already-used', 'another-person-needed'],
})

export const noteTelephoned = contract({
  id: 'noteTelephoned',
  method: 'post',
  path: '/notices/:id/telephoned',
  action: 'observation.flag',
  summary: 'I have telephoned about this urgent call',
  params,
  body: z.strictObject({
    id: RecordId,
    whom: z.string().trim().max(200).optional().describe('Whom I reached'),
    happenedAt: Instant.describe('When I telephoned'),
  }),
  reply: { 201: Notice },
  problems: ['not-found', 'id-already-used'],
  idempotent: 'by-record-id',
})
