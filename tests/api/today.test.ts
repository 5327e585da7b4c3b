import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { aCase, aFish, simpleProtocolId } from '../builders/a-case.ts'
import { aGroup, aPlace, aTaxon } from '../builders/a-collection.ts'
import { anObservation } from '../builders/an-observation.ts'
import { anEnclosure, aTankAndSumpSheet } from '../builders/a-water.ts'
import { anAcquisition, aParty, aPermit, newLine } from '../builders/a-register.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'
import { worklistOf } from '../support/worklist.ts'

let api: TestApi
let second: TestPerson
let worklist: ReturnType<typeof worklistOf>
beforeAll(async () => {
  api = await startApi()
  worklist = worklistOf(api)
  second = await api.person({
    email: 'tech2@harrow-point.example',
    printedName: 'Second technician',
    roles: ['technician'],
  })
})
beforeEach(() => api.clock.set(testDay))
afterAll(() => api.stop())

describe('quarantine on the worklist', () => {
  it('wants a look every day, shows when the last was, and is late when a day went by without', async () => {
    const one = await aCase(api, { at: '2026-11-30T14:00:00Z' })
    const look = async (happenedAt: string) => {
      api.clock.set(new Date(happenedAt))
      await (
        await api.as('keeper')
      ).agent
        .post('/api/observations')
        .send(anObservation(api, one.enclosure.code, { happenedAt, lookedAt: true, feeding: 'all' }))
        .expect(201)
    }
    const item = async (at: string) => {
      api.clock.set(new Date(at))
      return (await worklist.itemsOf('keeper', 'observation', one.number))[0]
    }
    await look('2026-11-30T15:00:00Z')
    expect(await item('2026-12-01T18:20:00Z')).toMatchObject({
      state: 'due',
      dueOn: '2026-12-01',
      params: { lastAt: '2026-11-30T15:00:00.000Z', lastBy: 'Test keeper', enclosure: one.enclosure.code },
    })
    expect(await worklist.rolesThatSee('observation', one.number)).toEqual([
      'veterinarian',
      'technician',
      'keeper',
    ])
    await look('2026-12-01T18:30:00Z')
    expect(await item('2026-12-01T18:40:00Z')).toMatchObject({
      state: 'done',
      at: '2026-12-01T18:30:00.000Z',
    })
    // The day turns at midnight of the facility, 04:00Z
    expect(await item('2026-12-02T03:59:00Z')).toMatchObject({ state: 'done' })
    expect(await item('2026-12-02T04:00:00Z')).toMatchObject({ state: 'due', dueOn: '2026-12-02' })
    expect(await item('2026-12-04T12:00:00Z')).toMatchObject({ state: 'late', latestOn: '2026-12-02' })
  })

  it('lists samples in their windows and clearance when nothing stands against it', async () => {
    const one = await aCase(api, { at: '2026-10-20T14:00:00Z' })
    const samples = await worklist.itemsOf('technician', 'sample', one.number)
    expect(samples.length).toBeGreaterThan(0)
    for (const item of samples) expect(item).toMatchObject({ state: 'late' })
    const steps = (await (await api.as('technician')).agent.get(one.url).expect(200)).body.legs.at(-1)
      .steps as {
      key: string
      kind: string
      untilOn: string
    }[]
    const first = steps.find(({ kind }) => kind === 'sample')
    expect(samples.map((item) => [item.params['key'], item.latestOn])).toContainEqual([
      first?.key,
      first?.untilOn,
    ])
    await (
      await api.as('technician')
    ).agent
      .post(`${one.url}/steps`)
      .send({ id: api.nextId(), happenedAt: '2026-12-01T18:00:00Z', stepKey: first?.key, outcome: 'done' })
      .expect(201)
    const after = await worklist.itemsOf('technician', 'sample', one.number)
    expect(after.find((item) => item.params['key'] === first?.key)).toMatchObject({
      state: 'done',
      params: { by: 'Test technician' },
    })
    const board = (await (await api.as('veterinarian')).agent.get('/api/cases?view=ready').expect(200)).body
      .rows as { number: string }[]
    const ready = (await worklist.itemsOf('veterinarian', 'case-ready')).map((item) => item.params['case'])
    expect(ready.sort()).toEqual(board.map(({ number }) => number).sort())
  })

  it('shows a held case to the veterinarian, and one whose batch is still coming in to who opened it', async () => {
    const one = await aCase(api, { close: false })
    expect(await worklist.rolesThatSee('case-to-close', one.number)).toEqual(['veterinarian', 'technician'])
    expect(await worklist.itemsOf('keeper', 'observation', one.number)).toMatchObject([{ state: 'due' }])
    await (
      await api.as('keeper')
    ).agent
      .post(`${one.url}/holds`)
      .send({ id: api.nextId(), happenedAt: '2026-12-01T18:00:00Z', origin: 'online', device: 'test' })
      .expect(201)
    expect(await worklist.rolesThatSee('case-held', one.number)).toEqual(['veterinarian'])
  })

  it('names who came into quarantine and belongs to no case, until a case takes them', async () => {
    const enclosure = await anEnclosure(api, 'W-OUT', { boundary: 'Wing' })
    const given = { taxonId: await aFish(api), enclosureId: enclosure.id, count: 3 }
    const outside = await aGroup(api, { ...given, happenedAt: '2026-11-30T14:00:00Z' })
    const { accession } = outside
    expect(await worklist.rolesThatSee('outside-case', accession)).toEqual(['veterinarian', 'technician'])
    const { agent } = await api.as('technician')
    await agent
      .post('/api/cases')
      .send({
        id: api.nextId(),
        protocolVersionId: simpleProtocolId,
        members: [{ id: api.nextId(), accession, happenedAt: '2026-11-30T14:00:00Z' }],
        happenedAt: '2026-11-30T14:00:00Z',
      })
      .expect(201)
    expect(await worklist.itemsOf('technician', 'outside-case', accession)).toEqual([])
  })

  it('shows an urgent call to everybody who may answer it until somebody has seen it', async () => {
    const one = await aCase(api)
    const noticeId = api.nextId()
    await (
      await api.as('keeper')
    ).agent
      .post('/api/observations')
      .send(
        anObservation(api, one.enclosure.code, { noticeId, urgent: true, words: 'Two lie on the floor.' }),
      )
      .expect(201)
    expect(await worklist.rolesThatSee('urgent-call', noticeId)).toEqual([
      'veterinarian',
      'technician',
      'keeper',
      'registrar',
    ])
    const { items } = await worklist.todayOf('registrar')
    expect(items[0]).toMatchObject({
      kind: 'urgent-call',
      state: 'late',
      params: { words: 'Two lie on the floor.', fate: 'sending', by: 'Test keeper' },
      // somebody who can see to it has to say that they do
      acts: [],
    })
    const technicians = (await worklist.todayOf('technician')).items.find(({ id }) => id === items[0]?.id)
    expect(technicians?.acts).toEqual(['mark-seen'])
    await (
      await api.as('technician')
    ).agent
      .post(`/api/notices/${noticeId}/seen`)
      .send({ id: api.nextId() })
      .expect(201)
    expect(await worklist.rolesThatSee('urgent-call', noticeId)).toEqual([])
  })

  it('keeps what was marked for the veterinarian until one has read it', async () => {
    const one = await aCase(api)
    const id = api.nextId()
    await (
      await api.as('registrar')
    ).agent
      .post('/api/observations')
      .send(anObservation(api, one.enclosure.code, { id, forVeterinarian: true, words: 'One hides.' }))
      .expect(201)
    expect(await worklist.rolesThatSee('observation-flagged', id)).toEqual(['veterinarian'])
    expect((await worklist.itemsOf('veterinarian', 'observation-flagged', id))[0]?.acts).toEqual([
      'mark-read',
    ])
    await (
      await api.as('veterinarian')
    ).agent
      .post(`/api/observations/${id}/reviews`)
      .send({ id: api.nextId() })
      .expect(201)
    expect(await worklist.itemsOf('veterinarian', 'observation-flagged', id)).toEqual([])
    expect((await worklist.todayOf('keeper')).log.some((line) => line.params['words'] === 'One hides.')).toBe(
      true,
    )
  })
})

