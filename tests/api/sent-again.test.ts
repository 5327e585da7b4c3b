import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { BathTank, FormalinHouse } from '../builders/a-bath.ts'
import { anObservation } from '../builders/an-observation.ts'
import { startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let house: FormalinHouse
let bath: BathTank
beforeAll(async () => {
  api = await startApi()
  house = await aFormalinHouse(api)
  bath = await house.tankWithSchool()
})
afterAll(() => api.stop())

const refusal = { code: 'id-already-used', status: 409 }

describe('a record that is sent again under its id', () => {
  it('of a dose: the same is the first answer; another amount, time, lot or note is refused and said', async () => {
    const number = await house.signedBath(bath)
    const sent = { id: api.nextId(), note: 'poured at the return' }
    await house.record(number, sent).expect(201)
    const same = await house.record(number, sent).expect(201)
    expect(same.body.recorded).toHaveLength(1)
    for (const other of [
      { amount: { value: '21.8', unit: 'mL' } },
      { happenedAt: '2026-12-01T18:00:00Z' },
      { lotId: null },
      { note: 'poured at the overflow' },
      { kind: 'withheld', amount: null },
    ]) {
      const reply = await house.record(number, { ...sent, ...other })
      expect(reply.body).toMatchObject(refusal)
      expect(reply.body.detail).toContain('The first one stands as it was sent')
    }
    const sheet = await house.technician.agent.get(house.doseAt(number)).expect(200)
    expect(sheet.body.recorded).toMatchObject([{ amountText: '218\u00a0mL', note: 'poured at the return' }])
  })

  it('of a stop, a hold and an observation: what was seen is not dropped', async () => {
    const number = await house.signedBath(bath)
    const dose = api.nextId()
    await house.record(number, { id: dose }).expect(201)
    const keeper = await api.as('keeper')
    const stop = { id: api.nextId(), cause: 'stopped', happenedAt: '2026-12-01T18:20:00Z', seen: 'calm' }
    const send = (address: string, body: object) => keeper.agent.post(address).send(body)
    const hold = { id: api.nextId(), happenedAt: '2026-12-01T18:20:00Z' }
    const look = anObservation(api, bath.tank.code, { feeding: 'all' })
    await send(`/api/doses/${dose}/stop`, stop).expect(201)
    await send(`/api/doses/${dose}/stop`, stop).expect(201)
    expect(
      (await send(`/api/doses/${dose}/stop`, { ...stop, seen: 'two on their side' })).body,
    ).toMatchObject(refusal)
    await send(`/api/orders/${number}/holds`, hold).expect(201)
    const later = { ...hold, happenedAt: '2026-12-01T18:10:00Z' }
    expect((await send(`/api/orders/${number}/holds`, later)).body).toMatchObject(refusal)
    await send('/api/observations', look).expect(201)
    // the way it came is no part of it
    await send('/api/observations', { ...look, origin: 'outbox' }).expect(201)
    expect((await send('/api/observations', { ...look, words: 'one hides' })).body).toMatchObject(refusal)
  })

  it('may be mended under its id while it was refused', async () => {
    const number = await house.signedBath(bath)
    const id = api.nextId()
    await house.record(number, { id, amount: { value: '0', unit: 'mL' } }).expect(422)
    await house.record(number, { id, happenedAt: '2026-12-01T18:26:00Z' }).expect(422)
    await house.record(number, { id }).expect(201)
  })
})
