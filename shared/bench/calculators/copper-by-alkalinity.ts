import { copperInPentahydrate } from '../../domain/dose/copper.ts'
import { copperAlkalinityRule, copperByAlkalinity } from '../../domain/dose/copper-by-alkalinity.ts'
import { computeBathDose } from '../../domain/dose/compute-bath-dose.ts'
import { ok, refuse } from '../../domain/result.ts'
import { convert } from '../../domain/units/convert.ts'
import type { ParsedQuantity } from '../../domain/units/parse-quantity.ts'
import { quantityOf } from '../../domain/units/quantity-of.ts'
import { valueTerm } from '../../domain/working/value-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchCaution, type BenchLine } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { copperCautions, copperWords } from './parts/copper-words.ts'
import { measuredFigure } from './parts/measured-figure.ts'
import { volumeUnits, withVolumeAsEntered } from './parts/volume-input.ts'

/** Copper sulfate for fresh water by its total alkalinity. */
export const copperByAlkalinityCalculator = defineCalculator({
  id: 'copper-by-alkalinity',
  group: 'dose',
  words: defineMessages({
    name: 'Copper by alkalinity',
    purpose: 'Copper sulfate for fresh water by its total alkalinity: a hundredth of it.',
    formula: 'copper sulfate = total alkalinity ÷ 100',
    'input.product': 'Copper product',
    'option.product.pentahydrate': 'Copper sulfate pentahydrate',
    'option.product.chelated': 'A chelated or amine-complexed product',
    'input.water': 'Water',
    'option.water.fresh': 'Fresh water',
    'option.water.salt': 'Sea water or brackish water',
    'input.salinity': 'Salinity by a test',
    'input.alkalinity': 'Total alkalinity',
    'help.alkalinity': 'Measured today. It is not the hardness, though both are told as CaCO₃.',
    'input.volume': 'Net volume of the water',
    'input.volumeError': 'Error of the volume',
    'input.purity': 'Purity of the salt',
    'input.division': 'Smallest step of the balance',
    'result.amount': 'Copper sulfate to weigh',
    'result.sulfate': 'Copper sulfate in the water',
    'result.copper': 'Copper in it',
    'result.pounds': 'The same in pounds',
    'line.alkalinity': 'Total alkalinity as CaCO₃',
    'line.sulfate': 'Copper sulfate, a hundredth of the alkalinity that is counted',
    'line.copper': 'Copper in it',
    'refusal.alkalinity-too-low-for-copper': (p: { limit: string; unit?: string }) =>
      `Below ${p.limit} mg/L as CaCO₃ copper can kill fish at the dose that treats them. No figure is given: a bioassay in this very water comes first.`,
    'refusal.copper-rule-fresh-water-only':
      'This rule was found in fresh water and means nothing in salt water. Use the copper sulfate calculator with a target of free copper.',
    'refusal.alkalinity-rule-chelated-product':
      'The rule is of copper sulfate. Dose a chelated product by its label, in total copper, and test it the way its maker says.',
    'caution.capped': (p: { cap: string }) =>
      `More than ${p.cap} mg/L of alkalinity is counted as ${p.cap} (common practice, from memory).`,
    ...copperWords,
    'caution.least': (p: { least: string }) =>
      `Below ${p.least} mg/L of alkalinity no copper is used without a bioassay: measure it again before every dose.`,
    'caution.oxygen':
      'Killed algae take oxygen from the water for days (common practice, from memory): aerate, and treat a part at a time.',
    'caution.volume': 'A wrong volume is a wrong dose: say how the volume was found, and when.',
  }),
  inputs: {
    product: choice(['pentahydrate', 'chelated']),
    water: choice(['fresh', 'salt']),
    salinity: quantity({
      units: ['PSS-78'],
      limits: { min: 0, max: 120 },
      optional: true,
      when: { water: ['fresh'] },
      reading: 'salinity',
    }),
    alkalinity: quantity({
      units: ['mg/L_CaCO3', 'meq/L', 'dKH'],
      limits: { min: 0, max: 99, plausible: { max: 10 } },
      reading: 'alkalinity',
    }),
    volume: quantity({ units: volumeUnits, limits: { above: 0 }, netVolume: true }),
    volumeError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'volume',
    }),
    purity: quantity({ units: ['percent_w_w'], limits: { above: 0, max: 100 }, optional: true }),
    division: quantity({ units: ['g', 'mg', 'kg'], limits: { above: 0 }, optional: true }),
  },
  fields: {
    alkalinityMgPerLCaCO3: 'alkalinity',
    salinityPss78: 'salinity',
    strength: 'purity',
    netVolume: 'volume',
  },
  example: {
    product: 'pentahydrate',
    water: 'fresh',
    alkalinity: { value: '120', unit: 'mg/L_CaCO3' },
    volume: { value: '20', unit: 'm3' },
    volumeError: { value: '5', unit: 'percent' },
    division: { value: '0.1', unit: 'g' },
  },
  sources: ['mcnevin-2003', 'copper-alkalinity-limits', 'treatment-practice', 'iupac-weights'],
  cautions: [
    ...copperCautions,
    {
      code: 'least',
      level: 'warning',
      params: { least: copperAlkalinityRule.leastMgPerLCaCO3 },
    },
    { code: 'oxygen', level: 'note' },
    { code: 'volume', level: 'note' },
  ],
  plot: { vary: 'alkalinity', unit: 'mg/L_CaCO3', from: 50, to: 400, figure: 'sulfate' },
  carries: [{ to: 'order', division: 'division' }],
  published: [
    'alkalinity_rule_copper_sulfate_mg_per_L',
    'alkalinity_rule_cu_mg_per_L',
    'alkalinity_rule_copper_sulfate_lb',
  ],
  compute({ product, water, salinity, alkalinity, volume, purity, division }) {
    if (product === 'chelated') return refuse('alkalinity-rule-chelated-product', 'product')
    if (water === 'salt') return refuse('copper-rule-fresh-water-only', 'water')
    const asCaCO3 = asTyped(alkalinity)
    if (!asCaCO3.ok) return asCaCO3
    const rule = copperByAlkalinity({
      alkalinityMgPerLCaCO3: asCaCO3.value,
      salinityPss78: salinity?.value ?? 0,
    })
    if (!rule.ok) return rule
    const { copperSulfateMgPerL, copperMgPerL, countedMgPerLCaCO3, capped } = rule.value
    const dose = computeBathDose({
      target: { concentration: quantityOf(copperSulfateMgPerL, 'mg/L'), basis: 'salt' },
      netLitres: volume.value,
      product: {
        form: 'solid',
        strength: purity?.entered ?? { value: '100', unit: 'percent_w_w' },
        strengthBasis: 'salt',
      },
      ...(division ? { measure: { division: division.entered } } : {}),
    })
    if (!dose.ok) return dose
    const { amount, unit, measured, working } = dose.value
    const pounds = convert(amount, 'g', 'lb')
    if (!pounds.ok) return pounds
    const cautions: BenchCaution[] = capped
      ? [
          {
            code: 'capped',
            level: 'note',
            params: { cap: copperAlkalinityRule.mostCountedMgPerLCaCO3 },
          },
        ]
      : []
    return ok({
      figures: [
        measuredFigure('amount', amount, unit, measured),
        { key: 'sulfate', value: copperSulfateMgPerL, unit: 'mg/L', figures: 3 },
        { key: 'copper', value: copperMgPerL, unit: 'mg/L', figures: 3 },
        { key: 'pounds', value: pounds.value, unit: 'lb', kind: 'dose' },
      ],
      working: [
        ...ruleLines(alkalinity, asCaCO3.value, countedMgPerLCaCO3, copperSulfateMgPerL, copperMgPerL),
        ...withVolumeAsEntered(working, volume),
      ],
      cautions,
    })
  },
})

