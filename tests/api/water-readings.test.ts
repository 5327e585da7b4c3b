import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { anEnclosure, aValve, aWaterBody } from '../builders/a-water.ts'
import type { BuiltEnclosure } from '../builders/a-water.ts'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let tank: BuiltEnclosure
let sumpId: string
beforeAll(async () => {
  api = await startApi()
  tank = await anEnclosure(api, 'KH-1', { area: 'Kelp hall' })
  sumpId = await aWaterBody(api, 'KS-1')
  await aValve(api, 'V-KH1', [tank.waterBodyId, sumpId])
})
afterAll(() => api.stop())

const reading = (parameter: string, value: string, unit: string, more: object = {}) => ({
  id: api.nextId(),
  parameter,
  value: { value, unit },
  ...more,
})
const body = (readings: object[], more: object = {}) => ({
  waterBodyId: tank.waterBodyId,
  happenedAt: '2026-12-01T18:00:00Z',
  readings,
  ...more,
})
const post = async (role: 'technician' | 'keeper' | 'registrar', sent: object) =>
  (await api.as(role)).agent.post('/api/readings').send(sent)

describe('readings', () => {
  it('keeps the digits of the instrument, and the canonical value beside them', async () => {
    const reply = await post(
      'keeper',
      body([
        reading('dissolved-oxygen', '5.80', 'mg/L', { instrument: 'Meter 4' }),
        reading('temperature', '78.1', 'degF'),
        reading('ph', '8.10', 'pH', { scale: 'nbs' }),
        reading('total-ammonia-n', '0.05', 'mg/L', { below: true }),
      ]),
    )
    expect(reply.status).toBe(201)
    const [oxygen, temperature, ph, ammonia] = reply.body.readings
    expect(oxygen).toMatchObject({
      value: { value: '5.80', unit: 'mg/L' },
      canonicalValue: 5.8,
      instrument: 'Meter 4',
      happenedOn: '2026-12-01',
      recordedBy: 'Test keeper',
      judgement: { level: 'no-range' },
    })
    // (78.1 − 32) × 5 ÷ 9
    expect(temperature.canonicalValue).toBeCloseTo(25.611_111, 5)
    expect(temperature).toMatchObject({ value: { value: '78.1', unit: 'degF' }, canonicalUnit: 'degC' })
    expect(ph).toMatchObject({ scale: 'nbs', value: { value: '8.10' } })
    expect(ammonia).toMatchObject({ below: true, value: { value: '0.05' } })
  })

  it('answers the same form sent twice as the first time, and refuses other content under the same id', async () => {
    const sent = body([reading('nitrite-n', '0.06', 'mg/L')])
    expect((await post('technician', sent)).status).toBe(201)
    const again = await post('technician', sent)
    expect(again.status).toBe(201)
    expect(again.body.readings).toHaveLength(1)
    const changed = structuredClone(sent)
    ;(changed.readings[0] as { value: { value: string } }).value.value = '0.6'
    const other = await post('technician', changed)
    expect([other.status, other.body.code]).toEqual([409, 'id-already-used'])
  })

  it.each([
    ['a bare ppm', 'nitrate-n', '10', 'ppm', '/readings/0/value', 'bare-ppm'],
    ['a length for a temperature', 'temperature', '10', 'cm', '/readings/0/value', 'dimensions-differ'],
    ['words', 'salinity', 'about 33', 'PSS-78', '/readings/0/value', 'not-a-number'],
    [
      'a comma that may be thousands',
      'alkalinity',
      '1,280',
      'mg/L_CaCO3',
      '/readings/0/value',
      'thousands-or-decimal',
    ],
    ['a negative oxygen', 'dissolved-oxygen', '-1', 'mg/L', '/readings/0/value', 'below-least'],
    ['a temperature no water has', 'temperature', '256', 'degC', '/readings/0/value', 'above-most'],
    ['a pH without its scale', 'ph', '8.1', 'pH', '/readings/0/scale', 'ph-scale-missing'],
  ])('refuses %s, and says what to do', async (_what, parameter, value, unit, pointer, code) => {
    const reply = await post('technician', body([reading(parameter, value, unit)]))
    expect(reply.status).toBe(422)
    expect(reply.body.errors[0]).toMatchObject({ pointer, code })
    expect(reply.body.errors[0].detail.length).toBeGreaterThan(15)
  })

  it('writes all of a form or nothing, and names every fault', async () => {
    const good = reading('salinity', '33.1', 'g/kg')
    const reply = await post(
      'technician',
      body([good, reading('nitrate-n', '1', 'ppm'), reading('ph', '81', 'pH', { scale: 'nbs' })]),
    )
    expect(reply.status).toBe(422)
    expect(reply.body.errors.map((error: { pointer: string }) => error.pointer)).toEqual([
      '/readings/1/value',
      '/readings/2/value',
    ])
    const { agent } = await api.as('technician')
    const list = await agent.get('/api/enclosures/KH-1/readings?parameter=salinity').expect(200)
    expect(list.body.total).toBe(0)
  })

  it('refuses a time in the future and an unknown water; takes one of last week', async () => {
    const ahead = await post(
      'keeper',
      body([reading('temperature', '12', 'degC')], { happenedAt: '2026-12-01T18:26:00Z' }),
    )
    expect([ahead.status, ahead.body.code]).toEqual([422, 'in-the-future'])
    const skewed = await post(
      'keeper',
      body([reading('temperature', '12', 'degC')], { happenedAt: '2026-12-01T18:24:00Z' }),
    )
    expect(skewed.status).toBe(201)
    // it was entered on a phone whose clock is fast; it counts from now on, not in four minutes
    const { agent } = await api.as('keeper')
    const { latest } = (await agent.get('/api/enclosures/KH-1/water').expect(200)).body
    expect(latest.find((row: { parameter: string }) => row.parameter === 'temperature').value.value).toBe(
      '12',
    )
    const nowhere = await post(
      'keeper',
      body([reading('temperature', '12', 'degC')], { waterBodyId: api.nextId() }),
    )
    expect([nowhere.status, nowhere.body.code]).toEqual([404, 'not-found'])
    const late = await post(
      'keeper',
      body([reading('temperature', '11.4', 'degC')], { happenedAt: '2026-11-24T01:30:00Z' }),
    )
    // 21:30 of the day before at the facility, UTC−4
    expect(late.body.readings[0]).toMatchObject({ happenedOn: '2026-11-23' })
  })

  it('is refused for somebody who may not measure', async () => {
    const reply = await post('registrar', body([reading('temperature', '12', 'degC')]))
    expect([reply.status, reply.body.code]).toEqual([403, 'may-not'])
  })

  it('stays readable when struck through, and no longer counts', async () => {
    const { agent } = await api.as('keeper')
    const wrong = reading('conductivity', '5.2', 'mS/cm')
    await post(
      'keeper',
      body([reading('conductivity', '50.1', 'mS/cm')], { happenedAt: '2026-12-01T17:00:00Z' }),
    )
    await post('keeper', body([wrong]))
    const strike = (key: string) =>
      agent
        .post(`/api/water-records/reading/${wrong.id}/void`)
        .set('Idempotency-Key', key)
        .send({ reason: 'point of the meter misread' })
    const key = newKey()
    await strike(key).expect(200)
    await strike(key).expect(200)
    expect((await strike(newKey()).expect(409)).body.code).toBe('already-void')
    const shown = await agent.get('/api/enclosures/KH-1/readings?parameter=conductivity').expect(200)
    expect(shown.body.rows.map((row: { value: { value: string } }) => row.value.value)).toEqual(['50.1'])
    const all = await agent
      .get('/api/enclosures/KH-1/readings?parameter=conductivity&voided=with')
      .expect(200)
    expect(all.body.rows[0]).toMatchObject({
      voided: { reason: 'point of the meter misread', by: 'Test keeper' },
    })
    const water = await agent.get('/api/enclosures/KH-1/water').expect(200)
    const latest = water.body.latest.find((row: { parameter: string }) => row.parameter === 'conductivity')
    expect(latest.value.value).toBe('50.1')
    await agent
      .post(`/api/water-records/reading/${api.nextId()}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'not there' })
      .expect(404)
  })

  it('leaves an audit entry with what was entered', async () => {
    const { agent } = await api.as('administrator')
    const trail = await agent.get('/api/audit?q=reading.record&limit=1').expect(200)
    expect(trail.body.rows[0]).toMatchObject({ action: 'reading.record', subjectLabel: 'KH-1' })
    expect((await agent.get('/api/audit?q=reading.void').expect(200)).body.total).toBe(1)
  })

  it('shows sump readings on the page of the tank, and prefers the tank’s own for what is newest', async () => {
    const { agent } = await api.as('technician')
    await post('technician', body([reading('nitrate-n', '12', 'mg/L')], { waterBodyId: sumpId }))
    await post(
      'technician',
      body([reading('alkalinity', '2.5', 'meq/L')], { happenedAt: '2026-11-30T12:00:00Z' }),
    )
    await post('technician', body([reading('alkalinity', '2.9', 'meq/L')], { waterBodyId: sumpId }))
    const { latest } = (await agent.get('/api/enclosures/KH-1/water').expect(200)).body
    const of = (parameter: string) => latest.find((row: { parameter: string }) => row.parameter === parameter)
    expect(of('nitrate-n')).toMatchObject({ waterBodyCode: 'KS-1', value: { value: '12' } })
    expect(of('alkalinity')).toMatchObject({ waterBodyCode: 'KH-1', value: { value: '2.5' } })
  })

  it('gives the shown readings as CSV, formulas made harmless', async () => {
    const { agent } = await api.as('technician')
    await post('technician', body([reading('oxidation-reduction', '-12', 'mV', { note: '=1+1' })]))
    const reply = await agent
      .get('/api/enclosures/KH-1/readings.csv?parameter=oxidation-reduction')
      .expect(200)
    expect(reply.headers['content-type']).toBe('text/csv; charset=utf-8')
    const [head, row] = reply.text.replace(/^\ufeff/, '').split('\r\n')
    expect(head).toMatch(/^Measured at,Facility date,Water,Parameter,Value,Unit/)
    expect(row).toContain("'=1+1")
    expect(row).toContain('oxidation-reduction potential')
  })
})

describe('what is wanted', () => {
  const range = (more: object) => ({ id: api.nextId(), parameter: 'dissolved-oxygen', unit: 'mg/L', ...more })
  const send = async (role: 'technician' | 'keeper', sent: object) =>
    (await api.as(role)).agent.post('/api/enclosures/KH-1/ranges').send(sent)

  it('judges the newest reading by inner and outer limits', async () => {
    const set = await send('technician', range({ outerLow: '4.5', innerLow: '5.5', innerHigh: '9.0' }))
    expect(set.status).toBe(201)
    expect(set.body.ranges[0]).toMatchObject({
      innerLow: 5.5,
      entered: { innerHigh: '9.0', outerHigh: null },
    })
    const { agent } = await api.as('technician')
    // the worked example of the water alerts: limits 5.5 inner, 4.5 outer
    for (const [value, level] of [
      ['5.5', 'inside'],
      ['5.4', 'inner'],
      ['4.5', 'inner'],
      ['4.4', 'outer'],
      ['9.1', 'inner'],
    ]) {
      api.clock.set(new Date(api.clock.now().getTime() + 60_000))
      const sent = body([reading('dissolved-oxygen', value ?? '', 'mg/L')], {
        happenedAt: api.clock.now().toISOString(),
      })
      const reply = await post('technician', sent)
      expect(reply.body.readings[0].judgement.level, value).toBe(level)
    }
    const list = await agent.get('/api/water?state=outside').expect(200)
    expect(list.body.rows[0]).toMatchObject({ code: 'KH-1', outside: [{ value: { value: '9.1' } }] })
  })

  it('refuses limits that do not rise, and limits without a number', async () => {
    const reversed = await send('technician', range({ innerLow: '6', innerHigh: '5' }))
    expect(reversed.body.errors[0]).toMatchObject({ pointer: '/innerHigh', code: 'range-out-of-order' })
    const outside = await send('technician', range({ outerLow: '6', innerLow: '5.5' }))
    expect(outside.body.errors[0]).toMatchObject({ pointer: '/innerLow' })
    const words = await send('technician', range({ innerLow: 'some' }))
    expect(words.body.errors[0]).toMatchObject({ pointer: '/innerLow', code: 'not-a-number' })
  })

  it('keeps the earlier range in the ledger; a set without limits ends it', async () => {
    const ended = await send('technician', range({}))
    expect(ended.body.ranges).toEqual([])
    const again = await send('technician', range({ innerLow: '5' }))
    expect(again.body.ranges).toHaveLength(1)
  })

  it('is set by those who look after the water, not by keepers', async () => {
    const reply = await send('keeper', range({ innerLow: '5' }))
    expect([reply.status, reply.body.code]).toEqual([403, 'may-not'])
  })
})

describe('water events', () => {
  const event = (more: object) => ({
    id: api.nextId(),
    waterBodyId: tank.waterBodyId,
    happenedAt: '2026-12-01T17:00:00Z',
    kind: 'water-change',
    ...more,
  })
  const send = async (sent: object) => (await api.as('keeper')).agent.post('/api/water-events').send(sent)

  it('takes a water change by amount or by share, once', async () => {
    const byAmount = event({ amount: { value: '120', unit: 'gal_us' } })
    const reply = await send(byAmount)
    expect(reply.status).toBe(201)
    // 120 × 3.785411784 L
    expect(reply.body.amountLitres).toBeCloseTo(454.249_414, 6)
    expect((await send(byAmount)).status).toBe(201)
    expect((await send(event({ sharePercent: '30' }))).body).toMatchObject({ sharePercent: 30, amount: null })
    const { agent } = await api.as('keeper')
    const { events } = (await agent.get('/api/enclosures/KH-1/water').expect(200)).body
    expect(events).toHaveLength(2)
  })

  it.each([
    ['neither amount nor share', {}, '/amount'],
    ['both', { amount: { value: '5', unit: 'L' }, sharePercent: '5' }, '/amount'],
    ['a share of nothing', { sharePercent: '0' }, '/sharePercent'],
    ['more than all', { sharePercent: '120' }, '/sharePercent'],
    ['a negative amount', { amount: { value: '-5', unit: 'L' } }, '/amount'],
    ['a gallon of no country', { amount: { value: '5', unit: 'gal' } }, '/amount'],
    ['a share of a backwash', { kind: 'backwash', sharePercent: '5' }, '/sharePercent'],
  ])('refuses %s', async (_what, more, pointer) => {
    const reply = await send(event(more))
    expect(reply.status).toBe(422)
    expect(reply.body.errors[0].pointer).toBe(pointer)
  })
})
