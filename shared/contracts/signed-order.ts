import { z } from 'zod'
import {
  BathOrderFields,
  OrderAmount,
  OrderWater,
  SaidCaution,
  SaidCondition,
  SaidLine,
} from './order-primitives.ts'
import { EnteredQuantity } from './primitives.ts'

/** Orders signed earlier name the rule alone. */
const signedAnswer = { ruleId: z.string(), code: z.string().optional(), text: z.string().optional() }

/**
 * What a signature under an order for a bath covers, as far as screens read it. A text that was changed after it was
 * signed may no longer fit: parse it, and say so where it does not.
 */
export const SignedBathOrder = z.object({
  number: z.string().describe('Number of the order'),
  versionNo: z.int().describe('Version'),
  enclosure: z.object({ code: z.string(), name: z.string() }).describe('Enclosure whose water is treated'),
  water: OrderWater.describe('Connected water and everybody in it at signing'),
  valves: z.array(z.object({ code: z.string(), state: z.string() })).describe('Valves and pumps at signing'),
  product: z
    .object({
      establishedName: z.string(),
      productName: z.string(),
      strength: EnteredQuantity,
      strengthBasis: z.string(),
    })
    .describe('Product'),
  lot: z
    .object({ lotNumber: z.string(), expiresOn: z.string() })
    .nullable()
    .describe('Lot, where one was chosen'),
  doseLine: z
    .object({ text: z.string(), citation: z.string(), mark: z.string(), state: z.string() })
    .nullable()
    .describe('Dose line that the target was taken from'),
  fields: z.object(BathOrderFields.shape).describe('The order as entered'),
  targetText: z.string().describe('Target as written'),
  basisText: z.string().describe('What the target is of'),
  amount: OrderAmount.nullable().describe(
    'Amount of each dose; left out for whoever may be the blind second person',
  ),
  working: z.array(SaidLine).describe('Working of the amount'),
  cautions: z.array(SaidCaution).describe('Cautions at signing'),
  conditions: z.array(SaidCondition).describe('What has to be true before each dose'),
  overrides: z
    .array(z.object({ ...signedAnswer, reason: z.string() }))
    .describe('Stops that were overridden, with their reasons'),
  relationship: z
    .string()
    .nullable()
    .optional()
    .describe('What the signer stated of knowing these animals, where the use is extralabel'),
  read: z.array(z.union([z.string(), z.object(signedAnswer)])).describe('Warnings that were read'),
})
export type SignedBathOrder = z.infer<typeof SignedBathOrder>
