import { z } from 'zod'
import { agentCodes } from '../domain/formulary/agent.ts'
import { contract } from './contract.ts'
import {
  BathOrderFields,
  OrderAmount,
  OrderNumber,
  OrderWater,
  SaidBench,
  SaidCaution,
  SaidCondition,
  SaidLine,
} from './order-primitives.ts'
import { Instant, listQuery, May, page, Reason, RecordId, Version } from './primitives.ts'
import { ChosenLicence, SignatureBlock } from './signing.contract.ts'
import { actAddresses } from './today.addresses.ts'

export const OrderPreview = z.object({
  amount: OrderAmount.nullable().describe('The amount; null while it cannot be worked out'),
  refusal: z
    .object({
      field: z.string().nullable().describe('Field at fault'),
      code: z.string().describe('Stable code'),
      detail: z.string().describe('What to do'),
    })
    .nullable()
    .describe('Why there is no amount'),
  working: z.array(SaidLine).describe('Working of the amount'),
  water: OrderWater.describe('Connected water and everybody in it'),
  cautions: z.array(SaidCaution).describe('Cautions, the gravest first'),
  conditions: z.array(SaidCondition).describe('What has to be true before each dose'),
  missing: z.array(z.string()).describe('Fields that have to be filled before signing'),
  bench: SaidBench.nullable().describe(
    'What was worked out beforehand on the bench, worked out again; null without one, or while it is left out',
  ),
})
export type OrderPreview = z.infer<typeof OrderPreview>

export const orderPhases = [
  'draft',
  'proposed',
  'not-started',
  'in-progress',
  'held',
  'completed',
  'expired',
  'discontinued',
] as const

export const OrderRow = z.object({
  id: RecordId,
  number: OrderNumber,
  phase: z.enum(orderPhases).describe('Where the order stands'),
  enclosureCode: z.string().describe('Enclosure'),
  enclosureName: z.string().describe('Name of the enclosure'),
  agent: z.enum(agentCodes).nullable().describe('Drug; null while none is chosen'),
  problem: z.string().describe('Condition treated'),
  amountText: z
    .string()
    .nullable()
    .describe('Signed amount; left out while a second person has to work it out blind'),
  targetText: z.string().nullable().describe('Signed target'),
  startsAt: Instant.nullable().describe('First dose'),
  signedBy: z.string().nullable().describe('Signer'),
  signedAt: Instant.nullable().describe('When it was signed'),
  versionNo: z.int().nullable().describe('Signed version in force'),
  record: z
    .enum(['intact', 'broken'])
    .nullable()
    .describe('Broken: the text cannot be read, or what is stored beside it is not what was signed'),
  dosesGiven: z.int().describe('Doses given'),
  dosesIrregular: z
    .int()
    .describe('Doses against a rule, given more than once, or whose bath was stopped before its time'),
  doses: z.int().nullable().describe('Doses planned'),
  nextDueAt: Instant.nullable().describe('Next planned dose'),
})
export type OrderRow = z.infer<typeof OrderRow>

const OrderEvent = z.object({
  id: RecordId,
  kind: z.enum(['held', 'hold-lifted', 'discontinued']).describe('What happened'),
  reason: z.string().nullable().describe('Why, where somebody said so'),
  happenedAt: Instant,
  by: z.string().describe('Who did it'),
})

const CalendarRecord = z.object({
  kind: z.enum(['given', 'recorded', 'withheld', 'refused']).describe('What was recorded'),
  happenedAt: Instant.describe('When it happened'),
  by: z.string().describe('Who recorded it'),
  stoppedAt: Instant.nullable().describe('When its bath was stopped before its time'),
  broke: z
    .array(z.string())
    .describe('What it breaks, in words without figures; warnings of the water left out'),
  warnings: z.int().describe('How many warnings of the water stood besides'),
  record: z.enum(['intact', 'broken']).describe('Whether it is what was recorded'),
})

