import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aGroup, anAnimal, aPlace, aTaxon } from '../builders/a-collection.ts'
import type { TestPlace } from '../builders/a-collection.ts'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let taxonId: string
let tank: TestPlace
beforeAll(async () => {
  api = await startApi()
  tank = await aPlace(api)
  taxonId = await aTaxon(api, {
    scientificName: 'Spheniscus testensis',
    commonName: 'Test penguin',
    group: 'bird',
    band: ['2.2', '4.5', 'kg'],
  })
})
afterAll(() => api.stop())
const at = '2026-11-20T12:00:00Z'

describe('taxa', () => {
  it('are entered by the registrar, whose group decides the quarantine kind', async () => {
    const { agent } = await api.as('registrar')
    const id = api.nextId()
    const body = { id, scientificName: 'Octopus testensis', commonName: 'Test octopus', group: 'cephalopod' }
    const first = await agent.post('/api/taxa').send(body).expect(201)
    expect(first.body).toMatchObject({ quarantineKind: 'invertebrate', weightBands: [], version: 1 })
    await agent.post('/api/taxa').send(body).expect(201)
    const other = await agent
      .post('/api/taxa')
      .send({ ...body, commonName: 'Other octopus' })
      .expect(409)
    expect(other.body.code).toBe('id-already-used')
    const twice = await agent
      .post('/api/taxa')
      .send({ ...body, id: api.nextId(), scientificName: 'octopus TESTENSIS' })
      .expect(409)
    expect(twice.body.code).toBe('taxon-already-known')
    const { id: _, ...fields } = body
    await agent
      .put(`/api/taxa/${id}`)
      .send({ ...fields, commonName: 'Reef octopus', expectedVersion: 1 })
      .expect(200)
    const stale = await agent
      .put(`/api/taxa/${id}`)
      .send({ ...fields, expectedVersion: 1 })
      .expect(409)
    expect(stale.body).toMatchObject({ code: 'stale-version', current_version: 2 })
    const found = await (await api.as('keeper')).agent.get('/api/taxa?q=reef%20oct').expect(200)
    expect(found.body).toMatchObject({ total: 1, rows: [{ commonName: 'Reef octopus' }] })
  })

  it('keep every weight band, the newest of a stage in force, as typed and in kilograms', async () => {
    const { agent } = await api.as('registrar')
    const enter = (low: string, high: string, unit = 'kg') =>
      agent
        .post(`/api/taxa/${taxonId}/weight-bands`)
        .send({ id: api.nextId(), stage: null, low, high, unit, source: 'own records', mark: 'P' })
    const reply = await enter('2200', '5000', 'g')
    expect(reply.body.weightBands).toMatchObject([{ low: '2200', unit: 'g', lowKg: 2.2, highKg: 5 }])
    expect((await enter('5', '4')).body).toMatchObject({ code: 'bad-input', errors: [{ pointer: '/high' }] })
    expect((await enter('0', '4')).body).toMatchObject({ code: 'bad-input', errors: [{ pointer: '/low' }] })
  })

  it('take sensitivities from a veterinarian only; the newest holds, and none takes one back', async () => {
    const set = async (role: 'veterinarian' | 'registrar', level: string) =>
      (await api.as(role)).agent
        .post(`/api/taxa/${taxonId}/sensitivities`)
        .send({ id: api.nextId(), code: 'handling', level, note: 'stops feeding' })
    expect((await set('registrar', 'avoid')).status).toBe(403)
    expect((await set('veterinarian', 'avoid')).body.sensitivities).toMatchObject([
      { code: 'handling', level: 'avoid' },
    ])
    expect((await set('veterinarian', 'caution')).body.sensitivities).toMatchObject([{ level: 'caution' }])
    expect((await set('veterinarian', 'none')).body.sensitivities).toEqual([])
  })
})

