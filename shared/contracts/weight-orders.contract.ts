import { z } from 'zod'
import { injectionPlaces, routesByWeight } from '../domain/orders/order-route.ts'
import { concentrationBases } from '../domain/units/basis.ts'
import { contract } from './contract.ts'
import { SaidCaution, SaidCondition, SaidLine } from './order-primitives.ts'
import { EnteredQuantity, Instant, LocalDate, noneTwice, RecordId } from './primitives.ts'

/**
 * What a veterinarian writes of a dose that goes by the weight of one animal, or of one group by the mean weight of its
 * members; choices that attest are null until somebody makes them.
 */
export const WeightOrderFields = z
  .strictObject({
    route: z.enum(routesByWeight).describe('How it reaches the animal'),
    animalId: RecordId.describe('The animal, or the group, of which each member gets the amount'),
    place: z.enum(injectionPlaces).nullable().describe('Where the needle goes in; of an injection only'),
    productId: RecordId.nullable().describe('Product'),
    lotId: RecordId.nullable().describe('Lot, where one is chosen already'),
    problem: z.string().trim().max(500).describe('Condition treated'),
    use: z.enum(['as-labelled', 'extralabel']).nullable().describe('Use by the label, or outside it'),
    target: EnteredQuantity.nullable().describe('Dose for the weight of the animal'),
    basis: z.enum(concentrationBases).nullable().describe('What the dose is of'),
    mostPerPlace: EnteredQuantity.nullable().describe(
      'Largest volume for one place of an injection; null: all of it goes in at one',
    ),
    doses: z.int().min(1).max(60).describe('Number of doses'),
    intervalHours: z
      .number()
      .positive()
      .max(2160)
      .nullable()
      .describe('Hours between doses; null for a single one'),
    startsAt: Instant.nullable().describe('First dose'),
    division: EnteredQuantity.nullable().describe('Smallest step of the syringe or balance'),
    stopIf: z.string().trim().max(1000).describe('When it is stopped at once'),
    instructions: z.string().trim().max(2000).describe('How it is given'),
    experienceWith: noneTwice(z.array(z.string().max(200)).max(50)).describe(
      'Taxa for which the veterinarian declares earlier experience with this drug here',
    ),
  })
  .describe('A dose by the weight of an animal')
export type WeightOrderFields = z.infer<typeof WeightOrderFields>

export const WeightAmount = z.object({
  unrounded: z.number().describe('Amount for one animal as worked out, in g or mL as the unit says'),
  unroundedUnit: z.enum(['g', 'mL']).describe('Unit of the unrounded amount'),
  measured: EnteredQuantity.nullable().describe(
    'What is drawn up or weighed; null without a syringe or balance',
  ),
  text: z.string().describe('The amount for one animal as it is written'),
  roundingPercent: z
    .number()
    .nullable()
    .describe('What the rounding to the step makes of the dose; null without a step'),
  portions: z
    .array(EnteredQuantity)
    .describe('What goes in at each place, where one place does not take it all; else empty'),
  thinTo: z
    .number()
    .nullable()
    .describe('Thinning of 1 in so many that could be read well on this step; null where it can be already'),
})

export const WeightOrderPreview = z.object({
  amount: WeightAmount.nullable().describe('The amount for one animal; null while it cannot be worked out'),
  refusal: z
    .object({
      field: z.string().nullable().describe('Field at fault'),
      code: z.string().describe('Stable code'),
      detail: z.string().describe('What to do'),
    })
    .nullable()
    .describe('Why there is no amount'),
  working: z.array(SaidLine).describe('Working of the amount'),
  animal: z
    .object({
      accession: z.string().describe('Accession number'),
      commonName: z.string().describe('Common name'),
      scientificName: z.string().describe('Scientific name'),
      countText: z.string().describe('How many'),
      enclosureCode: z.string().describe('Where it is held'),
    })
    .describe('The animal or group'),
  weight: z
    .object({
      text: z.string().describe('Mass of one animal; of several weighed together the mean'),
      basis: z.enum(['measured', 'estimated']).describe('Measured or estimated'),
      happenedOn: LocalDate.describe('Day on which it was weighed'),
      animalsWeighed: z.int().describe('How many were weighed together'),
    })
    .nullable()
    .describe('The newest weight, which the amount goes by; null where nobody weighed it'),
  cautions: z.array(SaidCaution).describe('Cautions, the gravest first'),
  conditions: z.array(SaidCondition).describe('What has to be true before each dose'),
  missing: z.array(z.string()).describe('What is still to be filled in'),
})
export type WeightOrderPreview = z.infer<typeof WeightOrderPreview>

export const previewWeightOrder = contract({
  id: 'previewWeightOrder',
  method: 'post',
  path: '/weight-order-previews',
  action: 'order.draft',
  summary: 'Work out a dose by the newest weight of an animal and judge it, without keeping anything',
  body: WeightOrderFields,
  reply: { 200: WeightOrderPreview },
  problems: ['not-found', 'bad-input', 'product-not-by-weight'],
  idempotent: 'nothing-kept',
})
