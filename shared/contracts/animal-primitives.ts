import { z } from 'zod'
import {
  animalForms,
  birthKinds,
  carcassPlaces,
  carcassStates,
  deathKinds,
  identifierKinds,
  lifeStages,
  sexes,
} from '../domain/animals/description.ts'
import { foodAnswers } from '../domain/animals/food-or-release.ts'
import { quarantineKindNames, taxonGroupNames } from '../domain/taxa/taxon-group.ts'
import { Instant, LocalDate, PartialDate, RecordId } from './primitives.ts'

export const AccessionNumber = z.string().trim().min(1).max(60).describe('Accession number of the registrar')
export const TaxonGroupName = z.enum(taxonGroupNames).describe('Group that the rules of treatment know')
export const QuarantineKindName = z
  .enum(quarantineKindNames)
  .describe('Kind by which quarantine tells animals apart')
export const AnimalFormName = z.enum(animalForms).describe('An individual, or a group managed as one')
export const SexName = z.enum(sexes).describe('Sex')
export const StageName = z.enum(lifeStages).describe('Stage of life')
export const IdentifierKindName = z.enum(identifierKinds).describe('Kind of mark')
export const FoodAnswerName = z.enum(foodAnswers).describe('Yes: it may be eaten or set free; no: never')
export const DeathKindName = z.enum(deathKinds).describe('How the death came to be known')
export const CarcassStateName = z.enum(carcassStates).describe('State of the body when it was found')
export const CarcassPlaceName = z.enum(carcassPlaces).describe('What became of the body')
export const Note = z.string().trim().max(2000).describe('Remarks, in words')
export const WholeCount = z.int().min(1).max(10_000_000).describe('Whole animals, 1 or more')
export const HappenedAt = Instant.describe('When it happened; at most 5 minutes ahead of the server')

export const Birth = z
  .strictObject({
    kind: z.enum(birthKinds).describe('Hatched, born or propagated'),
    date: PartialDate,
    approximate: z.boolean().describe('Only about that date'),
  })
  .describe('When the animal began, as exactly as it is known')
export type Birth = z.infer<typeof Birth>

/** Who recorded a fact, and the three times of it. */
export const recordedFields = {
  happenedAt: Instant.describe('When it happened'),
  happenedOn: LocalDate.describe('Day of the facility on which it happened'),
  recordedAt: Instant.describe('When it was written down'),
  recordedBy: z.string().describe('Who wrote it down'),
}

/** A fact that was entered with its date alone stands in the ledgers at the open end of it; the date is what is known. */
export const KnownOn = PartialDate.nullable().describe(
  'Date, month or year as entered, where the time of day is not known; null where it is',
)

export const Struck = z
  .object({
    reason: z.string().describe('Why it was struck out'),
    at: Instant.describe('When it was struck out'),
    by: z.string().describe('Who struck it out'),
  })
  .nullable()
  .describe('Set when the row was struck out; it stays readable')

export const Place = z
  .object({
    id: RecordId,
    code: z.string().describe('Code of the enclosure'),
    name: z.string().describe('Name of the enclosure'),
    area: z.string().describe('Part of the house'),
    boundary: z.string().nullable().describe('Quarantine boundary that it lies in; null outside any'),
  })
  .describe('The enclosure')
export type Place = z.infer<typeof Place>

export const Count = z
  .object({
    basis: z.enum(['counted', 'estimated']).describe('Counted, or estimated between two figures'),
    ledger: z.int().describe('Sum of the count ledger, whole animals'),
    low: z.int().describe('Lowest figure, whole animals; the ledger itself where counted'),
    high: z.int().describe('Highest figure, whole animals; the ledger itself where counted'),
    agrees: z.boolean().describe('The newest count or estimate agrees with the ledger'),
  })
  .describe('How many there are')
export type Count = z.infer<typeof Count>

export const NewestWeight = z
  .object({
    weightKg: z.number().describe('Mass of one animal, kg'),
    value: z.string().describe('The digits as entered'),
    unit: z.string().describe('Code of the unit as entered'),
    animalsWeighed: z.int().describe('How many were weighed together; the entered mass is of all of them'),
    basis: z.enum(['measured', 'estimated']).describe('Measured or estimated'),
    happenedAt: Instant.describe('When it was weighed'),
    happenedOn: LocalDate.describe('Day of the facility on which it was weighed'),
  })
  .describe('The newest weight')
export type NewestWeight = z.infer<typeof NewestWeight>
