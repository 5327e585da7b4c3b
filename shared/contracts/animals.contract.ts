import { z } from 'zod'
import { discrepancyKindNames, discrepancyOutcomes } from '../domain/animals/discrepancy.ts'
import {
  AccessionNumber,
  AnimalFormName,
  Birth,
  CarcassPlaceName,
  CarcassStateName,
  Count,
  DeathKindName,
  FoodAnswerName,
  IdentifierKindName,
  KnownOn,
  NewestWeight,
  Place,
  QuarantineKindName,
  recordedFields,
  SexName,
  StageName,
  Struck,
  TaxonGroupName,
} from './animal-primitives.ts'
import { contract } from './contract.ts'
import { Instant, listQuery, LocalDate, May, page, RecordId } from './primitives.ts'
import { Sensitivity, WeightBand } from './taxa.contract.ts'

const LockState = z
  .enum(['none', 'boundary', 'all'])
  .describe('Movement: free, inside its quarantine boundary only, or none')

export const AnimalRow = z.object({
  id: RecordId,
  accession: AccessionNumber,
  form: AnimalFormName,
  name: z.string().nullable().describe('House name'),
  taxon: z
    .object({
      id: RecordId,
      scientificName: z.string().describe('Scientific name'),
      commonName: z.string().describe('Common name'),
      group: TaxonGroupName,
      quarantineKind: QuarantineKindName,
    })
    .describe('Taxon'),
  sex: SexName,
  stage: StageName,
  place: Place.nullable().describe('Enclosure it is in; null outside the house'),
  since: Instant.nullable().describe('In this enclosure since'),
  sinceKnownOn: KnownOn,
  count: Count,
  newestWeight: NewestWeight.nullable().describe('Newest weight; null when it was never weighed'),
  lock: LockState,
  openDiscrepancies: z.int().describe('Discrepancies that wait for somebody'),
})
export type AnimalRow = z.infer<typeof AnimalRow>

export const AnimalIdentifier = z.object({
  id: RecordId,
  kind: IdentifierKindName,
  value: z.string().describe('The mark as read'),
  place: z.string().nullable().describe('Where on the animal'),
  ...recordedFields,
  ended: z
    .object({ reason: z.string().describe('Why'), at: Instant.describe('Since when') })
    .nullable()
    .describe('Set when the mark is no longer on the animal'),
})

export const Discrepancy = z.object({
  id: RecordId,
  accession: AccessionNumber,
  animalName: z.string().describe('Common name, and house name where there is one'),
  kind: z.enum(discrepancyKindNames).describe('What does not fit'),
  forRole: z.enum(['veterinarian', 'registrar']).describe('Who explains it'),
  facts: z
    .record(z.string(), z.union([z.string(), z.number()]))
    .describe('Figures and names for its sentence'),
  ...recordedFields,
  resolution: z
    .object({
      outcome: z.enum(discrepancyOutcomes).describe('What it turned out to be'),
      reason: z.string().describe('In words'),
      at: Instant.describe('When it was explained'),
      by: z.string().describe('By whom'),
    })
    .nullable()
    .describe('How it was explained; null while it is open'),
})
export type Discrepancy = z.infer<typeof Discrepancy>

export const Animal = AnimalRow.extend({
  birth: Birth.nullable().describe('Birth or hatching; null when nothing is known'),
  splitFrom: AccessionNumber.nullable().describe('Group that it was taken from'),
  splitInto: z.array(AccessionNumber).describe('Groups and individuals taken from it'),
  arrivedAt: Instant.nullable().describe('First moment in the house'),
  arrivedKnownOn: KnownOn,
  foodOrRelease: z
    .object({
      answer: FoodAnswerName,
      accession: AccessionNumber.describe(
        'Of whom it was said: itself, or a group it came from or that joined it',
      ),
      reason: z.string().describe('Why'),
      happenedOn: LocalDate.describe('Since when'),
      recordedBy: z.string().describe('Who said it'),
    })
    .nullable()
    .describe('Whether it may be eaten or set free; null while nobody said'),
  identifiers: z.array(AnimalIdentifier).describe('Every mark it ever had'),
  locks: z
    .array(
      z.object({
        id: RecordId,
        kind: z.enum(['boundary', 'all']).describe('Inside its boundary only, or not at all'),
        sourceLabel: z.string().describe('What put it on, for example a case number'),
        reason: z.string().describe('Why'),
        since: Instant.describe('Since when'),
      }),
    )
    .describe('Movement locks in force'),
  discrepancies: z.array(Discrepancy).describe('Open discrepancies'),
  weightBand: WeightBand.nullable().describe('What it may plausibly weigh, by taxon and stage'),
  sensitivities: z.array(Sensitivity).describe('Sensitivities of its taxon'),
  version: z.int().describe('Version for saving'),
  may: May,
})
export type Animal = z.infer<typeof Animal>