describe('water on the worklist', () => {
  it('asks another person to confirm a volume', async () => {
    const tank = await anEnclosure(api, 'KH-9')
    const id = api.nextId()
    await (
      await api.as('technician')
    ).agent
      .post('/api/enclosures/KH-9/volumes')
      .send({
        id,
        happenedAt: '2026-11-30T14:00:00Z',
        waterBodyIds: [tank.waterBodyId],
        sheet: { ...aTankAndSumpSheet, parts: aTankAndSumpSheet.parts.slice(0, 1) },
      })
      .expect(201)
    expect(await worklist.itemsOf('technician', 'volume-to-confirm', 'KH-9')).toEqual([])
    expect(await worklist.itemsOf(second, 'volume-to-confirm', 'KH-9')).toMatchObject([
      { state: 'waiting', params: { by: 'Test technician' } },
    ])
    expect(await worklist.rolesThatSee('volume-to-confirm', 'KH-9')).toEqual(['veterinarian'])
    await second.agent
      .post(`/api/volumes/${id}/confirmation`)
      .set('Idempotency-Key', newKey())
      .send({})
      .expect(200)
    expect(await worklist.itemsOf('veterinarian', 'volume-to-confirm', 'KH-9')).toEqual([])
  })
})

describe('the registrar’s worklist', () => {
  it('names what does not fit, transactions without papers and permits that end', async () => {
    const taxonId = await aTaxon(api, {
      scientificName: 'Chromis registrata',
      commonName: 'Kept chromis',
      group: 'teleost',
    })
    const tank = await aPlace(api)
    const school = await aGroup(api, { taxonId, enclosureId: tank.id, count: 2 })
    await (
      await api.as('keeper')
    ).agent
      .post(`/api/animals/${school.accession}/deaths`)
      .send({ id: api.nextId(), kind: 'found-dead', count: 3, happenedAt: '2026-12-01T18:00:00Z' })
      .expect(201)
    expect(await worklist.rolesThatSee('discrepancy-registrar', school.accession)).toEqual(['registrar'])

    const { number } = await anAcquisition(api, {
      counterpartyId: await aParty(api, 'Norrell Reef Lab'),
      lines: [newLine(api, { taxonId, enclosureId: tank.id, count: 4 })],
    })
    expect(await worklist.rolesThatSee('transaction-papers', number)).toEqual(['registrar'])
    expect((await worklist.itemsOf('registrar', 'transaction-papers', number))[0]?.params).toMatchObject({
      party: 'Norrell Reef Lab',
      way: 'in',
    })
    const permit = await aPermit(api, { taxonIds: [taxonId], validUntil: '2026-12-20' })
    expect(await worklist.rolesThatSee('permit-runs-out', permit.number)).toEqual(['registrar'])
    expect((await worklist.itemsOf('registrar', 'permit-runs-out', permit.number))[0]).toMatchObject({
      latestOn: '2026-12-20',
      params: { days: 19 },
    })
  })
})