/** From the digits as they were typed: 50 mg/L stays 50, and is not refused for a last binary digit. */
const asTyped = ({ entered }: ParsedQuantity) => convert(Number(entered.value), entered.unit, 'mg/L_CaCO3')

function ruleLines(
  alkalinity: ParsedQuantity,
  asCaCO3: number,
  counted: number,
  sulfate: number,
  copper: number,
): BenchLine[] {
  const { activeGPerMol, compoundGPerMol } = copperInPentahydrate
  const inOther = alkalinity.entered.unit !== 'mg/L_CaCO3'
  const toCaCO3 = `${valueTerm(alkalinity.value, 'meq/L')} * 100.086 / 2`
  return [
    ...(inOther ? [line('alkalinity', toCaCO3, asCaCO3, 'mg/L_CaCO3')] : []),
    line(
      'sulfate',
      `${valueTerm(counted, 'mg/L_CaCO3')} / 100 * 1 mg/L`,
      sulfate,
      'mg/L',
      inOther && counted === asCaCO3 ? ['alkalinity'] : [],
    ),
    line(
      'copper',
      `${valueTerm(sulfate, 'mg/L')} * ${String(activeGPerMol)} / ${String(compoundGPerMol)} to mg/L`,
      copper,
      'mg/L',
      ['sulfate'],
    ),
  ]
}