export const animalParams = z.strictObject({ accession: AccessionNumber })

export const animalSorts = ['accession', 'name', 'taxon', 'place', 'count', 'weight', 'arrived'] as const
export const animalFilters = {
  group: TaxonGroupName.optional(),
  kind: QuarantineKindName.optional(),
  form: AnimalFormName.optional(),
  taxonId: RecordId.optional(),
  place: z.string().max(60).optional().describe('Code of an enclosure'),
  area: z.string().max(200).optional().describe('Part of the house'),
  state: z
    .enum(['here', 'gone', 'all'])
    .optional()
    .describe('In the house (unless told otherwise), gone, or both'),
}

export const listAnimals = contract({
  id: 'listAnimals',
  method: 'get',
  path: '/animals',
  action: 'collection.read',
  summary: 'Animals and groups: search by name, number, mark, taxon or place',
  query: listQuery(animalSorts).extend(animalFilters),
  reply: { 200: page(AnimalRow) },
  problems: [],
})

export const listAnimalsCsv = contract({
  id: 'listAnimalsCsv',
  method: 'get',
  path: '/animals.csv',
  action: 'collection.read',
  summary: 'The same list as a file for a spreadsheet, all pages',
  query: listQuery(animalSorts).omit({ cursor: true, limit: true }).extend(animalFilters),
  reply: { 200: z.string().describe('CSV, UTF-8') },
  produces: 'csv',
  problems: [],
})

export const getAnimal = contract({
  id: 'getAnimal',
  method: 'get',
  path: '/animals/:accession',
  action: 'collection.read',
  summary: 'One animal or group: who it is, where it is, how many, what it weighs',
  params: animalParams,
  reply: { 200: Animal },
  problems: ['not-found'],
})

export const listInhabitants = contract({
  id: 'listInhabitants',
  method: 'get',
  path: '/enclosures/:code/inhabitants',
  action: 'collection.read',
  summary: 'Who is in an enclosure now, or was at an instant',
  params: z.strictObject({ code: z.string().max(60).describe('Code of the enclosure') }),
  query: z.strictObject({ at: Instant.optional().describe('The instant; now unless told') }),
  reply: {
    200: z.object({
      at: Instant.describe('The instant it holds for'),
      rows: z.array(AnimalRow).describe('Animals and groups, by accession number'),
    }),
  },
  problems: ['not-found'],
})

export const WeightEntry = NewestWeight.extend({
  id: RecordId,
  ...recordedFields,
  method: z.string().nullable().describe('How it was weighed'),
  doubt: z.string().nullable().describe('What spoke against it; null when nothing did'),
  confirmedReason: z.string().nullable().describe('Why it was kept all the same'),
  struck: Struck,
})
export type WeightEntry = z.infer<typeof WeightEntry>

export const listWeights = contract({
  id: 'listWeights',
  method: 'get',
  path: '/animals/:accession/weights',
  action: 'collection.read',
  summary: 'Every weight, the newest first, struck ones included',
  params: animalParams,
  reply: { 200: z.object({ rows: z.array(WeightEntry).describe('Weights') }) },
  problems: ['not-found'],
})

export const MoveEntry = z.object({
  id: RecordId,
  kind: z.enum(['arrival', 'move', 'departure']).describe('Into the house, inside it, or out'),
  from: Place.nullable().describe('Enclosure it left; null from outside'),
  to: Place.nullable().describe('Enclosure it came to; null to outside'),
  reason: z.string().nullable().describe('Why'),
  documentedTransfer: z
    .string()
    .nullable()
    .describe('Of a veterinarian’s transfer across a quarantine boundary'),
  againstRule: z.string().nullable().describe('Rule that it broke when it happened'),
  ...recordedFields,
  knownOn: KnownOn,
  struck: Struck,
})
export type MoveEntry = z.infer<typeof MoveEntry>

