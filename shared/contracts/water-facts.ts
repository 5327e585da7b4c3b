import { z } from 'zod'
import { lifeSupportKinds } from '../domain/places/life-support-kind.ts'
import { waterEventKinds } from '../domain/places/water-event-kind.ts'
import { phScales, readingParameters } from '../domain/readings/parameters.ts'
import { EnteredQuantity, Instant, LocalDate, RecordId } from './primitives.ts'

// The pieces that replies about water are built from.

export const Parameter = z.enum(readingParameters).describe('What was measured')
export const Litres = z.number().describe('Litres, unrounded')

export const Voided = z
  .object({
    reason: z.string().describe('Why it does not count'),
    at: Instant.describe('When it was struck through'),
    by: z.string().describe('Who struck it through'),
  })
  .nullable()
  .describe('Set when the record was struck through; it stays readable')

const recorded = {
  id: RecordId,
  happenedAt: Instant.describe('When it happened'),
  happenedOn: LocalDate.describe('Facility date on which it happened'),
  recordedAt: Instant.describe('When it was entered'),
  recordedBy: z.string().describe('Who entered it'),
  voided: Voided,
}

export const Judgement = z
  .object({
    level: z
      .enum(['inside', 'inner', 'outer', 'no-range', 'unknown'])
      .describe('Inside what is wanted, beyond the inner or the outer limit, or not to be told'),
    side: z.enum(['low', 'high']).nullable().describe('Too low or too high'),
    limit: z.number().nullable().describe('The limit passed, in the unit of the range'),
  })
  .describe('How the reading stands to what is wanted')

export const Range = z.object({
  id: RecordId,
  parameter: Parameter,
  unit: z.string().describe('Unit as entered'),
  entered: z
    .object({
      outerLow: z.string().nullable().describe('Urgent below, as entered'),
      innerLow: z.string().nullable().describe('Warned below, as entered'),
      innerHigh: z.string().nullable().describe('Warned above, as entered'),
      outerHigh: z.string().nullable().describe('Urgent above, as entered'),
    })
    .describe('The limits as entered'),
  canonicalUnit: z.string().describe('Unit the limits are compared in'),
  outerLow: z.number().nullable().describe('Urgent below, canonical unit'),
  innerLow: z.number().nullable().describe('Warned below, canonical unit'),
  innerHigh: z.number().nullable().describe('Warned above, canonical unit'),
  outerHigh: z.number().nullable().describe('Urgent above, canonical unit'),
  since: Instant.describe('In force since'),
  setBy: z.string().describe('Who set it'),
})
export type Range = z.infer<typeof Range>

export const ReadingRow = z.object({
  ...recorded,
  waterBodyId: RecordId,
  waterBodyCode: z.string().describe('Where it was taken'),
  parameter: Parameter,
  value: EnteredQuantity.describe('As the instrument gave it'),
  below: z.boolean().describe('The true value lies below the figure: the lowest mark of the kit'),
  scale: z.enum(phScales).nullable().describe('Scale of a pH'),
  canonicalValue: z.number().describe('In the canonical unit'),
  canonicalUnit: z.string().describe('The canonical unit'),
  instrument: z.string().nullable().describe('Instrument or kit'),
  note: z.string().nullable().describe('Note'),
  judgement: Judgement,
})
export type ReadingRow = z.infer<typeof ReadingRow>

export const WaterEventRow = z.object({
  ...recorded,
  waterBodyId: RecordId,
  waterBodyCode: z.string().describe('Water it was done to'),
  kind: z.enum(waterEventKinds).describe('What was done'),
  amount: EnteredQuantity.nullable().describe('Water changed or added, as entered'),
  amountLitres: Litres.nullable().describe('Water changed or added, L'),
  sharePercent: z.number().nullable().describe('Share of the water changed, percent'),
  lifeSupportCode: z.string().nullable().describe('The machine that was cleaned'),
  note: z.string().nullable().describe('Note'),
})
export type WaterEventRow = z.infer<typeof WaterEventRow>

