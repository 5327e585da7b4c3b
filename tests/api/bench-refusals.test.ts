import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { calculators } from '../../shared/bench/calculators.ts'
import { startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
beforeAll(async () => {
  api = await startApi()
})
afterAll(() => api.stop())

const post = async (at: string, body: string, type = 'application/json') =>
  (await api.as('keeper')).agent
    .post(`/api/bench/${at}`)
    .set('Content-Type', type)
    .serialize((given) => given as unknown as string)
    .send(body)

type Reply = Awaited<ReturnType<typeof post>>

/** What every refusal of the bench has: a status, the kind of problem, and for each error a place, a code and a sentence. */
function expectRefused(reply: Reply, status: number, errors: { pointer: string; code: string }[]): void {
  expect([reply.status, reply.headers['content-type']], reply.text).toEqual([
    status,
    expect.stringContaining('application/problem+json'),
  ])
  expect(reply.body.errors).toMatchObject(errors)
  expect(reply.body.errors).toHaveLength(errors.length)
  for (const { code, detail } of reply.body.errors) {
    expect(code).toMatch(/^[a-z]+(-[a-z0-9]+)*$/)
    expect(detail).toMatch(/ /)
  }
}

const example = calculators[0]?.example ?? {}
const addresses = ['bath-dose', 'bath-dose/sheet', 'quarantine-clock', 'connected-water']

describe.each(addresses)('a question to %s', (at) => {
  it.each([
    ['cut short', '{"target":', 'not-json'],
    ['no JSON at all', 'velvet', 'not-json'],
    ['with a trailing comma', '{"target":1,}', 'not-json'],
  ])('that is %s is unreadable, by a stable code', async (_what, body, code) => {
    const reply = await post(at, body)
    expectRefused(reply, 400, [{ pointer: '', code }])
    expect(reply.body.code).toBe('malformed-json')
  })

  it('in another encoding is unreadable, by a code of its own', async () => {
    expectRefused(await post(at, '{}', 'application/json; charset=latin1'), 400, [
      { pointer: '', code: 'other-encoding' },
    ])
  })

  it.each(['null', '5', '"25 mg/L"', 'true', '[1]'])('of %s was read, and is no question', async (body) => {
    const reply = await post(at, body)
    expectRefused(reply, 422, [{ pointer: '', code: 'wrong-kind' }])
    expect(reply.body.code).toBe('bad-input')
  })

  it('is asked for where the body is of another type', async () => {
    expectRefused(await post(at, '{}', 'text/plain'), 422, [{ pointer: '', code: 'missing' }])
  })

  it('is asked for field by field where nothing came', async () => {
    const reply = await post(at, '')
    expect(reply.status).toBe(422)
    for (const { code } of reply.body.errors) expect(code).toMatch(/missing|blank|not-chosen/)
  })

  it('says where a character stands that cannot be written', async () => {
    const reply = await post(at, JSON.stringify({ target: { value: '25\u0000', unit: 'mg/L' } }))
    expectRefused(reply, 422, [{ pointer: '/target/value', code: 'character-not-writable' }])
  })

  it('names the first twenty of ten thousand names that it does not know', async () => {
    const many = Object.fromEntries(Array.from({ length: 10_000 }, (_, i) => [`name${String(i)}`, 1]))
    const reply = await post(at, JSON.stringify(many))
    expect(reply.status).toBe(422)
    const unknown = (reply.body.errors as { code: string }[]).filter(({ code }) => code === 'not-asked')
    expect(unknown).toHaveLength(20)
  })

  it('is not read however deep it goes, nor however long it is', async () => {
    const deep = `{"target":${'['.repeat(80)}${']'.repeat(80)}}`
    expect((await post(at, deep)).body.errors).toMatchObject([{ code: 'nested-too-deep' }])
    const reply = await post(at, JSON.stringify({ target: 'a'.repeat(1_100_000) }))
    expectRefused(reply, 422, [{ pointer: '', code: 'body-too-large' }])
  })
})

it('gives a code with every fault of the longer questions', async () => {
  const clock = { zone: '', asOf: '2026-02-30', quarantineKind: 'newt', events: {}, caseId: 'mine' }
  expectRefused(await post('quarantine-clock', JSON.stringify(clock)), 422, [
    { pointer: '/zone', code: 'too-small' },
    { pointer: '/asOf', code: 'wrong-format' },
    { pointer: '/quarantineKind', code: 'not-an-option' },
    { pointer: '/events', code: 'wrong-kind' },
    { pointer: '/caseId', code: 'not-asked' },
  ])
  const water = {
    at: '2026-03-02T12:00:00Z',
    bodies: [{ waterBodyId: 'A', kind: 'enclosure', litres: 1e12 }],
  }
  expectRefused(await post('connected-water', JSON.stringify(water)), 422, [
    { pointer: '/bodies/0/litres', code: 'too-large' },
    { pointer: '/connections', code: 'missing' },
    { pointer: '/ledger', code: 'missing' },
  ])
})

const nul = String.fromCharCode(0)
const hostile: unknown[] = [
  null,
  '',
  nul,
  '25',
  -1,
  1e400,
  1e308,
  [],
  {},
  { value: null, unit: null },
  { value: nul, unit: 'L' },
  { value: '1', unit: nul },
  { value: '1', unit: '__proto__' },
  { value: '1e999', unit: 'L' },
  { value: { value: '1' }, unit: ['L'] },
  { value: '１２', unit: 'L' },
]

it('gives a code and a sentence with whatever stands in a field, for every calculator', async () => {
  expect(example).not.toEqual({})
  for (const of of calculators)
    for (const name of Object.keys(of.inputs)) {
      // every fourth of them in each field is enough of a question to the server; the domain is asked all of them
      const from = name.length % 4
      for (const given of hostile.filter((_, index) => index % 4 === from)) {
        const reply = await post(of.id, JSON.stringify({ ...of.example, [name]: given }))
        const what = `${of.id} ${name} ${JSON.stringify(given)} ${reply.text.slice(0, 300)}`
        expect([200, 422], what).toContain(reply.status)
        if (reply.status !== 422) continue
        expect(reply.body.errors.length, what).toBeGreaterThan(0)
        for (const { code, detail, pointer } of reply.body.errors) {
          expect(code, what).toMatch(/^[a-z]+(-[a-z0-9]+)*$/)
          expect(detail, what).toMatch(/ /)
          expect(pointer, what).toMatch(/^(\/.*)?$/)
        }
      }
    }
}, 60_000)
