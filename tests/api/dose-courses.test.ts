import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { aCase } from '../builders/a-case.ts'
import type { BuiltCase } from '../builders/a-case.ts'
import { anEnclosure, aValve } from '../builders/a-water.ts'
import { aBathWater, aDraft, aProduct, aSchool, bathFields, signDraft } from '../builders/an-order.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let quarantined: BuiltCase
let formalin: { id: string; lotId: string }
let praziquantel: { id: string; lotId: string }
beforeAll(async () => {
  api = await startApi()
  const tank = await aBathWater(api, 'QT-3')
  quarantined = await aCase(api, { enclosure: tank })
  formalin = await aProduct(api, {
    agent: 'formalin',
    productName: 'Formalin 37 %',
    form: 'liquid',
    strength: { value: '37', unit: 'percent_w_w' },
    density: { value: '1.08', unit: 'g/mL' },
  })
  praziquantel = await aProduct(api, {})
})
beforeEach(() => api.clock.set(testDay))
afterAll(() => api.stop())

async function anOrder(given: object = {}): Promise<string> {
  const draft = await aDraft(
    api,
    bathFields({
      enclosureId: quarantined.enclosure.id,
      animalIds: [quarantined.animal.id],
      productId: formalin.id,
      lotId: formalin.lotId,
      target: { value: '100', unit: 'uL/L' },
      basis: 'product',
      timing: 'timed',
      contactMinutes: 45,
      division: { value: '1', unit: 'mL' },
      startsAt: '2026-12-01T18:20:00Z',
      ...given,
    }),
  )
  const signed = await signDraft(api, draft)
  if (signed.status !== 201) throw new Error(JSON.stringify(signed.body))
  return draft.number
}

async function record(number: string, key: string, happenedAt: string, given: object = {}): Promise<string> {
  const { agent } = await api.as('technician')
  const id = api.nextId()
  await agent
    .post(`/api/orders/${number}/doses/${key}/record`)
    .send({
      id,
      kind: 'recorded',
      happenedAt,
      amount: { value: '218', unit: 'mL' },
      lotId: formalin.lotId,
      ...given,
    })
    .expect(201)
  return id
}

async function end(doseId: string, happenedAt: string) {
  const { agent } = await api.as('keeper')
  const body = { id: api.nextId(), cause: 'time-up', happenedAt }
  await agent.post(`/api/doses/${doseId}/stop`).send(body).expect(201)
  return body
}

async function discontinue(number: string) {
  const { agent } = await api.as('veterinarian')
  await agent
    .post(`/api/orders/${number}/discontinuation`)
    .set('Idempotency-Key', newKey())
    .send({ reason: 'enough' })
    .expect(200)
}

interface StoredEvent {
  kind: string
  at: string
  facts: { treatmentId: string; agentName: string; masks: boolean; plannedEndOn?: string }
}

/** What the case's clock has of treatments, in the order of time. */
async function treatments(number?: string): Promise<StoredEvent[]> {
  const rows: { kind: string; facts: StoredEvent['facts']; happened_at: Date }[] =
    await api.composition.parts.dataSource.query(
      `SELECT e.kind, e.facts, e.happened_at FROM case_events e
         LEFT JOIN orders o ON e.facts ->> 'treatmentId' LIKE o.id::text || '%'
        WHERE e.kind LIKE 'treatment-%' AND ($1::text IS NULL OR o.number = $1) ORDER BY e.happened_at`,
      [number ?? null],
    )
  return rows.map(({ kind, facts, happened_at }) => ({ kind, facts, at: happened_at.toISOString() }))
}

const reasonsOfCase = async () => {
  const { agent } = await api.as('veterinarian')
  return JSON.stringify((await agent.get(quarantined.url).expect(200)).body)
}

