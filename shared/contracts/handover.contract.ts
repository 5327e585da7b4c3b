import { z } from 'zod'
import { contract } from './contract.ts'
import { Instant, RecordId } from './primitives.ts'
import { actAddresses } from './today.addresses.ts'

/** A note from one watch to the next. */
export const HandoverNote = z.object({
  id: RecordId,
  about: z.string().nullable().describe('Place or animals that it is about, in words'),
  words: z.string().describe('What the next watch has to know'),
  at: Instant.describe('When it was written'),
  by: z.string().describe('Who wrote it'),
  readBy: z
    .array(z.object({ by: z.string().describe('Who'), at: Instant.describe('When first') }))
    .describe('Who has said that they have read it'),
  mine: z.boolean().describe('Written by the reader'),
  readByMe: z.boolean().describe('The reader has said that they have read it'),
})
export type HandoverNote = z.infer<typeof HandoverNote>

export const writeHandover = contract({
  ...actAddresses.writeHandover,
  action: 'observation.record',
  summary: 'Leave a note for the next watch; it is never altered, another one puts it right',
  body: z.strictObject({
    id: RecordId,
    about: z.string().trim().max(120).optional().describe('Place or animals that it is about, in words'),
    words: z.string().trim().min(1).max(2000).describe('What the next watch has to know'),
  }),
  reply: { 201: HandoverNote },
  problems: ['id-already-used'],
})

export const noteHandoverRead = contract({
  ...actAddresses.noteHandoverRead,
  action: 'observation.record',
  summary: 'I have read this note',
  params: z.strictObject({ id: RecordId }),
  body: z.strictObject({ id: RecordId }),
  reply: { 201: HandoverNote },
  problems: ['not-found', 'id-already-used'],
})
