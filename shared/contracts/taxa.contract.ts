import { z } from 'zod'
import { sensitivityCodes, sensitivityLevels } from '../domain/taxa/sensitivity.ts'
import { Note, QuarantineKindName, StageName, TaxonGroupName } from './animal-primitives.ts'
import { contract } from './contract.ts'
import { Instant, listQuery, page, RecordId, Version } from './primitives.ts'

const ScientificName = z.string().trim().min(3).max(200).describe('Scientific name')
const CommonName = z.string().trim().min(1).max(200).describe('Common name')
const Mark = z.enum(['V', 'V2', 'C', 'M', 'P']).describe('How sure the source is: V, V2, C, M or P')

export const WeightBand = z.object({
  id: RecordId,
  stage: StageName.nullable().describe(
    'Stage it holds for; null for grown animals and where no other is known',
  ),
  low: z.string().describe('Lower end as entered'),
  high: z.string().describe('Upper end as entered'),
  unit: z.string().describe('Code of the unit as entered'),
  lowKg: z.number().describe('Lower end, kg'),
  highKg: z.number().describe('Upper end, kg'),
  source: z.string().describe('Where the figures come from'),
  mark: Mark,
  recordedAt: Instant.describe('When it was entered'),
  recordedBy: z.string().describe('Who entered it'),
})
export type WeightBand = z.infer<typeof WeightBand>

export const Sensitivity = z.object({
  code: z.enum(sensitivityCodes).describe('To what'),
  level: z.enum(sensitivityLevels).describe('Avoid, caution, or known to be borne'),
  note: z.string().nullable().describe('Remarks'),
  recordedAt: Instant.describe('When it was set'),
  recordedBy: z.string().describe('The veterinarian who set it'),
})
export type Sensitivity = z.infer<typeof Sensitivity>

export const TaxonRow = z.object({
  id: RecordId,
  scientificName: z.string().describe('Scientific name'),
  commonName: z.string().describe('Common name'),
  group: TaxonGroupName,
  quarantineKind: QuarantineKindName,
  note: z.string().nullable().describe('Remarks'),
  weightBands: z.array(WeightBand).describe('Plausible weights in force, one a stage'),
  sensitivities: z.array(Sensitivity).describe('Sensitivities in force'),
  animalsHere: z.int().describe('Accession numbers of this taxon that are in the house'),
  version: z.int().describe('Version for saving'),
})
export type TaxonRow = z.infer<typeof TaxonRow>

const taxonParams = z.strictObject({ id: RecordId })
const taxonFields = {
  scientificName: ScientificName,
  commonName: CommonName,
  group: TaxonGroupName,
  note: Note.optional(),
}

export const listTaxa = contract({
  id: 'listTaxa',
  method: 'get',
  path: '/taxa',
  action: 'collection.read',
  summary: 'Taxa, with plausible weights and sensitivities',
  query: listQuery(['scientificName', 'commonName', 'group']).extend({
    group: TaxonGroupName.optional(),
    kind: QuarantineKindName.optional(),
  }),
  reply: { 200: page(TaxonRow) },
  problems: [],
})

export const getTaxon = contract({
  id: 'getTaxon',
  method: 'get',
  path: '/taxa/:id',
  action: 'collection.read',
  summary: 'One taxon',
  params: taxonParams,
  reply: { 200: TaxonRow },
  problems: ['not-found'],
})

export const enterTaxon = contract({
  id: 'enterTaxon',
  method: 'post',
  path: '/taxa',
  action: 'register.manage',
  summary: 'Enter a taxon; its group decides the quarantine kind',
  body: z.strictObject({ id: RecordId, ...taxonFields }),
  reply: { 201: TaxonRow },
  problems: ['taxon-already-known', 'id-already-used'],
  idempotent: 'by-record-id',
})

export const correctTaxon = contract({
  id: 'correctTaxon',
  method: 'put',
  path: '/taxa/:id',
  action: 'register.manage',
  summary: 'Correct the names or the group of a taxon',
  params: taxonParams,
  body: z.strictObject({ expectedVersion: Version, ...taxonFields }),
  reply: { 200: TaxonRow },
  problems: ['not-found', 'stale-version', 'taxon-already-known'],
})

export const enterWeightBand = contract({
  id: 'enterWeightBand',
  method: 'post',
  path: '/taxa/:id/weight-bands',
  action: 'register.manage',
  summary: 'Enter what a healthy animal of this taxon and stage may weigh; the one before stays readable',
  params: taxonParams,
  body: z.strictObject({
    id: RecordId,
    stage: StageName.nullable().describe(
      'Stage it holds for; null for grown animals and where no other is known',
    ),
    low: z.string().trim().min(1).max(40).describe('Lower end, digits as typed'),
    high: z.string().trim().min(1).max(40).describe('Upper end, digits as typed'),
    unit: z.string().min(1).max(40).describe('Code of the unit of both'),
    source: z.string().trim().min(1).max(300).describe('Where the figures come from'),
    mark: Mark,
  }),
  reply: { 201: TaxonRow },
  problems: ['not-found', 'id-already-used', 'bad-input'],
  idempotent: 'by-record-id',
})

export const setSensitivity = contract({
  id: 'setSensitivity',
  method: 'post',
  path: '/taxa/:id/sensitivities',
  action: 'taxon.set-sensitivity',
  summary: 'Say what this taxon bears or does not; the entry before stays readable',
  params: taxonParams,
  body: z.strictObject({
    id: RecordId,
    code: z.enum(sensitivityCodes).describe('To what'),
    level: z.enum(sensitivityLevels).describe('Avoid, caution, known to be borne; none takes an entry back'),
    note: Note.optional(),
  }),
  reply: { 201: TaxonRow },
  problems: ['not-found', 'id-already-used'],
  idempotent: 'by-record-id',
})
