/**
 * Molar masses of nitrogen and of the two forms of ammonia, g/mol.
 *
 * @source iupac-weights · check values nh3conv.01 to nh3conv.03
 */
export const nitrogenGPerMol = 14.007
export const ammoniaGPerMol = 17.031
export const ammoniumGPerMol = 18.039

/** What a test for ammonia says its figure is of; never guessed. */
export const ammoniaBases = ['n', 'nh3', 'nh4'] as const
export type AmmoniaBasis = (typeof ammoniaBases)[number]

/** Grams of the form that hold a gram of nitrogen. */
export const gramsPerGramOfNitrogen: Readonly<Record<AmmoniaBasis, number>> = {
  n: 1,
  nh3: ammoniaGPerMol / nitrogenGPerMol,
  nh4: ammoniumGPerMol / nitrogenGPerMol,
}