describe('the clock of a case on treated water', () => {
  it('hears of a course at its first dose and at the end of its last bath, and waits its masking window', async () => {
    const number = await anOrder({ doses: 2, intervalHours: 48, startsAt: '2026-11-28T18:20:00Z' })
    const first = await record(number, '1', '2026-11-28T18:25:00Z')
    expect(await treatments(number)).toMatchObject([
      {
        kind: 'treatment-started',
        at: '2026-11-28T18:25:00.000Z',
        facts: {
          agentName: 'formaldehyde solution 37 % (formalin)',
          masks: true,
          plannedEndOn: '2026-11-30',
        },
      },
    ])
    await end(first, '2026-11-28T19:05:00Z')
    expect(await treatments(number)).toHaveLength(1)
    const second = await record(number, '2', '2026-11-30T18:20:00Z')
    expect(await treatments(number)).toHaveLength(1)
    await end(second, '2026-11-30T19:05:00Z')
    const heard = await treatments(number)
    expect(heard.map(({ kind, at }) => [kind, at])).toEqual([
      ['treatment-started', '2026-11-28T18:25:00.000Z'],
      ['treatment-ended', '2026-11-30T19:05:00.000Z'],
    ])
    expect(heard[1]?.facts.treatmentId).toBe(heard[0]?.facts.treatmentId)
    // K14: 14 days from the end of the treatment, 30 Nov + 14 d = 14 Dec, worked by hand
    expect(await reasonsOfCase()).toContain('2026-12-14')
  })

  it('is told once, however often the same dose or stop is sent', async () => {
    const number = await anOrder()
    const { agent } = await api.as('technician')
    const body = {
      id: api.nextId(),
      kind: 'recorded',
      happenedAt: '2026-12-01T17:00:00Z',
      amount: { value: '218', unit: 'mL' },
      lotId: formalin.lotId,
    }
    const send = () => agent.post(`/api/orders/${number}/doses/1/record`).send(body).expect(201)
    await send()
    await send()
    const stop = await end(body.id, '2026-12-01T17:45:00Z')
    await agent.post(`/api/doses/${body.id}/stop`).send(stop).expect(201)
    expect((await treatments(number)).map(({ kind }) => kind)).toEqual([
      'treatment-started',
      'treatment-ended',
    ])
  })

  it('hears the end when a veterinarian ends the order, or the rest is withheld', async () => {
    const cut = await anOrder({ doses: 3, intervalHours: 24 })
    await end(await record(cut, '1', '2026-12-01T16:00:00Z'), '2026-12-01T16:30:00Z')
    expect(await treatments(cut)).toHaveLength(1)
    await discontinue(cut)
    expect((await treatments(cut)).at(-1)).toMatchObject({
      kind: 'treatment-ended',
      at: '2026-12-01T16:30:00.000Z',
    })
    const kept = await anOrder({ doses: 2, intervalHours: 24 })
    await end(await record(kept, '1', '2026-12-01T16:00:00Z'), '2026-12-01T16:40:00Z')
    await record(kept, '2', '2026-12-01T18:00:00Z', { kind: 'withheld', amount: null })
    expect((await treatments(kept)).at(-1)).toMatchObject({
      kind: 'treatment-ended',
      at: '2026-12-01T16:40:00.000Z',
    })
  })

  it('takes a bath that still runs, or an agent left in the water, as not ended', async () => {
    const running = await anOrder({ doses: 2, intervalHours: 24 })
    const doseId = await record(running, '1', '2026-12-01T18:00:00Z')
    await discontinue(running)
    expect(await treatments(running)).toHaveLength(1)
    await end(doseId, '2026-12-01T18:19:00Z')
    expect(await treatments(running)).toHaveLength(2)

    const left = await anOrder({
      productId: praziquantel.id,
      lotId: praziquantel.lotId,
      target: { value: '2', unit: 'mg/L' },
      basis: 'active',
      division: { value: '0.01', unit: 'g' },
      timing: 'indefinite',
      contactMinutes: null,
    })
    const leftId = await record(left, '1', '2026-12-01T17:00:00Z', {
      amount: { value: '4.36', unit: 'g' },
      lotId: praziquantel.lotId,
    })
    expect((await treatments(left)).map(({ kind }) => kind)).toEqual(['treatment-started'])
    await end(leftId, '2026-12-01T18:10:00Z')
    expect((await treatments(left)).at(-1)).toMatchObject({
      kind: 'treatment-ended',
      at: '2026-12-01T18:10:00.000Z',
    })
  })

  it('hears nothing of a dose that never went in, or of one into other water', async () => {
    const before = (await treatments()).length
    const number = await anOrder()
    await record(number, '1', '2026-12-01T18:00:00Z', { kind: 'refused', amount: null })
    const elsewhere = await aBathWater(api, 'QT-8')
    const other = await aCase(api, { enclosure: elsewhere })
    const order = await anOrder({ enclosureId: elsewhere.id, animalIds: [other.animal.id] })
    await record(order, '1', '2026-12-01T18:00:00Z')
    const heard = await treatments()
    expect(heard).toHaveLength(before + 1)
    const mine = await api.composition.parts.dataSource.query(
      `SELECT c.number FROM case_events e JOIN quarantine_cases c ON c.id = e.case_id
         JOIN orders o ON o.id::text = e.facts ->> 'treatmentId' WHERE o.number = $1`,
      [order],
    )
    expect(mine).toEqual([{ number: other.number }])
  })
})

