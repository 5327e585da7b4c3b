import { ok, refuse, type Result } from '../result.ts'
import { chlorineMasses } from './chlorine-masses.ts'
import type { NeutralisationRefusal } from './neutralisation-refusal.ts'

/** What is printed on the jar: sodium thiosulfate pentahydrate (crystals), or anhydrous (powder). */
export type ThiosulfateForm = 'pentahydrate' | 'anhydrous'

/** What has the chlorine in it: a disinfectant that is to be thrown away, or water that comes in. */
export type ChlorinatedWater = 'spent-disinfectant' | 'tap-water'

const { chlorineGPerMol, thiosulfateGPerMol } = chlorineMasses

const isForm = (form: ThiosulfateForm): boolean => form === 'pentahydrate' || form === 'anhydrous'

/**
 * Thiosulfate for a milligram of chlorine by the equation 2 Na₂S₂O₃ + Cl₂ → Na₂S₄O₆ + 2 NaCl.
 *
 * @param input.form    which of the two is weighed; not stated, it is refused
 * @param input.product what thiosulfate becomes: only tetrathionate. On to sulfate it would take 0.875 mg of the
 *                      pentahydrate, but so slowly that no dose is planned by it
 * @returns mg per mg of Cl₂: 7.001 of the pentahydrate, 4.460 anhydrous
 * @refuses thiosulfate-form-not-stated (form) · only-tetrathionate-plans-a-dose (product)
 * @source  thiosulfate-stoichiometry · iupac-weights · check values dechl.01, dechl.02, dechl.refuse2
 */
export function stoichiometricThiosulfateRatio(input: {
  form: ThiosulfateForm
  product: 'tetrathionate'
}): Result<number, NeutralisationRefusal> {
  const { form, product } = input
  if (!isForm(form)) return refuse('thiosulfate-form-not-stated', 'form')
  // the type knows no other, a hostile caller does
  if ((product as string) !== 'tetrathionate') return refuse('only-tetrathionate-plans-a-dose', 'product')
  return ok((2 * thiosulfateGPerMol[form]) / chlorineGPerMol)
}

/** Of the pentahydrate, mg per mg of Cl₂. */
const practicalRatios = {
  'spent-disinfectant': { least: 7, most: 7.4 },
  'tap-water': { least: 10, most: 10 },
} as const satisfies Record<ChlorinatedWater, { least: number; most: number }>

/**
 * Thiosulfate for a milligram of chlorine as it is done: 7 to 7.4 for spent disinfectant, 10 for tap water that comes in, of
 * the pentahydrate. Of the anhydrous salt the same amount in moles, which is 0.637 of the mass.
 *
 * @returns mg per mg of Cl₂
 * @refuses thiosulfate-form-not-stated (form) · chlorinated-water-not-stated (chlorinatedWater)
 * @source  spent disinfectant: thiosulfate-support-note (7.0), piper-1982 (7.4) · tap water: dechlorination-practice, from memory ·
 *          check values dechl.03, dechl.04, dechl.06
 */
export function practicalThiosulfateRatio(input: {
  form: ThiosulfateForm
  chlorinatedWater: ChlorinatedWater
}): Result<{ least: number; most: number }, NeutralisationRefusal> {
  const { form, chlorinatedWater } = input
  if (!isForm(form)) return refuse('thiosulfate-form-not-stated', 'form')
  if (chlorinatedWater !== 'spent-disinfectant' && chlorinatedWater !== 'tap-water')
    return refuse('chlorinated-water-not-stated', 'chlorinatedWater')
  const { least, most } = practicalRatios[chlorinatedWater]
  const share = thiosulfateGPerMol[form] / thiosulfateGPerMol.pentahydrate
  return ok({ least: least * share, most: most * share })
}
