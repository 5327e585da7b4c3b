import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { ReplyOf } from '../../shared/contracts/contract.ts'
import type { find } from '../../shared/contracts/find.contract.ts'
import { plainText } from '../../shared/domain/plain-text.ts'
import type { Role } from '../../shared/domain/permissions/roles.ts'
import { aCase } from '../builders/a-case.ts'
import { aGroup, aTaxon } from '../builders/a-collection.ts'
import { aDraft, bathFields } from '../builders/an-order.ts'
import { anAcquisition, aParty, aPermit, newLine } from '../builders/a-register.ts'
import { anEnclosure } from '../builders/a-water.ts'
import { startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
const numbers = { order: '', case: '', transaction: '', permit: '', animal: '' }
beforeAll(async () => {
  api = await startApi()
  // one word in the name of everything
  const taxonId = await aTaxon(api, {
    scientificName: 'Heniochus quellae',
    commonName: 'Quella bannerfish',
    group: 'teleost',
  })
  const tank = await anEnclosure(api, 'QL-1', { name: 'Quella tank' })
  const school = await aGroup(api, { taxonId, enclosureId: tank.id, count: 6 })
  numbers.animal = school.accession
  numbers.order = (
    await aDraft(api, bathFields({ enclosureId: tank.id, animalIds: [school.id], problem: 'Skin flukes' }))
  ).number
  numbers.case = (await aCase(api, { taxonId, enclosure: tank })).number
  const counterpartyId = await aParty(api, 'Quella Reef Station')
  numbers.transaction = (
    await anAcquisition(api, {
      counterpartyId,
      lines: [newLine(api, { taxonId, enclosureId: tank.id, count: 2 })],
    })
  ).number
  numbers.permit = (await aPermit(api, { taxonIds: [taxonId], authority: 'Quella Fisheries' })).number
  await api.person({ email: 'quella@harrow-point.example', printedName: 'Ada Quella', roles: ['keeper'] })
  for (let i = 1; i <= 9; i++) await anEnclosure(api, `ROW-${String(i)}`)
})
afterAll(() => api.stop())

async function found(role: Role, q: string) {
  const { agent } = await api.as(role)
  const reply = await agent.get('/api/find').query({ q }).expect(200)
  return (reply.body as ReplyOf<typeof find>).groups
}

describe('find', () => {
  it('needs no accents and no capitals, and finds what is written with or without them', async () => {
    await anEnclosure(api, 'OR-1', { name: 'Ångström épuration, Øst' })
    const codes = async (q: string) =>
      (await found('keeper', q)).flatMap(({ rows }) => rows.map(({ name }) => name)).join('; ')
    for (const q of ['angstrom', 'ÅNGSTRÖM', 'A\u030angstrom', 'epuration', 'øst', 'OST'])
      expect(await codes(q), q).toContain('OR-1')
    // the database and the program take the same text for plain
    for (const words of [
      'Ångström',
      'Señor Łoś',
      'Æbelø œuf',
      'İzmir ılık',
      'Đà Nẵng',
      'µg/L 5 %_\\',
      'Straße',
    ]) {
      const [row]: { plain: string }[] = await api.composition.parts.dataSource.query(
        `SELECT plain_text($1) AS plain`,
        [words],
      )
      expect(row?.plain).toBe(plainText(words))
    }
    expect(await codes('ang%strom')).toBe('')
  })

  it('finds a word in everything that the reader may see, and asks nothing else', async () => {
    const kinds = async (role: Role) => (await found(role, 'quella')).map(({ kind }) => kind)
    const everywhere = ['animal', 'enclosure', 'order', 'case', 'transaction', 'permit']
    expect(await kinds('veterinarian')).toEqual(everywhere)
    expect(await kinds('technician')).toEqual(everywhere)
    expect(await kinds('keeper')).toEqual(everywhere)
    expect(await kinds('registrar')).toEqual(everywhere)
    expect(await kinds('administrator')).toEqual(['animal', 'enclosure', 'case', 'person'])
  })

  it('gives what an address is made of, the name, and where it is', async () => {
    const groups = await found('registrar', 'Quella')
    const first = (kind: string) => groups.find((group) => group.kind === kind)?.rows
    expect(first('animal')).toContainEqual({
      key: numbers.animal,
      name: `${numbers.animal} Quella bannerfish`,
      note: 'Heniochus quellae, QL-1',
    })
    expect(first('enclosure')).toMatchObject([{ key: 'QL-1', name: 'QL-1 Quella tank' }])
    expect(first('order')).toMatchObject([{ key: numbers.order }])
    expect(first('case')).toMatchObject([{ key: numbers.case, note: 'QL-1' }])
    expect(first('transaction')).toMatchObject([
      { key: numbers.transaction, name: `${numbers.transaction}, Quella Reef Station` },
    ])
    expect(first('permit')).toMatchObject([{ key: numbers.permit }])
    expect((await found('administrator', 'ada q')).map(({ rows }) => rows)).toMatchObject([
      [{ name: 'Ada Quella', note: 'quella@harrow-point.example' }],
    ])
  })

  it('finds by number', async () => {
    expect(await found('keeper', numbers.order)).toMatchObject([{ kind: 'order', total: 1 }])
    expect((await found('keeper', numbers.case))[0]).toMatchObject({ kind: 'case', total: 1 })
  })

  it('gives at most eight of a kind and says how many there are', async () => {
    const [enclosures] = await found('keeper', 'row-')
    expect(enclosures).toMatchObject({ kind: 'enclosure', total: 9 })
    expect(enclosures?.rows).toHaveLength(8)
  })

  it('takes signs of a pattern for what they are, and says so when nothing is found', async () => {
    expect(await found('veterinarian', '%%')).toEqual([])
    expect(await found('veterinarian', 'no such thing')).toEqual([])
  })

  it('wants two characters', async () => {
    const { agent } = await api.as('keeper')
    const reply = await agent.get('/api/find').query({ q: ' a ' })
    expect(reply.status).toBe(422)
    expect(reply.body).toMatchObject({ code: 'bad-input' })
  })
})
