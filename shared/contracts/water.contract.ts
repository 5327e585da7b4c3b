import { z } from 'zod'
import { waterEventKinds } from '../domain/places/water-event-kind.ts'
import { phScales } from '../domain/readings/parameters.ts'
import { contract } from './contract.ts'
import { Enclosure, enclosureParams, WaterBody } from './enclosures.contract.ts'
import { EnteredQuantity, Instant, listQuery, May, noneTwice, page, Reason, RecordId } from './primitives.ts'
import {
  ConnectionNow,
  Isolation,
  Judgement,
  LifeSupportNow,
  Litres,
  Parameter,
  Range,
  ReadingRow,
  Volume,
  WaterEventRow,
} from './water-facts.ts'

export const Note = z.string().trim().min(1).max(2000).nullable().optional().describe('Note')
export const HappenedAt = Instant.describe('When it happened; at most 5 min ahead of the server')
const asOf = Instant.optional().describe('The instant asked about; now unless told')

/** The volume to dose by, and whether it may be used as the valves stand. */
export const VolumeNow = z.object({
  volume: Volume.nullable().describe(
    'The newest determination that holds, else the newest that touches this water',
  ),
  usable: z.boolean().describe('Confirmed, and it holds for this water as the valves stand'),
  holds: z.boolean().describe('It holds for this water as the valves stand'),
  basis: z
    .enum(['connected-water', 'isolation'])
    .nullable()
    .describe('Covers all connected water, or a part under a recorded isolation'),
  refusal: z.string().nullable().describe('Code of why no volume can be used; null when one can'),
})

export const WaterListRow = z.object({
  id: RecordId,
  code: z.string().describe('Code of the enclosure'),
  name: z.string().describe('Name'),
  kind: z.string().describe('Kind of place'),
  area: z.string().describe('Part of the house'),
  boundary: z.string().nullable().describe('Quarantine boundary'),
  treatmentVessel: z.boolean().describe('Animals go into it for a bath'),
  connectedCodes: z.array(z.string()).describe('Other bodies that share this water now'),
  netVolumeLitres: Litres.nullable().describe('Net volume of the connected water, L'),
  errorPercent: z.number().nullable().describe('Relative error, percent'),
  volumeState: z
    .enum(['usable', 'to-confirm', 'does-not-hold', 'none', 'no-water'])
    .describe('Whether a dose may be worked out from the volume now'),
  lastReadingAt: Instant.nullable().describe('When its water was last measured'),
  outside: z
    .array(
      z.object({
        parameter: Parameter,
        value: EnteredQuantity.describe('As the instrument gave it'),
        below: z.boolean().describe('The lowest mark of the kit'),
        judgement: Judgement,
        at: Instant.describe('When it was measured'),
      }),
    )
    .describe('Newest readings that lie outside what is wanted'),
  lifeSupportOff: z.array(z.string()).describe('Machines on its water that are off'),
})
export type WaterListRow = z.infer<typeof WaterListRow>

const waterListQuery = listQuery(['code', 'name', 'area', 'volume', 'lastReading']).extend({
  area: z.string().trim().max(120).optional().describe('Only this part of the house'),
  kind: z.string().trim().max(40).optional().describe('Only this kind of place'),
  state: z
    .enum(['outside', 'volume-not-usable', 'life-support-off', 'treatment-vessel'])
    .optional()
    .describe('Only enclosures in this state'),
})

export const listWater = contract({
  id: 'listWater',
  method: 'get',
  path: '/water',
  action: 'collection.read',
  summary: 'Enclosures with their water as of now: connected bodies, volume, readings outside, machines off',
  query: waterListQuery,
  reply: {
    200: page(WaterListRow).extend({
      areas: z.array(z.string()).describe('Parts of the house, for the filter'),
      may: May,
    }),
  },
  problems: [],
})

export const exportWater = contract({
  id: 'exportWater',
  method: 'get',
  path: '/water.csv',
  action: 'collection.read',
  summary: 'The water list as CSV, with the same search, filters and order',
  query: waterListQuery,
  reply: { 200: z.string().describe('CSV') },
  problems: [],
  produces: 'csv',
})

export const WaterOfEnclosure = z.object({
  enclosure: Enclosure.describe('The enclosure'),
  asOf: Instant.describe('The instant this describes'),
  bodies: z.array(WaterBody).describe('Bodies that share its water then; empty for a land area'),
  enclosures: z
    .array(
      z.object({
        id: RecordId,
        code: z.string().describe('Code'),
        name: z.string().describe('Name'),
      }),
    )
    .describe('Enclosures that share its water then, itself among them'),
  connections: z.array(ConnectionNow).describe('Valves and pumps that touch this water'),
  unknownConnectionIds: z.array(RecordId).describe('Counted as open because nobody recorded their state'),
  lifeSupport: z.array(LifeSupportNow).describe('Machines on this water'),
  volume: VolumeNow.describe('The volume to dose by'),
  isolations: z.array(Isolation).describe('Isolations of this water that stand'),
  ranges: z.array(Range).describe('What is wanted here'),
  latest: z.array(ReadingRow).describe('Newest reading of each parameter in this water'),
  events: z.array(WaterEventRow).describe('The last 20 water events'),
  may: May,
})
export type WaterOfEnclosure = z.infer<typeof WaterOfEnclosure>

