import { z } from 'zod'
import { contract } from './contract.ts'
import { todayAddresses } from './today.addresses.ts'

/** What can be found, in the order in which it is shown. */
export const foundKinds = ['animal', 'enclosure', 'order', 'case', 'transaction', 'permit', 'person'] as const

export type FoundKind = (typeof foundKinds)[number]

export const FoundThing = z.object({
  key: z.string().describe('What its address is made of: number, code or id'),
  name: z.string().describe('Number or code and name'),
  note: z.string().describe('Where it is or what it is about; may be empty'),
})
export type FoundThing = z.infer<typeof FoundThing>

export const find = contract({
  ...todayAddresses.find,
  action: 'collection.read',
  summary:
    'Animals, enclosures, orders, cases, papers and people by name or number, as far as the reader may see them',
  query: z.strictObject({
    q: z.string().trim().min(2).max(100).describe('Part of a name or number, at least 2 characters'),
  }),
  reply: {
    200: z.object({
      groups: z
        .array(
          z.object({
            kind: z.enum(foundKinds).describe('What these are'),
            rows: z.array(FoundThing).describe('At most 8 of them'),
            total: z.int().describe('How many there are in all'),
          }),
        )
        .describe('What was found, kinds without a find left out'),
    }),
  },
  problems: [],
})
