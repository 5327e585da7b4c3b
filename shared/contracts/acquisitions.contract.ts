import { z } from 'zod'
import { animalForms } from '../domain/animals/description.ts'
import { transactionKindNames } from '../domain/register/transaction-kinds.ts'
import { NewAcquisition, NewDisposition } from './acquisition-bodies.ts'
import { fileLimitMB } from '../domain/documents/file-limit.ts'
import { contract } from './contract.ts'
import { AttachedDocument, UploadFields } from './documents.contract.ts'
import { PermitKindName, PermitMarkName } from './permits.contract.ts'
import { Instant, listQuery, LocalDate, May, page, PartialDate, Reason, RecordId } from './primitives.ts'
import { Guarded, HumanNumber, Named, Period, Stage, TimeOfDay, Voided } from './register-primitives.ts'

const Way = z.enum(['in', 'out']).describe('Into the collection, or out of it')
const KindName = z.enum(transactionKindNames).describe('Kind of transaction in the trade’s terms')
const Line = z.object({
  id: RecordId,
  animalId: RecordId.describe('The animal or group'),
  accession: HumanNumber.describe('Its accession number'),
  name: z.string().nullable().describe('House name'),
  commonName: z.string().describe('Common name of its taxon'),
  scientificName: z.string().describe('Scientific name of its taxon'),
  form: z.enum(animalForms).describe('An individual, or a group'),
  accessioned: z.boolean().describe('This transaction gave it its accession number'),
  count: z.int().describe('Whole animals'),
  estimate: z
    .object({ low: z.int().describe('At least'), high: z.int().describe('At most') })
    .nullable()
    .describe('Set where the number is an estimate'),
  deadOnArrival: z.int().nullable().describe('Dead in the boxes'),
  theirNumber: z.string().nullable().describe('Number with the other party'),
  sourceCode: z.string().nullable().describe('Letter of the source'),
  enclosure: Named.extend({ code: z.string().describe('Code of the enclosure') })
    .nullable()
    .describe('Enclosure they went into or left'),
})

export const TransactionRow = z.object({
  id: RecordId,
  number: HumanNumber,
  way: Way,
  kind: KindName,
  on: PartialDate,
  counterparty: z.string().nullable().describe('The other party'),
  reference: z.string().nullable().describe('Number on their paper'),
  animals: z
    .array(
      z.object({
        accession: HumanNumber,
        commonName: z.string().describe('Common name'),
        count: z.int().describe('Whole animals'),
      }),
    )
    .describe('What came or went, at most the first three'),
  lines: z.int().describe('How many animals and groups it names'),
  count: z.int().describe('Whole animals in all'),
  permits: z.int().describe('Permits used'),
  documents: z.int().describe('Papers on file'),
  openMarks: z.int().describe('Uses of permits that do not cover it and that nobody has explained'),
  voided: z.boolean().describe('Voided; it stays readable'),
  recordedAt: Instant.describe('When it was entered'),
})
export type TransactionRow = z.infer<typeof TransactionRow>

export const Transaction = z.object({
  id: RecordId,
  number: HumanNumber,
  way: Way,
  kind: KindName,
  stage: Stage,
  on: PartialDate,
  time: TimeOfDay.nullable().describe('Local time of day, where it is known'),
  at: Instant.describe('Where it stands in the ledgers'),
  counterparty: Named.nullable().describe('The other party'),
  reference: z.string().nullable().describe('Number on their paper'),
  place: z
    .object({
      locality: z.string().nullable().describe('Where'),
      on: z.string().nullable().describe('When'),
      method: z.string().nullable().describe('How'),
      latitude: z.number().nullable().describe('Decimal degrees, WGS 84'),
      longitude: z.number().nullable().describe('Decimal degrees, WGS 84'),
      uncertaintyMetres: z.number().nullable().describe('Radius of uncertainty in metres'),
    })
    .describe('Where the animals were collected, found or released'),
  transport: z
    .object({
      carrier: z.string().nullable().describe('Who carried them'),
      waybill: z.string().nullable().describe('Number of the waybill'),
      boxCount: z.int().nullable().describe('Number of boxes'),
      sealedAt: Instant.nullable().describe('When the boxes were sealed'),
      openedAt: Instant.nullable().describe('When they were opened'),
      note: z.string().nullable().describe('Water, temperature, packing'),
    })
    .describe('How the animals travelled'),
  loanDueOn: LocalDate.nullable().describe('Last day of a loan'),
  note: z.string().nullable().describe('Note'),
  lines: z.array(Line).describe('The animals and groups'),
  permitUses: z
    .array(
      z.object({
        id: RecordId,
        lineId: RecordId.describe('The line it is used for'),
        permit: HumanNumber.describe('Number of the permit on our file'),
        permitNumber: z.string().describe('Number printed on it'),
        authority: z.string().describe('Who gave it'),
        kind: PermitKindName,
        quantity: z.int().describe('Whole animals'),
        excess: z.int().describe('Animals it did not cover'),
        marks: z.array(PermitMarkName).describe('Empty: the permit covers the use'),
        explained: z.string().nullable().describe('What the registrar wrote about it'),
      }),
    )
    .describe('What was taken under which permit'),
  documents: z.array(AttachedDocument).describe('Papers on file, voided ones too'),
  recordedAt: Instant.describe('When it was entered'),
  recordedBy: z.string().describe('Who entered it'),
  voided: Voided,
  may: May,
})
export type Transaction = z.infer<typeof Transaction>

