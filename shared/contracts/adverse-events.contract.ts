import { z } from 'zod'
import { contract } from './contract.ts'
import { OrderNumber } from './order-primitives.ts'
import { Instant, Reason, RecordId } from './primitives.ts'

const orderParams = z.strictObject({ number: OrderNumber })

export const AdverseEvent = z.object({
  id: RecordId,
  doseKey: z.string().nullable().describe('Dose after which it was seen; null where nobody said'),
  seen: z.string().describe('What was seen'),
  affectedCount: z.int().nullable().describe('Animals affected; null where nobody counted'),
  happenedAt: Instant.describe('When it was seen'),
  recordedAt: Instant.describe('When it was written down'),
  recordedBy: z.string().describe('Who wrote it down'),
  review: z
    .object({
      finding: z.string().describe('What the veterinarian found, and what follows'),
      at: Instant.describe('When'),
      by: z.string().describe('The veterinarian'),
    })
    .nullable()
    .describe('Null until a veterinarian has reviewed it: no dose of the order is given before'),
})
export type AdverseEvent = z.infer<typeof AdverseEvent>

const AdverseEvents = z.object({ rows: z.array(AdverseEvent).describe('The newest first') })

export const listAdverseEvents = contract({
  id: 'listAdverseEvents',
  method: 'get',
  path: '/orders/:number/adverse-events',
  action: 'order.read',
  summary: 'What went wrong with animals under an order, and what a veterinarian found',
  params: orderParams,
  reply: { 200: AdverseEvents },
  problems: ['not-found'],
})

export const recordAdverseEvent = contract({
  id: 'recordAdverseEvent',
  method: 'post',
  path: '/orders/:number/adverse-events',
  action: 'adverse-event.record',
  summary: 'Record that something went wrong under an order; never refused for the state of the order',
  params: orderParams,
  body: z.strictObject({
    id: RecordId,
    doseKey: z.string().trim().min(1).max(20).nullable().describe('Dose after which it was seen'),
    seen: z.string().trim().min(3).max(2000).describe('What was seen'),
    affectedCount: z.int().min(0).max(10_000_000).nullable().describe('Animals affected'),
    happenedAt: Instant.describe('When it was seen'),
  }),
  reply: { 201: AdverseEvents },
  problems: ['not-found', 'id-already-used'],
  idempotent: 'by-record-id',
})

export const reviewAdverseEvent = contract({
  id: 'reviewAdverseEvent',
  method: 'post',
  path: '/orders/:number/adverse-events/:eventId/review',
  action: 'adverse-event.review',
  summary: 'Say what was found of an adverse event; for a veterinarian, once',
  params: orderParams.extend({ eventId: RecordId }),
  body: z.strictObject({ id: RecordId, finding: Reason }),
  reply: { 201: AdverseEvents },
  problems: ['not-found', 'already-resolved', 'id-already-used'],
  idempotent: 'by-record-id',
})
