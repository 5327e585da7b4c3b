import { z } from 'zod'
import { contract } from './contract.ts'
import { enclosureParams } from './enclosures.contract.ts'
import { LocalDate, noneTwice, Reason, RecordId } from './primitives.ts'
import { VolumeSheetBody } from './volume-sheet.ts'
import { HappenedAt, Note } from './water.contract.ts'
import { Volume } from './water-facts.ts'

const volumeParams = z.strictObject({ id: RecordId })

export const listVolumes = contract({
  id: 'listVolumes',
  method: 'get',
  path: '/enclosures/:code/volumes',
  action: 'collection.read',
  summary: 'Every volume determination that covers this enclosure, the newest first, also those withdrawn',
  params: enclosureParams,
  reply: { 200: z.object({ volumes: z.array(Volume).describe('The determinations') }) },
  problems: ['not-found'],
})

export const determineVolume = contract({
  id: 'determineVolume',
  method: 'post',
  path: '/enclosures/:code/volumes',
  action: 'water.configure',
  summary: 'Record a volume determination; it counts once another person has confirmed it',
  params: enclosureParams,
  body: z.strictObject({
    id: RecordId,
    happenedAt: HappenedAt.describe(
      'When it was measured; the valve state of that instant is what it holds for',
    ),
    waterBodyIds: noneTwice(z.array(RecordId).min(1, 'Name at least one body').max(50)).describe(
      'Bodies it covers: all that were joined then, or those of an isolation',
    ),
    isolationId: RecordId.nullable()
      .optional()
      .describe('Needed when it covers less than the connected water'),
    sheet: VolumeSheetBody,
    nextCheckOn: LocalDate.nullable().optional().describe('When it should be checked again'),
    note: Note,
  }),
  reply: { 201: Volume },
  problems: [
    'not-found',
    'id-already-used',
    'in-the-future',
    'kind-has-no-water',
    'valve-state-unknown',
    'volume-covers-other-water',
    'isolation-needed',
    'isolation-not-standing',
  ],
  idempotent: 'by-record-id',
})

export const confirmVolume = contract({
  id: 'confirmVolume',
  method: 'post',
  path: '/volumes/:id/confirmation',
  action: 'volume.confirm',
  summary: 'Confirm a volume determination that another person made',
  params: volumeParams,
  body: z.strictObject({
    note: Note,
    differenceSeen: z
      .boolean()
      .optional()
      .describe('Measured again: the volume is right though far from what was confirmed before'),
  }),
  reply: { 200: Volume },
  problems: ['not-found', 'another-person-needed', 'already-confirmed', 'already-void', 'volume-differs'],
  idempotent: 'by-key',
})

export const voidVolume = contract({
  id: 'voidVolume',
  method: 'post',
  path: '/volumes/:id/void',
  action: 'water.configure',
  summary:
    'Withdraw a volume determination that is wrong; it stays readable and no dose is worked out from it',
  params: volumeParams,
  body: z.strictObject({ reason: Reason }),
  reply: { 200: Volume },
  problems: ['not-found', 'already-void'],
  idempotent: 'by-key',
})