const transactionParams = z.strictObject({ number: HumanNumber })
const filter = {
  way: Way.optional(),
  kind: KindName.optional(),
  voided: z.enum(['yes', 'no']).optional().describe('Only voided ones, or only those that stand'),
  open: z
    .enum(['yes'])
    .optional()
    .describe('Only those with a use of a permit that waits for an explanation'),
  animalId: RecordId.optional().describe('Only those of this animal or group'),
  ...Period,
}
const sorts = ['date', 'number', 'counterparty', 'count'] as const

export const listTransactions = contract({
  id: 'listTransactions',
  method: 'get',
  path: '/register/transactions',
  action: 'register.read',
  summary: 'Transactions in and out, the newest first unless told',
  query: listQuery(sorts).extend(filter),
  reply: { 200: page(TransactionRow) },
  problems: [],
})

export const listTransactionsCsv = contract({
  id: 'listTransactionsCsv',
  method: 'get',
  path: '/register/transactions.csv',
  action: 'register.read',
  summary: 'The list of transactions as it is shown, one line of a transaction a row, as CSV',
  query: listQuery(sorts)
    .omit({ cursor: true, limit: true })
    .extend({ ...filter, guarded: Guarded }),
  reply: { 200: z.null() },
  problems: [],
  produces: 'csv',
})

export const getTransaction = contract({
  id: 'getTransaction',
  method: 'get',
  path: '/register/transactions/:number',
  action: 'register.read',
  summary: 'One transaction with its animals, permits and papers',
  params: transactionParams,
  reply: { 200: Transaction },
  problems: ['not-found'],
})

export const recordAcquisition = contract({
  id: 'recordAcquisition',
  method: 'post',
  path: '/register/acquisitions',
  action: 'register.manage',
  summary: 'Accession animals: from whom, when, under which permits, into which enclosures',
  body: NewAcquisition,
  reply: { 201: Transaction },
  problems: [
    'id-already-used',
    'in-the-future',
    'not-found',
    'permit-does-not-cover',
    'name-already-used',
    'not-a-group',
    'enclosure-not-in-use',
    'mark-already-carried',
  ],
  idempotent: 'by-record-id',
})

export const recordDisposition = contract({
  id: 'recordDisposition',
  method: 'post',
  path: '/register/dispositions',
  action: 'register.manage',
  summary: 'Record that animals left: to whom, when, under which permits',
  body: NewDisposition,
  reply: { 201: Transaction },
  problems: [
    'id-already-used',
    'in-the-future',
    'not-found',
    'permit-does-not-cover',
    'name-already-used',
    'count-too-small',
    'movement-locked',
    'withdrawal-not-over',
    'food-or-release-not-said',
  ],
  idempotent: 'by-record-id',
})

export const voidTransaction = contract({
  id: 'voidTransaction',
  method: 'post',
  path: '/register/transactions/:number/void',
  action: 'register.manage',
  summary:
    'Void a transaction that was entered wrongly: its lines in the ledgers are struck out and stay readable',
  params: transactionParams,
  body: z.strictObject({ reason: Reason }),
  reply: { 200: Transaction },
  problems: ['not-found', 'already-voided', 'later-records', 'count-too-small'],
  idempotent: 'by-key',
})

export const attachTransactionDocument = contract({
  id: 'attachTransactionDocument',
  method: 'post',
  path: '/register/transactions/:number/documents',
  action: 'document.attach',
  summary: `Attach a paper to a transaction: one file of at most ${String(fileLimitMB)} MB with its fields beside it`,
  params: transactionParams,
  body: UploadFields,
  reply: { 201: AttachedDocument },
  problems: [
    'not-found',
    'may-not',
    'file-missing',
    'file-too-large',
    'file-type-not-allowed',
    'id-already-used',
  ],
  idempotent: 'by-record-id',
  consumes: 'multipart',
})