describe('marks', () => {
  const mark = async (url: string, body: object) =>
    (await api.as('registrar')).agent
      .post(`${url}/identifiers`)
      .send({ id: api.nextId(), kind: 'transponder', value: '999 000 000 041 207', happenedAt: at, ...body })

  it('are checked, compared without spaces, and asked back when another animal carries them', async () => {
    const one = await anAnimal(api, { taxonId, enclosureId: tank.id })
    const two = await anAnimal(api, { taxonId, enclosureId: tank.id })
    expect((await mark(one.url, { value: '99900000004120' })).body).toMatchObject({
      code: 'bad-input',
      errors: [{ pointer: '/value' }],
    })
    expect((await mark(one.url, {})).status).toBe(201)
    const twice = await mark(two.url, { value: '999000000041207' })
    expect([twice.status, twice.body.code]).toEqual([409, 'mark-already-carried'])
    expect(twice.body.detail).toContain(one.accession)
    const kept = await mark(two.url, {
      value: '999000000041207',
      readTwiceReason: 'read three times on both',
    })
    expect(kept.status).toBe(201)
    expect(kept.body.discrepancies).toMatchObject([
      { kind: 'identifier-twice', facts: { other: one.accession } },
    ])

    const sheet = await (await api.as('keeper')).agent.get(one.url).expect(200)
    const [first] = sheet.body.identifiers
    const end = await (
      await api.as('registrar')
    ).agent
      .post(`${one.url}/identifiers/${String(first.id)}/end`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'reads as nothing', happenedAt: at })
    expect(end.body.identifiers).toMatchObject([{ ended: { reason: 'reads as nothing' } }])
    const found = await (await api.as('keeper')).agent.get('/api/animals?q=041207').expect(200)
    expect(found.body.total).toBe(2)
  })

  it('are put on one animal: a group carries no transponder', async () => {
    const colony = await aGroup(api, { taxonId, enclosureId: tank.id, count: 5 })
    expect((await mark(colony.url, {})).body.code).toBe('not-a-single-animal')
    expect((await mark(colony.url, { kind: 'visible-implant', value: 'green elastomer, left' })).status).toBe(
      201,
    )
  })

  it('let one of two people who put it on two animals at once be told', async () => {
    const one = await anAnimal(api, { taxonId, enclosureId: tank.id })
    const two = await anAnimal(api, { taxonId, enclosureId: tank.id })
    const body = { kind: 'ring', value: 'L-77' }
    const replies = await Promise.all([mark(one.url, body), mark(two.url, body)])
    expect(replies.map((reply) => reply.status).sort()).toEqual([201, 409])
  })
})

describe('descriptions', () => {
  it('hold from their own time on; an older one entered late does not replace the newest', async () => {
    const bird = await anAnimal(api, { taxonId, enclosureId: tank.id, stage: 'juvenile' })
    const { agent } = await api.as('registrar')
    const describeIt = (body: object) =>
      agent.put(`${bird.url}/description`).send({
        expectedVersion: 1,
        taxonId,
        name: 'Moss',
        sex: 'female',
        stage: 'adult',
        birth: { kind: 'hatched', date: '2024-03', approximate: false },
        happenedAt: at,
        ...body,
      })
    const first = await describeIt({}).expect(200)
    expect(first.body).toMatchObject({ name: 'Moss', stage: 'adult', birth: { date: '2024-03' }, version: 2 })
    expect((await describeIt({})).body.code).toBe('stale-version')
    const late = await describeIt({
      expectedVersion: 2,
      stage: 'subadult',
      happenedAt: '2026-11-10T00:00:00Z',
    })
    expect(late.body).toMatchObject({ stage: 'adult', version: 3 })
    const { questions } = api.composition.animals
    const stageAt = async (day: string) =>
      (await questions.animalsById([bird.id], new Date(`2026-11-${day}T12:00:00Z`)))[0]?.stage
    expect([await stageAt('05'), await stageAt('15'), await stageAt('25')]).toEqual([
      'juvenile',
      'subadult',
      'adult',
    ])
    for (const date of ['2024-13', '24', '2024-02-30'])
      expect(
        (await describeIt({ expectedVersion: 3, birth: { kind: 'hatched', date, approximate: true } }))
          .status,
      ).toBe(422)
  })
})

