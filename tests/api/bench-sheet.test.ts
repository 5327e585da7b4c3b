import { mkdirSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { calculators } from '../../shared/bench/calculators.ts'
import { curveOf } from '../../shared/bench/curve.ts'
import { evaluate } from '../../shared/bench/evaluate.ts'
import { formatWorking } from '../../shared/bench/present.ts'
import { fewerPoints, sayAcross, sayUp } from '../../shared/bench/say-curve.ts'
import { sayCaution } from '../../shared/bench/words.ts'
import { infoOf, nfkc, pageCount, pageTexts, textOf } from '../pdf/support/poppler.ts'
import { startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'
import { readPdf } from '../support/fetch-pdf.ts'

let api: TestApi
beforeAll(async () => {
  api = await startApi()
})
afterAll(() => api.stop())

/** Lines of working and steps of a plan that one page has room for. */
const mostLines = 12
/** The same where a curve stands below them: a formula takes a line for so many characters. */
const [mostLinesAboveCurve, charactersInLine] = [16, 48]
const flat = (text: string) => nfkc(text).replace(/\s+/g, ' ')

const at = (calculator: string) => `/api/bench/${calculator}/sheet`
async function sheet(calculator: string, body: object): Promise<Uint8Array> {
  const { agent } = await api.as('keeper')
  const bytes = await readPdf(agent.post(at(calculator)).send(body))
  const folder = process.env['PRATIQUE_PICTURES']
  if (folder) {
    mkdirSync(folder, { recursive: true })
    writeFileSync(path.join(folder, `sheet-${calculator}.pdf`), bytes)
  }
  return bytes
}

/** 75 mg/L of peroxide at 35 % w/w, 1.1317 g/mL, in 1,000 L known to 5 %. */
const peroxide = {
  target: { value: '75', unit: 'mg/L' },
  basis: 'active',
  volume: { value: '1000', unit: 'L' },
  volumeError: { value: '5', unit: 'percent' },
  form: 'liquid',
  strength: { value: '35', unit: 'percent_w_w' },
  strengthOf: 'active',
  density: { value: '1.1317', unit: 'g/mL' },
  division: { value: '1', unit: 'mL' },
}

describe('a printed sheet of the bench', () => {
  it('has the inputs as typed, the result with its range, working, sources with marks, cautions, time and person', async () => {
    const text = flat(textOf(await sheet('bath-dose', peroxide)))
    const inOrder = [
      'Harrow Point Sea Hall',
      'Bench: Bath dose',
      // 75 g ÷ 0.35 ÷ 1.1317 g/mL = 189.35 mL, on a measure of 1 mL
      'Product to add',
      '189 mL',
      '179.9 mL to 198.8 mL, by the stated errors',
      'Asked',
      'Target in the water 75 mg/L',
      'What the target is of The active substance',
      'Net volume of the water 1,000 L',
      'Error of the volume 5 %',
      'Strength on the label 35 % w/w',
      'Density of the product 1.1317 g/mL',
      'Cautions',
      'A wrong volume is a wrong dose',
      'Working',
      '1,000 L × 75 mg/L',
      'Sources',
      'SRAC',
      '(V',
      'Decision support for licensed professionals.',
    ]
    let from = 0
    for (const part of inOrder) {
      const found = text.indexOf(nfkc(part), from)
      expect(
        found,
        `"${part}" after "${text.slice(Math.max(0, from - 60), from + 200)}"`,
      ).toBeGreaterThanOrEqual(0)
      from = found + part.length
    }
    expect(text).toContain('Not a treatment order, not signed.')
    expect(text).toContain(
      'Printed 1 Dec 2026, 14:20, UTC−4, by Test keeper. Nothing of it is kept as a record.',
    )
    expect(text).toContain('Page 1 of 1')
    expect(text).not.toContain('Record check')
  })

  it.each([
    ['Letter', '612 x 792 pts (letter)'],
    ['A4', '595.276 x 841.89 pts (A4)'],
  ])(
    'stands on one page of %s for the example of every calculator; a long working takes a second',
    async (paper, size) => {
      await api.setSetting('facility.paper', paper)
      const taken: [string, number][] = []
      for (const of of calculators) {
        const evaluation = evaluate(of, of.example)
        if (!evaluation.ok) throw new Error(of.id)
        const { cautions, working, schedule } = evaluation.answer
        const bytes = await sheet(of.id, of.example)
        expect(infoOf(bytes)['Page size'], of.id).toBe(size)
        const drawn = formatWorking(evaluation.answer).reduce(
          (lines, { formula }) => lines + Math.ceil(formula.length / charactersInLine),
          0,
        )
        const isLong =
          working.length + (schedule?.rows.length ?? 0) > mostLines ||
          (drawn > mostLinesAboveCurve && curveOf(of, of.example) !== null)
        const pages = pageCount(bytes)
        if (pages > (isLong ? 2 : 1)) taken.push([of.id, pages])
        const first = flat(pageTexts(bytes)[0] ?? '')
        for (const caution of cautions) expect(first, of.id).toContain(flat(sayCaution(of, caution)))
      }
      expect(taken).toEqual([])
    },
    120_000,
  )

  it('has the curve as a table with the own point marked, and none for a plan, whose steps it has', async () => {
    const ammonia = calculators.find(({ id }) => id === 'un-ionised-ammonia')
    if (!ammonia) throw new Error('no such calculator')
    const curve = curveOf(ammonia, ammonia.example)
    if (!curve) throw new Error('no curve')
    const text = flat(textOf(await sheet(ammonia.id, ammonia.example)))
    const [, table = ''] = text.split('How it changes')
    const shown = fewerPoints(curve, 8)
    expect(shown).toHaveLength(8)
    const across = shown.map((point) => `${point.own ? 'as typed ' : ''}${sayAcross(curve, point).number}`)
    const up = shown.map((point) => sayUp(curve, point)?.number ?? 'no answer')
    for (const figure of across) expect(table).toContain(flat(figure))
    expect(table).toContain(flat(up.join(' ')))
    expect(table.match(/as typed/g)).toHaveLength(1)
    const plan = calculators.find(({ id }) => id === 'salinity-change')
    if (!plan) throw new Error('no such calculator')
    const steps = flat(textOf(await sheet(plan.id, plan.example)))
    expect(steps).toContain('Step by step')
    expect(steps).not.toContain('How it changes')
  })

  it('says on every page of a long plan that it is no order', async () => {
    const steps = {
      way: 'steps',
      start: { value: '35', unit: 'PSS-78' },
      target: { value: '5', unit: 'PSS-78' },
      replacement: { value: '0', unit: 'PSS-78' },
      volume: { value: '2000', unit: 'L' },
      perDay: { value: '0.5', unit: 'PSS-78' },
    }
    const pages = pageTexts(await sheet('salinity-change', steps))
    // sixty lines of working, most of them on two lines, and sixty steps
    expect(pages.length).toBeGreaterThan(1)
    expect(pages.length).toBeLessThanOrEqual(6)
    for (const page of pages)
      expect(page.replaceAll('\n', ' ')).toContain('Not a treatment order, not signed.')
  })

  it('spells out a name that the typeface has no letters for', async () => {
    const person = await api.person({
      email: 'fish@harrow-point.example',
      printedName: 'Kim 🐟',
      roles: ['keeper'],
    })
    const bytes = await readPdf(person.agent.post(at('bath-dose')).send(peroxide))
    expect(textOf(bytes)).toContain('by Kim [U+1F41F]')
  })

  it('is refused to nobody signed in, for input at fault, and where there is no calculator', async () => {
    expect((await api.anonymous().post(at('bath-dose')).send(peroxide)).status).toBe(401)
    const { agent } = await api.as('keeper')
    const refused = await agent.post(at('bath-dose')).send({ ...peroxide, volume: { value: '0', unit: 'L' } })
    expect(refused.status).toBe(422)
    expect(refused.body).toMatchObject({
      code: 'not-computable',
      errors: [{ pointer: '/volume', code: 'not-above-zero' }],
    })
    const bare = await agent.post(at('bath-dose')).send({ ...peroxide, target: { value: 25, unit: 'ppm' } })
    expect(bare.body.errors[0]).toMatchObject({ pointer: '/target', code: 'bare-ppm' })
    expect((await agent.post(at('no-such-thing')).send({})).status).toBe(404)
    expect(
      (await agent.post(at('bath-dose')).set('Content-Type', 'application/json').send('{"a":')).status,
    ).toBe(400)
    expect(
      (await agent.post(at('bath-dose')).set('Content-Type', 'application/json').send('[1]')).status,
    ).toBe(422)
  })
})
