import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { defaultDoseLines } from '../../shared/domain/formulary/default-dose-lines.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'

let api: TestApi
beforeAll(async () => {
  api = await startApi()
  await api.composition.formulary.service.loadDefaults()
  await api.composition.formulary.service.loadDefaults()
})
afterAll(() => api.stop())

const product = (over: object = {}) => ({
  id: api.nextId(),
  agent: 'copper-sulfate',
  productName: 'Copper sulfate pentahydrate',
  form: 'crystals',
  strength: { value: '99.0', unit: 'percent_w_w' },
  strengthBasis: 'salt',
  ...over,
})

describe('the formulary', () => {
  it('starts with the project defaults, each once, with source and mark, and says that nobody confirmed them', async () => {
    const keeper = await api.as('keeper')
    const reply = await keeper.agent.get('/api/formulary').expect(200)
    expect(reply.body.lines).toHaveLength(defaultDoseLines.length)
    const formalin = reply.body.lines.find((line: { use: string }) => line.use === 'ectoparasites-bath')
    expect(formalin).toMatchObject({ high: 250, unit: 'uL/L', basis: 'product', mark: 'V', state: 'default' })
    expect(formalin.citation).toContain('529.1030')
  })

  it('lets a veterinarian with a valid licence confirm a line, once', async () => {
    const vet = await api.as('veterinarian')
    const [line] = defaultDoseLines
    const confirm = () =>
      vet.agent
        .post(`/api/dose-lines/${line?.id ?? ''}/confirmation`)
        .set('Idempotency-Key', newKey())
        .send({})
    expect((await confirm().expect(200)).body).toMatchObject({
      state: 'confirmed',
      confirmedBy: 'Test veterinarian',
    })
    expect((await confirm().expect(409)).body.code).toBe('already-confirmed')
  })

  it('refuses a confirmation without a valid licence', async () => {
    const vet = await api.person({
      email: 'nolic@harrow-point.example',
      printedName: 'No',
      roles: ['veterinarian'],
    })
    const reply = await vet.agent
      .post(`/api/dose-lines/${defaultDoseLines[1]?.id ?? ''}/confirmation`)
      .set('Idempotency-Key', newKey())
      .send({})
      .expect(403)
    expect(reply.body.code).toBe('licence-not-valid')
  })

  it('keeps a proposed line out of force until it is confirmed', async () => {
    const vet = await api.as('veterinarian')
    const tech = await api.as('technician')
    const before = defaultDoseLines[4]
    const id = api.nextId()
    await tech.agent
      .post('/api/dose-lines')
      .send({
        id,
        supersedesId: before?.id,
        low: 1.5,
        high: 2,
        longestContactMinutes: null,
        reason: 'assay results',
      })
      .expect(201)
    const lines = async () =>
      ((await vet.agent.get('/api/formulary')).body.lines as { id: string; state: string }[]).filter((line) =>
        [id, before?.id].includes(line.id),
      )
    expect((await lines()).map((line) => line.state).sort()).toEqual(['default', 'proposed'])
    await vet.agent
      .post(`/api/dose-lines/${id}/confirmation`)
      .set('Idempotency-Key', newKey())
      .send({})
      .expect(200)
    expect(await lines()).toMatchObject([{ id, state: 'confirmed' }])
  })

  it('keeps a strength as entered and refuses one above purity, bare percent and zero', async () => {
    const tech = await api.as('technician')
    const entered = await tech.agent.post('/api/products').send(product()).expect(201)
    expect(entered.body.strength).toEqual({ value: '99.0', unit: 'percent_w_w' })
    const refuse = async (strength: object) => {
      const reply = await tech.agent.post('/api/products').send(product({ strength })).expect(422)
      return reply.body.errors[0] as { pointer: string; code: string; detail: string }
    }
    expect(await refuse({ value: '101', unit: 'percent_w_w' })).toMatchObject({
      pointer: '/strength',
      code: 'above-most',
    })
    expect((await refuse({ value: '0', unit: 'percent_w_w' })).code).toBe('not-above-zero')
    expect((await refuse({ value: '35', unit: '%' })).code).toBe('percent-not-stated')
    expect((await refuse({ value: '500', unit: 'ppm' })).code).toBe('bare-ppm')
    expect((await refuse({ value: '1,234.5.6', unit: 'percent_w_w' })).detail.length).toBeGreaterThan(10)
  })

  it('refuses more in a millilitre than it weighs, where the label is entered and not at the order', async () => {
    const tech = await api.as('technician')
    const enter = (change: object) =>
      tech.agent.post('/api/products').send(product({ agent: 'formalin', form: 'liquid', ...change }))
    const of = (value: string) => ({ strength: { value, unit: 'mg/mL' } })
    const refused = await enter(of('2000')).expect(422)
    expect(refused.body.errors[0]).toMatchObject({ pointer: '/strength', code: 'strength-above-all' })
    expect(refused.body.detail).toMatch(/cannot be more than 1,080 mg\/mL.*Check the number and its unit/)
    const peroxide = { agent: 'hydrogen-peroxide', density: { value: '1.13', unit: 'g/mL' } }
    await enter({ ...of('1131'), ...peroxide }).expect(422)
    await enter({ ...of('396'), ...peroxide }).expect(201)
    await enter({ ...of('2001'), agent: 'copper-sulfate' }).expect(422)
    const light = await enter({ ...of('400'), density: { value: '0.4', unit: 'g/mL' } }).expect(422)
    expect(light.body.errors[0].pointer).toBe('/density')
  })

  it('shows why a lot may not be used', async () => {
    const tech = await api.as('technician')
    const entered = product()
    await tech.agent.post('/api/products').send(entered).expect(201)
    const receive = (lotNumber: string, expiresOn: string) =>
      tech.agent
        .post(`/api/products/${entered.id}/lots`)
        .send({ id: api.nextId(), lotNumber, expiresOn, receivedOn: '2026-01-10' })
    await receive('A1', '2026-11-30').expect(201)
    await receive('A2', '2026-12-01').expect(201)
    expect((await receive('A2', '2027-01-01').expect(409)).body.code).toBe('number-already-used')
    const third = await receive('A3', '2027-12-01').expect(201)
    const states = (lots: { lotNumber: string; state: string }[]) =>
      lots.map((lot) => `${lot.lotNumber} ${lot.state}`)
    expect(states(third.body.lots)).toEqual(['A1 expired', 'A2 usable', 'A3 usable'])
    const lotId = third.body.lots[2].id as string
    const note = (kind: string, happenedAt: string) =>
      tech.agent.post(`/api/lots/${lotId}/events`).send({ id: api.nextId(), kind, happenedAt })
    const cold = await note('stored-cold', '2026-11-20T10:00:00-04:00').expect(201)
    expect(states(cold.body.lots)[2]).toBe('A3 stored-cold')
    // a look is kept, and lifts no fault
    const looked = await note('looked-at', '2026-11-20T12:00:00-04:00').expect(201)
    expect(looked.body.lots[2]).toMatchObject({
      state: 'stored-cold',
      foundClearAt: '2026-11-20T16:00:00.000Z',
    })
    // nobody puts back alone what they took out
    const alone = await note('returned-to-use', '2026-11-21T10:00:00-04:00')
    expect([alone.status, alone.body.code]).toEqual([403, 'another-person-needed'])
    const other = await api.person({
      email: 'tech2@harrow-point.example',
      printedName: 'Second technician',
      roles: ['technician'],
    })
    const noteBy = (by: TestPerson, kind: string, happenedAt: string) =>
      by.agent.post(`/api/lots/${lotId}/events`).send({ id: api.nextId(), kind, happenedAt })
    const back = await noteBy(other, 'returned-to-use', '2026-11-21T10:00:00-04:00').expect(201)
    expect(states(back.body.lots)[2]).toBe('A3 usable')

    // a recall that is entered late stands, nothing noted beside it hides it, and only a veterinarian lifts it
    api.clock.set(new Date(testDay.getTime() + 1_000))
    const recalled = await note('recalled', '2026-11-20T09:00:00-04:00').expect(201)
    expect(states(recalled.body.lots)[2]).toBe('A3 recalled')
    expect(states((await note('set-aside', '2026-11-30T09:00:00-04:00').expect(201)).body.lots)[2]).toBe(
      'A3 recalled',
    )
    const refused = await noteBy(other, 'returned-to-use', '2026-12-01T10:00:00-04:00')
    expect([refused.status, refused.body.code]).toEqual([403, 'may-not'])
    expect(refused.body.detail).toBe('A recalled lot is put back into use by a veterinarian only.')
    const vet = await api.as('veterinarian')
    api.clock.set(new Date(testDay.getTime() + 2_000))
    const lifted = await noteBy(vet, 'returned-to-use', '2026-12-01T10:00:00-04:00').expect(201)
    expect(states(lifted.body.lots)[2]).toBe('A3 usable')
    expect((await note('recalled', '2026-12-02T10:00:00-04:00').expect(422)).body.code).toBe('in-the-future')
  })
})