export const getWaterOfEnclosure = contract({
  id: 'getWaterOfEnclosure',
  method: 'get',
  path: '/enclosures/:code/water',
  action: 'collection.read',
  summary:
    'An enclosure and its connected water at an instant: volume, valves, machines, ranges, newest readings',
  params: enclosureParams,
  query: z.strictObject({ asOf }),
  reply: { 200: WaterOfEnclosure },
  problems: ['not-found'],
})

const readingQuery = listQuery(['happenedAt']).extend({
  parameter: Parameter.optional(),
  from: Instant.optional().describe('From this instant'),
  until: Instant.optional().describe('Before this instant'),
  voided: z.enum(['with', 'without']).optional().describe('With or without those struck through; without'),
})

export const listReadings = contract({
  id: 'listReadings',
  method: 'get',
  path: '/enclosures/:code/readings',
  action: 'collection.read',
  summary:
    'Readings of the water of an enclosure and of the sumps and loops joined to it now, the newest first',
  params: enclosureParams,
  query: readingQuery,
  reply: { 200: page(ReadingRow) },
  problems: ['not-found'],
})

export const exportReadings = contract({
  id: 'exportReadings',
  method: 'get',
  path: '/enclosures/:code/readings.csv',
  action: 'collection.read',
  summary: 'The readings of an enclosure as CSV',
  params: enclosureParams,
  query: readingQuery,
  reply: { 200: z.string().describe('CSV') },
  problems: ['not-found'],
  produces: 'csv',
})

export const recordReadings = contract({
  id: 'recordReadings',
  method: 'post',
  path: '/readings',
  action: 'water.record',
  summary: 'Record what was measured in one water at one time; all of it or nothing',
  body: z.strictObject({
    waterBodyId: RecordId.describe('Where it was measured'),
    happenedAt: HappenedAt,
    readings: noneTwice(
      z
        .array(
          z.strictObject({
            id: RecordId,
            parameter: Parameter,
            value: EnteredQuantity.describe('As the instrument gave it'),
            below: z.boolean().optional().describe('The true value lies below the figure'),
            scale: z.enum(phScales).nullable().optional().describe('Scale of a pH, needed there'),
            instrument: z.string().trim().min(1).max(120).nullable().optional().describe('Instrument or kit'),
            note: Note,
          }),
        )
        .min(1, 'Enter at least one reading')
        .max(40),
    )
      .refine(
        (list) => new Set(list.map((reading) => reading.id)).size === list.length,
        'Each reading needs an id of its own',
      )
      .describe('The readings'),
  }),
  reply: { 201: z.object({ readings: z.array(ReadingRow).describe('As recorded') }) },
  problems: ['not-found', 'in-the-future', 'id-already-used'],
  idempotent: 'by-record-id',
})

export const setRange = contract({
  id: 'setRange',
  method: 'post',
  path: '/enclosures/:code/ranges',
  action: 'water.configure',
  summary: 'Say what is wanted of a parameter here; with no limits, that nothing is wanted any more',
  params: enclosureParams,
  body: z.strictObject({
    id: RecordId,
    parameter: Parameter,
    unit: z.string().min(1).max(40).describe('Unit of the limits'),
    outerLow: z.string().trim().max(40).nullable().optional().describe('Urgent below'),
    innerLow: z.string().trim().max(40).nullable().optional().describe('Warned below'),
    innerHigh: z.string().trim().max(40).nullable().optional().describe('Warned above'),
    outerHigh: z.string().trim().max(40).nullable().optional().describe('Urgent above'),
    reason: Reason.nullable().optional().describe('Why'),
  }),
  reply: { 201: z.object({ ranges: z.array(Range).describe('What is wanted here now') }) },
  problems: ['not-found', 'id-already-used'],
  idempotent: 'by-record-id',
})

export const recordWaterEvent = contract({
  id: 'recordWaterEvent',
  method: 'post',
  path: '/water-events',
  action: 'water.record',
  summary: 'Record a water change, backwash, media change or top-off',
  body: z.strictObject({
    id: RecordId,
    waterBodyId: RecordId.describe('Water it was done to'),
    kind: z.enum(waterEventKinds).describe('What was done'),
    amount: EnteredQuantity.nullable().optional().describe('Water changed or added'),
    sharePercent: z
      .string()
      .trim()
      .min(1)
      .max(40)
      .nullable()
      .optional()
      .describe('Share of the water changed, percent; either this or the amount for a water change'),
    lifeSupportUnitId: RecordId.nullable().optional().describe('The machine that was cleaned'),
    happenedAt: HappenedAt,
    note: Note,
  }),
  reply: { 201: WaterEventRow },
  problems: ['not-found', 'in-the-future', 'id-already-used'],
  idempotent: 'by-record-id',
})

export const waterRecordKinds = [
  'reading',
  'water-event',
  'connection-state',
  'life-support-state',
  'isolation',
] as const

export const voidWaterRecord = contract({
  id: 'voidWaterRecord',
  method: 'post',
  path: '/water-records/:kind/:id/void',
  action: 'water.record',
  summary: 'Strike through a record that is wrong; it stays readable and no longer counts',
  params: z.strictObject({
    kind: z.enum(waterRecordKinds).describe('Kind of record'),
    id: RecordId,
  }),
  body: z.strictObject({ reason: Reason }),
  reply: { 200: z.object({ id: RecordId, reason: z.string().describe('Why it does not count') }) },
  problems: ['not-found', 'already-void'],
  idempotent: 'by-key',
})
