import { ok, refuse, type Result } from '../result.ts'
import type { ConcentrationBasis } from '../units/basis.ts'
import { valueTerm } from '../working/value-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import { activeShare } from './active-share.ts'
import type { BathProduct } from './bath-product.ts'
import type { DoseRefusal } from './dose-refusal.ts'

/**
 * From what is wanted (free copper) to what the label is of (copper sulfate pentahydrate), by molar masses. Where both
 * are one, nothing is done.
 *
 * A free-ion target for a product labelled by its total metal is refused whatever share is given: of a chelated product
 * no fixed part is free.
 *
 * @param active the line that gives the mass of what is wanted, mg
 * @returns the line that gives the mass of the labelled compound, and the lines that led to it
 * @refuses strength-basis-missing · ionic-target-chelated-product · share-missing · share-outside-range
 * @source  check values bath.14, cu.01
 */
export function compoundNeeded(
  basis: ConcentrationBasis,
  active: WorkingLine,
  product: BathProduct,
): Result<{ mass: WorkingLine; lines: WorkingLine[] }, DoseRefusal> {
  const { strengthBasis, share } = product
  if (strengthBasis === undefined) return refuse('strength-basis-missing', 'strengthBasis')
  if (basis === 'free' && strengthBasis === 'total') return refuse('ionic-target-chelated-product', 'basis')
  if (basis === strengthBasis) return ok({ mass: active, lines: [active] })
  if (share === undefined) return refuse('share-missing', 'share')
  const fraction = activeShare(share)
  if (!fraction.ok) return fraction
  const percent = fraction.value * 100
  const shareLine: WorkingLine = {
    key: 'active-share',
    code: 'active-share',
    params: {},
    expression: `${share.activeGPerMol} / ${share.compoundGPerMol} * 100`,
    value: percent,
    unit: 'percent',
    rests: [],
  }
  const milligrams = active.value / fraction.value
  const mass: WorkingLine = {
    key: 'compound',
    code: 'product-mass',
    params: {},
    // by the masses themselves: the share as shown is rounded, and whoever works it out again would get another figure
    expression: `${valueTerm(active.value, 'mg')} / (${share.activeGPerMol} / ${share.compoundGPerMol}) to mg`,
    value: milligrams,
    unit: 'mg',
    rests: [active.key],
  }
  return ok({ mass, lines: [active, shareLine, mass] })
}
