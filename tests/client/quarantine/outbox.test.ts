import { describe, expect, it } from 'vitest'
import { createOutbox } from '../../../src/lib/outbox.ts'
import type { NewItem, Outbox } from '../../../src/lib/outbox.ts'
import type { OutboxItem, OutboxStore } from '../../../src/lib/outbox-store.ts'
import { ProblemError } from '../../../src/lib/problem-error.ts'

const problem = (status: number, code: string) =>
  new ProblemError(status, code, `It was ${code}`, undefined, [], undefined, {})
const since = '2026-12-01T14:03:00.000Z'
const noAnswer = problem(0, 'no-answer')

/** A disk that outlives the page, as IndexedDB does; the real one is tested in the browser. */
function aDisk(fails = false): OutboxStore {
  const kept = new Map<string, OutboxItem>()
  const or = async <T>(value: T): Promise<T> => {
    if (fails) throw new Error('full')
    return value
  }
  return {
    all: () => or([...kept.values()]),
    put: (item) => or(void kept.set(item.id, structuredClone(item))),
    remove: (id) => or(void kept.delete(id)),
  }
}

const entry = (id: string, minute: number, more: Partial<NewItem> = {}): NewItem => ({
  id,
  personId: 'keeper',
  madeAt: `2026-12-01T14:${String(minute).padStart(2, '0')}:00.000Z`,
  kind: 'observation',
  label: 'QT-5',
  address: { id: 'recordObservation', method: 'post', path: '/observations', idempotent: 'by-record-id' },
  params: {},
  body: { id, origin: 'online' },
  ...more,
})

/** A server that answers as told, and what reached it. */
function aServer(answer: (item: OutboxItem) => ProblemError | null) {
  const got: { id: string; origin: unknown }[] = []
  const send = async (item: OutboxItem) => {
    const refusal = answer(item)
    if (refusal) throw refusal
    got.push({ id: item.id, origin: item.body['origin'] })
  }
  return { got, send }
}

const states = (outbox: Outbox) => outbox.now().items.map(({ id, state, tries }) => [id, state, tries])

