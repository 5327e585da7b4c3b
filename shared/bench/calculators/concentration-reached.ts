import { checkDrift } from '../../domain/dose/check-drift.ts'
import { concentrationReached as reachedBy } from '../../domain/dose/concentration-reached.ts'
import { doseLimits } from '../../domain/dose/dose-limits.ts'
import { productVolumeReached } from '../../domain/dose/product-volume-reached.ts'
import { ok, refuse, type Result } from '../../domain/result.ts'
import type { ParsedQuantity } from '../../domain/units/parse-quantity.ts'
import { unitOf } from '../../domain/units/unit-of.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchCaution, type BenchLine, type Figure } from '../definition.ts'
import { quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { formalinCautions, formalinWords } from './parts/formalin-cautions.ts'
import {
  basisInput,
  basisWords,
  productFields,
  productInputs,
  productOf,
  productWords,
  targetUnits,
} from './parts/product-input.ts'
import { volumeInputs, volumeWords, withVolumeAsEntered } from './parts/volume-input.ts'

/** What concentration an amount that was really added makes, in a tank or in a bottle of stock. */
export const concentrationReached = defineCalculator({
  id: 'concentration-reached',
  group: 'dose',
  words: defineMessages({
    name: 'Concentration reached',
    purpose: 'What concentration an amount that was really added makes, in a tank or in a bottle of stock.',
    search: 'formalin formaldehyde',
    formula: 'concentration = amount × strength × share ÷ volume',
    'input.amount': 'Amount added',
    'help.amount': 'What was weighed or measured, of the product as it stands on the shelf.',
    'input.basis': 'What the concentration is wanted of',
    ...basisWords,
    ...volumeWords,
    ...productWords,
    'input.wanted': 'Target of the order',
    'help.wanted': 'On the same basis. Left open, nothing is compared.',
    'result.reached': 'Concentration reached',
    'result.by-volume': 'Product in the water, by volume',
    'result.difference': 'Difference from the target',
    'line.difference': 'Difference from the target',
    'caution.above-wanted': (p: { most: string }) =>
      `This is more than ${p.most} % above the target. Tell the veterinarian now. Water changes thin it; the calculator of water changes says how many.`,
    'caution.below-wanted': (p: { most: string }) =>
      `This is more than ${p.most} % below the target. Add nothing before the veterinarian has been asked.`,
    ...formalinWords,
    'caution.what-went-in':
      'This is what went in, evenly mixed and before any loss. What was in the water before is not counted: only a test says what is there.',
    'caution.volume': 'A wrong volume is a wrong dose: say how the volume was found, and when.',
  }),
  inputs: {
    amount: quantity({ units: ['g', 'mg', 'kg', 'mL', 'L', 'uL', 'lb', 'oz_av'], limits: { above: 0 } }),
    basis: basisInput,
    ...volumeInputs,
    ...productInputs,
    wanted: quantity({ units: targetUnits, limits: { above: 0 }, optional: true }),
  },
  fields: productFields,
  example: {
    amount: { value: '25', unit: 'mL' },
    basis: 'active',
    volume: { value: '1000', unit: 'L' },
    volumeError: { value: '5', unit: 'percent' },
    form: 'liquid',
    strength: { value: '37', unit: 'percent_w_w' },
    strengthOf: 'active',
    density: { value: '1.08', unit: 'g/mL' },
    wanted: { value: '9.25', unit: 'mg/L' },
  },
  sources: ['srac-410', 'cfr-529-1030'],
  cautions: [
    { code: 'what-went-in', level: 'note' },
    { code: 'volume', level: 'note' },
  ],
  published: [
    'formaldehyde_from_formalin_uL_per_L',
    'product_mg_per_L_from_uL_per_L',
    'cu_from_copper_sulfate_pentahydrate',
    'stock_cu_mg_per_mL',
  ],
  compute(given) {
    const { amount, basis, volume, wanted } = given
    const product = productOf(given)
    const netLitres = volume.value
    const figures: Figure[] = []
    const working: BenchLine[] = []
    const poured = unitOf(amount.entered.unit).dimension === 'volume'
    if (basis === 'product' && poured && product.form === 'liquid') {
      const reached = productVolumeReached({ amount: amount.entered, netLitres })
      if (!reached.ok) return reached
      figures.push({ key: 'by-volume', value: reached.value.ulPerL, unit: 'uL/L', kind: 'dose' })
      working.push(...reached.value.working)
    }
    if (figures.length === 0 || product.density !== undefined) {
      const reached = reachedBy({ amount: amount.entered, basis, netLitres, product })
      if (!reached.ok) return reached
      figures.push({ key: 'reached', value: reached.value.mgPerL, unit: 'mg/L', kind: 'dose' })
      const known = new Set(working.map((each) => each.key))
      working.push(...reached.value.working.filter((each) => !known.has(each.key)))
    }
    const compared = wanted ? compare(figures, working, wanted) : ok(undefined)
    if (!compared.ok) return compared
    const [first, ...rest] = figures
    if (first === undefined) return refuse('blank', 'amount')
    const asked = formalinCautions({ ...given, target: first })
    return ok({
      figures: [first, ...rest, ...(compared.value ? [compared.value.figure] : [])],
      working: [...withVolumeAsEntered(working, volume), ...(compared.value ? [compared.value.line] : [])],
      cautions: [...(compared.value?.cautions ?? []), ...asked.cautions],
      sources: asked.sources,
    })
  },
})

interface Compared {
  figure: Figure
  line: BenchLine
  cautions: BenchCaution[]
}

/** How far what was reached is from the target, in the figure that has the target's kind of unit. */
function compare(
  figures: readonly Figure[],
  working: readonly BenchLine[],
  wanted: ParsedQuantity,
): Result<Compared> {
  const figure = figures.find((each) => each.unit === wanted.unit)
  const from = working.findLast((each) => each.value === figure?.value)
  if (figure === undefined || from === undefined) return refuse('dimensions-differ', 'wanted')
  const most = doseLimits.volumeDriftPercent
  const drift = checkDrift(wanted.value, figure.value, most)
  if (!drift.ok) return { ok: false, refusal: { ...drift.refusal, field: 'amount' } }
  const { percent, within } = drift.value
  const expression = `(${valueTerm(figure.value, figure.unit)} / (${enteredTerm(wanted)}) - 1) * 100`
  const code = percent > 0 ? 'above-wanted' : 'below-wanted'
  const level = percent > 0 ? 'warning' : 'note'
  return ok({
    figure: { key: 'difference', value: percent, unit: 'percent', kind: 'reading' },
    line: line('difference', expression, percent, 'percent', [from.key]),
    cautions: within ? [] : [{ code, level, params: { most } }],
  })
}
