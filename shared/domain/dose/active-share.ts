import { ok, refuse, type Result } from '../result.ts'
import type { MolarShare } from './bath-product.ts'
import type { DoseRefusal } from './dose-refusal.ts'

/**
 * Mass of the part that counts in a mass of the compound, a fraction above 0 and at most 1.
 *
 * @param share molar masses, g/mol; those of several atoms in one formula are already multiplied
 * @refuses share-outside-range: not finite, not above zero, or a part heavier than the whole
 * @source  ratio of molar masses · check value bath.frac01
 */
export function activeShare(share: MolarShare): Result<number, DoseRefusal> {
  const { activeGPerMol, compoundGPerMol } = share
  const fraction = activeGPerMol / compoundGPerMol
  const sound = activeGPerMol > 0 && compoundGPerMol > 0 && fraction <= 1 && Number.isFinite(compoundGPerMol)
  return sound ? ok(fraction) : refuse('share-outside-range', 'share')
}
