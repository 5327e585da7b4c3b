import { z } from 'zod'
import { discrepancyOutcomes } from '../domain/animals/discrepancy.ts'
import {
  AccessionNumber,
  Birth,
  CarcassPlaceName,
  CarcassStateName,
  DeathKindName,
  FoodAnswerName,
  HappenedAt,
  IdentifierKindName,
  Note,
  SexName,
  StageName,
  WholeCount,
} from './animal-primitives.ts'
import { Animal, animalParams, Death, Discrepancy, WeightEntry } from './animals.contract.ts'
import { contract } from './contract.ts'
import { EnteredQuantity, Reason, RecordId, Version } from './primitives.ts'

const recordParams = animalParams.extend({ recordId: RecordId })
const strikeBody = z.strictObject({ reason: Reason })
const AlreadyHappened = Reason.optional().describe(
  'Set for what was done although a rule forbids it: it is kept, marked, and somebody is asked to explain it',
)
const DocumentedTransfer = Reason.optional().describe(
  'A veterinarian’s documented transfer across a quarantine boundary: where to, under what status',
)

export const recordWeight = contract({
  id: 'recordWeight',
  method: 'post',
  path: '/animals/:accession/weights',
  action: 'weight.record',
  summary: 'Record a weight, of one animal or of several weighed together',
  params: animalParams,
  body: z.strictObject({
    id: RecordId,
    weight: EnteredQuantity,
    animalsWeighed: WholeCount.optional().describe('How many lay on the balance together, 1 unless told'),
    basis: z.enum(['measured', 'estimated']).describe('Measured or estimated'),
    method: z.string().trim().max(200).optional().describe('How it was weighed, for example in a sling'),
    confirmedReason: Reason.optional().describe('Why a weight that was asked back is right'),
    happenedAt: HappenedAt,
  }),
  reply: { 201: WeightEntry },
  problems: ['not-found', 'in-the-future', 'weight-needs-confirmation', 'id-already-used'],
  idempotent: 'by-record-id',
})

export const strikeWeight = contract({
  id: 'strikeWeight',
  method: 'post',
  path: '/animals/:accession/weights/:recordId/void',
  action: 'weight.strike',
  summary: 'Strike out a wrong weight; it stays readable',
  params: recordParams,
  body: strikeBody,
  reply: { 200: Animal },
  problems: ['not-found', 'may-not'],
  idempotent: 'by-key',
})

export const moveAnimal = contract({
  id: 'moveAnimal',
  method: 'post',
  path: '/animals/:accession/moves',
  action: 'animal.move',
  summary: 'Move a whole animal or group from one enclosure to another',
  params: animalParams,
  body: z.strictObject({
    id: RecordId,
    fromEnclosureId: RecordId.describe('Enclosure it leaves'),
    toEnclosureId: RecordId.describe('Enclosure it goes to'),
    reason: Reason.optional(),
    documentedTransfer: DocumentedTransfer,
    alreadyHappened: AlreadyHappened,
    happenedAt: HappenedAt,
  }),
  reply: { 201: Animal },
  problems: [
    'not-found',
    'in-the-future',
    'not-in-that-enclosure',
    'contradicts-another-move',
    'enclosure-not-in-use',
    'movement-locked',
    'documented-transfer-needed',
    'id-already-used',
  ],
  idempotent: 'by-record-id',
})

export const strikeMove = contract({
  id: 'strikeMove',
  method: 'post',
  path: '/animals/:accession/moves/:recordId/void',
  action: 'move.strike',
  summary: 'Strike out a move that did not happen; it stays readable',
  params: recordParams,
  body: strikeBody,
  reply: { 200: Animal },
  problems: ['not-found', 'may-not', 'contradicts-another-move', 'part-of-another-record'],
  idempotent: 'by-key',
})

export const recordDeaths = contract({
  id: 'recordDeaths',
  method: 'post',
  path: '/animals/:accession/deaths',
  action: 'observation.record',
  summary: 'Record deaths as they were seen; more than the ledger has opens a discrepancy',
  params: animalParams,
  body: z.strictObject({
    id: RecordId,
    kind: DeathKindName,
    count: WholeCount,
    enclosureId: RecordId.optional().describe('Where they were found; where it lived unless told'),
    carcassState: CarcassStateName.optional(),
    carcassPlace: CarcassPlaceName.optional(),
    note: Note.optional(),
    happenedAt: HappenedAt,
  }),
  reply: { 201: Death },
  problems: ['not-found', 'in-the-future', 'id-already-used'],
  idempotent: 'by-record-id',
})

