import { z } from 'zod'
import { lifeSupportKinds } from '../domain/places/life-support-kind.ts'
import { contract } from './contract.ts'
import { PlaceCode, PlaceName, WaterBody } from './enclosures.contract.ts'
import { Instant, noneTwice, RecordId, Version } from './primitives.ts'
import { HappenedAt, Note } from './water.contract.ts'
import { ConnectionNow, Isolation, LifeSupportNow } from './water-facts.ts'

const idParams = z.strictObject({ id: RecordId })
const inUseFrom = Instant.optional().describe('Taken into use; now unless told')
const correction = {
  expectedVersion: Version,
  name: PlaceName,
  inUseUntil: Instant.nullable().describe('When it was taken out of use; null while in use'),
}

export const getWaterMap = contract({
  id: 'getWaterMap',
  method: 'get',
  path: '/water-map',
  action: 'collection.read',
  summary: 'Every body of water, valve and pump, with the state of each at an instant',
  query: z.strictObject({ asOf: Instant.optional().describe('The instant asked about; now unless told') }),
  reply: {
    200: z.object({
      asOf: Instant.describe('The instant this describes'),
      bodies: z.array(WaterBody).describe('Bodies in use then'),
      connections: z.array(ConnectionNow).describe('Valves and pumps in use then'),
      waters: z
        .array(z.array(RecordId).describe('Bodies of one water'))
        .describe('Which bodies share one water'),
    }),
  },
  problems: [],
})

export const enterConnection = contract({
  id: 'enterConnection',
  method: 'post',
  path: '/connections',
  action: 'water.configure',
  summary: 'Enter a valve or pump between two bodies, with its state',
  body: z.strictObject({
    id: RecordId,
    code: PlaceCode,
    name: PlaceName,
    kind: z.enum(['valve', 'pump']).describe('Valve or pump'),
    fromBodyId: RecordId.describe('Body at one end'),
    toBodyId: RecordId.describe('Body at the other end'),
    open: z.boolean().describe('Open, or running, from the start'),
    inUseFrom,
  }),
  reply: { 201: ConnectionNow },
  problems: ['not-found', 'id-already-used', 'number-already-used', 'in-the-future', 'same-body-twice'],
  idempotent: 'by-record-id',
})

export const correctConnection = contract({
  id: 'correctConnection',
  method: 'put',
  path: '/connections/:id',
  action: 'water.configure',
  summary: 'Rename a valve or pump, or take it out of use',
  params: idParams,
  body: z.strictObject(correction),
  reply: { 200: ConnectionNow },
  problems: ['not-found', 'stale-version', 'in-the-future', 'period-reversed'],
})

export const recordConnectionState = contract({
  id: 'recordConnectionState',
  method: 'post',
  path: '/connections/:id/states',
  action: 'water.record',
  summary: 'Record that a valve was opened or shut, a pump started or stopped',
  params: idParams,
  body: z.strictObject({
    id: RecordId,
    open: z.boolean().describe('Open, or running'),
    happenedAt: HappenedAt,
    note: Note,
  }),
  reply: { 201: ConnectionNow },
  problems: ['not-found', 'id-already-used', 'in-the-future'],
  idempotent: 'by-record-id',
})

export const enterLifeSupport = contract({
  id: 'enterLifeSupport',
  method: 'post',
  path: '/life-support',
  action: 'water.configure',
  summary: 'Enter a machine on a body of water, with its state',
  body: z.strictObject({
    id: RecordId,
    code: PlaceCode,
    name: PlaceName,
    kind: z.enum(lifeSupportKinds).describe('What it is'),
    waterBodyId: RecordId.describe('Water it works on'),
    on: z.boolean().describe('On from the start'),
    inUseFrom,
  }),
  reply: { 201: LifeSupportNow },
  problems: ['not-found', 'id-already-used', 'number-already-used', 'in-the-future'],
  idempotent: 'by-record-id',
})

export const correctLifeSupport = contract({
  id: 'correctLifeSupport',
  method: 'put',
  path: '/life-support/:id',
  action: 'water.configure',
  summary: 'Rename a machine, or take it out of use',
  params: idParams,
  body: z.strictObject(correction),
  reply: { 200: LifeSupportNow },
  problems: ['not-found', 'stale-version', 'in-the-future', 'period-reversed'],
})

export const recordLifeSupportState = contract({
  id: 'recordLifeSupportState',
  method: 'post',
  path: '/life-support/:id/states',
  action: 'water.record',
  summary: 'Record that a machine was switched on or off',
  params: idParams,
  body: z.strictObject({
    id: RecordId,
    on: z.boolean().describe('On'),
    happenedAt: HappenedAt,
    note: Note,
  }),
  reply: { 201: LifeSupportNow },
  problems: ['not-found', 'id-already-used', 'in-the-future'],
  idempotent: 'by-record-id',
})

export const recordIsolation = contract({
  id: 'recordIsolation',
  method: 'post',
  path: '/isolations',
  action: 'water.record',
  summary: 'Record that part of a connected water was shut off for a treatment',
  body: z.strictObject({
    id: RecordId,
    waterBodyIds: noneTwice(z.array(RecordId).min(1, 'Name at least one body').max(50)).describe(
      'Bodies shut off',
    ),
    happenedAt: HappenedAt,
    note: Note,
  }),
  reply: { 201: Isolation },
  problems: ['not-found', 'id-already-used', 'in-the-future', 'not-one-water'],
  idempotent: 'by-record-id',
})

export const recordIsolationTest = contract({
  id: 'recordIsolationTest',
  method: 'post',
  path: '/isolations/:id/tests',
  action: 'water.record',
  summary: 'Record the test that isolated water is really parted',
  params: idParams,
  body: z.strictObject({
    id: RecordId,
    method: z.string().trim().min(3).max(500).describe('How it was tested: dye, level, salinity'),
    passed: z.boolean().describe('The water is really parted'),
    happenedAt: HappenedAt,
  }),
  reply: { 201: Isolation },
  problems: ['not-found', 'id-already-used', 'in-the-future', 'already-void'],
  idempotent: 'by-record-id',
})

export const endIsolation = contract({
  id: 'endIsolation',
  method: 'post',
  path: '/isolations/:id/end',
  action: 'water.record',
  summary: 'Record that isolated water was opened again',
  params: idParams,
  body: z.strictObject({ id: RecordId, happenedAt: HappenedAt, note: Note }),
  reply: { 201: Isolation },
  problems: ['not-found', 'id-already-used', 'in-the-future', 'isolation-ended', 'period-reversed'],
  idempotent: 'by-record-id',
})
