import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aGroup, anAnimal, aPlace, aTaxon } from '../builders/a-collection.ts'
import type { TestPlace } from '../builders/a-collection.ts'
import { verifyAnimals } from '../../server/features/animals/index.ts'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'
import type { Role } from '../../shared/domain/permissions/roles.ts'

let api: TestApi
let taxonId: string
let kelp: TestPlace
let river: TestPlace
beforeAll(async () => {
  api = await startApi()
  taxonId = await aTaxon(api, {
    scientificName: 'Chromis testensis',
    commonName: 'Test chromis',
    group: 'teleost',
    band: ['5', '60', 'g'],
  })
  kelp = await aPlace(api)
  river = await aPlace(api)
})
afterAll(async () => {
  // whatever these tests did: what is derived still follows from the ledgers
  expect((await verifyAnimals(api.composition.parts.dataSource)).faults).toEqual([])
  await api.stop()
})

const monday = '2026-11-30T14:00:00Z'
const tuesday = '2026-12-01T10:00:00Z'

const post = async (role: Role, url: string, body: object) =>
  (await api.as(role)).agent
    .post(url)
    .set('Idempotency-Key', newKey())
    .send({ happenedAt: monday, ...body })
const record = (role: Role, url: string, body: object) => post(role, url, { id: api.nextId(), ...body })
const sheetOf = async (url: string) => (await (await api.as('keeper')).agent.get(url).expect(200)).body
const countsOf = async (url: string) =>
  (await (await api.as('keeper')).agent.get(`${url}/counts`).expect(200)).body
const strike = async (role: Role, url: string) =>
  (await api.as(role)).agent
    .post(`${url}/void`)
    .set('Idempotency-Key', newKey())
    .send({ reason: 'not this group' })

describe('deaths', () => {
  it('ends the stay of an individual at its death, and gives it back when the death was a mistake', async () => {
    const fish = await anAnimal(api, { taxonId, enclosureId: kelp.id })
    const id = api.nextId()
    const reply = await record('keeper', `${fish.url}/deaths`, {
      id,
      kind: 'found-dead',
      count: 1,
      carcassState: 'fresh',
      carcassPlace: 'cooled',
      note: 'behind the filter wall',
    })
    expect(reply.status).toBe(201)
    expect(reply.body).toMatchObject({
      seenCount: 1,
      postedCount: 1,
      excessCount: 0,
      place: { code: kelp.code },
    })
    expect(await sheetOf(fish.url)).toMatchObject({ place: null, count: { ledger: 0 }, discrepancies: [] })
    expect((await strike('keeper', `${fish.url}/deaths/${id}`)).status).toBe(200)
    expect(await sheetOf(fish.url)).toMatchObject({ place: { code: kelp.code }, count: { ledger: 1 } })
    expect((await countsOf(fish.url)).deaths).toMatchObject([{ struck: { reason: 'not this group' } }])
  })

  it('keeps three bodies where the ledger has two: two posted, a discrepancy, never below zero', async () => {
    const school = await aGroup(api, { taxonId, enclosureId: kelp.id, count: 2 })
    const id = api.nextId()
    const body = { id, kind: 'found-dead', count: 3 }
    const reply = await post('keeper', `${school.url}/deaths`, body)
    expect(reply.status).toBe(201)
    expect(reply.body).toMatchObject({ seenCount: 3, postedCount: 2, excessCount: 1 })
    const again = await post('keeper', `${school.url}/deaths`, body)
    expect(again.body).toEqual(reply.body)
    const sheet = await sheetOf(school.url)
    expect(sheet).toMatchObject({ count: { ledger: 0 }, openDiscrepancies: 1, place: null })
    expect(sheet.discrepancies).toMatchObject([
      {
        kind: 'more-than-counted',
        forRole: 'registrar',
        facts: { seen: 3, posted: 2, excess: 1, cause: 'death' },
      },
    ])
    const [discrepancy] = sheet.discrepancies
    const resolve = (role: Role, outcome: string) =>
      post(role, `/api/discrepancies/${String(discrepancy.id)}/resolution`, {
        outcome,
        reason: 'one more had hatched unseen',
        happenedAt: undefined,
      })
    expect((await resolve('veterinarian', 'explained')).status).toBe(403)
    const resolved = await resolve('registrar', 'count-corrected')
    expect(resolved.status).toBe(200)
    expect(resolved.body.resolution).toMatchObject({ outcome: 'count-corrected', by: 'Test registrar' })
    expect((await resolve('registrar', 'explained')).body.code).toBe('already-resolved')
    const { lines } = await countsOf(school.url)
    expect(lines.map((line: { kind: string; delta: number }) => [line.kind, line.delta]).sort()).toEqual([
      ['count-adjustment', 1],
      ['death', -1],
      ['death', -2],
      ['purchase', 2],
    ])
    expect(await sheetOf(school.url)).toMatchObject({ count: { ledger: 0 }, openDiscrepancies: 0 })
  })

  it('lets a late entry take no animal that left since', async () => {
    const school = await aGroup(api, { taxonId, enclosureId: kelp.id, count: 5 })
    await record('keeper', `${school.url}/deaths`, { kind: 'died-seen', count: 4, happenedAt: tuesday })
    const late = await record('keeper', `${school.url}/deaths`, { kind: 'found-dead', count: 3 })
    expect(late.body).toMatchObject({ postedCount: 1, excessCount: 2 })
    const { lines } = await countsOf(school.url)
    expect(lines.map((line: { balance: number }) => line.balance)).toEqual([0, 4, 5])
  })

  it('loses no body when two people record the same school at once', async () => {
    const school = await aGroup(api, { taxonId, enclosureId: kelp.id, count: 3 })
    const found = () => record('keeper', `${school.url}/deaths`, { kind: 'found-dead', count: 2 })
    const replies = await Promise.all([found(), found(), found()])
    expect(replies.map((reply) => reply.status)).toEqual([201, 201, 201])
    const posted = replies.map((reply) => Number(reply.body.postedCount))
    expect(posted.sort()).toEqual([0, 1, 2])
    expect((await sheetOf(school.url)).openDiscrepancies).toBe(2)
  })

  it('keeps a death at a time at which a later move has the animal elsewhere, and asks', async () => {
    const fish = await anAnimal(api, { taxonId, enclosureId: kelp.id })
    await record('keeper', `${fish.url}/moves`, {
      fromEnclosureId: kelp.id,
      toEnclosureId: river.id,
      happenedAt: tuesday,
    })
    await record('keeper', `${fish.url}/deaths`, { kind: 'found-dead', count: 1 })
    const sheet = await sheetOf(fish.url)
    expect(sheet.count.ledger).toBe(0)
    expect(sheet.discrepancies).toMatchObject([{ kind: 'place-contradicted' }])
  })
})

