/**
 * Beyond these a typed figure is taken for a slip and refused. What is safe for an animal is judged by the cautions,
 * not here.
 *
 * @source project-default: the strongest baths in use are salt dips of about 35 g/L and egg baths of 2 mL/L
 */
export const doseLimits = {
  mostTargetMgPerL: 100_000,
  mostTargetUlPerL: 100_000,
  /** mg or µL of a stock solution: a kilogram or a litre of something in a litre. */
  mostStockPerL: 1_000_000,
  /** A drug of ten grams for a kilogram, and an animal of twenty tonnes: as of an injection on the bench. */
  mostDoseMgPerKg: 10_000,
  mostWeightGrams: 20_000_000,
  leastDensityGPerMl: 0.5,
  mostDensityGPerMl: 3,
  mostStrengthMgPerMl: 2000,
  /** An amount of fewer divisions than this cannot be weighed well enough; a stock solution is needed. */
  leastDivisions: 10,
  /** A second calculation agrees within this share of the first, or within one division. */
  agreementPercent: 2,
  /** How much volume and weight may have drifted since the signature, unless the order says otherwise. */
  volumeDriftPercent: 5,
  weightDriftPercent: 10,
  /** How long a reading counts for a reading-driven addition. */
  readingValidMinutes: 120,
} as const
