import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { calculators } from '../../shared/bench/calculators.ts'
import { startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
beforeAll(async () => {
  api = await startApi()
})
afterAll(() => api.stop())

const everybody = ['veterinarian', 'technician', 'keeper', 'registrar', 'administrator'] as const
const ask = async (calculator: string, body: object | string) =>
  (await api.as('technician')).agent
    .post(`/api/bench/${calculator}`)
    .set('Content-Type', 'application/json')
    .send(typeof body === 'string' ? body : JSON.stringify(body))

/** 25 µL/L of formalin as it stands on the shelf, in 3,785 L. */
const formalin = {
  target: { value: '25', unit: 'uL/L' },
  basis: 'product',
  form: 'liquid',
  volume: { value: '3785', unit: 'L' },
}

describe('the bench', () => {
  it('lists every calculator with what it takes, to everybody', async () => {
    for (const role of everybody) {
      const reply = await (await api.as(role)).agent.get('/api/bench')
      expect(reply.status).toBe(200)
      expect(reply.body.calculators.map((one: { id: string }) => one.id)).toEqual(
        calculators.map(({ id }) => id),
      )
    }
    const { body } = await (await api.as('keeper')).agent.get('/api/bench')
    for (const one of body.calculators) {
      expect(one.purpose).toMatch(/ /)
      expect(Object.keys(one.body.properties).length).toBeGreaterThan(0)
      expect(one.sources.length).toBeGreaterThan(0)
    }
  })

  it('refuses who has not signed in, before anything is read', async () => {
    expect((await api.anonymous().get('/api/bench')).status).toBe(401)
    expect((await api.anonymous().post('/api/bench/bath-dose').send('{')).status).toBe(401)
    expect((await api.anonymous().post('/api/bench/nothing').send({})).status).toBe(401)
  })

  it('describes itself to people and to programs, once they signed in', async () => {
    expect((await api.anonymous().get('/api/docs')).status).toBe(401)
    const page = await (await api.as('registrar')).agent.get('/api/docs')
    expect(page.status).toBe(200)
    expect(page.type).toBe('text/html')
    const machine = await (await api.as('registrar')).agent.get('/api/openapi.json')
    for (const { id } of calculators) {
      expect(page.text).toContain(`POST /api/bench/${id}<`)
      expect(machine.body.paths[`/api/bench/${id}`].post.operationId).toBe(`bench:${id}`)
    }
  })

  it('answers every example with working, sources and digits', async () => {
    for (const of of calculators) {
      const reply = await ask(of.id, of.example)
      expect(reply.status, of.id).toBe(200)
      expect(Number.isFinite(reply.body.value)).toBe(true)
      expect(reply.body.significantFigures).toBeGreaterThan(0)
      expect(reply.body.working.length).toBeGreaterThan(0)
      expect(reply.body.sources.length).toBeGreaterThan(0)
    }
  })

  it('works out formalin by volume, taking a number for digits', async () => {
    const reply = await ask('bath-dose', { ...formalin, target: { value: 25, unit: 'µL/L' } })
    expect(reply.status).toBe(200)
    // 25 µL/L × 3,785 L: arithmetic of 21 CFR 529.1030, amounts in µL/L
    expect(reply.body).toMatchObject({ value: 94.625, unit: 'mL', shown: '94.63\u00a0mL', range: null })
    expect(reply.body.working.at(-1)).toMatchObject({
      formula: expect.stringContaining('25\u00a0µL/L'),
      unit: 'mL',
    })
  })

  it('carries the error of the volume to the result and rounds by it', async () => {
    const reply = await ask('bath-dose', { ...formalin, volumeError: { value: '10', unit: 'percent' } })
    expect(reply.body.range).toMatchObject({ low: 85.1625, high: 104.0875 })
    expect(reply.body).toMatchObject({ value: 94.625, significantFigures: 2, shown: '95\u00a0mL' })
  })

  it.each([
    ['bare ppm', { target: { value: 25, unit: 'ppm' } }, '/target', 'bare-ppm'],
    ['a gallon of no country', { volume: { value: '1000', unit: 'gal' } }, '/volume', 'gallon-not-stated'],
    ['no basis', { basis: undefined }, '/basis', 'basis-missing'],
    ['zero volume', { volume: { value: '0', unit: 'L' } }, '/volume', 'not-above-zero'],
    [
      'a thousand or a decimal',
      { volume: { value: '11,400', unit: 'L' } },
      '/volume',
      'thousands-or-decimal',
    ],
    [
      'a part of a quantity that it does not know',
      { volume: { value: '1000', unit: 'L', error: '50' } },
      '/volume',
      'quantity-part-unknown',
    ],
    [
      'a figure of which only rounding is left',
      { volume: { value: '0.0000000000000001', unit: 'L' } },
      '/volume',
      'too-near-zero',
    ],
    ['a name it does not know', { colour: 'red' }, '/colour', 'not-asked'],
    [
      '35 % by weight of a liquid without its density',
      {
        basis: 'active',
        target: { value: '75', unit: 'mg/L' },
        strength: { value: '35', unit: 'percent_w_w' },
        strengthOf: 'active',
      },
      '/density',
      'density-missing',
    ],
  ])('refuses %s with a code and a sentence', async (_, given, pointer, code) => {
    const reply = await ask('bath-dose', { ...formalin, ...given })
    expect(reply.status).toBe(422)
    expect(reply.headers['content-type']).toMatch('application/problem+json')
    expect(reply.body).toMatchObject({ code: 'not-computable', errors: [{ pointer, code }] })
    expect(reply.body.errors[0].detail).toMatch(/^[A-Z“].*\.$/)
  })

  it('names every input at fault, and answers broken bodies as all addresses do', async () => {
    const none = await ask('bath-dose', {})
    expect(none.body.errors.map((one: { pointer: string }) => one.pointer)).toEqual([
      '/target',
      '/basis',
      '/volume',
      '/form',
    ])
    expect((await ask('bath-dose', '{"target":')).status).toBe(400)
    expect((await ask('bath-dose', '[1]')).status).toBe(422)
    expect((await ask('no-such-calculator', {})).status).toBe(404)
  })
})