describe('counts', () => {
  it('adds births, and lets the registrar adjust with a reason but not below zero', async () => {
    const school = await aGroup(api, { taxonId, enclosureId: kelp.id, count: 10 })
    expect((await record('keeper', `${school.url}/births`, { count: 5 })).body.count).toMatchObject({
      ledger: 15,
    })
    const adjust = (delta: number, role: Role = 'registrar') =>
      record(role, `${school.url}/adjustments`, { delta, reason: 'counted on film' })
    expect((await adjust(-3)).body.count).toMatchObject({ ledger: 12 })
    const tooMany = await adjust(-13)
    expect(tooMany.status).toBe(409)
    expect(tooMany.body).toMatchObject({ code: 'count-too-small', errors: [{ pointer: '/delta' }] })
    expect((await adjust(1, 'keeper')).status).toBe(403)
    const { lines } = await countsOf(school.url)
    const birth = lines.find((line: { kind: string }) => line.kind === 'birth-or-hatch')
    expect((await strike('registrar', `${school.url}/counts/${String(birth.id)}`)).body.count).toMatchObject({
      ledger: 7,
    })
    const arrival = lines.find((line: { kind: string }) => line.kind === 'purchase')
    expect((await strike('registrar', `${school.url}/counts/${String(arrival.id)}`)).body.code).toBe(
      'part-of-another-record',
    )
  })

  it('opens a discrepancy when a count differs, and writes the difference when the registrar agrees', async () => {
    const school = await aGroup(api, { taxonId, enclosureId: kelp.id, count: 100 })
    const counted = await record('keeper', `${school.url}/counts`, { basis: 'counted', low: 97, high: 97 })
    expect(counted.body).toMatchObject({ count: { ledger: 100, agrees: false }, openDiscrepancies: 1 })
    const [{ id }] = counted.body.discrepancies
    await post('registrar', `/api/discrepancies/${String(id)}/resolution`, {
      outcome: 'count-corrected',
      reason: 'three not seen for weeks',
      happenedAt: undefined,
    })
    expect(await sheetOf(school.url)).toMatchObject({
      count: { ledger: 97, agrees: true },
      openDiscrepancies: 0,
    })
  })

  it('carries an estimate along with what is posted after it', async () => {
    const school = await aGroup(api, {
      taxonId,
      enclosureId: kelp.id,
      count: 350,
      estimate: { low: 300, high: 400 },
    })
    await record('keeper', `${school.url}/deaths`, { kind: 'found-dead', count: 12 })
    expect((await sheetOf(school.url)).count).toEqual({
      basis: 'estimated',
      ledger: 338,
      low: 288,
      high: 388,
      agrees: true,
    })
    const bad = await record('keeper', `${school.url}/counts`, { basis: 'estimated', low: 5, high: 4 })
    expect(bad.body).toMatchObject({ code: 'bad-input', errors: [{ pointer: '/high' }] })
  })

  it('is for groups: an individual is not counted, born into or adjusted', async () => {
    const fish = await anAnimal(api, { taxonId, enclosureId: kelp.id })
    expect((await record('keeper', `${fish.url}/births`, { count: 1 })).body.code).toBe('not-a-group')
    expect(
      (await record('keeper', `${fish.url}/counts`, { basis: 'counted', low: 1, high: 1 })).body.code,
    ).toBe('not-a-group')
    expect(
      (await record('registrar', `${fish.url}/adjustments`, { delta: 1, reason: 'two of them' })).body.code,
    ).toBe('not-a-group')
  })
})