export const strikeDeath = contract({
  id: 'strikeDeath',
  method: 'post',
  path: '/animals/:accession/deaths/:recordId/void',
  action: 'death.strike',
  summary: 'Strike out a death that was recorded by mistake; it stays readable',
  params: recordParams,
  body: strikeBody,
  reply: { 200: Animal },
  problems: ['not-found', 'may-not', 'cause-signed', 'contradicts-another-move', 'count-too-small'],
  idempotent: 'by-key',
})

export const recordBirths = contract({
  id: 'recordBirths',
  method: 'post',
  path: '/animals/:accession/births',
  action: 'observation.record',
  summary: 'Record young that were born or hatched into a group',
  params: animalParams,
  body: z.strictObject({ id: RecordId, count: WholeCount, note: Note.optional(), happenedAt: HappenedAt }),
  reply: { 201: Animal },
  problems: ['not-found', 'in-the-future', 'not-a-group', 'not-here-then', 'id-already-used'],
  idempotent: 'by-record-id',
})

export const stateCount = contract({
  id: 'stateCount',
  method: 'post',
  path: '/animals/:accession/counts',
  action: 'observation.record',
  summary: 'State what was counted or estimated; the ledger stays, and a difference opens a discrepancy',
  params: animalParams,
  body: z.strictObject({
    id: RecordId,
    basis: z.enum(['counted', 'estimated']).describe('Every animal counted, or a range'),
    low: z.int().min(0).max(10_000_000).describe('Lowest figure; the count itself where counted'),
    high: z.int().min(0).max(10_000_000).describe('Highest figure; the count itself where counted'),
    note: Note.optional(),
    happenedAt: HappenedAt,
  }),
  reply: { 201: Animal },
  problems: ['not-found', 'in-the-future', 'not-a-group', 'bad-input', 'id-already-used'],
  idempotent: 'by-record-id',
})

export const adjustCount = contract({
  id: 'adjustCount',
  method: 'post',
  path: '/animals/:accession/adjustments',
  action: 'register.manage',
  summary: 'Adjust the ledger of a group with a reason',
  params: animalParams,
  body: z.strictObject({
    id: RecordId,
    delta: z
      .int()
      .min(-10_000_000)
      .max(10_000_000)
      .refine((delta) => delta !== 0, 'Give how many more or fewer there are, not 0')
      .describe('Whole animals, signed'),
    reason: Reason,
    happenedAt: HappenedAt,
  }),
  reply: { 201: Animal },
  problems: [
    'not-found',
    'in-the-future',
    'not-a-group',
    'not-here-then',
    'count-too-small',
    'id-already-used',
  ],
  idempotent: 'by-record-id',
})

export const splitGroup = contract({
  id: 'splitGroup',
  method: 'post',
  path: '/animals/:accession/splits',
  action: 'animal.move',
  summary: 'Take part of a group out under a number of its own, in the same enclosure or another',
  params: animalParams,
  body: z.strictObject({
    id: RecordId.describe('UUIDv7 of the new animal or group'),
    form: z.enum(['individual', 'group']).describe('What is taken out: one animal, or a group'),
    count: WholeCount,
    toEnclosureId: RecordId.describe('Enclosure it goes to; may be the same'),
    name: z.string().trim().max(100).optional().describe('House name'),
    sex: SexName.optional(),
    stage: StageName.optional(),
    reason: Reason.optional(),
    documentedTransfer: DocumentedTransfer,
    alreadyHappened: AlreadyHappened,
    happenedAt: HappenedAt,
  }),
  reply: {
    201: z.object({ from: Animal.describe('The group it came from'), into: Animal.describe('The new one') }),
  },
  problems: [
    'not-found',
    'in-the-future',
    'not-a-group',
    'not-here-then',
    'count-too-small',
    'discrepancy-open',
    'enclosure-not-in-use',
    'movement-locked',
    'documented-transfer-needed',
    'id-already-used',
  ],
  idempotent: 'by-record-id',
})

