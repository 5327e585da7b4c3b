import type { MolarShare } from './bath-product.ts'

/**
 * Copper in copper sulfate pentahydrate: 63.546 ÷ 249.685 = 25.45 %. The one pair of molar masses for the whole
 * project, so that two screens never differ in the last digit.
 *
 * @source iupac-weights · check value bath.frac01; a set computed with 249.677 differs by 0.003 %
 */
export const copperInPentahydrate = {
  activeGPerMol: 63.546,
  compoundGPerMol: 249.685,
} as const satisfies MolarShare
