import { z } from 'zod'
import { contract } from './contract.ts'
import { RecordId } from './primitives.ts'
import { CaseNumber } from './quarantine-primitives.ts'

export const listCasesInWater = contract({
  id: 'listCasesInWater',
  method: 'get',
  path: '/enclosures/:id/cases',
  action: 'collection.read',
  summary: 'Running quarantine cases in the water of an enclosure and in what is connected with it now',
  params: z.strictObject({ id: RecordId }),
  reply: {
    200: z.object({
      rows: z
        .array(
          z.object({
            number: CaseNumber,
            batchClosed: z
              .boolean()
              .describe('The last of its batch is in: whatever comes in now may start its clock again'),
          }),
        )
        .describe('Running cases in that water'),
    }),
  },
  problems: ['not-found'],
})