describe('what an agent leaves in water that is parted later', () => {
  it('is known through a valve that was shut since, until it is out; what never came through is not', async () => {
    const dosed = await aBathWater(api, 'QT-13')
    const fish = await aSchool(api, dosed.id, 13)
    const prolonged = (enclosureId: string, animalIds: string[]) =>
      bathFields({
        enclosureId,
        animalIds,
        productId: praziquantel.id,
        lotId: praziquantel.lotId,
        startsAt: api.clock.now().toISOString(),
      })
    const signed = () => anOrder(prolonged(dosed.id, [fish.id]))
    const given = (number: string, happenedAt: string) =>
      record(number, '1', happenedAt, {
        amount: { value: '4.36', unit: 'g' },
        lotId: praziquantel.lotId,
      })
    // both before there is a valve that the volume was not determined with
    const first = await signed()
    const second = await signed()
    const beside = await anEnclosure(api, 'QT-14')
    const valve = await aValve(api, 'V-14', [dosed.waterBodyId, beside.waterBodyId], false)
    const tech = await api.as('technician')
    const turn = (open: boolean, happenedAt: string) =>
      tech.agent
        .post(`/api/connections/${valve}/states`)
        .send({ id: api.nextId(), open, happenedAt })
        .expect(201)
    const here = async () => {
      const { agent } = await api.as('veterinarian')
      const { body } = await agent.post('/api/order-previews').send(prolonged(beside.id, [])).expect(200)
      return (
        body.cautions
          .filter(({ ruleId }: { ruleId: string }) => ruleId === 'R29')
          .map(({ code }: { code: string }) => code)
          // that the drug was in some water of the day, and is out, is said besides
          .filter((code: string) => code !== 'same-agent-same-day')
      )
    }
    expect(await here()).toEqual([])
    // given while the valve was shut, and never let through
    const alone = await given(first, '2026-12-01T12:00:00Z')
    expect(await here()).toEqual([])
    await end(alone, '2026-12-01T13:00:00Z')
    const through = await given(second, '2026-12-01T14:00:00Z')
    await turn(true, '2026-12-01T15:00:00Z')
    await turn(false, '2026-12-01T16:00:00Z')
    expect(await here()).toEqual(['same-agent-together'])
    // taken out of the one water after the two were parted: it is in the other still
    await end(through, '2026-12-01T17:00:00Z')
    expect(await here()).toEqual(['same-agent-together'])
    // that nobody can record, so it is remembered for 30 days
    api.clock.set(new Date('2026-12-31T13:59:00Z'))
    expect(await here()).toEqual(['same-agent-together'])
    api.clock.set(new Date('2026-12-31T14:01:00Z'))
    expect(await here()).toEqual([])
    // taken out of both while they were joined
    api.clock.set(testDay)
    await end(await given(second, '2026-12-01T14:30:00Z'), '2026-12-01T15:30:00Z')
    const vet = await api.as('veterinarian')
    await vet.agent
      .post(`/api/dose-records/dose/${through}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'written twice' })
      .expect(200)
    expect(await here()).toEqual([])
  })
})
