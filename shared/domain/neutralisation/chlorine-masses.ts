/**
 * Molar masses of what reacts with chlorine, g/mol, from Na 22.990, S 32.06, O 15.999, H 1.008, N 14.007, Cl 35.45.
 *
 * @source iupac-weights
 */
const anhydrous = 2 * 22.99 + 2 * 32.06 + 3 * 15.999
const water = 2 * 1.008 + 15.999

export const chlorineMasses = {
  chlorineGPerMol: 2 * 35.45,
  nitrogenGPerMol: 14.007,
  /** Of the two forms in which sodium thiosulfate is sold. */
  thiosulfateGPerMol: { anhydrous, pentahydrate: anhydrous + 5 * water },
} as const