export const ConnectionNow = z.object({
  id: RecordId,
  code: z.string().describe('Code of the valve or pump'),
  name: z.string().describe('Name in words'),
  kind: z.enum(['valve', 'pump']).describe('Valve or pump'),
  fromBodyId: RecordId,
  fromCode: z.string().describe('Body at one end'),
  toBodyId: RecordId,
  toCode: z.string().describe('Body at the other end'),
  state: z.enum(['open', 'shut', 'unknown']).describe('At the instant asked about; unknown counts as open'),
  since: Instant.nullable().describe('Since when'),
  by: z.string().nullable().describe('Who recorded it'),
  inside: z.boolean().describe('Both ends lie in this water'),
  version: z.int().describe('Version for saving'),
})
export type ConnectionNow = z.infer<typeof ConnectionNow>

export const LifeSupportNow = z.object({
  id: RecordId,
  code: z.string().describe('Code of the machine'),
  name: z.string().describe('Name in words'),
  kind: z.enum(lifeSupportKinds).describe('What it is'),
  waterBodyId: RecordId,
  waterBodyCode: z.string().describe('Water it works on'),
  state: z.enum(['on', 'off', 'unknown']).describe('At the instant asked about'),
  since: Instant.nullable().describe('Since when'),
  by: z.string().nullable().describe('Who recorded it'),
  version: z.int().describe('Version for saving'),
})
export type LifeSupportNow = z.infer<typeof LifeSupportNow>

export const Isolation = z.object({
  ...recorded,
  waterBodyIds: z.array(RecordId).describe('Bodies that were shut off'),
  codes: z.array(z.string()).describe('Their codes'),
  test: z
    .object({
      method: z.string().describe('How it was tested'),
      passed: z.boolean().describe('The water is really parted'),
      at: Instant.describe('When it was tested'),
      by: z.string().describe('Who tested'),
    })
    .nullable()
    .describe('The newest test; null while none was made'),
  endedAt: Instant.nullable().describe('When it was opened again; null while it stands'),
  note: z.string().nullable().describe('Note'),
})
export type Isolation = z.infer<typeof Isolation>

export const WorkingLineReply = z
  .object({
    key: z.string().describe('Names the line'),
    code: z.string().describe('What the line works out'),
    params: z.record(z.string(), z.union([z.string(), z.number()])).describe('For the words of the line'),
    expression: z.string().describe('The arithmetic with its numbers and units'),
    value: z.number().describe('The answer, unrounded'),
    unit: z.string().describe('Unit of the answer'),
    rests: z.array(z.string()).describe('Lines that it takes'),
  })
  .describe('One line of working')

export const Volume = z.object({
  ...recorded,
  method: z.enum(['geometry', 'metered', 'dilution', 'estimated']).describe('How it was found'),
  grossVolumeLitres: Litres.nullable().describe('Gross volume, L'),
  netVolumeLitres: Litres.describe('Net volume, L'),
  errorPercent: z.number().nullable().describe('Relative error, percent, one side'),
  displacementSubtracted: z.boolean().describe('What stands in the water was taken off'),
  sheet: z.record(z.string(), z.unknown()).describe('The sheet it was worked out from, as entered'),
  working: z.array(WorkingLineReply).describe('The working as it was'),
  waterBodyIds: z.array(RecordId).describe('Bodies it covers'),
  codes: z.array(z.string()).describe('Their codes'),
  valves: z
    .array(
      z.object({
        connectionId: RecordId,
        code: z.string().describe('Valve or pump'),
        open: z.boolean().describe('Open or running'),
      }),
    )
    .describe('The valve state it holds for'),
  isolationId: RecordId.nullable().describe('The isolation it was made under'),
  nextCheckOn: LocalDate.nullable().describe('When it should be checked again'),
  note: z.string().nullable().describe('Note'),
  confirmation: z
    .object({
      at: Instant.describe('When'),
      by: z.string().describe('Who'),
      note: z.string().nullable().describe('Note'),
    })
    .nullable()
    .describe('The second person; null while it waits'),
  determinedById: RecordId.describe('Who determined it'),
})
export type Volume = z.infer<typeof Volume>
