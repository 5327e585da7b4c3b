import { z } from 'zod'
import { animalForms, birthKinds, identifierKinds, lifeStages, sexes } from '../domain/animals/description.ts'
import { exportFormats } from '../domain/register/export-formats.ts'
import { contract } from './contract.ts'
import { AttachedDocument } from './documents.contract.ts'
import { PermitKindName, PermitMarkName } from './permits.contract.ts'
import { Instant, listQuery, LocalDate, May, page, PartialDate, Reason, RecordId } from './primitives.ts'
import { HumanNumber, Period, Voided } from './register-primitives.ts'

const ExportFormatName = z.enum(exportFormats).describe('Form of the file')
const Place = z
  .object({ code: z.string().describe('Code of the enclosure'), name: z.string().describe('Its name') })
  .nullable()
const Text = z.string().nullable()

/** A permit as it stands in a history: what was taken under it for this animal or group. */
export const HistoryPermit = z.object({
  number: HumanNumber.describe('Number of the permit on our file'),
  permitNumber: z.string().describe('Number printed on the permit'),
  authority: z.string().describe('Authority that gave it'),
  kind: PermitKindName,
  validFrom: LocalDate.describe('First day of validity'),
  validUntil: LocalDate.describe('Last day of validity'),
  quantity: z.int().describe('Whole animals taken under it'),
  marks: z.array(PermitMarkName).describe('In which respects it does not cover the use'),
})
export type HistoryPermit = z.infer<typeof HistoryPermit>

/** A place outside the house, as the registrar knows it. */
const Site = z.object({
  locality: Text.describe('Where'),
  latitude: z.number().nullable().describe('Decimal degrees, WGS 84'),
  longitude: z.number().nullable().describe('Decimal degrees, WGS 84'),
  uncertaintyMetres: z.number().nullable().describe('Radius of uncertainty in metres'),
})

export const HistoryEvent = z.object({
  eventId: z.string().describe('Id of the line in the ledger'),
  kind: z.string().describe('What happened: a kind of the count ledger, move, counted or estimated'),
  on: PartialDate.describe('When, as exactly as it is known'),
  at: Instant.describe('Where it stands in the ledgers'),
  exact: z.boolean().describe('The time of day is known'),
  delta: z.int().describe('Whole animals gained or lost; of a voided line, what it had said'),
  countAfter: z.int().describe('Animals held after it'),
  found: z
    .object({ low: z.int().describe('At least'), high: z.int().describe('At most') })
    .nullable()
    .describe('What was found when somebody counted or estimated'),
  from: Place.describe('Where it left'),
  to: Place.describe('Where it went'),
  site: Site.optional().describe('Where it was released or given away, where that is known'),
  otherAccession: Text.describe('The other half of a split or merge'),
  transaction: Text.describe('Number of the transaction'),
  counterparty: Text.describe('The other party'),
  reference: Text.describe('Number on the other party’s paper'),
  theirNumber: Text.describe('Number with the other party'),
  deadOnArrival: z.int().nullable().describe('Dead in the boxes, never accessioned'),
  sourceCode: Text.describe('Letter of the source'),
  transport: Text.describe('How it travelled, in words'),
  permits: z.array(HistoryPermit).describe('Permits used'),
  documents: z.array(AttachedDocument).describe('Papers on file for the transaction, voided ones too'),
  note: Text.describe('Note or reason'),
  recordedAt: Instant.describe('When it was entered'),
  recordedBy: z.string().describe('Who entered it'),
  voided: Voided,
})
export type HistoryEvent = z.infer<typeof HistoryEvent>

export const HistoryOrigin = z.object({
  kind: z.enum(['born', 'collected']).describe('What is known of the time before it was kept here'),
  on: Text.describe('When, as exactly as it is known'),
  approximate: z.boolean().describe('The date is an estimate'),
  birthKind: z.enum(birthKinds).nullable().describe('How it came into being'),
  locality: Text.describe('Where'),
  method: Text.describe('How it was collected'),
  latitude: z.number().nullable().describe('Decimal degrees, WGS 84'),
  longitude: z.number().nullable().describe('Decimal degrees, WGS 84'),
  uncertaintyMetres: z.number().nullable().describe('Radius of uncertainty in metres'),
})
export type HistoryOrigin = z.infer<typeof HistoryOrigin>