describe('splits and merges', () => {
  const split = (url: string, body: object) =>
    record('keeper', `${url}/splits`, { form: 'group', count: 4, toEnclosureId: river.id, ...body })

  it('gives the part a number of its own and makes or loses no animal', async () => {
    const school = await aGroup(api, { taxonId, enclosureId: kelp.id, count: 10, stage: 'juvenile' })
    const id = api.nextId()
    const reply = await split(school.url, { id })
    expect(reply.status).toBe(201)
    expect(reply.body.from).toMatchObject({ count: { ledger: 6 }, place: { code: kelp.code } })
    expect(reply.body.into).toMatchObject({
      count: { ledger: 4 },
      place: { code: river.code },
      splitFrom: school.accession,
      stage: 'juvenile',
    })
    expect(reply.body.into.accession).not.toBe(school.accession)
    const again = await split(school.url, { id })
    expect(again.body.into.accession).toBe(reply.body.into.accession)
    expect(again.body.from.count.ledger).toBe(6)
    const tooMany = await split(school.url, { count: 7 })
    expect(tooMany.body).toMatchObject({ code: 'count-too-small', errors: [{ pointer: '/count' }] })
    expect(tooMany.body.detail).toContain('6')

    const single = await split(school.url, {
      form: 'individual',
      count: 1,
      toEnclosureId: kelp.id,
      name: 'Pip',
    })
    expect(single.body.into).toMatchObject({ form: 'individual', name: 'Pip', count: { ledger: 1 } })
    expect((await split(school.url, { form: 'individual', count: 2 })).body.code).toBe('bad-input')
    expect((await split(`/api/animals/${String(single.body.into.accession)}`, {})).body.code).toBe(
      'not-a-group',
    )
  })

  it('takes the last ones out of a group, which is then in no enclosure', async () => {
    const school = await aGroup(api, { taxonId, enclosureId: kelp.id, count: 4 })
    const reply = await split(school.url, {})
    expect(reply.body.from).toMatchObject({ count: { ledger: 0 }, place: null })
  })

  it('merges into a group of the same taxon in the same enclosure, and into no other', async () => {
    const one = await aGroup(api, { taxonId, enclosureId: kelp.id, count: 6 })
    const two = await aGroup(api, { taxonId, enclosureId: kelp.id, count: 9 })
    const away = await aGroup(api, { taxonId, enclosureId: river.id, count: 9 })
    const otherTaxon = await aTaxon(api, {
      scientificName: 'Labrus testensis',
      commonName: 'Test wrasse',
      group: 'teleost',
    })
    const wrasse = await aGroup(api, { taxonId: otherTaxon, enclosureId: kelp.id, count: 2 })
    const single = await anAnimal(api, { taxonId, enclosureId: kelp.id })
    const merge = (into: string, body: object = {}) =>
      record('keeper', `${one.url}/merges`, { into, ...body })
    const cases: [string, object, string][] = [
      [away.accession, {}, 'not-in-that-enclosure'],
      [wrasse.accession, {}, 'taxa-differ'],
      [single.accession, {}, 'not-a-group'],
      [one.accession, {}, 'not-found'],
      ['A-9999', {}, 'not-found'],
      [two.accession, { count: 7 }, 'count-too-small'],
      [two.accession, { happenedAt: '2026-10-01T00:00:00Z' }, 'not-here-then'],
    ]
    for (const [into, body, code] of cases) expect((await merge(into, body)).body.code, into).toBe(code)
    const part = await merge(two.accession, { count: 2 })
    expect(part.status).toBe(201)
    expect(part.body).toMatchObject({ from: { count: { ledger: 4 } }, into: { count: { ledger: 11 } } })
    const id = api.nextId()
    const all = await merge(two.accession, { id })
    expect(all.body).toMatchObject({
      from: { count: { ledger: 0 }, place: null },
      into: { count: { ledger: 15 } },
    })
    expect((await merge(two.accession, { id })).body.into.count.ledger).toBe(15)
    expect((await merge(two.accession, { id, happenedAt: tuesday })).body.code).toBe('id-already-used')
    const { lines } = await countsOf(two.url)
    const half = lines.find((line: { kind: string }) => line.kind === 'merge-in')
    expect(half.other).toBe(one.accession)
    expect((await strike('registrar', `${two.url}/counts/${String(half.id)}`)).body.code).toBe(
      'part-of-another-record',
    )
  })
})