describe('people on the worklist', () => {
  it('names veterinarians without a licence, accounts never used and settings nobody confirmed', async () => {
    const vet2 = await api.person({
      email: 'vet2@harrow-point.example',
      printedName: 'Dr Second',
      roles: ['veterinarian'],
    })
    expect(await worklist.rolesThatSee('account-without-licence', 'Dr Second')).toEqual(['administrator'])
    // who has a licence is not named
    expect(await worklist.itemsOf('administrator', 'account-without-licence', 'Test veterinarian')).toEqual(
      [],
    )
    expect((await worklist.itemsOf(vet2, 'own-licence'))[0]).toMatchObject({ state: 'waiting', params: {} })
    expect(await worklist.itemsOf('veterinarian', 'own-licence')).toEqual([])
    await (
      await api.as('administrator')
    ).agent
      .post('/api/people')
      .send({
        id: api.nextId(),
        email: 'new@harrow-point.example',
        printedName: 'Newly Entered',
        roles: ['keeper'],
      })
      .expect(201)
    expect(await worklist.rolesThatSee('account-without-sign-in', 'Newly Entered')).toEqual(['administrator'])
    expect(await worklist.itemsOf('administrator', 'account-without-sign-in', 'Dr Second')).toEqual([])
    expect(await worklist.itemsOf('administrator', 'settings-default')).toMatchObject([{ state: 'waiting' }])
    const { items, log } = await worklist.todayOf('administrator')
    expect(new Set(items.map(({ kind }) => kind))).toEqual(
      new Set(['account-without-licence', 'account-without-sign-in', 'settings-default']),
    )
    expect(log).toEqual([])
  })

  it('gives somebody with several roles the work of all of them', async () => {
    const both = await api.person({
      email: 'both@harrow-point.example',
      printedName: 'Both',
      roles: ['keeper', 'registrar'],
    })
    const kinds = new Set((await worklist.todayOf(both)).items.map(({ kind }) => kind))
    for (const kind of ['observation', 'discrepancy-registrar', 'transaction-papers'] as const)
      expect([...kinds]).toContain(kind)
    expect([...kinds]).not.toContain('volume-to-confirm')
  })
})