const CalendarDose = z.object({
  key: z.string().describe('Which planned dose: 1, 2 …'),
  dueAt: Instant.describe('When it is planned'),
  opensAt: Instant.describe('Earliest time at which it is not early'),
  closesAt: Instant.describe('Latest time at which it is not late'),
  recorded: z
    .enum(['given', 'recorded', 'withheld', 'refused'])
    .nullable()
    .describe('What was recorded of it last; null: nothing yet'),
  records: z.array(CalendarRecord).describe('Every record of it that stands, the oldest first'),
})

export const SignedVersion = z.object({
  versionNo: z.int().describe('Version'),
  signature: SignatureBlock.describe('Who signed it, and whether the text is still what was signed'),
  content: z.unknown().describe('Everything that was signed, as it was signed'),
  superseded: z.boolean().describe('A later version is in force'),
})

export const Order = OrderRow.extend({
  amountsWithheld: z
    .boolean()
    .describe('The amount and its working are left out: the person who asks may be the blind second person'),
  version: z.int().describe('Version for saving the draft'),
  draft: BathOrderFields.nullable().describe('The draft, where there is one'),
  draftBench: SaidBench.nullable().describe('What the draft took over from the bench, worked out again'),
  benchWithheld: z
    .boolean()
    .describe('A working of the bench is kept with it and left out for the person who asks'),
  createdBy: z.string().describe('Who wrote it first'),
  createdAt: Instant.describe('When it was written first'),
  versions: z.array(SignedVersion).describe('Signed versions, the newest first'),
  events: z.array(OrderEvent).describe('Holds and ends, the newest first'),
  calendar: z.array(CalendarDose).describe('Doses that the signed version in force plans, in time order'),
  may: May,
})
export type Order = z.infer<typeof Order>

const orderParams = z.strictObject({ number: OrderNumber })

const orderList = listQuery(['number', 'startsAt', 'enclosure', 'signedAt']).extend({
  phase: z
    .enum([...orderPhases, 'open'])
    .optional()
    .describe('Only orders that stand here; open: not ended'),
  enclosureCode: z.string().max(40).optional().describe('Only orders for this enclosure'),
})

export const listOrders = contract({
  id: 'listOrders',
  method: 'get',
  path: '/orders',
  action: 'order.read',
  summary: 'Treatment orders',
  query: orderList,
  reply: { 200: page(OrderRow) },
  problems: [],
})

export const listOrdersCsv = contract({
  id: 'listOrdersCsv',
  method: 'get',
  path: '/orders.csv',
  action: 'order.read',
  summary: 'The list of orders as it is shown, every page, as CSV',
  query: orderList.omit({ cursor: true, limit: true }),
  reply: { 200: z.null() },
  problems: [],
  produces: 'csv',
})

export const getOrder = contract({
  id: 'getOrder',
  method: 'get',
  path: '/orders/:number',
  action: 'order.read',
  summary: 'One order with its signed versions, each checked now',
  params: orderParams,
  query: z.strictObject({
    amounts: z
      .enum(['yes'])
      .optional()
      .describe('Show the amount too; whoever asks for it is no blind second person any more'),
  }),
  reply: { 200: Order },
  problems: ['not-found'],
})

export const previewOrder = contract({
  id: 'previewOrder',
  method: 'post',
  path: '/order-previews',
  action: 'order.draft',
  summary: 'Work out an order and judge it, without keeping anything',
  query: z.strictObject({
    order: OrderNumber.optional().describe(
      'The order that is being written or amended, once it has a number',
    ),
  }),
  body: BathOrderFields,
  reply: { 200: OrderPreview },
  problems: ['not-found', 'dose-line-not-usable', 'product-not-for-water'],
  idempotent: 'nothing-kept',
})

export const draftOrder = contract({
  id: 'draftOrder',
  method: 'post',
  path: '/orders',
  action: 'order.draft',
  summary: 'Keep a new draft; a technician’s is a proposal',
  body: z.strictObject({ id: RecordId, fields: BathOrderFields }),
  reply: { 201: Order },
  problems: ['not-found', 'id-already-used', 'dose-line-not-usable', 'product-not-for-water'],
  idempotent: 'by-record-id',
})