export const mergeGroup = contract({
  id: 'mergeGroup',
  method: 'post',
  path: '/animals/:accession/merges',
  action: 'animal.move',
  summary: 'Put an animal or group, or part of it, into a group of the same taxon in the same enclosure',
  params: animalParams,
  body: z.strictObject({
    id: RecordId.describe('UUIDv7 of the merge'),
    into: AccessionNumber.describe('Group that it becomes part of'),
    count: WholeCount.optional().describe('How many; all of them unless told'),
    reason: Reason.optional(),
    happenedAt: HappenedAt,
  }),
  reply: { 201: z.object({ from: Animal.describe('What was put in'), into: Animal.describe('The group') }) },
  problems: [
    'not-found',
    'in-the-future',
    'not-a-group',
    'taxa-differ',
    'not-in-that-enclosure',
    'not-here-then',
    'count-too-small',
    'discrepancy-open',
    'movement-locked',
    'id-already-used',
  ],
  idempotent: 'by-record-id',
})

export const describeAnimal = contract({
  id: 'describeAnimal',
  method: 'put',
  path: '/animals/:accession/description',
  action: 'register.manage',
  summary:
    'Say who it is from an instant on: taxon, name, sex, stage, birth; earlier descriptions stay readable',
  params: animalParams,
  body: z.strictObject({
    expectedVersion: Version,
    taxonId: RecordId.describe('Taxon'),
    name: z.string().trim().max(100).nullable().describe('House name'),
    sex: SexName,
    stage: StageName,
    birth: Birth.nullable().describe('Birth or hatching; null when nothing is known'),
    reason: Reason.optional(),
    happenedAt: HappenedAt,
  }),
  reply: { 200: Animal },
  problems: ['not-found', 'stale-version', 'in-the-future'],
})

export const sayFoodOrRelease = contract({
  id: 'sayFoodOrRelease',
  method: 'post',
  path: '/animals/:accession/food-or-release',
  action: 'animal.say-food-or-release',
  summary: 'Say whether an animal or group may ever be eaten or set free',
  params: animalParams,
  body: z.strictObject({
    id: RecordId,
    answer: FoodAnswerName,
    reason: Reason,
    happenedAt: HappenedAt,
  }),
  reply: { 201: Animal },
  problems: ['not-found', 'in-the-future', 'id-already-used'],
  idempotent: 'by-record-id',
})

export const addIdentifier = contract({
  id: 'addIdentifier',
  method: 'post',
  path: '/animals/:accession/identifiers',
  action: 'register.manage',
  summary: 'Record a mark put on or read; one that another animal carries is asked back',
  params: animalParams,
  body: z.strictObject({
    id: RecordId,
    kind: IdentifierKindName,
    value: z.string().trim().min(1).max(100).describe('The mark as read'),
    place: z.string().trim().max(100).optional().describe('Where on the animal'),
    readTwiceReason: Reason.optional().describe('Set when the same mark was really read on two animals'),
    happenedAt: HappenedAt,
  }),
  reply: { 201: Animal },
  problems: [
    'not-found',
    'in-the-future',
    'bad-input',
    'mark-already-carried',
    'not-a-single-animal',
    'id-already-used',
  ],
  idempotent: 'by-record-id',
})

export const endIdentifier = contract({
  id: 'endIdentifier',
  method: 'post',
  path: '/animals/:accession/identifiers/:recordId/end',
  action: 'register.manage',
  summary: 'Say that a mark was lost, removed or read wrongly',
  params: recordParams,
  body: z.strictObject({ reason: Reason, happenedAt: HappenedAt }),
  reply: { 200: Animal },
  problems: ['not-found', 'in-the-future'],
  idempotent: 'by-key',
})

export const strikeCountLine = contract({
  id: 'strikeCountLine',
  method: 'post',
  path: '/animals/:accession/counts/:recordId/void',
  action: 'register.manage',
  summary: 'Strike out a wrong birth or adjustment; it stays readable',
  params: recordParams,
  body: strikeBody,
  reply: { 200: Animal },
  problems: ['not-found', 'count-too-small', 'part-of-another-record'],
  idempotent: 'by-key',
})

export const resolveDiscrepancy = contract({
  id: 'resolveDiscrepancy',
  method: 'post',
  path: '/discrepancies/:id/resolution',
  action: 'discrepancy.resolve',
  summary: 'Explain a discrepancy; correcting the count writes the missing lines into the ledger',
  params: z.strictObject({ id: RecordId }),
  body: z.strictObject({
    outcome: z.enum(discrepancyOutcomes).describe('What it turned out to be'),
    reason: Reason,
  }),
  reply: { 200: Discrepancy },
  problems: ['not-found', 'already-resolved', 'may-not', 'bad-input'],
  idempotent: 'by-key',
})
