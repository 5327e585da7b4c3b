import { z } from 'zod'
import { permitKinds, purposeCodes } from '../domain/register/permit-kinds.ts'
import { fileLimitMB } from '../domain/documents/file-limit.ts'
import { contract } from './contract.ts'
import { AttachedDocument, UploadFields } from './documents.contract.ts'
import {
  Instant,
  listQuery,
  LocalDate,
  May,
  noneTwice,
  page,
  PartialDate,
  Reason,
  RecordId,
} from './primitives.ts'
import {
  AnimalCount,
  Guarded,
  HumanNumber,
  Named,
  optionalWords,
  Voided,
  words,
} from './register-primitives.ts'

export const PermitKindName = z.enum(permitKinds).describe('What the permit allows')
export const PermitMarkName = z
  .enum([
    'over-quantity',
    'not-yet-valid',
    'expired',
    'other-taxon',
    'voided',
    'fewer-than-animals',
    'more-than-animals',
  ])
  .describe('In which respect the permit does not cover a use')
const PermitStateName = z
  .enum(['void', 'not-yet', 'expired', 'runs-out', 'valid'])
  .describe('Where the permit stands today; runs-out: its last day is at most 60 days away')

export const PermitUse = z.object({
  id: RecordId,
  transaction: HumanNumber.describe('Number of the transaction'),
  kind: z.string().describe('Kind of the transaction'),
  on: PartialDate,
  accession: z.string().describe('Accession number of the animal or group'),
  commonName: z.string().describe('Common name of its taxon'),
  quantity: AnimalCount.describe('Whole animals taken under the permit'),
  excess: z.int().describe('How many of them the permit did not cover when they were entered'),
  remaining: z.int().nullable().describe('Animals left after this use; null where no number is stated'),
  marks: z.array(PermitMarkName).describe('Empty: the permit covers the use'),
  explained: z
    .object({ reason: Reason, at: Instant, by: z.string().describe('Who explained it') })
    .nullable()
    .describe('What the registrar wrote about a use that the permit does not cover'),
  voided: z.boolean().describe('The transaction was voided, so that the use no longer counts'),
})
export type PermitUse = z.infer<typeof PermitUse>

export const PermitRow = z.object({
  id: RecordId,
  number: HumanNumber.describe('Number of the permit on our file'),
  permitNumber: z.string().describe('Number printed on the permit'),
  authority: z.string().describe('Authority that gave it'),
  kind: PermitKindName,
  validFrom: LocalDate.describe('First day of validity'),
  validUntil: LocalDate.describe('Last day of validity'),
  state: PermitStateName,
  daysLeft: z.int().describe('Days to the last day of validity, negative when it has passed'),
  quantityAllowed: z.int().nullable().describe('Whole animals it allows; null where no number is stated'),
  used: z.int().describe('Whole animals taken under it'),
  remaining: z.int().nullable().describe('Animals left, negative when more were taken; null as above'),
  taxa: z
    .array(
      z
        .object({
          id: RecordId,
          commonName: z.string().describe('Common name'),
          scientificName: z.string().describe('Scientific name'),
        })
        .describe('A taxon'),
    )
    .describe('Taxa it is restricted to; empty: none is named'),
  openMarks: z.int().describe('Uses that it does not cover and that nobody has explained'),
  documents: z.int().describe('Papers on file'),
})
export type PermitRow = z.infer<typeof PermitRow>

export const Permit = PermitRow.extend({
  counterparty: Named.nullable().describe('Party it was given to or names'),
  purposeCode: z.string().nullable().describe('Letter of the purpose, where the permit has one'),
  conditions: z.string().nullable().describe('Conditions in words'),
  uses: z.array(PermitUse).describe('What was taken under it, in order of time'),
  papers: z.array(AttachedDocument).describe('Papers on file, voided ones too'),
  recordedAt: Instant.describe('When it was entered'),
  recordedBy: z.string().describe('Who entered it'),
  voided: Voided,
  may: May,
})
export type Permit = z.infer<typeof Permit>

