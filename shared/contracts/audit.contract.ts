import { z } from 'zod'
import { contract } from './contract.ts'
import { Instant, page } from './primitives.ts'

export const AuditEntry = z.object({
  seq: z.int().describe('Place in the chain'),
  at: Instant,
  actorName: z.string().describe('Who did it'),
  action: z.string().describe('What was done, noun.verb'),
  subjectKind: z.string().describe('Kind of record'),
  subjectLabel: z.string().describe('The record as people know it'),
  withheld: z.boolean().describe('Clinical text that the reader may not see was left out'),
  amountLeftOut: z
    .boolean()
    .describe('The amount of a dose was left out: the reader may still calculate one of its order blind'),
  before: z.unknown().describe('What it was'),
  after: z.unknown().describe('What it became'),
  hash: z.string().describe('Hash of this entry, which covers the one before'),
})
export type AuditEntry = z.infer<typeof AuditEntry>

export const listAudit = contract({
  id: 'listAudit',
  method: 'get',
  path: '/audit',
  action: 'audit.read',
  summary: 'The audit trail, the newest first, as far as the reader may see it',
  query: z.strictObject({
    q: z.string().trim().max(200).optional().describe('Words in name, action or record'),
    subjectKind: z.string().max(60).optional().describe('Only this kind of record'),
    subjectId: z.string().max(100).optional().describe('Only this record'),
    cursor: z.string().regex(/^\d+$/).optional().describe('Entries before this place in the chain'),
    limit: z.coerce.number().int().min(1).max(200).optional().describe('Entries a page, 50 unless told'),
  }),
  reply: { 200: page(AuditEntry) },
  problems: [],
})
