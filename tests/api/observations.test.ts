import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aCase, aFish } from '../builders/a-case.ts'
import { aGroup, anAnimal } from '../builders/a-collection.ts'
import { anEnclosure } from '../builders/a-water.ts'
import { anObservation } from '../builders/an-observation.ts'
import type { ObservationBody } from '../builders/an-observation.ts'
import { newKey, startApi } from '../support/api.ts'
import { worklistOf } from '../support/worklist.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
beforeAll(async () => void (api = await startApi()))
afterAll(() => api.stop())

const send = async (body: ObservationBody, role: 'keeper' | 'registrar' | 'administrator' = 'keeper') =>
  (await api.as(role)).agent.post('/api/observations').send(body)

const rowsOf = (sql: string, ...values: unknown[]): Promise<Record<string, unknown>[]> =>
  api.composition.parts.dataSource.query(sql, values)

describe('an observation', () => {
  it('belongs to the case whose batch is there, and counts as the look of its day', async () => {
    const one = await aCase(api)
    const reply = await send(
      anObservation(api, one.enclosure.code, { lookedAt: true, feeding: 'some', words: 'two hang back' }),
    )
    expect(reply.status).toBe(201)
    expect(reply.body).toMatchObject({
      enclosure: one.enclosure.code,
      cases: [one.number],
      feeding: 'some',
      breathing: null,
      count: null,
      foundDead: null,
      happenedOn: '2026-12-01',
      recordedBy: 'Test keeper',
      notice: null,
      timeDoubtful: false,
    })
    const { agent } = await api.as('keeper')
    const shown = await agent.get(one.url)
    const look = shown.body.legs[0].steps.find((step: { key: string }) => step.key === 'observe')
    expect(look).toMatchObject({ state: 'done', daily: { doneDays: 1, passedDays: 22 } })
    const log = await agent.get(`/api/observations?case=${one.number}`).expect(200)
    expect(log.body.rows.map((row: { id: string }) => row.id)).toEqual([reply.body.id])
    const admin = await api.as('administrator')
    const trail = await admin.agent.get(`/api/audit?q=observation.record&limit=1`).expect(200)
    expect(trail.body.rows[0]).toMatchObject({ subjectLabel: one.enclosure.code, withheld: true })
  })

  it('sent twice is kept once; the same id with other content is refused', async () => {
    const one = await aCase(api)
    const body = anObservation(api, one.enclosure.code, { foundDead: 1, origin: 'outbox' })
    const both = await Promise.all([send(body), send(body)])
    expect(both.map(({ status }) => status)).toEqual([201, 201])
    expect((await send(body)).status).toBe(201)
    const [{ n } = {}] = await rowsOf(`SELECT count(*)::int AS n FROM observations WHERE id = $1`, body.id)
    expect(n).toBe(1)
    const { agent } = await api.as('keeper')
    expect((await agent.get(one.url)).body.animals).toEqual({ low: 7, high: 7 })
    const other = await send({ ...body, foundDead: 2 })
    expect([other.status, other.body.code]).toEqual([409, 'id-already-used'])
  })

  it('keeps the dead of an animal that is elsewhere, and a registrar explains where it was', async () => {
    const one = await aCase(api)
    const other = await aCase(api)
    const deathId = api.nextId()
    const reply = await send(
      anObservation(api, other.enclosure.code, {
        foundDead: 1,
        deaths: [{ id: deathId, accession: one.animal.accession, count: 1 }],
      }),
    )
    expect([reply.status, reply.body.foundDead, reply.body.unassignedDead]).toEqual([201, 1, 0])
    const { agent } = await api.as('registrar')
    const chart = await agent.get(`/api/animals/${one.animal.accession}`).expect(200)
    expect(chart.body.discrepancies).toMatchObject([
      {
        kind: 'died-elsewhere',
        forRole: 'registrar',
        facts: { seen: 1, enclosure: other.enclosure.code, place: one.enclosure.code },
      },
    ])
    const there = await agent.get(`/api/animals/${other.animal.accession}`).expect(200)
    expect(there.body.discrepancies).toEqual([])
  })

  it('posts the dead to the ledger, keeps three where two are held, and opens a discrepancy', async () => {
    const one = await aCase(api, { count: 2, at: '2026-11-25T14:00:00Z' })
    const deathId = api.nextId()
    const reply = await send(
      anObservation(api, one.enclosure.code, {
        foundDead: 3,
        deaths: [{ id: deathId, accession: one.animal.accession, count: 3 }],
      }),
    )
    expect([reply.status, reply.body.foundDead, reply.body.unassignedDead]).toEqual([201, 3, 0])
    const { agent } = await api.as('keeper')
    const counts = await agent.get(`/api/animals/${one.animal.accession}/counts`).expect(200)
    expect(counts.body.deaths).toMatchObject([{ id: deathId, seenCount: 3, postedCount: 2, excessCount: 1 }])
    expect(counts.body.lines[0]).toMatchObject({ balance: 0 })
    const shown = await agent.get(one.url)
    expect(shown.body).toMatchObject({
      animals: { low: 0, high: 0 },
      openDiscrepancies: 1,
      extensions: [{ kind: 'death', untilOn: '2026-12-15', state: 'standing' }],
    })
  })

  it('keeps bodies that nobody could name, and the clock waits for them all the same', async () => {
    const enclosure = await anEnclosure(api, 'OB-RAYS', { boundary: 'Wing' })
    const taxonId = await aFish(api)
    const at = '2026-11-10T14:00:00Z'
    const one = await aCase(api, { at, count: 3, enclosure, taxonId })
    const second = await anAnimal(api, { taxonId, enclosureId: enclosure.id, happenedAt: at })
    const tech = await api.as('technician')
    await tech.agent
      .post(`${one.url}/members`)
      .send({ id: api.nextId(), accession: second.accession, happenedAt: at })
      .expect(201)
    const reply = await send(anObservation(api, enclosure.code, { foundDead: 2 }))
    expect(reply.body).toMatchObject({ foundDead: 2, unassignedDead: 2 })
    const { body } = await tech.agent.get(one.url)
    expect(body.animals).toEqual({ low: 4, high: 4 })
    expect(body.deaths).toMatchObject([{ count: 2, accession: null, finding: 'unexplained' }])
    expect(body.earliestClearanceOn).toBe('2026-12-15')
    const named = await (
      await api.as('veterinarian')
    ).agent
      .post(`/api/observations/${String(reply.body.id)}/bodies`)
      .send({
        id: api.nextId(),
        deaths: [{ id: api.nextId(), accession: one.animal.accession, count: 1 }],
        reason: 'the other was too old to tell',
      })
    expect(named.status).toBe(201)
    const after = (await tech.agent.get(one.url)).body
    expect(after.animals).toEqual({ low: 3, high: 3 })
    expect(
      after.deaths.map((row: { count: number; accession: string }) => [row.count, row.accession]),
    ).toEqual(
      expect.arrayContaining([
        [1, one.animal.accession],
        [1, null],
      ]),
    )
    expect(after.deaths).toHaveLength(2)
  })

  it('asks on the worklist whose bodies outside quarantine were, and takes the answer into the ledgers once', async () => {
    const enclosure = await anEnclosure(api, 'OB-HALL')
    const taxonId = await aFish(api)
    const place = { taxonId, enclosureId: enclosure.id }
    const school = await aGroup(api, { ...place, count: 6 })
    const other = await aGroup(api, { ...place, count: 4 })
    const worklist = worklistOf(api)
    const seen = await send(anObservation(api, enclosure.code, { foundDead: 3 }))
    expect(seen.body).toMatchObject({ unassignedDead: 3, bodiesToName: 3, bodies: null, cases: [] })
    const id = seen.body.id as string
    expect(await worklist.rolesThatSee('bodies-veterinarian', id)).toEqual(['veterinarian'])
    expect(await worklist.rolesThatSee('bodies-registrar', id)).toEqual(['registrar'])

    const name = async (role: 'keeper' | 'registrar', body: object) =>
      (await api.as(role)).agent.post(`/api/observations/${id}/bodies`).send({ id: api.nextId(), ...body })
    const death = (accession: string, count: number) => ({ id: api.nextId(), accession, count })
    expect((await name('keeper', { deaths: [death(school.accession, 3)] })).status).toBe(403)
    expect((await name('registrar', { deaths: [death(school.accession, 4)] })).body.errors[0].pointer).toBe(
      '/deaths',
    )
    expect((await name('registrar', { deaths: [death('A-9999', 3)] })).body.errors[0].pointer).toBe(
      '/deaths/0/accession',
    )
    expect((await name('registrar', { deaths: [] })).body.code).toBe('reason-needed')
    const answer = {
      id: api.nextId(),
      deaths: [death(school.accession, 1), death(other.accession, 1)],
      reason: 'one was eaten down to the spine',
    }
    for (let i = 0; i < 2; i++) {
      const named = await name('registrar', answer)
      expect([named.status, named.body.bodiesToName]).toEqual([201, 0])
      expect(named.body.bodies).toMatchObject({ named: 2, reason: answer.reason, by: 'Test registrar' })
    }
    expect((await name('registrar', { ...answer, id: api.nextId() })).body.code).toBe('already-explained')
    const { agent } = await api.as('keeper')
    const counts = await agent.get(`${school.url}/counts`)
    expect(counts.body.deaths).toMatchObject([{ seenCount: 1, place: { code: 'OB-HALL' } }])
    expect((await agent.get(other.url)).body.count.ledger).toBe(3)
    expect(await worklist.rolesThatSee('bodies-registrar', id)).toEqual([])
  })

  it('counts a group, says when the count differs, and never takes "not counted" for a number', async () => {
    const one = await aCase(api, { count: 40 })
    await send(anObservation(api, one.enclosure.code, { count: { basis: 'not-counted' } }))
    const { agent } = await api.as('keeper')
    const before = await agent.get(`/api/animals/${one.animal.accession}`)
    expect(before.body).toMatchObject({ count: { basis: 'counted', ledger: 40 }, openDiscrepancies: 0 })
    await send(anObservation(api, one.enclosure.code, { count: { basis: 'estimated', low: 30, high: 45 } }))
    expect((await agent.get(one.url)).body.animals).toEqual({ low: 30, high: 45 })
    await send(
      anObservation(api, one.enclosure.code, {
        happenedAt: '2026-12-01T18:10:00Z',
        count: { basis: 'counted', low: 39, high: 39 },
      }),
    )
    const after = await agent.get(`/api/animals/${one.animal.accession}`)
    expect(after.body.openDiscrepancies).toBe(1)
  })

  it('from a phone whose clock runs ahead is kept, marked and taken at its receipt; online it is refused', async () => {
    const one = await aCase(api)
    const ahead = { happenedAt: '2026-12-01T20:00:00Z', feeding: 'all' } as const
    const online = await send(anObservation(api, one.enclosure.code, ahead))
    expect([online.status, online.body.code]).toEqual([422, 'in-the-future'])
    expect(online.body.errors[0].pointer).toBe('/happenedAt')
    const body = anObservation(api, one.enclosure.code, { ...ahead, origin: 'outbox', foundDead: 1 })
    const kept = await send(body)
    expect(kept.body).toMatchObject({
      timeDoubtful: true,
      saidAt: '2026-12-01T20:00:00.000Z',
      happenedAt: '2026-12-01T18:20:00.000Z',
    })
    expect((await send(body)).status).toBe(201)
    const little = await send(
      anObservation(api, one.enclosure.code, { happenedAt: '2026-12-01T18:24:00Z', feeding: 'all' }),
    )
    expect(little.body).toMatchObject({ timeDoubtful: false, happenedAt: '2026-12-01T18:20:00.000Z' })
  })

  it('kept on a phone for hours belongs to the case that ran then', async () => {
    const one = await aCase(api, { at: '2026-10-01T14:00:00Z' })
    const late = await send(
      anObservation(api, one.enclosure.code, {
        origin: 'outbox',
        happenedAt: '2026-11-28T09:00:00Z',
        feeding: 'none',
      }),
    )
    expect(late.body).toMatchObject({ cases: [one.number], happenedOn: '2026-11-28', origin: 'outbox' })
    const before = await send(
      anObservation(api, one.enclosure.code, {
        origin: 'outbox',
        happenedAt: '2026-09-28T09:00:00Z',
        feeding: 'none',
      }),
    )
    expect(before.body.cases).toEqual([])
  })

  it('is refused for its shape only, and says how to put it right', async () => {
    const one = await aCase(api)
    const code = one.enclosure.code
    const faults: [Partial<ObservationBody>, number, string][] = [
      [{}, 422, 'nothing-said'],
      [{ urgent: true, foundDead: 1 }, 422, 'urgent-without-words'],
      [{ count: { basis: 'estimated', low: 9, high: 3 } }, 422, 'count-reversed'],
      [
        { foundDead: 1, deaths: [{ id: api.nextId(), accession: one.animal.accession, count: 2 }] },
        422,
        'more-named-than-found',
      ],
    ]
    for (const [said, status, refusal] of faults) {
      const reply = await send(anObservation(api, code, said))
      expect([reply.status, reply.body.errors[0].code]).toEqual([status, refusal])
    }
    const nowhere = await send(anObservation(api, 'NOWHERE', { feeding: 'all' }))
    expect([nowhere.status, nowhere.body.errors[0].pointer]).toEqual([422, '/enclosure'])
    const shape = await send(anObservation(api, code, { foundDead: -1, feeding: 'plenty' as never }))
    expect(shape.body.errors.map((error: { pointer: string }) => error.pointer)).toEqual([
      '/feeding',
      '/foundDead',
    ])
    const old = await send(anObservation(api, code, { schemaVersion: 999, feeding: 'all' }))
    expect([old.status, old.body.code]).toEqual([409, 'form-too-old'])
    const unknown = await send(
      anObservation(api, code, {
        foundDead: 1,
        deaths: [{ id: api.nextId(), accession: 'A-9999', count: 1 }],
      }),
    )
    expect(unknown.status).toBe(404)
    const { agent } = await api.as('keeper')
    expect((await agent.get(`/api/observations?case=${one.number}`)).body.total).toBe(0)
  })

  it('of a registrar is a flag in words, not a round', async () => {
    const one = await aCase(api)
    const code = one.enclosure.code
    const flag = await send(
      anObservation(api, code, { words: 'one floats', forVeterinarian: true }),
      'registrar',
    )
    expect(flag.status).toBe(201)
    const round = await send(
      anObservation(api, code, { words: 'one floats', forVeterinarian: true, foundDead: 1 }),
      'registrar',
    )
    expect([round.status, round.body.code]).toEqual([403, 'may-not'])
    expect((await send(anObservation(api, code, { words: 'hm' }), 'registrar')).status).toBe(403)
    expect((await send(anObservation(api, code, { feeding: 'all' }), 'administrator')).status).toBe(403)
  })

  it('marked for the veterinarian waits until a veterinarian has read it', async () => {
    const one = await aCase(api)
    const reply = await send(
      anObservation(api, one.enclosure.code, {
        signs: ['rubbing'],
        words: 'rubs its left side',
        forVeterinarian: true,
      }),
    )
    const { agent } = await api.as('keeper')
    const waiting = () => agent.get(`/api/observations?waiting=yes&case=${one.number}`)
    expect((await waiting()).body.total).toBe(1)
    expect((await agent.get(one.url)).body.forVeterinarian).toBe(1)
    const review = { id: api.nextId(), words: 'Scrape on Monday' }
    expect((await agent.post(`/api/observations/${reply.body.id}/reviews`).send(review)).status).toBe(403)
    const vet = await api.as('veterinarian')
    const read = await vet.agent.post(`/api/observations/${reply.body.id}/reviews`).send(review)
    expect(read.body.reviewed).toMatchObject({ by: 'Test veterinarian', words: 'Scrape on Monday' })
    await vet.agent.post(`/api/observations/${reply.body.id}/reviews`).send(review).expect(201)
    expect((await waiting()).body.total).toBe(0)
  })

  it('is struck out by whoever made it or a veterinarian, and stays readable', async () => {
    const one = await aCase(api)
    const made = await send(anObservation(api, one.enclosure.code, { feeding: 'none' }))
    const strike = (agent: Awaited<ReturnType<TestApi['as']>>['agent']) =>
      agent
        .post(`/api/observations/${made.body.id}/void`)
        .set('Idempotency-Key', newKey())
        .send({ reason: 'Wrong tank' })
    const tech = await api.as('technician')
    expect((await strike(tech.agent)).status).toBe(403)
    const keeper = await api.as('keeper')
    expect((await strike(keeper.agent)).body).toMatchObject({ voidedReason: 'Wrong tank', feeding: 'none' })
    expect((await strike(keeper.agent)).body.code).toBe('already-void')
    const look = (await keeper.agent.get(one.url)).body.legs[0].steps.find(
      (step: { key: string }) => step.key === 'observe',
    )
    expect(look.daily.doneDays).toBe(0)
  })

  it('has its place in the round, quarantine last', async () => {
    const display = await anEnclosure(api, 'AA-DISPLAY')
    await aGroup(api, { taxonId: await aFish(api), enclosureId: display.id, count: 5 })
    const one = await aCase(api)
    await send(anObservation(api, one.enclosure.code, { feeding: 'all' }))
    const { agent } = await api.as('keeper')
    const { body } = await agent.get('/api/rounds').expect(200)
    const places = body.rows.map((row: { enclosure: string }) => row.enclosure)
    expect(places.indexOf('AA-DISPLAY')).toBeLessThan(places.indexOf(one.enclosure.code))
    expect(body.rows[places.indexOf(one.enclosure.code)]).toMatchObject({
      cases: [{ number: one.number, dayNumber: 21, held: false }],
      animals: [{ accession: one.animal.accession, count: 8 }],
      looksToday: 1,
    })
  })
})