describe('the outbox', () => {
  it('sends what was entered, in the order in which it was made, and keeps nothing of it', async () => {
    const server = aServer(() => null)
    const outbox = createOutbox({ store: aDisk(), send: server.send, now: () => entry('', 20).madeAt })
    await outbox.enter(entry('b', 20))
    await outbox.enter(entry('a', 19))
    await outbox.flush('keeper')
    expect(server.got).toEqual([
      { id: 'a', origin: 'outbox' },
      { id: 'b', origin: 'online' },
    ])
    expect(outbox.now()).toMatchObject({ items: [], downSince: null, durable: true })
  })

  it('keeps everything without a signal, survives a reload, and sends it once when there is one', async () => {
    const disk = aDisk()
    const dead = createOutbox({ store: disk, send: aServer(() => noAnswer).send, now: () => since })
    for (const [i, id] of ['a', 'b', 'c'].entries()) {
      await dead.enter(entry(id, i))
      await dead.flush('keeper')
    }
    expect(states(dead)).toEqual([
      ['a', 'waiting', 3],
      ['b', 'waiting', 0],
      ['c', 'waiting', 0],
    ])
    expect(dead.now().downSince).toBe(since)

    const server = aServer(() => null)
    const after = createOutbox({ store: disk, send: server.send, now: () => '2026-12-01T15:00:00.000Z' })
    await after.read()
    expect(after.now().items).toHaveLength(3)
    await Promise.all([after.flush('keeper'), after.flush('keeper')])
    // each says that it came later; its time is its own
    expect(server.got).toEqual([
      { id: 'a', origin: 'outbox' },
      { id: 'b', origin: 'outbox' },
      { id: 'c', origin: 'outbox' },
    ])
    expect(await disk.all()).toEqual([])
  })

  it('goes on past an entry that is refused, and keeps that with the reason until it is mended', async () => {
    let mended = false
    const server = aServer((item) => (item.id === 'a' && !mended ? problem(422, 'bad-input') : null))
    const outbox = createOutbox({ store: aDisk(), send: server.send })
    await outbox.enter(entry('a', 1))
    await outbox.enter(entry('b', 2))
    await outbox.flush('keeper')
    expect(server.got.map(({ id }) => id)).toEqual(['b'])
    expect(outbox.now().items).toMatchObject([
      { id: 'a', state: 'refused', refusal: { code: 'bad-input', says: 'It was bad-input' } },
    ])
    mended = true
    await outbox.mend('a', { id: 'a', origin: 'outbox', words: 'mended' })
    await outbox.flush('keeper')
    expect(outbox.now().items).toEqual([])
    expect(server.got.map(({ id }) => id)).toEqual(['b', 'a'])
  })

  it('keeps an entry whose writer is not the one signed in, and sends it when they are', async () => {
    let signedIn = 'vet'
    const server = aServer((item) => (item.personId === signedIn ? null : problem(409, 'different-person')))
    const outbox = createOutbox({ store: aDisk(), send: server.send })
    await outbox.enter(entry('a', 1))
    await outbox.enter(entry('b', 2, { personId: 'vet' }))
    // the page is still the keeper's while a veterinarian has signed in beside it
    await Promise.all([outbox.flush('keeper'), outbox.flush('vet')])
    expect(server.got.map(({ id }) => id)).toEqual(['b'])
    expect(states(outbox)).toEqual([['a', 'waiting', 1]])
    expect(outbox.now().downSince).toBeNull()
    signedIn = 'keeper'
    await outbox.flush('keeper')
    expect(server.got.map(({ id }) => id)).toEqual(['b', 'a'])
  })

  it('never sends what was struck out, and keeps it readable with the reason', async () => {
    const server = aServer((item) => (item.id === 'a' ? problem(422, 'bad-input') : null))
    const outbox = createOutbox({ store: aDisk(), send: server.send })
    await outbox.enter(entry('a', 1))
    await outbox.flush('keeper')
    await outbox.strike('a', 'wrong tank')
    await outbox.flush('keeper')
    expect(outbox.now().items).toMatchObject([{ id: 'a', state: 'struck', struckReason: 'wrong tank' }])
    expect(server.got).toEqual([])
  })

  it.each([
    [401, 'not-signed-in'],
    [503, 'busy'],
    [429, 'too-many-requests'],
    [502, 'not-understood'],
    [200, 'not-understood'],
  ])('waits at %d %s, since the same entry may be taken later', async (status, code) => {
    const outbox = createOutbox({ store: aDisk(), send: aServer(() => problem(status, code)).send })
    await outbox.enter(entry('a', 1))
    await outbox.flush('keeper')
    expect(states(outbox)).toEqual([['a', 'waiting', 1]])
  })

  it('sends only what the person made who is signed in', async () => {
    const server = aServer(() => null)
    const outbox = createOutbox({ store: aDisk(), send: server.send })
    await outbox.enter(entry('mine', 1))
    await outbox.enter(entry('theirs', 2, { personId: 'technician' }))
    await outbox.flush('keeper')
    expect(server.got.map(({ id }) => id)).toEqual(['mine'])
    expect(states(outbox)).toEqual([['theirs', 'waiting', 0]])
  })

  it('says when the device keeps nothing, and holds the entry as long as the page lives', async () => {
    const outbox = createOutbox({ store: aDisk(true), send: aServer(() => noAnswer).send })
    await outbox.enter(entry('a', 1))
    await outbox.flush('keeper')
    expect(outbox.now()).toMatchObject({ durable: false, items: [{ id: 'a', state: 'waiting' }] })
  })

  it('does not take a bug for a lost signal', async () => {
    const outbox = createOutbox({
      store: aDisk(),
      send: async () => {
        throw new TypeError('a bug')
      },
    })
    await outbox.enter(entry('a', 1))
    await expect(outbox.flush('keeper')).rejects.toThrow('a bug')
    expect(states(outbox)).toEqual([['a', 'waiting', 0]])
  })
})
