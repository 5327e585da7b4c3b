import { z } from 'zod'
import { concentrationBases } from '../domain/units/basis.ts'
import { EnteredQuantity, Instant, noneTwice, RecordId } from './primitives.ts'

export const OrderNumber = z
  .string()
  .regex(/^[A-Z]+-\d+$/)
  .describe('Number of the order, for example TO-0734')
const Basis = z.enum(concentrationBases).describe('What the figure is a concentration of')

/** What a form can state that no ledger holds yet. Nothing is chosen beforehand. */
export const Stated = z
  .strictObject({
    waterKind: z
      .enum(['fresh', 'brackish', 'marine'])
      .nullable()
      .describe('Kind of water, where no salinity was read'),
    oxygenIsLogged: z.boolean().nullable().describe('Oxygen is logged continuously'),
    hasBloom: z.boolean().nullable().describe('There is a heavy bloom of algae'),
    hasPlantsOrAlgae: z.boolean().nullable().describe('Plants or algae are on show in this water'),
    lights: z.enum(['full', 'dimmed', 'off']).nullable().describe('Lights over the water'),
    isBuffered: z.boolean().nullable().optional().describe('Bicarbonate goes into the bath with tricaine'),
    isAired: z.boolean().nullable().optional().describe('Out of doors, or in a room whose air is changed'),
    hasBiofilter: z
      .boolean()
      .nullable()
      .optional()
      .describe('A biofilter stands in this water, where its life support does not say'),
    experienceWith: noneTwice(z.array(z.string().max(200)).max(50)).describe(
      'Taxa for which the veterinarian declares earlier experience with this drug here',
    ),
  })
  .describe('Facts that no ledger holds, stated on the form')

/** An order for an immersion bath as it is being written; choices that attest are null until somebody makes them. */
export const BathOrderFields = z
  .strictObject({
    enclosureId: RecordId.describe('Enclosure whose water is treated'),
    animalIds: noneTwice(z.array(RecordId).max(200)).describe('Animals and groups that are treated'),
    productId: RecordId.nullable().describe('Product'),
    lotId: RecordId.nullable().describe('Lot, where one is chosen already'),
    doseLineId: RecordId.nullable().describe('Dose line of the formulary that the target is taken from'),
    problem: z.string().trim().max(500).describe('Condition treated'),
    use: z.enum(['as-labelled', 'extralabel']).nullable().describe('Use by the label, or outside it'),
    target: EnteredQuantity.nullable().describe('What is wanted in the water'),
    basis: Basis.nullable().describe('What the target is a concentration of'),
    timing: z.enum(['timed', 'indefinite']).nullable().describe('For a time, or left in the water'),
    contactMinutes: z.number().positive().max(20_160).nullable().describe('Contact time in minutes'),
    doses: z.int().min(1).max(60).describe('Number of doses'),
    intervalHours: z
      .number()
      .positive()
      .max(2160)
      .nullable()
      .describe('Hours between doses; null for a single one'),
    startsAt: Instant.nullable().describe('First dose'),
    setting: z.enum(['tank', 'raceway', 'pond']).nullable().describe('Where the water is'),
    division: EnteredQuantity.nullable().describe('Smallest step of the balance or measure'),
    stopIf: z.string().trim().max(1000).describe('When the bath is stopped at once'),
    instructions: z.string().trim().max(2000).describe('How it is given'),
    allowedVolumeDriftPercent: z
      .number()
      .min(0)
      .max(50)
      .describe('How far the volume may have moved since the signature, in percent'),
    stated: Stated,
  })
  .describe('An order for a bath')
export type BathOrderFields = z.infer<typeof BathOrderFields>

export const SaidLine = z.object({
  key: z.string().describe('Names the line within its working'),
  label: z.string().describe('What the line works out, in words'),
  expression: z.string().describe('The arithmetic with its numbers and units'),
  shown: z.string().describe('The arithmetic as a person reads it'),
  value: z.number().describe('The unrounded answer, in the unit beside it'),
  unit: z.string().describe('Unit of the answer'),
  result: z.string().describe('The answer as shown'),
})

/** By which cause a caution fired; those of one cause are said as one. */
export const SaidCause = z.object({
  resolvedBy: z.array(z.string()).describe('Codes of what would resolve it: any one'),
  unknownFacts: z.array(z.string()).describe('Facts that were not known and made it fire'),
  subject: z.string().nullable().describe('The order, test or drug that it is about, where it names one'),
})

export const SaidCaution = z.object({
  ruleId: z.string().describe('Rule that fired'),
  code: z.string().describe('What it found'),
  level: z.enum(['stop', 'warning', 'note']).describe('How grave it is'),
  overridable: z.boolean().describe('A veterinarian may override it with a signed reason'),
  title: z.string().describe('The caution in a few words'),
  text: z.string().describe('The caution in sentences'),
  resolve: z.array(z.string()).describe('What would resolve it'),
  citations: z.array(z.string()).describe('What it rests on, with marks'),
  secondCalculation: z.boolean().describe('It asks for a second calculation'),
  cause: SaidCause.optional().describe('By which cause it fired; orders signed earlier do not say it'),
})
export type SaidCaution = z.infer<typeof SaidCaution>

export const SaidCondition = z.object({
  ruleId: z.string().describe('Rule that is judged at the dose'),
  level: z.enum(['stop', 'warning', 'note']).describe('How grave it is when it is not met'),
  text: z.string().describe('What has to be true before the first gram'),
  state: z.enum(['met', 'unmet', 'unknown']).describe('How it stands by the facts at hand'),
  secondCalculation: z.boolean().describe('It asks for a second calculation'),
})

export const OrderAmount = z.object({
  unrounded: z.number().describe('Amount as worked out, in g or mL as the unit says'),
  unroundedUnit: z.enum(['g', 'mL']).describe('Unit of the unrounded amount'),
  measured: EnteredQuantity.nullable().describe(
    'What is weighed or measured; null without a balance or measure',
  ),
  text: z.string().describe('The amount as it is written'),
  rangeText: z.string().nullable().describe('What the error of the volume makes of it'),
})

export const OrderWater = z.object({
  enclosureCode: z.string().describe('Enclosure'),
  vessel: z
    .boolean()
    .optional()
    .describe('A treatment vessel: animals held elsewhere are brought to it for the bath'),
  bodies: z.array(z.string()).describe('Connected water now'),
  volumeText: z.string().nullable().describe('Net volume to its error'),
  volumeNote: z.string().nullable().describe('Why there is no usable volume, or how it was determined'),
  animals: z
    .array(
      z.object({
        animalId: RecordId,
        accession: z.string().describe('Accession number'),
        commonName: z.string().describe('Common name'),
        scientificName: z.string().describe('Scientific name'),
        countText: z.string().describe('How many'),
        enclosureCode: z.string().describe('Where it is held'),
        treated: z.boolean().describe('Named on the order'),
      }),
    )
    .describe('Everybody in the connected water'),
})