export const reviseDraft = contract({
  id: 'reviseDraft',
  method: 'put',
  path: '/orders/:number/draft',
  action: 'order.draft',
  summary: 'Save the draft again, or begin an amended version of a signed order',
  params: orderParams,
  body: z.strictObject({ expectedVersion: Version, fields: BathOrderFields }),
  reply: { 200: Order },
  problems: [
    'not-found',
    'may-not',
    'stale-version',
    'order-ended',
    'dose-line-not-usable',
    'product-not-for-water',
  ],
})

/** A caution as it was read: an answer counts for this one alone, in these words. */
export const AnsweredCaution = z.strictObject({
  ruleId: z.string().max(20).describe('Rule that fired'),
  code: z.string().max(80).describe('What it found'),
  text: z.string().max(4000).describe('The sentences as they were read'),
})
export type AnsweredCaution = z.infer<typeof AnsweredCaution>

export const signOrder = contract({
  id: 'signOrder',
  method: 'post',
  path: '/orders/:number/signature',
  action: 'order.sign',
  summary: 'Sign the draft: recomputed, judged again, frozen',
  params: orderParams,
  body: z.strictObject({
    licenceId: ChosenLicence,
    password: z.string().min(1).max(200).describe('The signer’s password'),
    expectedVersion: Version,
    relationship: z
      .boolean()
      .optional()
      .describe(
        'The signer states a valid veterinarian-client-patient relationship; an extralabel order is not signed without',
      ),
    read: z.array(AnsweredCaution).max(60).describe('Warnings that the signer has read'),
    overrides: z
      .array(AnsweredCaution.extend({ reason: Reason }))
      .max(30)
      .describe('Stops that are overridden, each with its reason'),
  }),
  reply: { 201: Order },
  problems: [
    'not-found',
    'stale-version',
    'licence-not-valid',
    'licence-not-chosen',
    'registration-needed',
    'password-wrong',
    'sign-in-locked',
    'order-incomplete',
    'not-as-entered',
    'bad-input',
    'dose-line-not-usable',
    'product-not-for-water',
    'caution-stops',
    'caution-not-fired',
    'cautions-unread',
    'working-disagrees',
    'nothing-to-sign',
  ],
  idempotent: 'by-key',
})

export const holdOrder = contract({
  ...actAddresses.holdOrder,
  action: 'order.hold',
  summary: 'Hold an order at once; needs no password and no reason',
  params: orderParams,
  body: z.strictObject({
    id: RecordId,
    happenedAt: Instant,
    reason: z.string().trim().max(2000).optional().describe('Why, where there is time to say so'),
  }),
  reply: { 201: Order },
  problems: ['not-found', 'id-already-used'],
})

export const liftOrderHold = contract({
  ...actAddresses.liftOrderHold,
  action: 'hold.lift',
  summary: 'Lift the hold of an order; for a veterinarian',
  params: orderParams,
  body: z.strictObject({ reason: Reason }),
  reply: { 200: Order },
  problems: ['not-found', 'not-held'],
})

export const discontinueOrder = contract({
  id: 'discontinueOrder',
  method: 'post',
  path: '/orders/:number/discontinuation',
  action: 'order.discontinue',
  summary: 'End an order before its time; for a veterinarian',
  params: orderParams,
  body: z.strictObject({ reason: Reason }),
  reply: { 200: Order },
  problems: ['not-found', 'order-ended'],
  idempotent: 'by-key',
})

export const printOrderLabel = contract({
  id: 'printOrderLabel',
  method: 'get',
  path: '/orders/:number/label',
  action: 'order.print',
  summary: 'The label for a container of what is dispensed under an order, as PDF; it tells no amount',
  params: orderParams,
  reply: { 200: z.string().describe('PDF') },
  problems: ['not-found', 'broken-record', 'print-busy', 'print-failed'],
  produces: 'pdf',
})

export const printOrder = contract({
  id: 'printOrder',
  method: 'get',
  path: '/orders/:number/print',
  action: 'order.print',
  summary: 'The signed order as PDF, checked now',
  params: orderParams,
  query: z.strictObject({
    version: z.coerce.number().int().min(1).optional().describe('Version; the newest unless told'),
  }),
  reply: { 200: z.string().describe('PDF') },
  problems: ['not-found', 'broken-record', 'print-busy', 'print-failed'],
  produces: 'pdf',
})
