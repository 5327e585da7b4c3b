import { z } from 'zod'
import { agentCodes } from '../domain/formulary/agent.ts'
import { concentrationBases } from '../domain/units/basis.ts'
import { contract } from './contract.ts'
import { EnteredQuantity, Instant, LocalDate, Reason, RecordId, Version } from './primitives.ts'

const Agent = z.enum(agentCodes).describe('The drug itself')
const Basis = z.enum(concentrationBases).describe('What the figure is a concentration of')

export const lotEventKinds = [
  'recalled',
  'set-aside',
  'stored-cold',
  'precipitate',
  'returned-to-use',
  'used-up',
  'looked-at',
] as const

export const Lot = z.object({
  id: RecordId,
  lotNumber: z.string().describe('Lot number as on the container'),
  expiresOn: LocalDate.describe('Last day of use'),
  receivedOn: LocalDate.describe('Day it came in'),
  state: z
    .enum(['usable', 'expired', 'recalled', 'set-aside', 'stored-cold', 'precipitate', 'used-up'])
    .describe('Whether it may be used today, and if not why'),
  foundClearAt: Instant.nullable().describe('When somebody last looked at it and found it clear'),
})
export type Lot = z.infer<typeof Lot>

export const Product = z.object({
  id: RecordId,
  agent: Agent,
  productName: z.string().describe('Name on the container'),
  form: z.enum(['liquid', 'powder', 'crystals']).describe('Form'),
  strength: EnteredQuantity.describe('Strength as on the label'),
  strengthBasis: Basis.describe('What the strength is a strength of'),
  densityGPerMl: z.number().nullable().describe('Density in g/mL, where known'),
  inUse: z.boolean().describe('Offered when an order is written'),
  record: z
    .enum(['intact', 'broken'])
    .describe('Whether it is what was entered; of a broken one no figure is to be used'),
  version: z.int().describe('Version for saving'),
  lots: z.array(Lot).describe('Lots, the first to expire first'),
})
export type Product = z.infer<typeof Product>

export const DoseLine = z.object({
  id: RecordId,
  agent: Agent,
  use: z.string().describe('What it is given for, code'),
  low: z.number().nullable().describe('Lower end of the range in the unit stated; null: upper limit only'),
  high: z.number().describe('Upper end of the range in the unit stated'),
  unit: z.string().describe('Unit of the range'),
  basis: Basis,
  longestContactMinutes: z.number().nullable().describe('Longest contact in minutes; null: none named'),
  water: z.enum(['fresh', 'marine', 'both']).describe('Kind of water; of a dose by weight: both'),
  source: z.string().describe('Key of the source'),
  citation: z.string().describe('The source in words'),
  mark: z.string().describe('How well the figure is known: V, V2, C, M or P'),
  state: z.enum(['default', 'proposed', 'confirmed']).describe('Project default, proposal, or confirmed'),
  confirmedBy: z.string().nullable().describe('Who confirmed it'),
  confirmedAt: Instant.nullable().describe('When it was confirmed'),
})
export type DoseLine = z.infer<typeof DoseLine>

export const getFormulary = contract({
  id: 'getFormulary',
  method: 'get',
  path: '/formulary',
  action: 'collection.read',
  summary: 'Dose lines in force with their sources, and products with their lots',
  reply: {
    200: z.object({
      lines: z.array(DoseLine).describe('Dose lines in force'),
      products: z.array(Product).describe('Products'),
    }),
  },
  problems: [],
})

const productParams = z.strictObject({ id: RecordId })
const productFields = {
  agent: Agent,
  productName: z.string().trim().min(1).max(200).describe('Name on the container'),
  form: z.enum(['liquid', 'powder', 'crystals']).describe('Form'),
  strength: EnteredQuantity.describe('Strength as on the label'),
  strengthBasis: Basis.describe('What the strength is a strength of'),
  density: EnteredQuantity.optional().describe('Density, where the container states it'),
}

export const enterProduct = contract({
  id: 'enterProduct',
  method: 'post',
  path: '/products',
  action: 'formulary.propose',
  summary: 'Enter a product with its strength as on the label',
  body: z.strictObject({ id: RecordId, ...productFields }),
  reply: { 201: Product },
  problems: ['id-already-used'],
  idempotent: 'by-record-id',
})

export const withdrawProduct = contract({
  id: 'withdrawProduct',
  method: 'put',
  path: '/products/:id',
  action: 'formulary.propose',
  summary: 'Take a product out of use, or into use again',
  params: productParams,
  body: z.strictObject({
    expectedVersion: Version,
    inUse: z.boolean().describe('Offered when an order is written'),
  }),
  reply: { 200: Product },
  problems: ['not-found', 'stale-version'],
})

export const receiveLot = contract({
  id: 'receiveLot',
  method: 'post',
  path: '/products/:id/lots',
  action: 'stock.manage',
  summary: 'Enter a lot that came in',
  params: productParams,
  body: z.strictObject({
    id: RecordId,
    lotNumber: z.string().trim().min(1).max(60).describe('Lot number as on the container'),
    expiresOn: LocalDate.describe('Last day of use'),
    receivedOn: LocalDate.describe('Day it came in'),
  }),
  reply: { 201: Product },
  problems: ['not-found', 'id-already-used', 'number-already-used'],
  idempotent: 'by-record-id',
})

export const noteLotEvent = contract({
  id: 'noteLotEvent',
  method: 'post',
  path: '/lots/:lotId/events',
  action: 'stock.manage',
  summary: 'Note what happened to a lot: recalled, stored too cold, set aside, used up …',
  params: z.strictObject({ lotId: RecordId }),
  body: z.strictObject({
    id: RecordId,
    kind: z.enum(lotEventKinds).describe('What happened'),
    happenedAt: Instant,
    note: z.string().trim().max(500).optional().describe('In words'),
  }),
  reply: { 201: Product },
  problems: ['not-found', 'id-already-used', 'in-the-future', 'may-not', 'another-person-needed'],
  idempotent: 'by-record-id',
})

export const proposeDoseLine = contract({
  id: 'proposeDoseLine',
  method: 'post',
  path: '/dose-lines',
  action: 'formulary.propose',
  summary: 'Propose other figures in place of a dose line',
  body: z.strictObject({
    id: RecordId,
    supersedesId: RecordId.describe('The line it takes the place of'),
    low: z.number().positive().nullable().describe('Lower end of the range in the unit of the line'),
    high: z.number().positive().describe('Upper end of the range in the unit of the line'),
    longestContactMinutes: z.number().positive().nullable().describe('Longest contact in minutes'),
    reason: Reason,
  }),
  reply: { 201: DoseLine },
  problems: ['not-found', 'id-already-used', 'stale-version'],
  idempotent: 'by-record-id',
})

export const confirmDoseLine = contract({
  id: 'confirmDoseLine',
  method: 'post',
  path: '/dose-lines/:id/confirmation',
  action: 'formulary.confirm',
  summary: 'Confirm a dose line for this facility; needs a valid licence',
  params: productParams,
  body: z.strictObject({ reason: Reason.optional() }),
  reply: { 200: DoseLine },
  problems: ['not-found', 'licence-not-valid', 'sign-in-locked', 'already-confirmed'],
  idempotent: 'by-key',
})
