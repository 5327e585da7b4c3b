import { z } from 'zod'
import { enclosureKinds } from '../domain/places/enclosure-kind.ts'
import { contract } from './contract.ts'
import { EnteredQuantity, Instant, listQuery, May, page, RecordId, Version } from './primitives.ts'

/** Codes of places, valves and machines: as painted on them. They never change and are never used again. */
export const PlaceCode = z
  .string()
  .trim()
  .toUpperCase()
  .regex(
    /^[A-Z0-9][A-Z0-9.-]{0,19}$/,
    'Use letters, digits, points and hyphens, at most 20, for example QT-3',
  )
  .describe('Code as painted on it, for example QT-3')
export const PlaceName = z.string().trim().min(1, 'Type a name').max(120).describe('Name in words')
const OptionalName = z.string().trim().min(1).max(120).nullable()

const FillMark = z
  .strictObject({
    mark: z.string().trim().min(1).max(120).describe('Where the mark is, for example "red line, 60 L"'),
    volume: EnteredQuantity.describe('Water in the vessel when filled to the mark'),
  })
  .describe('Fill mark of a treatment vessel')

const enclosureFields = {
  name: PlaceName,
  kind: z.enum(enclosureKinds).describe('Kind of place'),
  area: z.string().trim().min(1, 'Type the part of the house').max(120).describe('Part of the house'),
  boundary: OptionalName.describe('Quarantine boundary it lies in; null outside every one'),
  airSpace: OptionalName.describe('Air space it shares; null where it shares none'),
  treatmentVessel: z.boolean().describe('Animals go into it for a bath and keep their home'),
  fillMark: FillMark.nullable().describe('Needed for a treatment vessel; null otherwise'),
  description: z.string().trim().min(1).max(2000).nullable().describe('Shape, material, what it is for'),
}

export const Enclosure = z.object({
  id: RecordId,
  code: z.string().describe('Code as painted on it'),
  ...enclosureFields,
  fillMark: z
    .object({
      mark: z.string().describe('Where the mark is'),
      volume: EnteredQuantity.describe('As entered'),
      litres: z.number().describe('Volume to the mark, L'),
    })
    .nullable()
    .describe('Fill mark of a treatment vessel'),
  waterBodyId: RecordId.nullable().describe('Its own water; null for a land area'),
  inUseFrom: Instant.describe('Taken into use'),
  inUseUntil: Instant.nullable().describe('Taken out of use; null while in use'),
  version: z.int().describe('Version for saving'),
  may: May,
})
export type Enclosure = z.infer<typeof Enclosure>

export const enclosureParams = z.strictObject({ code: PlaceCode })
const inUseFrom = Instant.optional().describe('Taken into use; now unless told')

export const listEnclosures = contract({
  id: 'listEnclosures',
  method: 'get',
  path: '/enclosures',
  action: 'collection.read',
  summary: 'Enclosures in use: tanks, pools, pens, tubs, land areas, transport',
  query: listQuery(['code', 'name', 'area']).extend({
    kind: z.enum(enclosureKinds).optional().describe('Only this kind'),
    area: z.string().trim().max(120).optional().describe('Only this part of the house'),
    boundary: z.string().trim().max(120).optional().describe('Only inside this quarantine boundary'),
    treatmentVessel: z.enum(['yes', 'no']).optional().describe('Only treatment vessels, or only others'),
  }),
  reply: { 200: page(Enclosure) },
  problems: [],
})

export const getEnclosure = contract({
  id: 'getEnclosure',
  method: 'get',
  path: '/enclosures/:code',
  action: 'collection.read',
  summary: 'One enclosure as it is described',
  params: enclosureParams,
  reply: { 200: Enclosure },
  problems: ['not-found'],
})

export const enterEnclosure = contract({
  id: 'enterEnclosure',
  method: 'post',
  path: '/enclosures',
  action: 'water.configure',
  summary: 'Enter an enclosure; one with water gets a water body of the same code',
  body: z.strictObject({ id: RecordId, code: PlaceCode, ...enclosureFields, inUseFrom }),
  reply: { 201: Enclosure },
  problems: ['id-already-used', 'number-already-used', 'in-the-future'],
  idempotent: 'by-record-id',
})

export const correctEnclosure = contract({
  id: 'correctEnclosure',
  method: 'put',
  path: '/enclosures/:code',
  action: 'water.configure',
  summary: 'Correct the description of an enclosure; its code stays',
  params: enclosureParams,
  body: z.strictObject({ expectedVersion: Version, ...enclosureFields }),
  reply: { 200: Enclosure },
  problems: ['not-found', 'stale-version', 'kind-has-no-water'],
})

export const WaterBody = z.object({
  id: RecordId,
  code: z.string().describe('Code as painted on it'),
  name: z.string().describe('Name in words'),
  kind: z.enum(['enclosure', 'sump', 'loop']).describe('Water of an enclosure, a sump or a loop'),
  enclosureId: RecordId.nullable().describe('The enclosure; null for a sump or loop'),
  inUseFrom: Instant.describe('Taken into use'),
  inUseUntil: Instant.nullable().describe('Taken out of use; null while in use'),
  version: z.int().describe('Version for saving'),
})
export type WaterBody = z.infer<typeof WaterBody>

export const enterWaterBody = contract({
  id: 'enterWaterBody',
  method: 'post',
  path: '/water-bodies',
  action: 'water.configure',
  summary: 'Enter a sump or a loop; the water of an enclosure is entered with it',
  body: z.strictObject({
    id: RecordId,
    code: PlaceCode,
    name: PlaceName,
    kind: z.enum(['sump', 'loop']).describe('A sump or a loop of pipework'),
    inUseFrom,
  }),
  reply: { 201: WaterBody },
  problems: ['id-already-used', 'number-already-used', 'in-the-future'],
  idempotent: 'by-record-id',
})

export const correctWaterBody = contract({
  id: 'correctWaterBody',
  method: 'put',
  path: '/water-bodies/:id',
  action: 'water.configure',
  summary: 'Rename a sump or loop, or take it out of use',
  params: z.strictObject({ id: RecordId }),
  body: z.strictObject({
    expectedVersion: Version,
    name: PlaceName,
    inUseUntil: Instant.nullable().describe('When it was taken out of use; null while in use'),
  }),
  reply: { 200: WaterBody },
  problems: ['not-found', 'stale-version', 'in-the-future', 'period-reversed', 'belongs-to-enclosure'],
})