export const listMoves = contract({
  id: 'listMoves',
  method: 'get',
  path: '/animals/:accession/moves',
  action: 'collection.read',
  summary: 'Every move, the newest first, struck ones included',
  params: animalParams,
  reply: { 200: z.object({ rows: z.array(MoveEntry).describe('Moves') }) },
  problems: ['not-found'],
})

export const CountLine = z.object({
  id: RecordId,
  kind: z.string().describe('Why the count changed'),
  delta: z.int().describe('Whole animals, signed'),
  balance: z.int().nullable().describe('The count after this line; null for a struck one'),
  other: AccessionNumber.nullable().describe('The other group of a split or merge'),
  reason: z.string().nullable().describe('In words'),
  ...recordedFields,
  knownOn: KnownOn,
  struck: Struck,
})
export type CountLine = z.infer<typeof CountLine>

export const CountStatement = z.object({
  id: RecordId,
  basis: z.enum(['counted', 'estimated']).describe('Counted or estimated'),
  low: z.int().describe('Lowest figure, whole animals'),
  high: z.int().describe('Highest figure, whole animals'),
  note: z.string().nullable().describe('Remarks'),
  ...recordedFields,
})

export const Death = z.object({
  id: RecordId,
  accession: AccessionNumber,
  kind: DeathKindName,
  seenCount: z.int().describe('Bodies seen'),
  postedCount: z.int().describe('Of these, taken from the ledger'),
  excessCount: z.int().describe('Of these, more than the ledger had; more than 0 opens a discrepancy'),
  place: Place.nullable().describe('Where they were found'),
  carcassState: CarcassStateName.nullable().describe('State of the body; null when not said'),
  carcassPlace: CarcassPlaceName.nullable().describe('What became of the body; null when not said'),
  note: z.string().nullable().describe('Remarks'),
  ...recordedFields,
  struck: Struck,
})
export type Death = z.infer<typeof Death>

export const listCounts = contract({
  id: 'listCounts',
  method: 'get',
  path: '/animals/:accession/counts',
  action: 'collection.read',
  summary: 'The count ledger with its running sum, the counts made, and the deaths',
  params: animalParams,
  reply: {
    200: z.object({
      lines: z.array(CountLine).describe('Ledger lines, the newest first'),
      statements: z.array(CountStatement).describe('Counts and estimates made, the newest first'),
      deaths: z.array(Death).describe('Deaths, the newest first'),
    }),
  },
  problems: ['not-found'],
})

export const LogLine = z.object({
  id: z.string().describe('Id of the record'),
  kind: z.string().describe('Kind of record'),
  facts: z
    .record(z.string(), z.union([z.string(), z.number(), z.null()]))
    .describe('Figures and names for its sentence'),
  ...recordedFields,
  knownOn: KnownOn,
  struckReason: z.string().nullable().describe('Why it was struck out, where it was'),
})
export type LogLine = z.infer<typeof LogLine>

export const listAnimalLog = contract({
  id: 'listAnimalLog',
  method: 'get',
  path: '/animals/:accession/log',
  action: 'collection.read',
  summary: 'One log of everything recorded of an animal, the newest first',
  params: animalParams,
  query: z.strictObject({
    cursor: z.string().max(500).optional().describe('Where the last page ended'),
    limit: z.coerce.number().int().min(1).max(200).optional().describe('Lines a page, 50 unless told'),
  }),
  reply: { 200: page(LogLine) },
  problems: ['not-found'],
})

export const listDiscrepancies = contract({
  id: 'listDiscrepancies',
  method: 'get',
  path: '/discrepancies',
  action: 'collection.read',
  summary: 'Recorded facts that do not fit the ledgers, the newest first',
  query: z.strictObject({
    state: z.enum(['open', 'all']).optional().describe('Only open ones unless told'),
    forRole: z.enum(['veterinarian', 'registrar']).optional().describe('Only those for this role'),
    cursor: z.string().max(500).optional().describe('Where the last page ended'),
    limit: z.coerce.number().int().min(1).max(200).optional().describe('Rows a page, 50 unless told'),
  }),
  reply: { 200: page(Discrepancy) },
  problems: [],
})