const permitParams = z.strictObject({ number: HumanNumber })
const permitFilter = {
  state: PermitStateName.optional(),
  kind: PermitKindName.optional(),
  open: z.enum(['yes']).optional().describe('Only permits with uses that wait for an explanation'),
}
const permitSorts = ['validUntil', 'number', 'authority', 'remaining'] as const

export const listPermits = contract({
  id: 'listPermits',
  method: 'get',
  path: '/register/permits',
  action: 'register.read',
  summary: 'Permits with their use-up',
  query: listQuery(permitSorts).extend(permitFilter),
  reply: { 200: page(PermitRow) },
  problems: [],
})

export const listPermitsCsv = contract({
  id: 'listPermitsCsv',
  method: 'get',
  path: '/register/permits.csv',
  action: 'register.read',
  summary: 'The list of permits as it is shown, as CSV',
  query: listQuery(permitSorts)
    .omit({ cursor: true, limit: true })
    .extend({ ...permitFilter, guarded: Guarded }),
  reply: { 200: z.null() },
  problems: [],
  produces: 'csv',
})

export const getPermit = contract({
  id: 'getPermit',
  method: 'get',
  path: '/register/permits/:number',
  action: 'register.read',
  summary: 'One permit, with everything taken under it and its papers',
  params: permitParams,
  reply: { 200: Permit },
  problems: ['not-found'],
})

/** A permit as the registrar enters it. */
export const NewPermit = z.strictObject({
  id: RecordId,
  permitNumber: words(120).describe('Number printed on the permit'),
  authority: words(200).describe('Authority that gave it'),
  kind: PermitKindName,
  validFrom: LocalDate.describe('First day of validity'),
  validUntil: LocalDate.describe('Last day of validity'),
  quantityAllowed: AnimalCount.nullish().describe(
    'Whole animals it allows; absent where no number is stated',
  ),
  taxonIds: noneTwice(z.array(RecordId).max(50)).describe('Taxa it is restricted to; empty: none is named'),
  counterpartyId: RecordId.nullish().describe('Party it was given to or names'),
  purposeCode: z.enum(purposeCodes).nullish().describe('Letter of the purpose'),
  conditions: optionalWords(4000, 'Conditions in words'),
})

export const enterPermit = contract({
  id: 'enterPermit',
  method: 'post',
  path: '/register/permits',
  action: 'register.manage',
  summary: 'Enter a permit as it is printed; a wrong one is voided and entered again',
  body: NewPermit,
  reply: { 201: Permit },
  problems: ['id-already-used', 'number-already-used', 'period-reversed', 'not-found'],
  idempotent: 'by-record-id',
})

export const voidPermit = contract({
  id: 'voidPermit',
  method: 'post',
  path: '/register/permits/:number/void',
  action: 'register.manage',
  summary: 'Void a permit that was entered wrongly or was withdrawn; it and its uses stay readable',
  params: permitParams,
  body: z.strictObject({ reason: Reason }),
  reply: { 200: Permit },
  problems: ['not-found', 'already-voided'],
  idempotent: 'by-key',
})

export const explainPermitUse = contract({
  id: 'explainPermitUse',
  method: 'post',
  path: '/register/permits/:number/uses/:useId/explanation',
  action: 'register.manage',
  summary: 'Explain a use that a permit does not cover; the marks stay',
  params: permitParams.extend({ useId: RecordId }),
  body: z.strictObject({ reason: Reason }),
  reply: { 200: Permit },
  problems: ['not-found', 'already-explained'],
  idempotent: 'by-key',
})

export const attachPermitDocument = contract({
  id: 'attachPermitDocument',
  method: 'post',
  path: '/register/permits/:number/documents',
  action: 'document.attach',
  summary: `Attach a paper to a permit: one file of at most ${String(fileLimitMB)} MB with its fields beside it`,
  params: permitParams,
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
