import type { BathProduct } from '../../../domain/dose/bath-product.ts'
import type { ParsedQuantity } from '../../../domain/units/parse-quantity.ts'
import { choice, quantity } from '../../inputs.ts'

/** What a concentration can be of, other than the product as a whole. */
export const ofSubstance = ['active', 'salt', 'base', 'free', 'total'] as const

/** What a target in the water is given in. */
export const targetUnits = ['mg/L', 'uL/L', 'g/L', 'ug/L', 'mL/L', 'mL/m3', 'g/m3', 'percent_v_v'] as const

/** Words of a target with its basis. */
export const basisWords = {
  'option.basis.product': 'The product as it stands on the shelf',
  'option.basis.active': 'The active substance',
  'option.basis.salt': 'The salt or hydrate',
  'option.basis.base': 'The base',
  'option.basis.free': 'The free ion',
  'option.basis.total': 'The total of a metal',
} as const

/** Words of a product as its label describes it. */
export const productWords = {
  'input.form': 'Form of the product',
  'option.form.solid': 'Powder or crystals',
  'option.form.liquid': 'Liquid',
  'input.strength': 'Strength on the label',
  'help.strength': 'A percentage by weight of a liquid needs its density.',
  'input.strengthTolerance': 'Tolerance of the strength',
  'input.strengthOf': 'What the strength is of',
  'option.strengthOf.active': 'The active substance',
  'option.strengthOf.salt': 'The salt or hydrate',
  'option.strengthOf.base': 'The base',
  'option.strengthOf.total': 'The total of a metal',
  'input.share': 'Share of the target substance in what the label names',
  'help.share':
    'Only where the target is of one thing and the label of another: copper in its sulfate 25.45 %.',
  'input.density': 'Density of the product',
  'refusal.share-missing':
    'The target is of one substance and the label of another. Type the share of the target substance in what the label names, or give both of the same.',
} as const

export const basisInput = choice(['product', ...ofSubstance], { missing: 'basis-missing' })

const form = ['solid', 'liquid'] as const
const strength = {
  units: ['percent_w_w', 'mg/mL', 'percent_w_v', 'g/L', 'g/mL_w_v'],
  // 1,000 mg/mL or 100 % w/v; what is by weight never comes near it
  limits: { above: 0, plausible: { max: 1_000_000 } },
} as const
const tolerance = {
  units: ['percent'],
  limits: { min: 0, max: 90 },
  optional: true,
  errorOf: 'strength',
} as const
const strengthOf = ['active', 'salt', 'base', 'total'] as const
const missing = 'strength-basis-missing'
const share = { units: ['percent'], limits: { above: 0, max: 100 }, optional: true } as const
const density = {
  units: ['g/mL', 'kg/L', 'kg/m3'],
  limits: { min: 0.5, max: 3, plausible: { min: 0.7, max: 2 } },
  optional: true,
} as const

/** A product as its label describes it. Its strength matters only where the target is not of the product itself. */
export const productInputs = {
  form: choice(form),
  strength: quantity({ ...strength, when: { basis: ofSubstance } }),
  strengthTolerance: quantity({ ...tolerance, when: { basis: ofSubstance } }),
  strengthOf: choice(strengthOf, { missing, when: { basis: ofSubstance } }),
  share: quantity({ ...share, when: { basis: ofSubstance } }),
  density: quantity({ ...density, when: { form: ['liquid'] } }),
} as const

/** The same where a product is asked for only when this or that is to be found. */
export const productInputsToFind = (find: readonly string[]) =>
  ({
    form: choice(form, { when: { find } }),
    strength: quantity({ ...strength, when: { find, basis: ofSubstance } }),
    strengthTolerance: quantity({ ...tolerance, when: { find, basis: ofSubstance } }),
    strengthOf: choice(strengthOf, { missing, when: { find, basis: ofSubstance } }),
    share: quantity({ ...share, when: { find, basis: ofSubstance } }),
    density: quantity({ ...density, when: { find, form: ['liquid'] } }),
  }) as const

/** How the engines of doses name these inputs in their refusals. */
export const productFields = { purity: 'strength', netVolume: 'volume', strengthBasis: 'strengthOf' } as const

interface GivenProduct {
  form: 'solid' | 'liquid' | undefined
  strength: ParsedQuantity | undefined
  strengthOf: 'active' | 'salt' | 'base' | 'total' | undefined
  share: ParsedQuantity | undefined
  density: ParsedQuantity | undefined
}

/** The product as the engines take it. Where no form was asked, a liquid. */
export function productOf({
  form = 'liquid',
  strength,
  strengthOf,
  share,
  density,
}: GivenProduct): BathProduct {
  return {
    form,
    ...(strength ? { strength: strength.entered } : {}),
    ...(strengthOf ? { strengthBasis: strengthOf } : {}),
    ...(share ? { share: { activeGPerMol: share.value, compoundGPerMol: 100 } } : {}),
    ...(density ? { density: density.entered } : {}),
  }
}