describe('the list', () => {
  it('is searched by words in any column, filtered, sorted, paged, and left as a file', async () => {
    const { agent } = await api.as('keeper')
    const place = await aPlace(api)
    const names = ['Zephyr', 'Ash', 'Moth']
    for (const name of names) await anAnimal(api, { taxonId, enclosureId: place.id, name })
    const list = async (query: object) =>
      (
        await agent
          .get('/api/animals')
          .query({ place: place.code, ...query })
          .expect(200)
      ).body
    const namesOf = (body: { rows: { name: string }[] }) => body.rows.map((row) => row.name)
    expect(namesOf(await list({ sort: 'name' }))).toEqual(['Ash', 'Moth', 'Zephyr'])
    expect(namesOf(await list({ sort: 'name', direction: 'desc' }))).toEqual(['Zephyr', 'Moth', 'Ash'])
    expect(namesOf(await list({ q: `zeph penguin ${place.code}` }))).toEqual(['Zephyr'])
    expect((await list({ q: '100% _' })).total).toBe(0)
    expect((await list({ kind: 'fish' })).total).toBe(0)
    expect((await list({ state: 'gone' })).total).toBe(0)
    const page = await list({ sort: 'name', limit: 2 })
    expect(page).toMatchObject({ total: 3 })
    expect(namesOf(await list({ sort: 'name', limit: 2, cursor: page.nextCursor }))).toEqual(['Zephyr'])
    const file = await agent.get('/api/animals.csv').query({ place: place.code, sort: 'name' }).expect(200)
    expect(file.headers['content-type']).toContain('text/csv')
    expect(file.headers['content-disposition']).toContain('animals.csv')
    const lines = file.text.trim().split('\r\n')
    expect(lines).toHaveLength(4)
    expect(lines[1]).toContain(',Ash,Test penguin,Spheniscus testensis,bird,bird,')
  })

  it('shows the administrator every line of an animal, and none of the words that belong to the chart', async () => {
    const school = await anAnimal(api, { taxonId, enclosureId: tank.id, form: 'group', count: 9 })
    const keeper = await api.as('keeper')
    const send = async (what: string, body: object) => {
      const id = api.nextId()
      await keeper.agent
        .post(`${school.url}/${what}`)
        .send({ id, happenedAt: at, ...body })
        .expect(201)
      return id
    }
    const words = 'liver pale and friable'
    const death = await send('deaths', { kind: 'found-dead', count: 1, carcassState: 'fresh', note: words })
    const slip = await send('deaths', { kind: 'found-dead', count: 1, carcassState: 'fresh' })
    await send('counts', { basis: 'counted', low: 7, high: 7, note: words })
    await keeper.agent
      .post(`${school.url}/deaths/${slip}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: words })
      .expect(200)
    const shown = async (role: 'keeper' | 'registrar' | 'administrator') => {
      const { agent } = await api.as(role)
      const urls = ['', '/log', '/counts', '/weights'].map((part) => `${school.url}${part}`)
      const replies = []
      for (const url of urls) replies.push((await agent.get(url).expect(200)).body)
      return replies
    }
    for (const role of ['keeper', 'registrar'] as const)
      expect(JSON.stringify(await shown(role))).toContain(words)
    const [animal, log, counts] = await shown('administrator')
    expect(JSON.stringify([animal, log, counts])).not.toContain(words)
    const hidden = 'not shown to you'
    expect(counts).toMatchObject({ statements: [{ low: 7, note: hidden }] })
    expect(counts.deaths).toEqual(
      expect.arrayContaining([
        expect.objectContaining({ id: death, seenCount: 1, carcassState: 'fresh', note: hidden }),
        expect.objectContaining({ id: slip, struck: expect.objectContaining({ reason: hidden }) }),
      ]),
    )
    const line = (id: string) => log.rows.find((row: { id: string }) => row.id === id)
    expect(line(death)).toMatchObject({ kind: 'death', facts: { seen: 1, note: hidden }, struckReason: null })
    expect(line(slip)).toMatchObject({ facts: { note: null }, struckReason: hidden })
  })

  it('tells the whole story of an animal in one log, struck lines included', async () => {
    const bird = await anAnimal(api, { taxonId, enclosureId: tank.id })
    const keeper = await api.as('keeper')
    const id = api.nextId()
    await keeper.agent
      .post(`${bird.url}/weights`)
      .send({ id, weight: { value: '3.10', unit: 'kg' }, basis: 'measured', happenedAt: at })
      .expect(201)
    await keeper.agent
      .post(`${bird.url}/weights/${id}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'other bird' })
      .expect(200)
    const log = await keeper.agent.get(`${bird.url}/log`).expect(200)
    const kinds = log.body.rows.map((row: { kind: string }) => row.kind)
    expect(kinds.sort()).toEqual(['count', 'description', 'move', 'weight'])
    const weight = log.body.rows.find((row: { kind: string }) => row.kind === 'weight')
    expect(weight).toMatchObject({
      kind: 'weight',
      facts: { value: '3.10', unit: 'kg' },
      struckReason: 'other bird',
      recordedBy: 'Test keeper',
    })
  })
})
