import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aCase, aFish } from '../builders/a-case.ts'
import { aGroup, aTaxon, anAnimal } from '../builders/a-collection.ts'
import { aParty, anAcquisition } from '../builders/a-register.ts'
import { anEnclosure, aValve } from '../builders/a-water.ts'
import { newKey, password, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
beforeAll(async () => void (api = await startApi()))
afterAll(() => api.stop())

// The fixed day of the tests is 2026-12-01 in Halifax, where days begin at 04:00 UTC.

describe('the clock of a case', () => {
  it('restarts when an animal is put into its water, without anybody reporting it, and not when it is struck out', async () => {
    const one = await aCase(api)
    const ray = await aTaxon(api, {
      scientificName: 'Rhinoptera addita',
      commonName: 'Cownose ray',
      group: 'elasmobranch',
    })
    const elsewhere = await anEnclosure(api, 'ELSE-1', { boundary: 'Wing' })
    const added = await anAnimal(api, {
      taxonId: ray,
      enclosureId: elsewhere.id,
      happenedAt: '2026-11-15T14:00:00Z',
    })
    const { agent } = await api.as('keeper')
    expect((await agent.get(one.url)).body.day0On).toBe('2026-11-10')
    const move = {
      id: api.nextId(),
      fromEnclosureId: elsewhere.id,
      toEnclosureId: one.enclosure.id,
      happenedAt: '2026-11-20T14:00:00Z',
    }
    await agent.post(`${added.url}/moves`).send(move).expect(201)
    const { body } = await agent.get(one.url).expect(200)
    expect(body).toMatchObject({ day0On: '2026-11-20', dayNumber: 11, earliestClearanceOn: '2026-12-20' })
    expect(body.legs).toHaveLength(2)
    expect(body.legs[0]).toMatchObject({ day0On: '2026-11-10', endedOn: '2026-11-20', daysRun: 10 })
    expect(body.legs[0].endReason).toMatchObject({
      code: 'restarted-animals',
      params: { animalName: 'cownose ray', animalCount: 1, water: 'same-water' },
    })
    await agent
      .post(`${added.url}/moves/${move.id}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'It was another tank' })
      .expect(200)
    expect((await agent.get(one.url)).body).toMatchObject({ day0On: '2026-11-10', legs: [{ endedOn: null }] })
  })

  it('restarts when animals are accessioned into a group of its batch', async () => {
    const one = await aCase(api, { at: '2026-11-10T14:00:00Z' })
    const counterpartyId = await aParty(api, 'Ledder Bay Marsh Trust')
    await anAcquisition(api, {
      kind: 'loan-in',
      on: '2026-11-25',
      counterpartyId,
      lines: [{ record: 'existing', id: api.nextId(), animalId: one.animal.id, count: 4 }],
    })
    const { agent } = await api.as('veterinarian')
    const { body } = await agent.get(one.url).expect(200)
    expect(body).toMatchObject({ day0On: '2026-11-25', dayNumber: 6 })
  })

  it('restarts over an open valve, and not over a shut one', async () => {
    const one = await aCase(api)
    const open = await anEnclosure(api, 'VO-1', { boundary: 'Wing' })
    const shut = await anEnclosure(api, 'VS-1', { boundary: 'Wing' })
    await aValve(api, 'V-OPEN', [one.enclosure.waterBodyId, open.waterBodyId])
    await aValve(api, 'V-SHUT', [one.enclosure.waterBodyId, shut.waterBodyId], false)
    const taxonId = await aFish(api)
    await aGroup(api, { taxonId, enclosureId: shut.id, count: 2, happenedAt: '2026-11-18T14:00:00Z' })
    const { agent } = await api.as('keeper')
    expect((await agent.get(one.url)).body.day0On).toBe('2026-11-10')
    await aGroup(api, { taxonId, enclosureId: open.id, count: 2, happenedAt: '2026-11-22T14:00:00Z' })
    const { body } = await agent.get(one.url)
    expect(body.day0On).toBe('2026-11-22')
    expect(body.reasons.at(-1)).toMatchObject({
      code: 'restarted-animals',
      params: { water: 'connected-water', animalCount: 2 },
    })
  })

  it('takes a part of its own group along, and is not restarted by it', async () => {
    const one = await aCase(api)
    const { agent } = await api.as('technician')
    await agent
      .post(`/api/animals/${one.animal.accession}/splits`)
      .send({
        id: api.nextId(),
        form: 'individual',
        count: 1,
        toEnclosureId: one.enclosure.id,
        happenedAt: '2026-11-20T14:00:00Z',
      })
      .expect(201)
    const { body } = await agent.get(one.url)
    expect(body).toMatchObject({ day0On: '2026-11-10', animals: { low: 8, high: 8 }, members: 2 })
    expect(body.batch.map((row: { fromSplit: boolean }) => row.fromSplit).sort()).toEqual([false, true])
  })

  it('is extended by an unexplained death, and no longer once a veterinarian signs its cause', async () => {
    const one = await aCase(api, { at: '2026-10-25T14:00:00Z' })
    const keeper = await api.as('keeper')
    const death = { id: api.nextId(), kind: 'found-dead', count: 1, happenedAt: '2026-11-20T14:00:00Z' }
    await keeper.agent.post(`/api/animals/${one.animal.accession}/deaths`).send(death).expect(201)
    const extended = await keeper.agent.get(one.url)
    expect(extended.body).toMatchObject({
      day0On: '2026-10-25',
      earliestClearanceOn: '2026-12-04',
      extensions: [{ kind: 'death', untilOn: '2026-12-04', state: 'standing' }],
      deaths: [{ eventId: death.id, finding: 'unexplained', cause: null, accession: one.animal.accession }],
      animals: { low: 7, high: 7 },
    })
    const vet = await api.as('veterinarian')
    const sign = (agent: typeof vet.agent, typed: string) =>
      agent.post(`${one.url}/deaths/${death.id}/cause`).set('Idempotency-Key', newKey()).send({
        finding: 'explained-not-transmissible',
        cause: 'caught in the outflow screen',
        password: typed,
      })
    expect((await sign(keeper.agent, password)).status).toBe(403)
    expect((await sign(vet.agent, 'wrong')).body.code).toBe('password-wrong')
    const signed = await sign(vet.agent, password)
    expect(signed.status).toBe(200)
    expect(signed.body).toMatchObject({
      earliestClearanceOn: '2026-11-24',
      extensions: [{ state: 'withdrawn' }],
      deaths: [{ finding: 'explained-not-transmissible', signature: { state: 'intact' } }],
    })
    const codes = signed.body.reasons.map((reason: { code: string }) => reason.code)
    expect(codes).toContain('extended-death')
    expect(codes).toContain('death-explained')
    // Whoever reads no charts sees the case and its clock without the words of the chart
    const admin = await api.as('administrator')
    for (const url of [one.url, '/api/cases']) {
      const shown = await admin.agent.get(url).expect(200)
      expect(JSON.stringify(shown.body)).not.toContain('outflow screen')
      expect(JSON.stringify(shown.body)).toContain('not shown to you')
    }

    // What a veterinarian signed a cause for is struck out by nobody before the signature is
    const strike = (agent: typeof vet.agent) =>
      agent
        .post(`/api/animals/${one.animal.accession}/deaths/${death.id}/void`)
        .set('Idempotency-Key', newKey())
        .send({ reason: 'It was in another tank' })
    for (const { agent } of [keeper, vet]) {
      const refused = await strike(agent)
      expect([refused.status, refused.body.code]).toEqual([409, 'cause-signed'])
      expect(refused.body.detail).toContain(one.number)
    }
    const events = (await vet.agent.get(one.url)).body.events as { id: string; kind: string }[]
    const signature = events.find(({ kind }) => kind === 'death-cause-signed')
    await vet.agent
      .post(`${one.url}/decisions`)
      .send({
        id: api.nextId(),
        happenedAt: '2026-12-01T14:00:00Z',
        reason: 'The body was from another tank',
        decision: { kind: 'voided', voidsEventId: signature?.id },
      })
      .expect(201)
    expect((await strike(vet.agent)).status).toBe(200)
    expect((await vet.agent.get(one.url)).body).toMatchObject({ deaths: [], animals: { low: 8, high: 8 } })
  })

  it('stands still for true time of a fault, rounded up once', async () => {
    const one = await aCase(api)
    const { agent } = await api.as('technician')
    const pause = api.nextId()
    await agent
      .post(`${one.url}/events`)
      .send({
        id: pause,
        happenedAt: '2026-11-20T14:00:00Z',
        event: { kind: 'pause-started', cause: 'life-support-failure' },
      })
      .expect(201)
    const running = await agent.get(one.url)
    expect(running.body.runningPauses).toMatchObject([{ pauseId: pause }])
    const early = await agent.post(`${one.url}/events`).send({
      id: api.nextId(),
      happenedAt: '2026-11-20T13:00:00Z',
      event: { kind: 'pause-ended', pauseId: pause },
    })
    expect([early.status, early.body.code]).toEqual([422, 'period-reversed'])
    const { body } = await agent
      .post(`${one.url}/events`)
      .send({
        id: api.nextId(),
        happenedAt: '2026-11-22T14:01:00Z',
        event: { kind: 'pause-ended', pauseId: pause },
      })
      .expect(201)
    expect(body).toMatchObject({ pausedDays: 3, earliestClearanceOn: '2026-12-13' })
  })

  it('is one clock on one water, and none is cleared while another there is locked', async () => {
    const early = await aCase(api, { at: '2026-10-20T14:00:00Z' })
    const late = await aCase(api, { at: '2026-11-12T14:00:00Z' })
    const valve = await aValve(
      api,
      'V-JOIN',
      [early.enclosure.waterBodyId, late.enclosure.waterBodyId],
      false,
    )
    const keeper = await api.as('keeper')
    await api.composition.water.services.map.recordConnectionState(
      {
        actor: { personId: keeper.id, printedName: keeper.printedName, roles: ['keeper'] },
        requestId: 'test',
      },
      valve,
      { id: api.nextId(), open: true, happenedAt: '2026-11-14T14:00:00Z', note: null },
    )
    const joined = await keeper.agent.get(early.url)
    expect(joined.body).toMatchObject({
      day0On: '2026-11-12',
      earliestClearanceOn: '2026-12-12',
      sharesWaterWith: [late.number],
    })
    const vet = await api.as('veterinarian')
    await vet.agent
      .post(`${late.url}/locks`)
      .send({
        id: api.nextId(),
        happenedAt: '2026-11-30T14:00:00Z',
        cause: 'notifiable-suspicion',
        reason: 'Ulcers on three',
      })
      .expect(201)
    const locked = await keeper.agent.get(early.url)
    expect(locked.body.status).toBe('locked')
    expect(locked.body.locks).toMatchObject([{ cause: 'notifiable-suspicion', fromCase: late.number }])
    const partner = await keeper.agent.get(`/api/animals/${early.animal.accession}`)
    expect(partner.body.lock).toBe('all')
  })

  it('counts negatives by the day taken, and a listed positive locks it', async () => {
    const one = await aCase(api, { at: '2026-11-01T14:00:00Z' })
    const { agent } = await api.as('technician')
    const result = (change: object) =>
      agent.post(`${one.url}/results`).send({
        id: api.nextId(),
        happenedAt: '2026-11-16T14:00:00Z',
        takenAt: '2026-11-15T14:00:00Z',
        testKey: 'wet-mount',
        result: 'negative',
        ...change,
      })
    const first = await result({})
    expect(first.body.criteria).toMatchObject([{ count: 1, wanted: 2, earliestSampleOn: '2026-11-29' }])
    const backwards = await result({ takenAt: '2026-11-17T14:00:00Z' })
    expect([backwards.status, backwards.body.code]).toEqual([422, 'period-reversed'])
    expect((await result({ testKey: 'guess' })).status).toBe(422)
    expect((await result({ result: 'positive' })).status).toBe(422)
    const second = await result({ takenAt: '2026-11-29T14:00:00Z', happenedAt: '2026-11-30T14:00:00Z' })
    expect(second.body.criteria).toMatchObject([{ met: true, metOn: '2026-11-29' }])
    expect(second.body).toMatchObject({ earliestClearanceOn: '2026-12-01', readyToClear: true, unmet: [] })
    const positive = await result({
      takenAt: '2026-11-30T14:00:00Z',
      happenedAt: '2026-12-01T14:00:00Z',
      result: 'positive',
      pathogenName: 'a listed virus',
      pathogenStatus: 'listed',
    })
    expect(positive.body).toMatchObject({
      status: 'locked',
      earliestClearanceOn: null,
      criteria: [{ met: false, count: 0 }],
    })
  })

  it('forgets what is voided, and shows that it was', async () => {
    const one = await aCase(api)
    const { agent } = await api.as('technician')
    const event = {
      id: api.nextId(),
      happenedAt: '2026-11-25T14:00:00Z',
      event: { kind: 'addition', what: 'wet-material', into: 'same-water' },
    }
    expect((await agent.post(`${one.url}/events`).send(event)).body.day0On).toBe('2026-11-25')
    const vet = await api.as('veterinarian')
    const decision = (id: string) =>
      vet.agent.post(`${one.url}/decisions`).send({
        id,
        happenedAt: '2026-11-26T14:00:00Z',
        reason: 'The rock went to another system',
        decision: { kind: 'voided', voidsEventId: event.id },
      })
    const voided = await decision(api.nextId())
    expect(voided.body.day0On).toBe('2026-11-10')
    expect(voided.body.events.find((row: { id: string }) => row.id === event.id)).toMatchObject({
      voidedReason: 'The rock went to another system',
    })
    expect((await decision(api.nextId())).body.code).toBe('already-void')
  })
})
