import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { aFormalinHouse, bathAmount } from '../builders/a-bath.ts'
import type { BathTank, FormalinHouse } from '../builders/a-bath.ts'
import { textOf } from '../pdf/support/poppler.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'
import { fetchPdf } from '../support/fetch-pdf.ts'

let api: TestApi
let house: FormalinHouse
let bath: BathTank
beforeAll(async () => {
  api = await startApi()
  house = await aFormalinHouse(api)
})
// each in water of its own: what somebody learns of one order they know of the next one there
beforeEach(async () => {
  api.clock.set(testDay)
  bath = await house.tankWithSchool()
})
afterAll(() => api.stop())

const aBathToCalculate = async () => {
  const number = await house.signedBath(bath)
  await house.freshWater(bath)
  await house.calculateFirst(number).expect(201)
  return number
}
const pdfText = async (by: TestPerson, path: string) =>
  textOf(await fetchPdf(by, path)).replaceAll(/\s+/g, ' ')

describe('a second calculation is blind', () => {
  it(
    'so nobody makes it who was shown the amount, on the sheet or on paper',
    { timeout: 120_000 },
    async () => {
      const keeper = await api.as('keeper')
      const veterinarian = await api.as('veterinarian')
      const number = await aBathToCalculate()
      expect((await house.blindSheet(number, keeper)).secondShut).toBeNull()

      // the whole sheet, and then back as if nothing had been seen
      const whole = await keeper.agent.get(house.doseAt(number)).expect(200)
      expect(whole.body.amountNow).toEqual({ value: '218', unit: 'mL' })
      expect((await house.blindSheet(number, keeper)).secondShut).toBe('amount-seen')
      const seen = await house.calculateSecond(bath, number, {}, keeper)
      expect([seen.status, seen.body.code]).toEqual([403, 'another-person-needed'])
      expect(seen.body.detail).toContain('You have been shown the amount')

      await veterinarian.agent.get(house.doseAt(number, '/print')).expect(200)
      expect((await house.calculateSecond(bath, number, {}, veterinarian)).status).toBe(403)

      // each is noted once, with who and when
      await keeper.agent.get(house.doseAt(number)).expect(200)
      const noted = await api.composition.parts.dataSource.query(
        `SELECT a.actor_id FROM audit_entries a WHERE a.action = 'dose.see-amount' AND a.subject_label = $1
        ORDER BY a.seq`,
        [number],
      )
      expect(noted.map((row: { actor_id: string }) => row.actor_id)).toEqual(
        expect.arrayContaining([keeper.id, veterinarian.id]),
      )
      expect(noted.filter((row: { actor_id: string }) => row.actor_id === keeper.id)).toHaveLength(1)

      // whoever saw nothing still may; once the two agree the amount is there for everybody
      await house.calculateSecond(bath, number).expect(201)
      expect((await house.blindSheet(number, await api.as('keeper'))).amountNow).toEqual({
        value: '218',
        unit: 'mL',
      })
    },
  )

  it('so the order names no amount to whoever may make it, until they ask for it and are remembered', async () => {
    const number = await house.signedBath(bath)
    const url = `/api/orders/${number}`
    const sent = (body: object) => JSON.stringify(body).replaceAll('\u00a0', ' ')
    const shows = /218(\.1\d*)? ?mL|"218"|218\.1/
    for (const by of [house.second, await api.as('keeper')]) {
      const shown = (await by.agent.get(url).expect(200)).body
      expect(shown).toMatchObject({ amountsWithheld: true, amountText: null })
      expect(shown.versions[0].content).toMatchObject({ amount: null, working: [], facts: null })
      expect(sent(shown)).not.toMatch(shows)
      expect(sent((await by.agent.get(`/api/orders?q=${number}`)).body)).not.toMatch(shows)
      expect((await by.agent.get(`/api/orders.csv?q=${number}`)).text).not.toMatch(shows)
      expect(sent(await house.blindSheet(number, by))).not.toMatch(shows)
    }
    // whoever signed it has seen it, and is no second person
    const signer = (await (await api.as('veterinarian')).agent.get(url).expect(200)).body
    expect(signer).toMatchObject({
      amountsWithheld: false,
      versions: [{ content: { amount: { measured: bathAmount } } }],
    })

    await house.freshWater(bath)
    await house.calculateFirst(number).expect(201)
    const asked = (await house.second.agent.get(`${url}?amounts=yes`).expect(200)).body
    expect(asked).toMatchObject({ amountsWithheld: false, amountText: '218\u00a0mL' })
    expect((await house.blindSheet(number, house.second)).secondShut).toBe('amount-seen')
    expect((await house.calculateSecond(bath, number)).body.code).toBe('another-person-needed')
    expect((await house.second.agent.get(url).expect(200)).body.amountsWithheld).toBe(false)
    // typing amounts at the tank is no way to find the right one: the answer is the same for each
    const guess = async (value: string) => {
      const { status, body } = await house.give(number, { amount: { value, unit: 'mL' } })
      return { status, why: body.why, shown: sent(body).match(shows) }
    }
    const wrong = await guess('1')
    expect(wrong).toMatchObject({ status: 409, shown: null })
    expect(await guess(bathAmount.value)).toEqual(wrong)
    // paper shows it too
    const keeper = await api.as('keeper')
    await keeper.agent.get(`${url}/print`).expect(200)
    expect((await house.blindSheet(number, keeper)).secondShut).toBe('amount-seen')
  })

  it('also after a record of the dose was struck out, and under a version of the order that was amended since', async () => {
    const number = await aBathToCalculate()
    const keeper = await api.as('keeper')
    const { id } = (await house.record(number).expect(201)).body.recorded[0]
    await house.technician.agent
      .post(`/api/dose-records/dose/${id}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'the other tank was meant' })
      .expect(200)
    expect((await house.blindSheet(number, house.technician)).recorded).toMatchObject([
      { amountText: '218\u00a0mL' },
    ])
    const blind = await house.blindSheet(number, keeper)
    expect(blind).toMatchObject({
      blind: true,
      secondShut: null,
      recorded: [{ amountText: null, struck: { reason: 'the other tank was meant' } }],
    })
    expect(JSON.stringify(blind)).not.toMatch(/218/)
    await keeper.agent.get(house.doseAt(number)).expect(200)
    expect((await house.blindSheet(number, keeper)).secondShut).toBe('amount-seen')

    await house.amend(bath, number, { target: { value: '90', unit: 'uL/L' } })
    await house.calculateFirst(number).expect(201)
    expect((await house.blindSheet(number, keeper)).secondShut).toBe('amount-seen')
    expect((await house.blindSheet(number, house.second)).secondShut).toBeNull()
    expect((await keeper.agent.get(`/api/orders/${number}`).expect(200)).body.amountsWithheld).toBe(false)
  })

  it('and the doses of one order have one amount: whoever sees it at the first is no second person of the next', async () => {
    const number = await house.signedBath(bath, { doses: 3, intervalHours: 24 })
    await house.freshWater(bath)
    await house.calculateFirst(number).expect(201)
    await house.calculateSecond(bath, number).expect(201)
    const { id } = (await house.give(number).expect(201)).body.recorded[0]
    const keeper = await api.as('keeper')
    const sent = (body: object) => JSON.stringify(body).replaceAll('\u00a0', ' ')
    const shows = /21[89](\.1\d*)? ?mL|"21[89]"|218\.1/
    const next = async (by: TestPerson) =>
      (await by.agent.get(`${house.doseAt(number).replace('/1', '/2')}?blind=yes`).expect(200)).body
        .secondShut

    // neither the sheet of the bath that runs, nor the reply to stopping it, nor the worklist names it
    const running = await house.blindSheet(number, keeper)
    expect(running).toMatchObject({ blind: true, state: 'running', recorded: [{ amountText: null }] })
    expect(sent(running)).not.toMatch(shows)
    const today = async (by: TestPerson) => {
      const { items, log } = (await by.agent.get('/api/today').expect(200)).body
      return sent([...items, ...log].filter((one) => Object.values(one.params).includes(number)))
    }
    expect(await today(keeper)).toContain(number)
    expect(await today(keeper)).not.toMatch(shows)
    api.clock.set(new Date(testDay.getTime() + 45 * 60_000))
    const stopped = await keeper.agent
      .post(`/api/doses/${id}/stop`)
      .send({ id: api.nextId(), happenedAt: api.clock.now().toISOString(), cause: 'time-up' })
      .expect(201)
    expect(stopped.body).toMatchObject({ state: 'done', recorded: [{ amountText: null }] })
    expect(sent(stopped.body)).not.toMatch(shows)
    expect(await today(keeper)).not.toMatch(shows)
    expect(await next(keeper)).toBe('no-first')

    // who worked it out blind has earned it, who signed it knows it, and who is shown it is remembered
    expect(await next(house.second)).toBe('no-first')
    expect(await today(await api.as('veterinarian'))).toMatch(shows)
    const whole = await keeper.agent.get(house.doseAt(number)).expect(200)
    expect(sent(whole.body)).toMatch(shows)
    api.clock.set(new Date(testDay.getTime() + 24 * 60 * 60_000))
    await house.freshWater(bath)
    const second = house.doseAt(number).replace('/1', '/2')
    await house.technician.agent
      .post(`${second}/first-calculation`)
      .send({ id: api.nextId(), lotId: house.formalin.lotId })
      .expect(201)
    expect(await next(keeper)).toBe('amount-seen')
    expect(await next(house.second)).toBeNull()
  })

  it('nor by whoever worked the same drug out for the same water, as an order being written', async () => {
    const other = await house.tankWithSchool()
    const own = await house.tankWithSchool()
    const number = await house.signedBath(own)
    await house.freshWater(own)
    await house.calculateFirst(number).expect(201)
    const preview = async (of: BathTank, given: object = {}) =>
      (await house.second.agent.post('/api/order-previews').send(house.fieldsOf(of, given)).expect(200)).body
        .amount
    expect(await preview(other)).not.toBeNull()
    expect(await preview(own, { target: null })).toBeNull()
    expect((await house.blindSheet(number, house.second)).secondShut).toBeNull()
    expect(await preview(own)).toMatchObject({ measured: bathAmount })
    expect((await house.blindSheet(number, house.second)).secondShut).toBe('amount-seen')
    expect((await house.calculateSecond(own, number)).body.code).toBe('another-person-needed')
  })

  it('nor by whoever had worked it out before the order was signed', async () => {
    const own = await house.tankWithSchool()
    await house.freshWater(own)
    const keeper = await api.as('keeper')
    const look = await house.second.agent.post('/api/order-previews').send(house.fieldsOf(own)).expect(200)
    expect(look.body.amount).toMatchObject({ measured: bathAmount })
    const number = await house.signedBath(own)
    await house.calculateFirst(number).expect(201)
    expect((await house.blindSheet(number, house.second)).secondShut).toBe('amount-seen')
    expect((await house.calculateSecond(own, number)).body.code).toBe('another-person-needed')
    expect((await house.blindSheet(number, keeper)).secondShut).toBeNull()
  })

  it('nor by whoever began to write the order that another signed', async () => {
    await house.freshWater(bath)
    const number = await house.signedBath(bath, {}, house.second)
    await house.calculateFirst(number).expect(201)
    expect((await house.blindSheet(number, house.second)).secondShut).toBe('amount-seen')
    expect((await house.calculateSecond(bath, number)).body.code).toBe('another-person-needed')
    const keeper = await api.as('keeper')
    await house.calculateSecond(bath, number, {}, keeper).expect(201)
  })

  it('so the audit trail names no amount of it to a veterinarian who may be asked, and all of it to who signed', async () => {
    const other = await api.person({
      email: 'vet2@harrow-point.example',
      printedName: 'Second veterinarian',
      roles: ['veterinarian'],
    })
    const number = await aBathToCalculate()
    const entry = async (by: TestPerson) => {
      const { rows } = (await by.agent.get(`/api/audit?q=${number}`).expect(200)).body
      return rows.find((row: { action: string }) => row.action === 'dose.calculate-first')
    }
    const lotId = house.formalin.lotId
    expect(await entry(other)).toMatchObject({
      amountLeftOut: true,
      withheld: false,
      after: { key: '1', lotId },
    })
    expect((await entry(other)).after).not.toHaveProperty('amount')
    const signer = await api.as('veterinarian')
    for (const by of [signer, house.technician])
      expect(await entry(by)).toMatchObject({ amountLeftOut: false, after: { amount: bathAmount } })
    expect((await house.blindSheet(number, other)).secondShut).toBeNull()
    await house.calculateSecond(bath, number, {}, other).expect(201)
    await house.give(number).expect(201)
    expect(await entry(other)).toMatchObject({ amountLeftOut: false, after: { amount: bathAmount } })
  })

  it('nor by whoever signed the order, who has seen what they signed', async () => {
    const number = await aBathToCalculate()
    const signer = await api.as('veterinarian')
    expect((await house.blindSheet(number, signer)).secondShut).toBe('amount-seen')
    const own = await house.calculateSecond(bath, number, {}, signer)
    expect([own.status, own.body.code]).toEqual([403, 'another-person-needed'])
    expect(own.body.detail).toContain('or signed the order')
    // nobody else there: as the first one they may repeat it
    api.clock.set(new Date(testDay.getTime() + 60_000))
    await house.calculateFirst(number, signer).expect(201)
    api.clock.set(new Date(testDay.getTime() + 6 * 60_000))
    const alone = await house.calculateSecond(bath, number, { nobodyReached: true }, signer).expect(201)
    expect(alone.body.second).toMatchObject({ agrees: true, alone: true })
  })

  it('by whoever never made a first one, also when another worked it out again since', async () => {
    const number = await aBathToCalculate()
    api.clock.set(new Date(testDay.getTime() + 60_000))
    await house.calculateFirst(number, await api.as('veterinarian')).expect(201)
    const own = await house.calculateSecond(bath, number, {}, house.technician)
    expect(own.body.code).toBe('another-person-needed')
  })

  it('and after a disagreement both begin again; the same request again gives the first answer', async () => {
    const number = await aBathToCalculate()
    const wrong = { id: api.nextId(), amount: { value: '2180', unit: 'mL' } }
    const answer = await house.calculateSecond(bath, number, wrong).expect(201)
    expect(answer.body).toMatchObject({ secondShut: 'begin-again', second: { agrees: false } })
    expect((await house.calculateSecond(bath, number, wrong).expect(201)).body.second).toEqual(
      answer.body.second,
    )
    const right = await house.calculateSecond(bath, number)
    expect([right.status, right.body.code]).toEqual([409, 'calculations-begin-again'])
    expect(right.body.detail).toContain('The first is worked out anew')
    api.clock.set(new Date(testDay.getTime() + 60_000))
    await house.calculateFirst(number).expect(201)
    expect((await house.blindSheet(number, house.second)).secondShut).toBeNull()
    await house.calculateSecond(bath, number).expect(201)
    await house.give(number).expect(201)
  })

  it('and where nobody else can be reached, the same person repeats it after five minutes; the dose is marked so', async () => {
    const number = await aBathToCalculate()
    const repeat = (given: object = {}) => house.calculateSecond(bath, number, given, house.technician)
    const after = (minutes: number) => api.clock.set(new Date(testDay.getTime() + minutes * 60_000))
    const unsaid = await repeat()
    expect([unsaid.status, unsaid.body.code]).toEqual([403, 'another-person-needed'])
    expect((await house.blindSheet(number, house.technician)).repeatAt).toBe(
      new Date(testDay.getTime() + 5 * 60_000).toISOString(),
    )
    expect((await house.blindSheet(number, house.second)).repeatAt).toBeNull()
    after(4.9)
    const early = await repeat({ nobodyReached: true })
    expect([early.status, early.body.code]).toEqual([403, 'another-person-needed'])
    expect(early.body.detail).toContain('you may repeat it yourself from')
    // it is no way round for somebody else who was shown the amount
    const keeper = await api.as('keeper')
    await keeper.agent.get(house.doseAt(number)).expect(200)
    after(5)
    expect((await house.calculateSecond(bath, number, { nobodyReached: true }, keeper)).status).toBe(403)
    const done = await repeat({ nobodyReached: true }).expect(201)
    const calculated = 'Calculated alone by Test technician, repeated after 5 min.'
    expect(done.body.second).toMatchObject({ agrees: true, alone: true, aloneText: calculated })
    const paper = await pdfText(house.technician, house.doseAt(number, '/print'))
    expect(paper).toContain(calculated)
    const given = await house.give(number).expect(201)
    expect(given.body.recorded[0].exceptions).toMatchObject([
      {
        ruleId: 'R39',
        code: 'calculated-alone',
        level: 'warning',
        text: expect.stringContaining(calculated),
      },
    ])
    const order = await pdfText(house.technician, `/api/orders/${number}/print`)
    expect(order).toContain(`Dose 1: no second person calculated the amount. ${calculated}`)
    const veterinarian = await api.as('veterinarian')
    const today = (await veterinarian.agent.get('/api/today').expect(200)).body
    expect(JSON.stringify(today)).toContain(`dose-exceptions:${given.body.recorded[0].id}`)
  })

  it('and says so as well of a dose that was recorded afterwards; not of one that went in before', async () => {
    const codes = async (happenedAfterMinutes: number) => {
      api.clock.set(testDay)
      const number = await aBathToCalculate()
      const at = (minutes: number) => new Date(testDay.getTime() + minutes * 60_000)
      api.clock.set(at(5))
      await house.calculateSecond(bath, number, { nobodyReached: true }, house.technician).expect(201)
      api.clock.set(at(10))
      const happenedAt = at(happenedAfterMinutes).toISOString()
      const [record] = (await house.record(number, { happenedAt }).expect(201)).body.recorded
      return record.exceptions.map(({ code }: { code: string }) => code)
    }
    expect(await codes(6)).toContain('calculated-alone')
    expect(await codes(4)).not.toContain('calculated-alone')
  })

  it('where a repeat by the same person disagrees, it begins again as well', async () => {
    const number = await aBathToCalculate()
    api.clock.set(new Date(testDay.getTime() + 6 * 60_000))
    const wrong = { nobodyReached: true, amount: { value: '2180', unit: 'mL' } }
    const differs = await house.calculateSecond(bath, number, wrong, house.technician).expect(201)
    expect(differs.body).toMatchObject({ second: { agrees: false, alone: true }, repeatAt: null })
    const again = await house.calculateSecond(bath, number, { nobodyReached: true }, house.technician)
    expect([again.status, again.body.code]).toEqual([409, 'calculations-begin-again'])
    expect((await house.give(number)).status).toBe(409)
  })

  it('and compares the mark that was read with the depth that the volume rests on', async () => {
    const number = await aBathToCalculate()
    const unit = await house.calculateSecond(bath, number, { markRead: '0.68' })
    expect([unit.status, unit.body.errors[0].pointer]).toEqual([422, '/markRead'])
    expect(unit.body.errors[0].detail).toBe('Type the depth as a number with its unit, for example 0.68 m.')
    const low = await house.calculateSecond(bath, number, { markRead: '48 cm' }).expect(201)
    expect(low.body.second).toMatchObject({ agrees: false, differs: ['mark'], markCompared: true })
    expect((await house.give(number)).body.code).toBe('dose-not-possible')
  })
})