export const History = z.object({
  animalId: RecordId,
  accession: HumanNumber,
  form: z.enum(animalForms).describe('An individual, or a group'),
  name: Text.describe('House name'),
  commonName: z.string().describe('Common name of the taxon'),
  scientificName: z.string().describe('Scientific name of the taxon'),
  sex: z.enum(sexes).describe('Sex'),
  lifeStage: z.enum(lifeStages).describe('Stage of life'),
  heldAs: z
    .enum(['owned', 'loan-in', 'loan-out', 'gone'])
    .describe('Owned, on loan from or to another party, or no longer held'),
  owner: Text.describe('The owner, where another party is'),
  since: Text.describe('In the collection since, as exactly as it is known'),
  count: z
    .object({
      basis: z.enum(['counted', 'estimated']).describe('How the number is known'),
      ledger: z.int().describe('Count of the ledger now'),
      low: z.int().nullable().describe('At least, where estimated'),
      high: z.int().nullable().describe('At most, where estimated'),
    })
    .describe('How many there are now'),
  place: Place.describe('Where it is now'),
  from: LocalDate.nullable().describe('First day of the period; null from the beginning'),
  until: LocalDate.nullable().describe('Last day of the period; null until now'),
  opening: z.int().describe('Animals held before the period'),
  gained: z.int().describe('Animals gained in it'),
  lost: z.int().describe('Animals lost in it'),
  closing: z.int().describe('Animals held at its end'),
  totals: z
    .array(
      z.object({
        kind: z.string().describe('Kind of ledger line'),
        lines: z.int().describe('How many lines'),
        delta: z.int().describe('Whole animals, signed'),
      }),
    )
    .describe('Sums by kind'),
  origins: z.array(HistoryOrigin).describe('What is known of the time before'),
  events: z.array(HistoryEvent).describe('Everything that happened, the oldest first'),
  identifiers: z
    .array(
      z.object({
        kind: z.enum(identifierKinds).describe('Kind of mark'),
        value: z.string().describe('What it reads'),
        place: Text.describe('Where on the body'),
        from: LocalDate.describe('Valid from'),
        until: LocalDate.nullable().describe('Valid to; null: in use'),
      }),
    )
    .describe('Marks and numbers, with their dates'),
  fingerprint: z.string().describe('SHA-256 of what this history says'),
  asOf: Instant.describe('When it was put together'),
  may: May,
})
export type History = z.infer<typeof History>

const historyParams = z.strictObject({ accession: HumanNumber })

export const getHistory = contract({
  id: 'getHistory',
  method: 'get',
  path: '/animals/:accession/history',
  action: 'register.read',
  summary: 'The acquisition history of an animal or group, with balances',
  params: historyParams,
  query: z.strictObject(Period),
  reply: { 200: History },
  problems: ['not-found', 'period-reversed'],
})

export const ExportRow = z.object({
  id: RecordId,
  accession: z.string().describe('Accession number of the animal or group'),
  format: ExportFormatName,
  from: LocalDate.nullable().describe('First day of the period'),
  until: LocalDate.nullable().describe('Last day of the period'),
  reason: Text.describe('What it was exported for'),
  fileName: z.string().describe('Name of the file'),
  bytes: z.int().describe('Size in bytes'),
  sha256: z.string().describe('SHA-256 of the file'),
  fingerprint: z.string().describe('SHA-256 of what it says'),
  exportedAt: Instant.describe('When it was exported'),
  exportedBy: z.string().describe('Who exported it'),
})
export type ExportRow = z.infer<typeof ExportRow>

export const exportHistory = contract({
  id: 'exportHistory',
  method: 'post',
  path: '/animals/:accession/history/exports',
  action: 'history.export',
  summary: 'Export an acquisition history as a file; who, when, why and the hash of the file are kept',
  params: historyParams,
  body: z.strictObject({
    id: RecordId,
    format: ExportFormatName,
    reason: Reason.nullish().describe('What it is exported for'),
    ...Period,
  }),
  reply: { 201: ExportRow },
  problems: ['not-found', 'period-reversed', 'id-already-used', 'print-busy', 'print-failed'],
  idempotent: 'by-record-id',
})

export const getExportFile = contract({
  id: 'getExportFile',
  method: 'get',
  path: '/exports/:id/file',
  action: 'history.export',
  summary: 'The bytes of an export, exactly as they were hashed',
  params: z.strictObject({ id: RecordId }),
  reply: { 200: z.null() },
  problems: ['not-found', 'file-missing'],
  produces: 'stream',
})

export const listExports = contract({
  id: 'listExports',
  method: 'get',
  path: '/register/exports',
  action: 'history.export',
  summary: 'What was exported, by whom and for what, the newest first',
  query: listQuery(['exported', 'accession']).extend({
    animalId: RecordId.optional().describe('Only those of this animal or group'),
  }),
  reply: { 200: page(ExportRow) },
  problems: [],
})
