import { copperConcentration } from '../../domain/cautions/copper-concentration.ts'
import { exceeds } from '../../domain/cautions/exceeds.ts'
import { copperInPentahydrate } from '../../domain/dose/copper.ts'
import { computeBathDose } from '../../domain/dose/compute-bath-dose.ts'
import { withoutTrailingZeros } from '../../domain/quantities/number-text.ts'
import { ok, refuse } from '../../domain/result.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchCaution } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { copperCautions, copperWords } from './parts/copper-words.ts'
import { measuredFigure } from './parts/measured-figure.ts'
import { volumeUnits, withVolumeAsEntered } from './parts/volume-input.ts'

/** Free copper that marine systems are usually kept at. @source ufifas-fa165, the range from memory */
const usualMgPerL = { low: 0.15, high: 0.2 }

/** Copper sulfate pentahydrate in fresh water, whatever its alkalinity, mg/L. @source ufifas-fa008 */
const mostFreshMgPerL = 2.5

/** Grams of copper sulfate for a target of free copper, or for what a test says is missing. */
export const copperSulfate = defineCalculator({
  id: 'copper-sulfate',
  group: 'dose',
  weekly: true,
  words: defineMessages({
    name: 'Copper sulfate',
    purpose: 'How much copper sulfate pentahydrate brings the free copper of a water to its target.',
    formula: 'mass = (target − measured) × net volume ÷ 0.2545',
    'input.product': 'Copper product',
    'option.product.pentahydrate': 'Copper sulfate pentahydrate',
    'option.product.chelated': 'A chelated or amine-complexed product',
    'input.targetOf': 'What the target is of',
    'option.targetOf.copper': 'Free copper (Cu²⁺)',
    'option.targetOf.compound': 'Copper sulfate pentahydrate',
    'input.target': 'Target in the water',
    'help.target': 'As the order says. Marine systems are usually kept at 0.15 to 0.2 mg/L of free copper.',
    'input.measured': 'Free copper by a test',
    'help.measured': 'Of copper, whatever the target is of.',
    'input.volume': 'Net volume of the water',
    'input.volumeError': 'Error of the volume',
    'input.purity': 'Purity of the salt',
    'input.division': 'Smallest step of the balance',
    'result.amount': 'Copper sulfate to add',
    'refusal.ionic-target-chelated-product':
      'A target of free copper must not be used for a chelated product. Dose it by its label, in total copper, and test it the way its maker says.',
    'refusal.reading-at-or-above-target':
      'The copper that was found is at or above the copper of the target. Nothing is to be added. 1 mg/L of copper is 3.93 mg/L of the pentahydrate.',
    'refusal.copper-basis-not-stated':
      'Choose what the target is of. Copper and copper sulfate differ by 3.93 times.',
    'caution.above-usual': (p: { low: string; high: string }) =>
      `More free copper than marine systems are usually kept at, ${p.low} to ${p.high} mg/L (from memory). Read the order again: one decimal place is ten times the copper, which kills.`,
    'caution.compound-above-usual': (p: { copper: string; low: string; high: string; most: string }) =>
      `This target is ${p.copper} mg/L of copper. Marine systems are usually kept at ${p.low} to ${p.high} mg/L of it (from memory). In fresh water the alkalinity sets the dose, and never more than ${p.most} mg/L of the pentahydrate: the calculator of copper by alkalinity works it out. Read the order again.`,
    ...copperWords,
    'caution.steps':
      'Raise it in steps over days, test at least daily, and write every reading down before adding.',
    'caution.volume': 'A wrong volume is a wrong dose: say how the volume was found, and when.',
  }),
  inputs: {
    product: choice(['pentahydrate', 'chelated']),
    targetOf: choice(['copper', 'compound'], { missing: 'copper-basis-not-stated' }),
    target: quantity({
      units: ['mg/L', 'ug/L', 'g/m3'],
      limits: { above: 0, max: 1000, plausible: { max: 3 } },
    }),
    measured: quantity({
      units: ['mg/L', 'ug/L'],
      limits: { min: 0 },
      optional: true,
      reading: 'copper-free',
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
  fields: { reading: 'measured', strength: 'purity', netVolume: 'volume', basis: 'targetOf' },
  example: {
    product: 'pentahydrate',
    targetOf: 'copper',
    target: { value: '0.2', unit: 'mg/L' },
    volume: { value: '11400', unit: 'L' },
    division: { value: '0.1', unit: 'g' },
  },
  sources: ['ufifas-fa165', 'ufifas-fa008', 'treatment-practice', 'iupac-weights'],
  cautions: [...copperCautions, { code: 'steps', level: 'note' }, { code: 'volume', level: 'note' }],
  carries: [
    {
      to: 'order',
      target: 'target',
      basis: { input: 'targetOf', as: { copper: 'free', compound: 'salt' } },
      division: 'division',
    },
  ],
  published: ['copper_sulfate_g'],
  compute({ product, targetOf, target, measured, volume, purity, division }) {
    if (product === 'chelated') return refuse('ionic-target-chelated-product', 'product')
    const dose = computeBathDose({
      target: { concentration: target.entered, basis: targetOf === 'copper' ? 'free' : 'salt' },
      netLitres: volume.value,
      product: {
        form: 'solid',
        strength: purity?.entered ?? { value: '100', unit: 'percent_w_w' },
        strengthBasis: 'salt',
        share: copperInPentahydrate,
      },
      ...(measured ? { present: measured.entered } : {}),
      ...(targetOf === 'compound' ? { presentShare: copperInPentahydrate } : {}),
      ...(division ? { measure: { division: division.entered } } : {}),
    })
    if (!dose.ok) return dose
    const { amount, unit, measured: weighed, working } = dose.value
    // whatever the target is of, it is the copper that kills
    const copper = copperConcentration({
      value: target.value,
      unit: 'mg/L',
      basis: targetOf === 'copper' ? 'free' : 'salt',
    })
    const isAboveUsual = copper !== null && exceeds(copper.copperMgPerL, usualMgPerL.high)
    const cautions: BenchCaution[] = []
    if (isAboveUsual && targetOf === 'copper')
      cautions.push({ code: 'above-usual', level: 'warning', params: usualMgPerL })
    // fresh water is dosed by the compound, and by its alkalinity
    if (isAboveUsual && targetOf === 'compound')
      cautions.push({
        code: 'compound-above-usual',
        level: 'warning',
        params: {
          ...usualMgPerL,
          copper: withoutTrailingZeros(copper.copperMgPerL.toPrecision(3)),
          most: mostFreshMgPerL,
        },
      })
    return ok({
      figures: [measuredFigure('amount', amount, unit, weighed)],
      working: withVolumeAsEntered(working, volume),
      cautions,
    })
  },
})
